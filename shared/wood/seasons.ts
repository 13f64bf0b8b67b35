import type { JobFinding } from '../coin/finding';
import type { CoinKind } from '../coin/tally';
import type { Groove } from '../coin/fit';
import { type Sawn, type Seasons, seasonalMovement } from './movement';
import type { Wood } from './woods';

export const SEASON_RULES = ['grooveTakesCoin', 'boardAtBattens'] as const;
export type SeasonFinding = JobFinding<(typeof SEASON_RULES)[number]>;

/** A board fastened hard across its grain cracks or bows where it moves by more than this over the year: common practice, no source. */
const STIFF = { in: 1 / 16, mm: 1.5 } as const;

/**
 * Whether a groove still takes its coins when it is narrowest. A groove runs along the grain, so its width moves with
 * the wood across it, about half a thousandth of itself: it is narrowest in dry winter, when the wood around it has
 * shrunk. Sheet goods hardly move and are left out.
 */
export function grooveOverSeasons(kinds: readonly Pick<CoinKind, 'name' | 'thickness'>[], groove: Groove, wood: Wood, sawn: Sawn, seasons: Seasons): SeasonFinding[] {
  const movement = seasonalMovement(groove.width, wood, sawn, seasons);
  if (!movement) return [];
  const narrowest = groove.width + Math.min(0, movement.winter, movement.summer);
  return kinds.map(({ name, thickness }): SeasonFinding => {
    const left = narrowest - thickness;
    return { rule: 'grooveTakesCoin', severity: left < 0 ? 'disagrees' : 'agrees', about: name, quantity: 'length', wanted: { least: 0, most: null }, measured: left, reason: left < 0 ? 'tooNarrow' : null, source: 'Wood Handbook' };
  });
}

/**
 * How far a board's height moves over the year between its battens, which lie across its grain and keep their length.
 * Above the limit the battens' holes want to be slots, all but one a batten.
 */
export function boardAtBattens(height: number, wood: Wood, sawn: Sawn, seasons: Seasons, units: 'in' | 'mm'): SeasonFinding[] {
  const movement = seasonalMovement(height, wood, sawn, seasons);
  if (!movement) return [];
  const swing = Math.max(0, movement.summer, movement.winter) - Math.min(0, movement.summer, movement.winter);
  const stiff = swing <= STIFF[units];
  return [{ rule: 'boardAtBattens', severity: stiff ? 'agrees' : 'caution', about: '', quantity: 'length', wanted: { least: null, most: STIFF[units] }, measured: swing, reason: stiff ? null : 'slotTheHoles', source: 'Wood Handbook' }];
}
