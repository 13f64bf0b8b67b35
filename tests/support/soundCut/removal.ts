import { boxOf, placeAt, planLength, trackOf, underTool, wayLength } from './geometry';
import type { Run } from './interpret';
import { outsideHome, shrink, type Slot } from './slotShape';
import type { JudgedOptions, JudgedSpec, Move, Point, Violation } from './types';

const STATIONS = 29; // along the slot, besides those at every corner of the path
const ACROSS = 13;
const RAMP_STEPS = 8;
const AROUND = 12;

/**
 * The wood's height at chosen points of the slot, motion by motion: a flat disc lowers what it passes over to its own
 * lowest height there. The depth of a cut at a point is the height before the motion less that lowest height, both
 * exact for lines, turns and helices; what is chosen is only where to look. A tool that goes down in several motions on
 * one spot does not hide: the points beside it meet the full depth as soon as it moves.
 *
 * Depth of cut never exceeds the stepdown by more than half the last decimal wherever radial engagement exceeds the
 * finish allowance; there the cutting length bounds it (issue, "The plan").
 */
export function judgeRemoval(run: Run, cuts: readonly Move[], spec: JudgedSpec, slot: Slot, options: JudgedOptions): Violation[] {
  const found: Violation[] = [];
  const slack = 2.5 * run.step; // in plan: two paths over one line each round by 0.71 of a step, arcs' radii by one more
  const allowance = spec.finishAllowance ?? 0;
  const chord = slot.home.round > 0 ? options.chordTolerance ?? 0 : 0; // chords leave that much more, not at the same spots in each pass
  const short = slack + chord;
  const roughed = allowance > 0 ? shrink(slot.home, allowance) : slot.home;
  const tracks = cuts.map(trackOf);
  // Half the last decimal, for a level cut; a ramp's ends round too, and so may those of the ramp it follows.
  const most = cuts.map(cut => spec.stepdown + (cut.from.z === cut.to.z ? 0.5 : 1.5) * run.step + 1e-7);
  const skinMost = Math.max(spec.cuttingLength ?? Infinity, spec.stepdown) + run.step;
  const worst = new Map<number, { readonly depth: number; readonly at: Point; readonly skin: boolean }>();

  for (const group of samplePoints(cuts, slot)) {
    const box = boxOf(group);
    const reach = slot.bitRadius + slack;
    const near = [...cuts.keys()].filter((i) => {
      const other = tracks[i]?.box;
      return other !== undefined && other.x0 - reach <= box.x1 && other.x1 + reach >= box.x0 && other.y0 - reach <= box.y1 && other.y1 + reach >= box.y0;
    });
    for (const point of group) {
      const { x, y } = point;
      let height = 0;
      const skin = allowance + chord > 0 && (roughed === null || outsideHome(roughed, x, y) >= slot.bitRadius - short);
      for (const i of near) {
        const cut = cuts[i];
        const track = tracks[i];
        if (cut === undefined || track === undefined) continue;
        if (Math.min(cut.from.z, cut.to.z) >= height) continue; // passes above what is left
        const swept = underTool(track, x, y, reach);
        if (swept === null) continue;
        const met = underTool(track, x, y, slot.bitRadius - slack);
        const depth = met === null ? 0 : height - lowest(cut, met);
        const limit = skin ? skinMost : most[i] ?? 0;
        if (depth > limit && depth > (worst.get(i)?.depth ?? 0)) worst.set(i, { depth, at: point, skin });
        height = Math.min(height, lowest(cut, swept));
      }
    }
  }
  for (const [i, { depth, at, skin }] of [...worst].sort(([a], [b]) => a - b)) {
    const limit = skin ? skinMost : spec.stepdown;
    found.push({
      rule: skin ? 'cutting-length' : 'too-deep',
      line: cuts[i]?.line ?? 0,
      message: `a cut ${depth.toFixed(6)} deep at X ${at.x.toFixed(4)} Y ${at.y.toFixed(4)}, at most ${limit}`,
    });
  }
  return found;
}

function lowest(cut: Move, [first, last]: readonly [number, number]): number {
  const share = cut.to.z < cut.from.z ? last : first;
  return cut.from.z + (cut.to.z - cut.from.z) * share;
}

/** Stations over the whole slot, and rings of points about every corner of the path and along every ramp; by neighbourhood. */
function samplePoints(cuts: readonly Move[], slot: Slot): Point[][] {
  const { home, bitRadius } = slot;
  const points = new Map<string, Point>();
  const take = (x: number, y: number): void => {
    if (outsideHome(home, x, y) > bitRadius) return; // not of the slot
    points.set(`${Math.round(x / (bitRadius / 32))},${Math.round(y / (bitRadius / 32))}`, { x, y });
  };
  const endX = home.halfX + home.round + bitRadius;
  const endY = home.halfY + home.round + bitRadius;
  for (let i = 0; i < STATIONS; i += 1) {
    const x = home.centre.x + endX * (2 * (i + 0.5) / STATIONS - 1);
    for (let j = 0; j < ACROSS; j += 1) take(x, home.centre.y + endY * 0.998 * (2 * j / (ACROSS - 1) - 1));
  }
  const spots = new Map<string, Point>();
  const spot = (point: Point): void => void spots.set(`${Math.round(point.x / (bitRadius / 8))},${Math.round(point.y / (bitRadius / 8))}`, point);
  for (const cut of cuts) {
    spot(cut.from);
    spot(cut.to);
    const ramp = cut.from.z !== cut.to.z && planLength(cut) > 0;
    const steps = ramp ? Math.min(RAMP_STEPS, Math.ceil(wayLength(cut) / bitRadius)) : 1;
    for (let i = 1; i < steps; i += 1) spot(placeAt(cut, i / steps));
  }
  for (const { x, y } of spots.values()) {
    take(x, y);
    for (let i = 0; i < AROUND; i += 1) {
      const angle = 2 * Math.PI * i / AROUND;
      for (const share of [0.55, 0.98]) take(x + share * bitRadius * Math.cos(angle), y + share * bitRadius * Math.sin(angle));
    }
  }
  const groups = new Map<string, Point[]>();
  for (const point of points.values()) {
    const key = `${Math.floor(point.x / (2 * bitRadius))},${Math.floor(point.y / (2 * bitRadius))}`;
    const group = groups.get(key);
    if (group === undefined) groups.set(key, [point]);
    else group.push(point);
  }
  return [...groups.values()];
}
