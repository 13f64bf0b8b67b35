import type { CurrencyCode } from '../money/currency';
import { type Money, byRatio, minus, money, percentOf, plus, sum } from '../money/money';
import type { ShopProblem } from '../shop/fields';
import type { BuyingPlan } from '../wood/buying';
import { type Taken, correctionOf } from './correction';
import type { LabourStep } from './labour';
import type { Source } from './sources';

/** What the lines of a costing are grouped by, in the order they stand in. */
export const COST_GROUPS = ['wood', 'machine', 'labour', 'finish', 'hardware', 'fees'] as const;
export type CostGroup = (typeof COST_GROUPS)[number];

/** One line: amount = quantity ÷ per × rate, rounded once. Quantities have two decimals, so that the sum can be checked by hand. */
export interface CostLine {
  readonly group: CostGroup;
  readonly words: string;
  readonly quantity: number;
  readonly unit: string;
  readonly rate: Money;
  /** How many of the unit the rate is for: 60 where minutes are paid by the hour. */
  readonly per: number;
  readonly amount: Money;
  readonly taxed: boolean;
  readonly from: Source;
}

/** Something bought for the piece, as the shop enters it. */
export interface Item {
  readonly words: string;
  readonly quantity: number;
  readonly unit: string;
  readonly rate: Money;
}

/** A fee is passed on as it is: no overhead and no margin on it. */
export interface Fee extends Item {
  readonly taxed: boolean;
}

export interface CostingInput {
  readonly currency: CurrencyCode;
  /** Board prices are minor units of the currency. */
  readonly wood: Pick<BuyingPlan, 'buy' | 'unplaced'>;
  readonly machine: {
    readonly hourly: Money;
    /** Each rail's program by its own estimate, in seconds. */
    readonly programs: readonly { readonly words: string; readonly seconds: number }[];
    /** Timed cuts of this machine that went well: seconds by the program and by the stopwatch. */
    readonly cuts: readonly Taken[];
  };
  readonly labour: {
    readonly hourly: Money;
    /** Minutes expected of each step, with what earlier pieces were expected to take and took. */
    readonly steps: readonly { readonly step: LabourStep; readonly minutes: number; readonly history: readonly Taken[] }[];
  };
  readonly finish: readonly Item[];
  readonly hardware: readonly Item[];
  readonly fees: readonly Fee[];
  /** Percent of the cost that it takes to keep the shop open: rent, power, blades. */
  readonly overheadPercent: number;
  /** Percent of the price (before rush, fees and tax) that is to be left after cost and overhead. */
  readonly marginPercent: number;
  /** Percent of that price that haste costs; 0: none. */
  readonly rushPercent: number;
  /** A price set by hand in its place; the margin is then what is left, and may be less than nothing. */
  readonly asked: Money | null;
  readonly tax: { readonly name: string; readonly percent: number };
}

/** What a piece costs the shop and what it asks. For the owner alone. Each figure is the sum of those it is made of. */
export interface Costing {
  readonly lines: readonly CostLine[];
  /** All lines but fees. */
  readonly cost: Money;
  readonly overhead: Money;
  readonly margin: Money;
  /** Cost, overhead and margin. */
  readonly price: Money;
  readonly rush: Money;
  readonly fees: Money;
  /** Price, rush and fees. */
  readonly net: Money;
  /** What tax is reckoned from: all but fees that bear none. */
  readonly taxable: Money;
  readonly tax: Money;
  /** Net and tax. */
  readonly total: Money;
  /** What keeps it from being a price to send, or ought to be looked at. */
  readonly problems: readonly ShopProblem[];
}

const hundredths = (quantity: number) => Math.round(quantity * 100 + 1e-9) / 100;

function lineOf(group: CostGroup, { words, quantity, unit, rate }: Item, from: Source, per = 1): CostLine {
  const shown = hundredths(quantity);
  return { group, words, quantity: shown, unit, rate, per, amount: byRatio(rate, shown, per), taxed: true, from };
}

/** Minutes paid by the hour. */
const minutesOf = (group: CostGroup, words: string, minutes: number, hourly: Money, from: Source) => lineOf(group, { words, quantity: minutes, unit: 'min', rate: hourly }, from, 60);

/** Every line of a piece's cost, in the order of its groups. */
export function costLines({ currency, wood, machine, labour, finish, hardware, fees }: CostingInput): CostLine[] {
  const cut = correctionOf(machine.cuts);
  const own = (group: CostGroup) => (item: Item) => lineOf(group, item, { kind: 'shop' });
  return [
    ...wood.buy.map(({ board, count }) => lineOf('wood', { words: board.name, quantity: count, unit: count === 1 ? 'board' : 'boards', rate: money(Math.round(board.price), currency) }, { kind: 'buyingPlan' })),
    ...machine.programs.map(({ words, seconds }) => minutesOf('machine', words, (seconds * cut.ratio) / 60, machine.hourly, { kind: 'programs', correction: cut })),
    ...labour.steps.map(({ step, minutes, history }) => {
      const correction = correctionOf(history);
      return minutesOf('labour', step, minutes * correction.ratio, labour.hourly, { kind: 'labour', correction });
    }),
    ...finish.map(own('finish')), ...hardware.map(own('hardware')),
    ...fees.map((fee) => ({ ...own('fees')(fee), taxed: fee.taxed })),
  ];
}

function problemsOf({ wood, machine, asked }: CostingInput, margin: Money): ShopProblem[] {
  const short = wood.unplaced.map(({ part }) => part);
  return [
    ...(short.length > 0 ? [{ field: 'wood', message: `No board on sale gives ${short.join(', ')}: the wood for it is not in this price. Add a board that does.` }] : []),
    ...(machine.programs.length === 0 ? [{ field: 'machine', message: 'No rail has a program: the machine\'s time is not in this price. Make the programs first.' }] : []),
    ...(asked && margin.amount < 0 ? [{ field: 'asked', message: 'The price asked is less than the piece costs. Ask more, or lower the cost.' }] : []),
  ];
}

/**
 * A piece's costing: lines, overhead on their cost, a margin that is a share of the price, rush on the price, fees as
 * they are, and tax. The price that leaves m percent over a cost is cost × 100 / (100 − m).
 */
export function costPiece(input: CostingInput): Costing {
  const { currency, overheadPercent, marginPercent, rushPercent, asked, tax } = input;
  const lines = costLines(input);
  const of = (which: (line: CostLine) => boolean) => sum(lines.filter(which).map(({ amount }) => amount), currency);
  const cost = of(({ group }) => group !== 'fees');
  const overhead = percentOf(cost, overheadPercent);
  const spent = plus(cost, overhead);
  const price = asked ?? byRatio(spent, 100, 100 - marginPercent);
  const margin = minus(price, spent);
  const rush = percentOf(price, rushPercent);
  const fees = of(({ group }) => group === 'fees');
  const net = sum([price, rush, fees], currency);
  const taxable = sum([price, rush, of(({ group, taxed }) => group === 'fees' && taxed)], currency);
  const taxed = percentOf(taxable, tax.percent);
  return { lines, cost, overhead, margin, price, rush, fees, net, taxable, tax: taxed, total: plus(net, taxed), problems: problemsOf(input, margin) };
}
