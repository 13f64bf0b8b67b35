import { type Units, byUnits } from '../measure/units';
import { advisedChipLoad, feedFor } from './chipLoad';
import type { SlotSpec } from './spec';

type Required = 'units' | 'length' | 'width' | 'depth' | 'stopMargin' | 'bitDiameter' | 'stepdown';

/** A spec as far as somebody gave it. */
export type GivenSpec = Pick<SlotSpec, Required> & { readonly [Field in Exclude<keyof SlotSpec, Required>]?: SlotSpec[Field] | undefined };

/** A feed is set on whole figures: 1 in/min or 10 mm/min, always downwards so that it stays within its cap. */
function wholeFeed(feed: number, units: Units): number {
  const step = byUnits(units, 1, 10);
  return feed > step ? Math.floor(feed / step + 1e-9) * step : feed;
}

/** Fills every size that was left open; `FIELDS` names the source of each default. */
export function fillDefaults(given: GivenSpec): SlotSpec {
  const { units, bitDiameter, machine = null } = given;
  const size = (inch: number, millimetre: number) => byUnits(units, inch, millimetre);

  const wood = given.wood ?? 'hardwood';
  const chipLoadRange = given.chipLoadRange ?? null;
  const flutes = given.flutes ?? 2;
  const [slowest, fastest] = machine?.spindleRange ?? [0, Infinity];
  const spindleSpeed = given.spindleSpeed ?? Math.min(Math.max(16000, slowest), fastest);
  const band = advisedChipLoad({ units, bitDiameter, wood, chipLoadRange, machine });
  const lowerThird = feedFor(band.least + (band.most - band.least) / 3, { spindleSpeed, flutes });
  const feed = given.feed ?? wholeFeed(Math.min(lowerThird, machine?.topFeed ?? Infinity), units);
  const cuttingLength = given.cuttingLength ?? 3 * bitDiameter;
  const clampHeight = given.clampHeight ?? size(0.5, 12);

  return {
    units,
    name: given.name ?? '',
    length: given.length,
    width: given.width,
    depth: given.depth,
    stopMargin: given.stopMargin,
    bitDiameter,
    stepdown: given.stepdown,
    railWidth: given.railWidth ?? 3 * given.width,
    railThickness: given.railThickness ?? size(0.75, 19),
    ends: given.ends ?? 'cornered',
    wood,
    flutes,
    spindleSpeed,
    feed,
    plungeFeed: given.plungeFeed ?? wholeFeed(feed / 4, units),
    rampAngle: given.rampAngle ?? 3,
    stepover: given.stepover ?? 0.4,
    finishAllowance: given.finishAllowance ?? 0,
    direction: given.direction ?? 'climb',
    cuttingLength,
    bitKind: given.bitKind ?? 'straight',
    centreCutting: given.centreCutting ?? false,
    chipLoadRange,
    colletDiameter: given.colletDiameter ?? size(1.25, 32),
    stickout: given.stickout ?? Math.max(cuttingLength, given.depth + clampHeight + size(0.25, 6)),
    clampHeight,
    clampReach: given.clampReach ?? 0,
    safeHeight: given.safeHeight ?? clampHeight + size(0.25, 6),
    workZero: given.workZero ?? 'corner',
    spindle: given.spindle ?? 'program',
    machine,
  };
}
