import { type Units, byUnits } from '../measure/units';
import { type FitFinding, FIT_PRACTICE, fitFindings, practiceFor } from './fitFindings';
import { worstOf } from './finding';
import { type Disc, type Fit, type Groove, type Style, fitOf } from './fit';
import type { CoinKind } from './tally';

type NamedDisc = Pick<CoinKind, 'name'> & Disc;

/** Sizes from `least` to `most` that suit every coin, or the two coins that no one size suits. */
export type SizeAdvice =
  | { readonly suits: true; readonly least: number; readonly most: number; readonly advised: number }
  | { readonly suits: false; readonly wantsMore: string; readonly wantsLess: string };

export interface GrooveAdvice {
  readonly width: SizeAdvice;
  readonly depth: SizeAdvice;
}

/** Marks that a size is rounded to: what a shop sets a stop or a bit by. */
const MARK = { in: 1 / 32, mm: 0.5 } as const;

/** Nearest mark to the middle that still lies between; the middle itself where no mark does. */
function onMark(least: number, most: number, units: Units): number {
  const mark = MARK[units];
  const nearest = Math.round((least + most) / 2 / mark) * mark;
  return nearest >= least && nearest <= most ? nearest : (least + most) / 2;
}

function common(ranges: readonly { readonly name: string; readonly least: number; readonly most: number }[], units: Units): SizeAdvice {
  const [first] = ranges;
  if (!first) return { suits: true, least: 0, most: Infinity, advised: NaN };
  const tightest = ranges.reduce((worst, range) => (range.least > worst.least ? range : worst), first);
  const loosest = ranges.reduce((worst, range) => (range.most < worst.most ? range : worst), first);
  if (tightest.least > loosest.most) return { suits: false, wantsMore: tightest.name, wantsLess: loosest.name };
  return { suits: true, least: tightest.least, most: loosest.most, advised: onMark(tightest.least, loosest.most, units) };
}

/**
 * Coins → groove: width and depth that suit every kind in the piece's style (common practice, see `FIT_PRACTICE`).
 * Leaning, the depth also leaves the front lip its height at the lean the coins take in the advised width.
 */
export function grooveFor(kinds: readonly NamedDisc[], style: Style, units: Units, boardDistance: number | null): GrooveAdvice {
  const practice = kinds.map((kind) => ({ name: kind.name, kind, ...practiceFor(kind, style, units) }));
  const width = common(practice.map(({ name, width: { least, most } }) => ({ name, least: least ?? 0, most: most ?? Infinity })), units);
  const wide = width.suits ? width.advised : Math.max(...kinds.map(({ thickness }) => thickness)) * 2;
  const depths = practice.map(({ name, kind, depth: { least, most } }) => {
    const deep = most ?? byUnits(units, 1, 25);
    const fit = fitOf(kind, { units, style, width: wide, depth: deep, boardDistance });
    const underLip = style === 'leaning' && !Number.isNaN(fit.lean) ? deep - fit.lip + FIT_PRACTICE.lip[units] : 0;
    return { name, least: Math.max(least ?? 0, underLip), most: deep };
  });
  return { width, depth: common(depths, units) };
}

/** Groove → coins: each kind with its fit and the worst that is said of it. */
export function kindsInGroove<Kind extends NamedDisc>(kinds: readonly Kind[], groove: Groove): { readonly kind: Kind; readonly fit: Fit; readonly findings: readonly FitFinding[]; readonly verdict: 'agrees' | 'caution' | 'disagrees' }[] {
  return kinds.map((kind) => {
    const findings = fitFindings(kind, groove);
    return { kind, fit: fitOf(kind, groove), findings, verdict: worstOf(findings) };
  });
}
