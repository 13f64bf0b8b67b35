import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type Removal, buildRemoval, depthAt, packFalls, pathSegments, removalInSlices } from '#shared/playback/index';
import type { Motion, Step } from '#shared/reader/motion';
import { defaultDynamics, timeOf } from '#shared/time/index';
import { BIT, RAIL, grooveSteps } from '../../support/steps/rail';
import { buildSteps } from '../../support/steps/steps';

const DYNAMICS = defaultDynamics('in', null);
const CHORD = BIT / 2000;

interface Footprint { x: number; y: number; z: number; travel: number }

/** Where the bit's end stands, every `pace` along the path: straight and circular motion worked out anew. */
function footprints(steps: readonly Step[], pace: number): Footprint[] {
  const found: Footprint[] = [];
  let travel = 0;
  for (const step of steps) {
    if (step.kind !== 'line' && step.kind !== 'rapid' && step.kind !== 'arc') continue;
    const length = lengthOf(step);
    if (Number.isNaN(length)) continue;
    const parts = Math.max(1, Math.ceil(length / pace));
    for (let i = 0; i <= parts; i++) found.push({ ...placeOn(step, i / parts), travel: travel + (length * i) / parts });
    travel += length;
  }
  return found;
}

function lengthOf({ from, to, arc }: Motion): number {
  return arc ? Math.hypot(arc.radius * arc.sweep, to.z - from.z) : Math.hypot(to.x - from.x, to.y - from.y, to.z - from.z);
}

function placeOn({ from, to, arc }: Motion, share: number) {
  const z = from.z + (to.z - from.z) * share;
  if (!arc) return { x: from.x + (to.x - from.x) * share, y: from.y + (to.y - from.y) * share, z };
  const angle = Math.atan2(from.y - arc.centre.y, from.x - arc.centre.x) + arc.turn * arc.sweep * share;
  return { x: arc.centre.x + arc.radius * Math.cos(angle), y: arc.centre.y + arc.radius * Math.sin(angle), z };
}

/** Least z of all footprints that cover the place, by brute force. */
function bruteDepth(prints: readonly Footprint[], x: number, y: number, radius: number, travel: number): number {
  return prints.reduce((depth, print) => (print.travel <= travel && Math.hypot(print.x - x, print.y - y) <= radius ? Math.min(depth, print.z) : depth), 0);
}

function make(steps: readonly Step[]) {
  const timeline = timeOf(steps, DYNAMICS);
  const removal = buildRemoval(pathSegments(timeline, CHORD), BIT, RAIL);
  const whole = timeline.before.at(-1) ?? 0;
  return { removal, whole, steps };
}

/** Checks one crossing at one travel against brute force, between a slightly narrower and a slightly wider bit. */
function expectSound({ removal, steps }: { removal: Removal; steps: readonly Step[] }, prints: readonly Footprint[], vertex: number, travel: number, pace: number) {
  const [x = NaN, y = NaN] = removal.places.subarray(vertex * 2, vertex * 2 + 2);
  const depth = depthAt(removal.falls, vertex, travel);
  const slack = CHORD + BIT * 0.001 + (pace * pace) / BIT; // chords, the lip, and the gap between two footprints
  const steepest = steps.reduce((most, step) => ('to' in step && step.from.z !== step.to.z && !Number.isNaN(lengthOf(step)) ? Math.max(most, Math.abs(step.to.z - step.from.z) / lengthOf(step)) : most), 0);
  const late = pace + 0.02 * BIT + Math.sqrt(slack * BIT); // along the path: a slightly wider bit comes by slightly sooner
  expect(depth).toBeLessThanOrEqual(bruteDepth(prints, x, y, BIT / 2 - slack, travel - late) + steepest * late + 1e-6);
  expect(depth).toBeGreaterThanOrEqual(bruteDepth(prints, x, y, BIT / 2 + slack, travel + late) - steepest * late - 1e-6);
}

/** Programs that go anywhere in a small area of the rail, down ramps, round arcs, up and over. */
const anyCut = fc
  .array(fc.record({ kind: fc.constantFrom('line', 'level', 'arc', 'rapid'), x: fc.integer({ min: 20, max: 120 }), y: fc.integer({ min: 20, max: 100 }), z: fc.integer({ min: -30, max: 10 }), turn: fc.constantFrom<1 | -1>(1, -1) }), { minLength: 1, maxLength: 8 })
  .map((moves) => {
    const program = buildSteps({ x: 0.5, y: 0.5, z: 0.1 }, 60);
    let [x, y] = [0.5, 0.5];
    for (const move of moves) {
      const to = { x: move.x / 100, y: move.y / 100 };
      const z = move.z / 100;
      if (move.kind === 'rapid') program.rapid({ z: 0.1 }).rapid({ ...to }).line({ z });
      else if (move.kind === 'level') program.line(to);
      else if (move.kind === 'line' || (to.x === x && to.y === y)) program.line({ ...to, z });
      else program.arc({ ...to, z }, { x: (x + to.x) / 2, y: (y + to.y) / 2 }, move.turn);
      [x, y] = [to.x, to.y];
    }
    return program.steps;
  });

