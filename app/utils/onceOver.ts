/** Ways along the rail that are less than this apart across it are one line on the screen. */
const SAME_LINE = 0.5; // px

/** The way with no stretch of it drawn twice: along the rail by what has been covered of each line, round the ends by its pieces. */
export function onceOver(px: readonly number[], py: readonly number[]): string {
  const covered = new Map<number, [number, number][]>();
  const drawn = new Set<string>();
  let [path, last] = ['', ''];
  const draw = (x0: number, y0: number, x1: number, y1: number) => {
    const [from, to] = [`${x0.toFixed(1)} ${y0.toFixed(1)}`, `${x1.toFixed(1)} ${y1.toFixed(1)}`];
    path += from === last ? `L${to}` : `M${from}L${to}`;
    last = to;
  };
  for (let i = 0; i + 1 < px.length; i++) {
    const [x0 = 0, y0 = 0, x1 = 0, y1 = 0] = [px[i], py[i], px[i + 1], py[i + 1]];
    if (Math.abs(y1 - y0) >= SAME_LINE) {
      const key = [`${x0.toFixed(1)} ${y0.toFixed(1)}`, `${x1.toFixed(1)} ${y1.toFixed(1)}`].sort().join();
      if (!drawn.has(key)) draw(x0, y0, x1, y1);
      drawn.add(key);
      continue;
    }
    const row = Math.round(y0 / SAME_LINE);
    const spans = covered.get(row) ?? [];
    for (const [a, b] of gapsIn(spans, Math.min(x0, x1), Math.max(x0, x1))) draw(x0 < x1 ? a : b, y0, x0 < x1 ? b : a, y0);
    covered.set(row, joined(spans, Math.min(x0, x1), Math.max(x0, x1)));
  }
  return path;
}

/** What of a stretch the spans, in order and apart, leave free. */
function gapsIn(spans: readonly (readonly [number, number])[], from: number, to: number): [number, number][] {
  const gaps: [number, number][] = [];
  let at = from;
  for (const [a, b] of spans) {
    if (a > at) gaps.push([at, Math.min(a, to)]);
    at = Math.max(at, b);
    if (at >= to) return gaps;
  }
  return at < to ? [...gaps, [at, to]] : gaps;
}

/** The spans with one more, joined with those it touches. */
function joined(spans: readonly [number, number][], from: number, to: number): [number, number][] {
  const apart = spans.filter(([a, b]) => b < from || a > to);
  const touched = spans.filter(([a, b]) => b >= from && a <= to);
  const all: [number, number] = [Math.min(from, ...touched.map(([a]) => a)), Math.max(to, ...touched.map(([, b]) => b))];
  return [...apart, all].sort(([a], [b]) => a - b);
}
