import type { Work } from '#shared/commission/work';
import type { Arrangement } from '#shared/piece/arrange';
import { type PieceWorkedOut, workOutPiece } from '~/piece/workOut';

/** A piece worked out anew whenever its work changes, in a worker: only the newest answer is shown, and the one before it until then. */
export function usePieceWorker(work: Readonly<Ref<Work | null>>) {
  const worked = shallowRef<PieceWorkedOut | null>(null);
  const busy = ref(false);
  let [worker, number]: [Worker | null, number] = [null, 0];
  /** The work that the newest answer is of. */
  const drawn = shallowRef<Work | null>(null);
  /** The newest arrangement that stands, with its work: the drawing keeps it while pins contradict each other. */
  const standing = shallowRef<{ readonly work: Work; readonly arrangement: Arrangement } | null>(null);

  function take(answer: PieceWorkedOut, of: Work): void {
    [worked.value, drawn.value, busy.value] = [answer, of, false];
    if (answer.arranged.ok) standing.value = { work: of, arrangement: answer.arranged.arrangement };
  }
  function hire(): Worker | null {
    try {
      return new Worker(new URL('../piece/worker.ts', import.meta.url), { type: 'module' });
    } catch {
      return null; // no worker may be started here: the page works it out itself
    }
  }
  function order(asked: Work): void {
    const mine = ++number;
    busy.value = true;
    // A search that is no longer wanted is ended, not waited for.
    if (worker && worker.onmessage) worker.terminate();
    worker = hire();
    if (!worker) return take(workOutPiece(asked), asked);
    worker.onmessage = ({ data }: MessageEvent<{ readonly number: number; readonly worked: PieceWorkedOut }>) => {
      if (data.number === mine && mine === number) take(data.worked, asked);
    };
    worker.onerror = () => {
      if (mine === number) take(workOutPiece(asked), asked);
    };
    worker.postMessage({ number: mine, work: asked });
  }
  onMounted(() => watch(work, (asked) => { if (asked) order(asked); }, { immediate: true }));
  onUnmounted(() => worker?.terminate());
  return { worked, drawn, standing, busy };
}
