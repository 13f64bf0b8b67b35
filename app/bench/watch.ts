import type { StopwatchMark } from '#shared/shop/stopwatch';

/** Where the stopwatch stands: seconds gathered, when it was last set going, and how many stops of the program are behind. */
export interface WatchState {
  readonly gathered: number;
  /** ms since the epoch; null: it stands. */
  readonly since: number | null;
  readonly stopsBehind: number;
}

/** What the stopwatch shows. */
export interface WatchFace {
  readonly seconds: number;
  /** The program stands at a stop of its own and waits for a hand: nobody knows how long that takes, so the watch stands too. */
  readonly held: boolean;
}

/** Reads the watch at a moment (ms since the epoch): it runs on until the program's next stop. */
export function readWatch({ gathered, since, stopsBehind }: WatchState, marks: readonly StopwatchMark[], now: number): WatchFace {
  const run = gathered + (since === null ? 0 : Math.max(0, now - since) / 1000);
  const stop = marks.filter(({ kind }) => kind === 'stop')[stopsBehind];
  return stop && run >= stop.seconds && since !== null ? { seconds: stop.seconds, held: true } : { seconds: run, held: false };
}

/** The watch set going: at the start, after it was stopped, or past the stop that it was held at. */
export function goOn(state: WatchState, marks: readonly StopwatchMark[], now: number): WatchState {
  const { seconds, held } = readWatch(state, marks, now);
  return { gathered: seconds, since: now, stopsBehind: state.stopsBehind + (held ? 1 : 0) };
}

/** The watch stopped where it is. */
export function stopWatch(state: WatchState, marks: readonly StopwatchMark[], now: number): WatchState {
  return { ...state, gathered: readWatch(state, marks, now).seconds, since: null };
}
