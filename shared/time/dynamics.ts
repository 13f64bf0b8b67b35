import { type Units, byUnits } from '../measure/units';
import type { MachineLimits } from '../slot/spec';

/** How the machine moves, the same on every axis. Lengths in the program's units. */
export interface Dynamics {
  /** Units per second squared; Infinity leaves every time at length ÷ feed. */
  readonly acceleration: number;
  /** Units per minute. */
  readonly rapidFeed: number;
  /** Units per minute that no cutting feed passes; Infinity where nobody said. */
  readonly topFeed: number;
  /** Seconds from a stopped spindle to full speed. */
  readonly spinUp: number;
  /** Seconds: at a corner the velocity may jump by at most acceleration × this. */
  readonly cornerTime: number;
}

/** In/s² and mm/s² of a light machine (common practice, no source). */
const ACCELERATION = { in: 20, mm: 500 } as const;
/** In/min and mm/min of a light machine (common practice, no source). */
const RAPID_FEED = { in: 200, mm: 5000 } as const;
/** Seconds a router spindle takes to full speed (common practice, no source). */
const SPIN_UP = 4;
/** Seconds: with 20 in/s² a square corner is taken at 8.5 in/min (common practice, no source). */
const CORNER_TIME = 0.01;

/** The shop's own figures, and common ones where it gives none; a machine's top feed is taken for its rapids too. */
export function defaultDynamics(units: Units, machine: MachineLimits | null): Dynamics {
  return {
    acceleration: machine?.acceleration ?? byUnits(units, ACCELERATION.in, ACCELERATION.mm),
    rapidFeed: machine?.topFeed ?? byUnits(units, RAPID_FEED.in, RAPID_FEED.mm),
    topFeed: machine?.topFeed ?? Infinity,
    spinUp: SPIN_UP,
    cornerTime: CORNER_TIME,
  };
}

/** What a timeline left out, for `timeAssumes`. */
export interface LeftOut {
  readonly unmeasured: number;
  readonly stops: number;
}

/** What the time took for granted, in one short sentence without its capital and full stop. */
export function timeAssumes(units: Units, machine: MachineLimits | null, leftOut: LeftOut): string {
  const dynamics = defaultDynamics(units, machine);
  const said: string[] = [];
  if (machine?.acceleration === undefined) said.push(`acceleration ${dynamics.acceleration} ${units}/s²`);
  if (machine?.topFeed === undefined) said.push(`rapids at ${dynamics.rapidFeed} ${units}/min`);
  said.push(`${dynamics.spinUp} s to spin up`);
  if (leftOut.unmeasured > 0) said.push('the way to the first point not counted');
  if (leftOut.stops > 0) said.push('stops not counted');
  return said.join(', ');
}
