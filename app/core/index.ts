import type { Step } from '#shared/reader/motion';
import type { Answer, RawRequest } from './answer';
import { type Order, type Parcel, readingOf } from './parcels';

/** A worker busy for longer than this is not waited for: a new one is at work sooner. */
const PATIENCE = 250; // ms

/**
 * The core as the page asks it: in a worker, fetched with the first question, or on the page's own thread where there
 * can be none. Only the newest question is answered.
 */
export function startCore(hear: (answer: Answer) => void): { readonly ask: (raw: RawRequest) => void } {
  let worker: Worker | null = null;
  let number = 0;
  let steps: Step[] = [];
  let newest: RawRequest = {};
  let working = false;
  let since = 0;
  let waiting = false;

  function ask(raw: RawRequest): void {
    newest = raw;
    if (typeof Worker === 'undefined') return void here();
    if (working && performance.now() - since < PATIENCE) {
      waiting = true;
      return;
    }
    if (working) drop();
    send();
  }

  function send(): void {
    try {
      worker ??= hire();
    } catch {
      return void here();
    }
    steps = [];
    working = true;
    waiting = false;
    since = performance.now();
    worker.postMessage({ number: ++number, raw: newest } satisfies Order);
  }

  function hire(): Worker {
    const hired = new Worker(new URL('./worker.ts', import.meta.url), { type: 'module' });
    hired.onmessage = ({ data }: MessageEvent<Parcel>) => {
      if (data.number === number && hired === worker) take(data);
    };
    hired.onerror = () => {
      if (hired !== worker) return;
      drop();
      void here();
    };
    return hired;
  }

  function drop(): void {
    worker?.terminate();
    worker = null;
    working = false;
  }

  function take(parcel: Parcel): void {
    if (parcel.kind === 'steps') {
      steps.push(...parcel.steps);
      return;
    }
    const refused = parcel.kind === 'judged' && parcel.issues.length > 0;
    const done = parcel.kind === 'made' || refused;
    // With a newer question waiting, nobody wants the old answer.
    if (!waiting) hear(parcel.kind === 'made' ? { kind: 'made', ...readingOf(parcel, steps) } : parcel);
    if (!done) return;
    working = false;
    if (waiting) send();
  }

  /** Without a worker: a pause between judging and making, in which a newer question can come. */
  async function here(): Promise<void> {
    const mine = ++number;
    try {
      const { answer } = await import('./answer');
      for (const said of answer(newest)) {
        if (mine !== number) return;
        hear(said);
        await new Promise((resolve) => setTimeout(resolve));
        if (mine !== number) return;
      }
    } catch {
      if (mine === number) hear({ kind: 'stopped' });
    }
  }

  return { ask };
}
