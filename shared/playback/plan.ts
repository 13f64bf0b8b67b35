import type { Segments } from './segments';

/** One unbroken cut seen from above, as an SVG path in program coordinates (Y up). */
export interface PlanRun {
  readonly d: string;
  readonly finish: boolean;
  /** Length of the line as drawn: what goes straight down has none. */
  readonly drawn: number;
  /** For each of its points, the program's travel and the drawn length there. */
  readonly travel: Float64Array;
  readonly at: Float64Array;
}

/** The cuts, each run of motions without a rapid between as one line (a finish lap as its own), and the rapids as one path. */
export function planRuns({ count, ends, travel, rapid, finish }: Segments): { readonly cuts: readonly PlanRun[]; readonly rapids: string } {
  const cuts: PlanRun[] = [];
  let rapids = '';
  for (let i = 0; i < count; ) {
    let end = i + 1;
    while (end < count && rapid[end] === rapid[i] && finish?.[end] === finish?.[i]) end++;
    const run = { ...planRun(ends.subarray(i * 6, end * 6), travel.subarray(i * 2, end * 2)), finish: finish?.[i] === 1 };
    if (rapid[i] === 1) rapids += run.d;
    else cuts.push(run);
    i = end;
  }
  return { cuts, rapids };
}

const place = (x: number, y: number): string => `${+x.toFixed(4)} ${+y.toFixed(4)}`;

function planRun(ends: Float64Array, travels: Float64Array): Omit<PlanRun, 'finish'> {
  const count = ends.length / 6;
  const travel = new Float64Array(count + 1);
  const at = new Float64Array(count + 1);
  const d = [`M${place(ends[0] ?? 0, ends[1] ?? 0)}`];
  travel[0] = travels[0] ?? 0;
  for (let i = 0; i < count; i++) {
    const [ax = 0, ay = 0, , bx = 0, by = 0] = ends.subarray(i * 6, i * 6 + 6);
    d.push(`L${place(bx, by)}`);
    travel[i + 1] = travels[i * 2 + 1] ?? 0;
    at[i + 1] = (at[i] ?? 0) + Math.hypot(bx - ax, by - ay);
  }
  return { d: d.join(''), drawn: at[count] ?? 0, travel, at };
}

/** How much of the run's drawn line is behind at a travel. */
export function drawnAt({ travel, at }: PlanRun, travelled: number): number {
  let low = 0;
  let high = travel.length - 1;
  if (travelled <= (travel[0] ?? 0)) return 0;
  if (travelled >= (travel[high] ?? 0)) return at[high] ?? 0;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if ((travel[middle] ?? 0) <= travelled) low = middle;
    else high = middle;
  }
  const [a = 0, b = 0, from = 0, to = 0] = [travel[low], travel[high], at[low], at[high]];
  return b > a ? from + ((to - from) * (travelled - a)) / (b - a) : from;
}
