/** Lets in who may see a page: `roles` in its meta, or whoever is signed in. The data behind it is guarded by the API's own table. */
export default defineNuxtRouteMiddleware(async (to) => {
  const { account, refresh } = useAccount();
  const { person } = account.value ?? (await refresh());
  if (!person) return navigateTo({ path: '/sign-in', query: { to: to.fullPath } });
  const { roles } = to.meta;
  if (roles && !roles.includes(person.role)) return navigateTo(HOMES[person.role]);
});
