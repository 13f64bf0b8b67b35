import type { Point3 } from '../geometry/point';
import type { Units } from '../measure/units';
import { UNSTATED, withModes } from './modes';
import type { Modes, ReadOptions, Step } from './motion';

/** The machine as the interpreter sees it between two items of Table 8. The only thing in the reader that changes. */
export interface Machine {
  readonly steps: Step[];
  /** Units before any G20 or G21. */
  readonly unstatedUnits: Units;
  /** Seconds in one unit of G4's P. */
  readonly dwellSeconds: number;
  modes: Modes;
  /** Recent modes that differ in motion and feed alone: programs switch between a few of them all the time. */
  variants: Modes[];
  /** Where the controlled point is; NaN on an axis not stated yet. */
  point: Point3;
  /** Units of the first motion; null before it. */
  units: Units | null;
  ended: boolean;
}

export function startMachine({ start = {}, dwellIn = 'seconds', units = 'mm' }: ReadOptions): Machine {
  const { x = NaN, y = NaN, z = NaN } = start;
  return {
    steps: [],
    unstatedUnits: units,
    dwellSeconds: dwellIn === 'seconds' ? 1 : 0.001,
    modes: UNSTATED,
    variants: [],
    point: { x, y, z },
    units: null,
    ended: false,
  };
}

/** Variants kept: rapids, lines and both arcs at two or three feeds. */
const MOST_VARIANTS = 12;

/** Changes modes of any kind; null, so that it can end an item of Table 8 that has no error. */
export function changeModes(machine: Machine, change: Partial<Modes>): null {
  machine.modes = withModes(machine.modes, change);
  machine.variants = [machine.modes];
  return null;
}

/** Changes motion and feed, the two that change often: equal modes are one object again, which spares their making. */
export function changeCut(machine: Machine, motion: Modes['motion'], feed: Modes['feed']): null {
  if (machine.modes.motion === motion && machine.modes.feed === feed) return null;
  for (const variant of machine.variants) {
    if (variant.motion !== motion || variant.feed !== feed) continue;
    machine.modes = variant;
    return null;
  }
  machine.modes = withModes(machine.modes, { motion, feed });
  if (machine.variants.length === MOST_VARIANTS) machine.variants = [];
  machine.variants.push(machine.modes);
  return null;
}
