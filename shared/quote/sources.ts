import { type Correction, LEAST_TIMES } from './correction';

/** Where a line's figure comes from. */
export type Source =
  | { readonly kind: 'buyingPlan' }
  | { readonly kind: 'programs'; readonly correction: Correction }
  | { readonly kind: 'labour'; readonly correction: Correction }
  | { readonly kind: 'shop' };

const figure = (ratio: number) => String(Number(ratio.toFixed(2)));

function corrected({ ratio, spread, count }: Correction, from: string, of: string): string {
  if (!spread) return `${from}, as it stands: ${count} of ${LEAST_TIMES} timed ${of} that a correction takes.`;
  return `${from} × ${figure(ratio)}, as ${count} timed ${of} took; half of them ${figure(spread.low)} to ${figure(spread.high)} times.`;
}

/** A source in words, beside its line. */
export function sourceWords(source: Source): string {
  switch (source.kind) {
    case 'buyingPlan': return 'The buying plan: whole boards.';
    case 'programs': return corrected(source.correction, "The programs' own time", 'cuts');
    case 'labour': return corrected(source.correction, "The shop's usual minutes", 'pieces');
    case 'shop': return "The shop's own figure.";
  }
}