describe('removal', () => {
  it('has every crossing as deep as brute force at the end, and at any moment before', () => {
    fc.assert(
      fc.property(anyCut, fc.infiniteStream(fc.double({ min: 0, max: 1, noNaN: true, maxExcluded: true })), (steps, stream) => {
        const made = make(steps);
        if (!made.removal) return;
        const removal = made.removal;
        const pace = 0.004;
        const prints = footprints(steps, pace);
        for (let n = 0; n < 60; n++) {
          const vertex = Math.floor((stream.next().value ?? 0) * removal.falls.vertices);
          const travel = n % 3 === 0 ? Infinity : (stream.next().value ?? 0) * made.whole;
          expectSound({ removal, steps }, prints, vertex, travel, pace);
        }
      }),
      { numRuns: 60 },
    );
  });

  it('cuts every crossing within the radius of a straight cut and none beyond, to 1/50 000 of an inch', () => {
    const straight = fc.array(fc.record({ x: fc.integer({ min: 20, max: 120 }), y: fc.integer({ min: 20, max: 100 }) }), { minLength: 1, maxLength: 6 });
    fc.assert(
      fc.property(straight, (places) => {
        const program = buildSteps({ x: 0.5, y: 0.5, z: -0.1 }, 60);
        for (const place of places) program.line({ x: place.x / 100, y: place.y / 100 });
        const { removal, steps } = make(program.steps);
        if (!removal) return;
        const moves = steps.flatMap((step) => (step.kind === 'line' ? [step] : []));
        for (let v = 0; v < removal.falls.vertices; v++) {
          const [x = NaN, y = NaN] = removal.places.subarray(v * 2, v * 2 + 2);
          const distance = moves.reduce((least, { from, to }) => {
            const [ux, uy] = [to.x - from.x, to.y - from.y];
            const along = Math.min(1, Math.max(0, ((x - from.x) * ux + (y - from.y) * uy) / (ux * ux + uy * uy || 1)));
            return Math.min(least, Math.hypot(x - from.x - ux * along, y - from.y - uy * along));
          }, Infinity);
          if (Math.abs(distance - BIT / 2) < 2e-5) continue;
          const cut = depthAt(removal.falls, v, Infinity) < 0;
          if (cut !== distance < BIT / 2) expect({ x, y, distance, cut }).toBe('cut exactly within the radius');
        }
      }),
      { numRuns: 30 },
    );
  });

  it('cuts the hand-written groove to its depth, its width and its length', () => {
    const { removal } = make(grooveSteps().steps);
    expect(removal).not.toBeNull();
    if (!removal) return;
    let [x0, x1, y0, y1, deepest] = [Infinity, -Infinity, Infinity, -Infinity, 0];
    for (let v = 0; v < removal.falls.vertices; v++) {
      const depth = depthAt(removal.falls, v, Infinity);
      deepest = Math.min(deepest, depth);
      if (depth === 0) continue;
      const [x = NaN, y = NaN] = removal.places.subarray(v * 2, v * 2 + 2);
      [x0, x1, y0, y1] = [Math.min(x0, x), Math.max(x1, x), Math.min(y0, y), Math.max(y1, y)];
      expect(depth).toBeCloseTo(-0.1875, 6); // the floor is flat
    }
    expect(deepest).toBeCloseTo(-0.1875, 6);
    expect(x1 - x0).toBeCloseTo(12, 3);
    expect(y1 - y0).toBeCloseTo(0.375, 3);
    expect(x0).toBeCloseTo(1, 3);
  });

  it('has the wood whole before the first cut', () => {
    const { removal } = make(grooveSteps().steps);
    for (let v = 0; v < (removal?.falls.vertices ?? 0); v++) expect(removal && depthAt(removal.falls, v, 0)).toBe(0);
    expect(removal?.falls.vertices).toBeGreaterThan(10_000);
  });

  it('keeps the final depth where a place falls more often than there are layers', () => {
    const many = Array.from({ length: 25 }, (_, i) => 0.01 * (i + 1));
    const { removal } = make(grooveSteps(many).steps);
    expect(removal && Math.min(...Array.from({ length: 200 }, (_, i) => depthAt(removal.falls, Math.floor(removal.falls.vertices / 2) + i, Infinity)))).toBeCloseTo(-0.25, 6);
    expect(removal?.falls.count.every((n) => n <= removal.falls.layers)).toBe(true);
  });

  it('is nothing for a program that stays above the wood', () => {
    expect(make(buildSteps({ x: 0, y: 0, z: 1 }, 60).line({ x: 3 }).rapid({ y: 1 }).steps).removal).toBeNull();
    expect(make([]).removal).toBeNull();
  });

  it('comes out the same in slices, whose shares rise to 1', () => {
    const segments = pathSegments(timeOf(grooveSteps([0.05, 0.1, 0.15, 0.1875]).steps, DYNAMICS), CHORD);
    const shares: number[] = [];
    const slices = removalInSlices(segments, BIT, RAIL);
    let next = slices.next();
    while (!next.done) {
      shares.push(next.value);
      next = slices.next();
    }
    expect(shares.length).toBeGreaterThan(3);
    expect(shares).toEqual([...shares].sort((a, b) => a - b));
    expect(shares.every((share) => share >= 0 && share <= 1)).toBe(true);
    const [inSlices, inOneGo] = [next.value?.falls.data, buildRemoval(segments, BIT, RAIL)?.falls.data];
    expect(inSlices?.length).toBeGreaterThan(0);
    expect(inSlices?.every((value, i) => value === inOneGo?.[i])).toBe(true);
  });

  it('packs into a texture without loss', () => {
    const { removal } = make(grooveSteps().steps);
    if (!removal) throw new Error('the groove cuts wood');
    const { columns, rows } = removal.grid;
    const packed = packFalls(removal.falls, columns, rows);
    expect(packed.data).toHaveLength(columns * rows * packed.layers * 4);
    for (let v = 0; v < columns * rows; v += 37) {
      const depth = Array.from({ length: packed.layers }, (_, layer) => packed.data.subarray((layer * columns * rows + v) * 4, (layer * columns * rows + v) * 4 + 4))
        .reduce((least, [sa = 0, , , zb = 0]) => (sa < 1e20 ? Math.min(least, zb) : least), 0);
      expect(depth).toBe(depthAt(removal.falls, v, 1e20));
    }
  });
});
