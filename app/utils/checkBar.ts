/** Bars to hold a rule against: 4 in and 100 mm, in CSS px; paper printed at another size shows it here. */
export const CHECK_BARS = [
  { words: '4 in', length: 4 * 96, parts: 4 },
  { words: '100 mm', length: (100 / 25.4) * 96, parts: 10 },
] as const;

/** One bar as a path: its line first, then a tick at every part, the ends higher. */
export function checkBarPath({ length, parts }: { readonly length: number; readonly parts: number }, x: number, y: number): string {
  const r = (value: number) => String(Number(value.toFixed(4)));
  const ticks = Array.from({ length: parts + 1 }, (_, i) => {
    const high = i === 0 || i === parts ? 8 : 4;
    return `M${r(x + (i * length) / parts)} ${r(y - high)}v${2 * high}`;
  });
  return `M${r(x)} ${r(y)}H${r(x + length)}${ticks.join('')}`;
}
