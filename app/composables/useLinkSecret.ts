/**
 * The secret of a mailed link. It stands behind the number sign, which browsers send to nobody, and leaves the address
 * and the history at once.
 */
export function useLinkSecret() {
  const secret = ref('');
  onMounted(() => {
    secret.value = window.location.hash.slice(1);
    window.history.replaceState(window.history.state, '', window.location.pathname);
  });
  return secret;
}
