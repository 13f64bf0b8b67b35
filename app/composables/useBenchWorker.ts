/** Whether the bench opens without a network on this tablet: not known yet, ready, or why it does not. */
export function useBenchWorker() {
  const state = useState<'unknown' | 'ready' | 'insecure' | 'unsupported' | 'failed'>('bench-worker', () => 'unknown');
  onMounted(async () => {
    if (!window.isSecureContext) state.value = 'insecure';
    else if (!('serviceWorker' in navigator)) state.value = 'unsupported';
    else if (!import.meta.dev) await register(); // the development server builds no worker
  });
  async function register(): Promise<void> {
    try {
      const { installing } = await navigator.serviceWorker.register('/bench-worker.js', { scope: '/bench' });
      installing?.addEventListener('statechange', () => {
        if (installing.state === 'redundant' && !navigator.serviceWorker.controller) state.value = 'failed'; // a file of the bench could not be fetched
      });
      await navigator.serviceWorker.ready;
      state.value = 'ready';
    } catch (error) {
      if (!(error instanceof Error)) throw error;
      // Without a network the worker that runs already serves the page: only its update is not to be had.
      state.value = navigator.serviceWorker.controller ? 'ready' : 'failed';
    }
  }
  const words = computed(() => ({
    unknown: '',
    ready: '',
    insecure: 'Without a network this page does not open here: the address begins with http, and browsers keep pages only from https or from this computer itself. Serve Tallyrail over https to change that. Logged cuts are kept all the same while the page stays open.',
    unsupported: 'This browser keeps no pages: without a network the bench does not open. Logged cuts are kept while the page stays open.',
    failed: 'This tablet could not keep the bench for times without a network. Reload once there is one.',
  })[state.value]);
  return { state, words };
}
