import type { Point2, Point3 } from '../geometry/point';
import { DECIMALS } from '../measure/length';
import { type Units, convertLength } from '../measure/units';
import type { CutMove, SlotPath } from '../slot/path';
import type { SlotSpec } from '../slot/spec';
import { chordPoints, evenCentre } from './arc';
import { type ProgramOptions, SPINDLE_WAIT_SECONDS } from './options';
import { formatFeed, formatSteps } from './words';

/** Radii of a written arc may differ by this: half of NISTIR 6556 3.5.3's 0.0002 in / 0.002 mm. */
const RADIUS_TOLERANCE: Readonly<Record<Units, number>> = { in: 0.0001, mm: 0.001 };
/** Decimals beyond the usual that an arc's centre may need; at six an inch program is exact to a light wave. */
const MOST_DECIMALS = 6;
/** Of the chord tolerance: the rest is left for rounding the slot's edges and the chords' ends to the last decimal. */
const CHORD_SHARE = 0.6;

/** Writes motion blocks one by one: rounds each coordinate once, and leaves out words that would change nothing. */
class Blocks {
  readonly lines: string[] = [];
  private readonly decimals: number;
  private readonly scale: number;
  private at = { x: NaN, y: NaN, z: NaN };
  private feed = '';

  constructor(private readonly from: Units, private readonly units: Units) {
    this.decimals = DECIMALS[units];
    this.scale = 10 ** this.decimals;
  }

  /** A length of the spec in whole steps of the program's last decimal: the only place where units are converted. */
  private steps(value: number): number {
    return Math.round(convertLength(value, this.from, this.units) * this.scale);
  }

  private word(letter: string, steps: number): string {
    return ` ${letter}${formatSteps(steps, this.decimals)}`;
  }

  private feedWord(feed: number): string {
    const text = formatFeed(convertLength(feed, this.from, this.units));
    if (text === this.feed) return '';
    this.feed = text;
    return ` F${text}`;
  }

  /** G0 or G1 to what is given of a point; nothing where it would not move. */
  straight(code: 'G0' | 'G1', to: Partial<Point3>, feed?: number): void {
    let words = '';
    for (const axis of ['x', 'y', 'z'] as const) {
      const value = to[axis];
      if (value === undefined) continue;
      const steps = this.steps(value);
      if (steps === this.at[axis]) continue;
      this.at[axis] = steps;
      words += this.word(axis.toUpperCase(), steps);
    }
    if (words) this.lines.push(`${code}${words}${feed === undefined ? '' : this.feedWord(feed)}`);
  }

  /** G2 or G3, X Y I J all written; Z where it changes. */
  arc(to: Point3, centre: Point2, turn: 1 | -1, feed: number): void {
    const end = { x: this.steps(to.x), y: this.steps(to.y), z: this.steps(to.z) };
    if (end.x === this.at.x && end.y === this.at.y) return this.straight('G1', to, feed);
    const { I, J } = this.centreWords(end, { x: this.steps(centre.x), y: this.steps(centre.y) });
    const z = end.z === this.at.z ? '' : this.word('Z', end.z);
    this.at = end;
    this.lines.push(`${turn === 1 ? 'G3' : 'G2'}${this.word('X', end.x)}${this.word('Y', end.y)}${z}${I}${J}${this.feedWord(feed)}`);
  }

  /** I and J from the rounded ends, with more decimals only where the two radii would differ too much without. */
  private centreWords(end: Point2, centre: Point2): { I: string; J: string } {
    const even = evenCentre(this.at, end, centre);
    for (let decimals = this.decimals; ; decimals++) {
      const fine = 10 ** (decimals - this.decimals);
      const [i, j] = [Math.round((even.x - this.at.x) * fine), Math.round((even.y - this.at.y) * fine)];
      const off = Math.hypot(i / fine, j / fine) - Math.hypot(this.at.x + i / fine - end.x, this.at.y + j / fine - end.y);
      if (Math.abs(off) <= RADIUS_TOLERANCE[this.units] * this.scale || decimals === MOST_DECIMALS) {
        return { I: ` I${formatSteps(i, decimals)}`, J: ` J${formatSteps(j, decimals)}` };
      }
    }
  }

  /** Where the bit stands, in the spec's units. */
  get point(): Point3 {
    const back = (steps: number) => convertLength(steps / this.scale, this.units, this.from);
    return { x: back(this.at.x), y: back(this.at.y), z: back(this.at.z) };
  }
}

/** Feed of each move: a plunge at its own, a ramp never sinking faster than a plunge would, all else at the feed. */
function feedOf(spec: SlotSpec, role: CutMove['role']): number {
  if (role === 'plunge') return spec.plungeFeed;
  if (role === 'ramp') return Math.min(spec.feed, spec.plungeFeed / Math.sin((spec.rampAngle * Math.PI) / 180));
  return spec.feed;
}

/**
 * The program's blocks without %, header and line numbers: modes, approach, the cut, one retract, end.
 *
 * Z moves alone first, X and Y only at the safe height, the spindle turns before the bit comes down and stops only
 * after it is up, on a block of its own (NISTIR 6556 Table 8: `G0 Z1 M5` would stop it first).
 */
export function writeBody(spec: SlotSpec, options: ProgramOptions, path: SlotPath): string[] {
  const units = options.programUnits ?? spec.units;
  const blocks = new Blocks(spec.units, units);
  const { lines } = blocks;
  const hand = spec.spindle === 'hand';
  const comment = (text: string) => (options.comments ? [`(${text})`] : []);

  lines.push(units === 'in' ? 'G20' : 'G21', 'G17 G40 G49 G54 G80 G90 G94');
  blocks.straight('G0', { z: spec.safeHeight });
  if (hand) lines.push(...comment(`SWITCH THE SPINDLE ON AT ${Math.round(spec.spindleSpeed)} REV PER MIN, THEN START`), 'M0');
  else lines.push(options.speedWord ? `S${Math.round(spec.spindleSpeed)} M3` : 'M3');
  if (!hand && options.spindleWait !== 'none') {
    lines.push(`G4 P${options.spindleWait === 'seconds' ? SPINDLE_WAIT_SECONDS.toFixed(1) : (SPINDLE_WAIT_SECONDS * 1000).toFixed(1)}`);
  }
  blocks.straight('G0', { x: path.start.x, y: path.start.y });
  blocks.straight('G1', { z: path.start.z }, spec.plungeFeed);

  for (const { to, arc, role } of path.moves) {
    const feed = feedOf(spec, role);
    if (!arc) {
      blocks.straight('G1', to, feed);
    } else if (options.chordTolerance === 0) {
      blocks.arc(to, arc.centre, arc.turn, feed);
    } else {
      const from = blocks.point;
      const points = chordPoints(from, to, arc.centre, arc.turn, options.chordTolerance * CHORD_SHARE);
      points.forEach((point, i) => {
        blocks.straight('G1', { ...point, z: from.z + ((to.z - from.z) * (i + 1)) / points.length }, feed);
      });
    }
  }

  blocks.straight('G0', { z: spec.safeHeight });
  lines.push(...(hand ? [...comment('SWITCH THE SPINDLE OFF, THEN START'), 'M0'] : ['M5']), options.end);
  return lines;
}
