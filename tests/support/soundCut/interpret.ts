import { FULL } from './geometry';
import { statedUnits } from './lintWords';
import { finestStep, type LengthUnits, type Move, type Place, type Turn, type Violation } from './types';
import { blocksOf, motionCode, namesAxis, type ProgramText, type TextLine, valueOf } from './words';

/** What a program does, in order. Lengths in the spec's units. */
export type Step =
  | { readonly kind: 'move'; readonly move: Move }
  | { readonly kind: 'spindle'; readonly on: boolean; readonly speed: number; readonly line: number }
  | { readonly kind: 'stop'; readonly line: number };

export interface Run {
  readonly steps: readonly Step[];
  readonly moves: readonly Move[];
  readonly violations: readonly Violation[];
  /** The last written decimal, in the spec's units. */
  readonly step: number;
}

const RADIUS_TOLERANCE = { in: 0.0002, mm: 0.002 }; // NISTIR 6556 3.5.3, from the rounded numbers of the text

interface State {
  at: Place;
  motion: number | undefined;
  speed: number;
  feed: number;
}

/** Runs the subset block by block (NISTIR 6556 Table 8: F, S, M3 M5, modes, motion, M0 M2 M30). */
export function interpret(program: ProgramText, units: LengthUnits): Run {
  const programUnits = statedUnits(program) ?? units;
  const scale = programUnits === units ? 1 : programUnits === 'in' ? 25.4 : 1 / 25.4;
  const step = finestStep(programUnits, units);
  const state: State = { at: { x: NaN, y: NaN, z: NaN }, motion: undefined, speed: 0, feed: 0 };
  const steps: Step[] = [];
  const violations: Violation[] = [];
  for (const block of blocksOf(program)) {
    const { line } = block;
    state.feed = valueOf(block, 'F') ?? state.feed;
    state.speed = valueOf(block, 'S') ?? state.speed;
    state.motion = motionCode(block) ?? state.motion;
    const m = valueOf(block, 'M');
    if (m === 3 || m === 5) steps.push({ kind: 'spindle', on: m === 3, speed: state.speed, line });
    const move = moveOf(block, state, scale, RADIUS_TOLERANCE[programUnits] * scale, step, violations);
    if (move !== null) {
      steps.push({ kind: 'move', move });
      state.at = move.to;
    }
    if (m === 0) steps.push({ kind: 'stop', line });
    if (m === 2 || m === 30) break;
  }
  return { steps, moves: steps.flatMap(one => one.kind === 'move' ? [one.move] : []), violations, step };
}

function moveOf(block: TextLine, state: State, scale: number, radiusTolerance: number, step: number, violations: Violation[]): Move | null {
  const { line } = block;
  const stated = motionCode(block);
  if (!namesAxis(block)) {
    if (stated !== undefined && stated !== 80) violations.push({ rule: 'axis-words', line, message: 'a move without X, Y or Z (NISTIR 6556 3.5.1, 3.5.2)' });
    return null;
  }
  if (state.motion === undefined || state.motion === 80) {
    violations.push({ rule: 'axis-words', line, message: 'X, Y or Z while no motion is in force (NISTIR 6556 3.5.15)' });
    return null;
  }
  const from = state.at;
  const read = (letter: string, before: number): number => {
    const value = valueOf(block, letter);
    return value === undefined ? before : value * scale;
  };
  const to = { x: read('X', from.x), y: read('Y', from.y), z: read('Z', from.z) };
  if (Number.isNaN(to.z)) violations.push({ rule: 'start', line, message: 'a move before the program has said Z' });
  if (Number.isNaN(to.x) !== Number.isNaN(to.y)) violations.push({ rule: 'start', line, message: 'the first move sideways must name X and Y' });
  const rapid = state.motion === 0;
  // Issue: F set before the first feed move; NISTIR 6556 2.1.2.5, units per minute.
  if (!rapid && !(state.feed > 0)) violations.push({ rule: 'feed', line, message: 'a feed move before F' });
  if (!rapid && (Number.isNaN(from.x) || Number.isNaN(from.z))) violations.push({ rule: 'start', line, message: 'a feed move from an unknown place' });
  if (state.motion !== 2 && state.motion !== 3) return { line, rapid, from, to, turn: null };
  return { line, rapid, from, to, turn: turnOf(block, from, to, state.motion === 3, scale, radiusTolerance, step, violations) };
}

/** NISTIR 6556 3.5.3.2: centre at the start point plus I and J; the two radii agree within the report's tolerance. */
function turnOf(block: TextLine, from: Place, to: Place, counterclockwise: boolean, scale: number, tolerance: number, step: number, violations: Violation[]): Turn | null {
  const { line } = block;
  const centre = { x: from.x + (valueOf(block, 'I') ?? 0) * scale, y: from.y + (valueOf(block, 'J') ?? 0) * scale };
  const startRadius = Math.hypot(from.x - centre.x, from.y - centre.y);
  const endRadius = Math.hypot(to.x - centre.x, to.y - centre.y);
  if (!(startRadius > 0) || Number.isNaN(endRadius)) {
    violations.push({ rule: 'arc-radius', line, message: 'an arc without a radius' });
    return null;
  }
  if (Math.abs(startRadius - endRadius) > tolerance + 1e-9) { // 1e-9: sums of rounded decimals in binary
    violations.push({ rule: 'arc-radius', line, message: `radius ${startRadius} at the start and ${endRadius} at the end` });
  }
  const start = Math.atan2(from.y - centre.y, from.x - centre.x);
  const finish = Math.atan2(to.y - centre.y, to.x - centre.x);
  const ahead = counterclockwise ? finish - start : start - finish;
  const turned = ahead - FULL * Math.floor(ahead / FULL);
  const sweep = turned < 1e-12 ? FULL : turned; // end on start is a full circle
  const radius = (startRadius + endRadius) / 2;
  // Issue: quarter arcs or smaller. Rounding moves each end by up to 0.71 of the last decimal, seen from the centre.
  if (sweep > Math.PI / 2 + 2 * step / radius + 1e-6) {
    violations.push({ rule: 'arc-sweep', line, message: `an arc of ${(sweep * 180 / Math.PI).toFixed(3)} degrees, at most 90` });
  }
  return { centre, radius, start, sweep: counterclockwise ? sweep : -sweep };
}
