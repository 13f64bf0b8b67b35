/** A small repeatable scatter, 0 to 1: the same rail always shows the same grain. */
function scatter(seed: number): () => number {
  let state = seed % 2147483647 || 1;
  return () => (state = (state * 48271) % 2147483647) / 2147483647; // Park and Miller's minimal generator, 1988
}

/** Long grain seen from above: lines that wander a little, and short flecks between them. */
export function longGrain(left: number, right: number, top: number, bottom: number, seed: number): string {
  const next = scatter(seed * 7919 + 17);
  const height = bottom - top;
  const count = Math.max(3, Math.round(height / 9));
  const r = (value: number) => value.toFixed(1);
  const lines = Array.from({ length: count }, (_, i) => {
    const y = top + ((i + 0.3 + 0.4 * next()) * height) / count;
    const [bend, third] = [(next() - 0.5) * 9, (right - left) / 3];
    return `M${r(left)} ${r(y)}C${r(left + third)} ${r(y + bend)} ${r(right - third)} ${r(y - bend)} ${r(right)} ${r(y + bend * 0.3)}`;
  });
  const flecks = Array.from({ length: Math.round((right - left) / 34) }, () => {
    const [x, y] = [left + next() * (right - left), top + 4 + next() * (height - 8)];
    return `M${r(x)} ${r(y)}h${r(5 + 9 * next())}`;
  });
  return [...lines, ...flecks].join('');
}
