import { type Units, convertLength } from '../measure/units';
import { type SlotSpec, railLength } from '../slot/spec';

/** An upright box: X along the rail, Y across it, Z up. */
export interface Box {
  readonly x0: number;
  readonly x1: number;
  readonly y0: number;
  readonly y1: number;
  readonly z0: number;
  readonly z1: number;
}

/** Every size the playback draws, in the program's units and its coordinates; the rail's top is Z zero. */
export interface StageSizes {
  readonly rail: Box;
  readonly bitDiameter: number;
  readonly cuttingLength: number;
  readonly stickout: number;
  readonly colletDiameter: number;
  readonly safeHeight: number;
  /** What earlier laps leave on the walls for the finish lap. */
  readonly finishAllowance: number;
  /** Where clamps may stand: nothing comes there below `z1`. */
  readonly keepOut: readonly Box[];
}

/** Share of the rail's width that a clamp may stand out in front and behind; for the drawing only. */
const CLAMP_OVERHANG = 0.15;

export function stageSizes(spec: SlotSpec, units: Units = spec.units): StageSizes {
  const size = (value: number) => convertLength(value, spec.units, units);
  const long = size(railLength(spec));
  const wide = size(spec.railWidth);
  const [x0, y0] = spec.workZero === 'corner' ? [0, 0] : [-long / 2, -wide / 2];
  const rail: Box = { x0, x1: x0 + long, y0, y1: y0 + wide, z0: -size(spec.railThickness), z1: 0 };
  return {
    rail,
    bitDiameter: size(spec.bitDiameter),
    cuttingLength: size(spec.cuttingLength),
    stickout: Math.max(size(spec.stickout), size(spec.cuttingLength)),
    colletDiameter: size(spec.colletDiameter),
    safeHeight: size(spec.safeHeight),
    finishAllowance: size(spec.finishAllowance),
    keepOut: keepOut(rail, size(spec.clampReach), size(spec.clampHeight)),
  };
}

function keepOut(rail: Box, reach: number, height: number): Box[] {
  if (reach <= 0 || height <= 0) return [];
  const out = (rail.y1 - rail.y0) * CLAMP_OVERHANG;
  const end = { y0: rail.y0 - out, y1: rail.y1 + out, z0: 0, z1: height };
  return [
    { ...end, x0: rail.x0, x1: rail.x0 + reach },
    { ...end, x0: rail.x1 - reach, x1: rail.x1 },
  ];
}
