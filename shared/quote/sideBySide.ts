import type { CurrencyCode } from '../money/currency';
import { type Money, minus, sum } from '../money/money';
import { COST_GROUPS, type CostGroup, type Costing } from './costing';

/** What stands down the side of the comparison: the groups of lines, then what is put on them. */
export const COMPARED = [...COST_GROUPS.filter((group): group is Exclude<CostGroup, 'fees'> => group !== 'fees'), 'overhead', 'margin', 'rush', 'fees', 'tax'] as const;
export type Compared = (typeof COMPARED)[number];

export interface ComparedRow {
  readonly what: Compared;
  /** One for each alternative, in their order. */
  readonly amounts: readonly Money[];
}

export interface Comparison {
  readonly names: readonly string[];
  readonly rows: readonly ComparedRow[];
  /** Each the sum of its column. */
  readonly totals: readonly Money[];
  /** How much each is above the first. */
  readonly above: readonly Money[];
}

function amountOf({ lines, overhead, margin, rush, fees, tax }: Costing, what: Compared, currency: CurrencyCode): Money {
  const put = { overhead, margin, rush, fees, tax };
  switch (what) {
    case 'overhead': case 'margin': case 'rush': case 'fees': case 'tax': return put[what];
    default: return sum(lines.filter(({ group }) => group === what).map(({ amount }) => amount), currency);
  }
}

/** Alternatives of one piece beside each other: two woods, two sizes. Rows that are nothing in all of them are left out. */
export function sideBySide(alternatives: readonly { readonly name: string; readonly costing: Costing }[], currency: CurrencyCode): Comparison {
  const rows = COMPARED.map((what) => ({ what, amounts: alternatives.map(({ costing }) => amountOf(costing, what, currency)) }));
  const totals = alternatives.map(({ costing }) => costing.total);
  const [first] = totals;
  return {
    names: alternatives.map(({ name }) => name),
    rows: rows.filter(({ amounts }) => amounts.some(({ amount }) => amount !== 0)),
    totals,
    above: totals.map((total) => (first ? minus(total, first) : total)),
  };
}
