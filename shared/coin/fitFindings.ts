import type { Units } from '../measure/units';
import { type JobFinding, type Wanted, isWithin } from './finding';
import { type Disc, type Fit, type Groove, type Style, fitOf } from './fit';
import type { CoinKind } from './tally';

/** What is looked at when a coin meets a groove. */
export const FIT_RULES = ['clearance', 'width', 'depth', 'rest', 'frontLip', 'hidden', 'footing'] as const;
export type FitRule = (typeof FIT_RULES)[number];
export type FitFinding = JobFinding<FitRule>;

/** The trade's figures for grooves; all common practice, no source. */
export const FIT_PRACTICE = {
  /** Upright: play between coin and groove. */
  play: { mm: [0.3, 1], in: [0.3 / 25.4, 1 / 25.4] },
  /** Upright: depth as a share of the diameter. */
  depthShare: [1 / 6, 1 / 4],
  /** Leaning: width in thicknesses of the coin. */
  thicknesses: [2, 3],
  /** Leaning: depth. */
  shallow: { in: [1 / 8, 3 / 16], mm: [25.4 / 8, 25.4 * 3 / 16] },
  /** Leaning: front lip above the coin's lowest front edge. */
  lip: { in: 0.06, mm: 0.06 * 25.4 },
  /** Most of the face's height that a groove may hide. */
  hidden: 1 / 4,
  /** How far a wall may tip the rail forward, degrees: 2 is 3/8 in in 11 in, more than a wall worth hanging on. */
  tilt: 2,
} as const;

/** Widths and depths that the trade would give one coin in a style; the lip is asked for apart, since it needs the lean. */
export function practiceFor(coin: Disc, style: Style, units: Units): { readonly width: Wanted; readonly depth: Wanted } {
  const { thickness: t, diameter: d } = coin;
  const [tight, loose] = style === 'upright' ? FIT_PRACTICE.play[units].map((play) => t + play) : FIT_PRACTICE.thicknesses.map((times) => t * times);
  const [shallow, deep] = style === 'upright' ? FIT_PRACTICE.depthShare.map((share) => d * share) : FIT_PRACTICE.shallow[units];
  return { width: { least: tight ?? null, most: loose ?? null }, depth: { least: shallow ?? null, most: deep ?? null } };
}

/** Whether the coin rests as the piece's style says, and why not. */
function restFinding(fit: Fit, style: Style): Pick<FitFinding, 'severity' | 'reason'> {
  const { rest } = fit;
  switch (rest.how) {
    case 'tooThick': case 'sinks': case 'slips': return { severity: 'disagrees', reason: rest.how };
    case 'upright': return style === 'upright' ? { severity: 'agrees', reason: 'upright' } : { severity: 'caution', reason: 'rattles' };
    case 'leans':
      if (style === 'upright') return { severity: 'caution', reason: 'leansOnRim' };
      if (rest.against === 'board') return { severity: 'agrees', reason: 'leansOnBoard' };
      return { severity: rest.keeps ? 'caution' : 'disagrees', reason: rest.keeps ? 'rimFirst' : 'climbsRim' };
  }
}

/**
 * Everything that can be said of a kind of coin in a groove. A coin that does not stand at all has findings of its
 * clearance and rest only: the others would measure a position it never takes.
 */
export function fitFindings(kind: Pick<CoinKind, 'name'> & Disc, groove: Groove): FitFinding[] {
  const fit = fitOf(kind, groove);
  const { units, style } = groove;
  const say = (rule: FitRule, quantity: FitFinding['quantity'], measured: number | null, wanted: Wanted | null, severity: FitFinding['severity'], reason: string | null, source: FitFinding['source']): FitFinding =>
    ({ rule, severity, about: kind.name, quantity, wanted, measured, reason, source });
  const practice = (rule: FitRule, quantity: FitFinding['quantity'], measured: number, wanted: Wanted) => {
    const reason = isWithin(wanted, measured) ? null : measured < (wanted.least ?? -Infinity) ? 'below' : 'above';
    return say(rule, quantity, measured, wanted, reason === null ? 'agrees' : 'caution', reason, 'common practice');
  };

  const { severity, reason } = restFinding(fit, style);
  const findings = [
    say('clearance', 'length', fit.clearance, { least: 0, most: null }, fit.clearance < 0 ? 'disagrees' : 'agrees', fit.clearance < 0 ? 'tooThick' : null, 'geometry'),
    say('rest', 'degrees', Number.isNaN(fit.lean) ? null : fit.lean, null, severity, reason, 'geometry'),
  ];
  if (Number.isNaN(fit.lean)) return findings;
  const { width, depth } = practiceFor(kind, style, units);
  const lip = { least: FIT_PRACTICE.lip[units], most: null };
  return [
    ...findings,
    practice('width', 'length', groove.width, width),
    practice('depth', 'length', groove.depth, depth),
    fit.lip <= 0 ? say('frontLip', 'length', fit.lip, lip, 'disagrees', 'below', 'geometry') : practice('frontLip', 'length', fit.lip, lip),
    practice('hidden', 'share', fit.hidden.heightShare, { least: null, most: FIT_PRACTICE.hidden }),
    fit.footing <= 0 ? say('footing', 'degrees', fit.tiltKept, { least: FIT_PRACTICE.tilt, most: null }, 'disagrees', 'below', 'geometry')
      : practice('footing', 'degrees', fit.tiltKept, { least: FIT_PRACTICE.tilt, most: null }),
  ];
}
