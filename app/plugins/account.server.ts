/** Who is signed in is known before the page is drawn. */
export default defineNuxtPlugin({
  name: 'account',
  async setup() {
    await useAccount().refresh();
  },
});
