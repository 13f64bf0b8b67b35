/** Milliseconds of work between two chances for the page to draw: half a frame at 60 a second. */
const SLICE = 8;

/**
 * Runs a generator to its end without holding the page up. Answers undefined once `stopped` says so.
 */
export async function inSlices<T>(work: Generator<number, T>, stopped: () => boolean, onShare: (share: number) => void): Promise<T | undefined> {
  let began = performance.now();
  for (;;) {
    const next = work.next();
    if (next.done) return stopped() ? undefined : next.value;
    if (performance.now() - began < SLICE) continue;
    onShare(next.value);
    await new Promise((resolve) => setTimeout(resolve));
    if (stopped()) return undefined;
    began = performance.now();
  }
}
