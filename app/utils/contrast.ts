/** Relative luminance of `#RRGGBB` or `#RGB` (WCAG 2.2, definition of relative luminance), or NaN for anything else. */
export function luminance(colour: string): number {
  const hex = colour.replace(/^#(.)(.)(.)$/, '#$1$1$2$2$3$3'); // a build shortens #FFFFFF to #fff
  if (!/^#[0-9a-f]{6}$/i.test(hex)) return NaN;
  const [r = 0, g = 0, b = 0] = [1, 3, 5].map((at) => {
    const part = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
    return part <= 0.04045 ? part / 12.92 : ((part + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

/** How far two colours stand apart, 1 to 21 (WCAG 2.2, definition of contrast ratio). */
export function contrast(one: string, other: string): number {
  const [light, dark] = [luminance(one), luminance(other)].sort((a, b) => b - a);
  return ((light ?? NaN) + 0.05) / ((dark ?? NaN) + 0.05);
}
