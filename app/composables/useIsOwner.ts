/** Whether the reader may change the shop's records: the API asks again. */
export function useIsOwner() {
  const { account } = useAccount();
  return computed(() => account.value?.person?.role === 'owner');
}
