import type { Segments, StageSizes } from '#shared/playback/index';
import { inSlices } from './inSlices';
import { type WorkedOut, workOut } from './workOut';

/** To the worker. */
export interface CutOrder {
  readonly segments: Segments;
  readonly sizes: Pick<StageSizes, 'bitDiameter' | 'rail'>;
}

/** From the worker. */
export type CutReport = { readonly kind: 'share'; readonly share: number } | { readonly kind: 'done'; readonly worked: WorkedOut };

/**
 * Works pictures out one after the other, only the newest to its end: in a worker, or in slices on the page's own thread
 * where there can be none.
 */
export function startWork(): { readonly work: (order: CutOrder, onShare: (share: number) => void) => Promise<WorkedOut | undefined>; readonly stop: () => void } {
  let worker: Worker | null = null;
  let leave: () => void = () => undefined;
  let number = 0;

  /** Ends the work under way: its promise answers undefined. */
  function stop(): void {
    number++;
    worker?.terminate();
    worker = null;
    leave();
  }

  function work(order: CutOrder, onShare: (share: number) => void): Promise<WorkedOut | undefined> {
    stop();
    const mine = number;
    const here = () => inSlices(workOut(order.segments, order.sizes), () => mine !== number, onShare);
    if (typeof Worker === 'undefined') return here();
    return new Promise((resolve, reject) => {
      leave = () => resolve(undefined);
      const instead = () => {
        if (mine === number) here().then(resolve, reject);
      };
      try {
        const hired = worker = new Worker(new URL('./worker.ts', import.meta.url), { type: 'module' });
        hired.onmessage = ({ data }: MessageEvent<CutReport>) => {
          if (mine !== number) return;
          if (data.kind === 'share') return onShare(data.share);
          resolve(data.worked);
          hired.terminate();
        };
        hired.onerror = instead;
        hired.postMessage(order);
      } catch {
        instead(); // no worker may be started here: the page works it out itself, as said above
      }
    });
  }
  return { work, stop };
}
