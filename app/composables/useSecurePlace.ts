/** Whether the browser takes this page for secure: passkeys and pages without a network are for such pages alone. */
export function useSecurePlace() {
  const ready = ref(false);
  const secure = ref(false);
  onMounted(() => {
    secure.value = window.isSecureContext;
    ready.value = true;
  });
  return { ready, secure };
}
