import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { BRADS, BRAD_GAUGES, type Joint, bradFindings, bradPlaces, chooseBrad, longestThroughBatten, withdrawalLoad } from '#shared/assembly/fasteners';
import { cleatFrom, coinMass, hangingFor, woodMass } from '#shared/assembly/hanging';
import { battenPlaces, storeyRod } from '#shared/assembly/positions';
import type { Build } from '#shared/wood/cutList';
import { THIRTEEN, pieceOf } from '../piece/thirteenStripes';

const section = { width: 1.25, thickness: 0.75, grooveWidth: 0.375, grooveDepth: 0.1875, stopMargin: 0.875, laneMargin: 0.875 };
const joint: Joint = { units: 'in', boardThickness: 0.75, section };
const build: Build = { boardThickness: 0.75, odd: 'walnut', even: 'cherry', union: 'walnut', rails: 'white-oak', battens: 'poplar', batten: { count: 4, width: 1.5, thickness: 0.75, inset: 1 } };
const bad = (brad: Parameters<typeof bradFindings>[0], at: Joint = joint) => bradFindings(brad, at).filter(({ severity }) => severity !== 'agrees').map(({ rule, severity, reason }) => `${rule} ${severity}: ${reason}`);

/** Whether a brad, as a level rectangle in the rail's section, comes nearer than 1/8 in to the groove or the front face: by points along it. */
function comesNear(brad: { gauge: keyof typeof BRADS; length: number; below: number }, { boardThickness, section: rail, units }: Joint): boolean {
  const scale = units === 'in' ? 1 : 25.4;
  const [d, clear] = [BRADS[brad.gauge].diameter * scale, scale / 8];
  const [from, to] = [(rail.width - rail.grooveWidth) / 2, (rail.width + rail.grooveWidth) / 2];
  for (let n = 0; n <= 200; n++) {
    const x = ((brad.length - boardThickness) * n) / 200;
    if (x > rail.width - clear + 1e-9) return true;
    // Level with the groove and nearer than the clearance to it, from before its back wall on; behind the front wall it has passed through.
    if (x > from - clear + 1e-9 && brad.below - d / 2 < rail.grooveDepth + clear - 1e-9 && x <= to + clear) return true;
  }
  return false;
}

describe('brads from behind', () => {
  const joints: fc.Arbitrary<Joint> = fc.record({
    units: fc.constantFrom('in' as const, 'mm' as const), boardThickness: fc.double({ min: 0.25, max: 1, noNaN: true }), width: fc.double({ min: 0.6, max: 2, noNaN: true }),
    thickness: fc.double({ min: 0.4, max: 1, noNaN: true }), groove: fc.double({ min: 0.1, max: 0.7, noNaN: true }), depth: fc.double({ min: 0.1, max: 0.9, noNaN: true }),
  }).map(({ units, boardThickness, width, thickness, groove, depth }) => {
    const k = units === 'in' ? 1 : 25.4;
    return { units, boardThickness: boardThickness * k, section: { width: width * k, thickness: thickness * k, grooveWidth: groove * width * k, grooveDepth: depth * thickness * k, stopMargin: k, laneMargin: k } };
  });

  it('are chosen so that none comes through or near a groove or the face', () => {
    let chosen = 0;
    fc.assert(fc.property(joints, fc.constantFrom(...BRAD_GAUGES), (each, gauge) => {
      const brad = chooseBrad(each, gauge);
      if (!brad) return;
      chosen++;
      expect(comesNear(brad, each)).toBe(false);
      expect(bradFindings(brad, each).filter(({ severity }) => severity === 'disagrees')).toEqual([]);
    }), { numRuns: 500 });
    expect(chosen).toBeGreaterThan(150);
  });

  it('are refused exactly where a point of them comes near', () => {
    fc.assert(fc.property(joints, fc.constantFrom(...BRAD_GAUGES), fc.double({ min: 0.5, max: 2.5, noNaN: true }), fc.double({ min: 0.05, max: 0.95, noNaN: true }), (each, gauge, long, share) => {
      const brad = { gauge, length: long * (each.units === 'in' ? 1 : 25.4), below: share * each.section.thickness };
      fc.pre(brad.length > each.boardThickness);
      const findings = bradFindings(brad, each).filter(({ rule, severity }) => severity === 'disagrees' && (rule === 'groove' || rule === 'frontFace'));
      expect(findings.length > 0).toBe(comesNear(brad, each));
    }), { numRuns: 500 });
  });

  it('go under the groove as long as the rail allows', () => {
    // Own arithmetic: wood from 0.1875 + 0.125 + 0.02375 to 0.75 − 0.11875; 3/4 + 1 1/4 − 1/8 leaves 1 7/8, and 1 3/4 is sold.
    const brad = chooseBrad(joint, 18);
    expect(brad?.length).toBe(1.75);
    expect(brad?.below).toBeCloseTo((0.33625 + 0.63125) / 2, 9);
    expect(brad && bad(brad)).toEqual(['holding caution: shortForBoard']);
  });

  it.each([
    [{ gauge: 18, length: 1.5, below: 0.1 }, 'groove disagrees: throughGroove'], [{ gauge: 18, length: 1.5, below: 0.3 }, 'groove disagrees: nearGroove'],
    [{ gauge: 18, length: 1.95, below: 0.5 }, 'frontFace disagrees: nearFace'], [{ gauge: 16, length: 2.5, below: 0.5 }, 'frontFace disagrees: throughFace'],
    [{ gauge: 18, length: 1, below: 0.5 }, 'bite disagrees: short'], [{ gauge: 18, length: 0.625, below: 0.5 }, 'bite disagrees: misses'],
    [{ gauge: 18, length: 1.5, below: 0.7 }, 'edge caution: nearEdge'],
  ] as const)('%j: %s', (brad, expected) => {
    expect(bad(brad)).toContain(expected);
  });

  it('are driven along a short rail, and from both ends inwards on a long one', () => {
    expect(bradPlaces(10, 18, 'in').map(({ order }) => order)).toEqual([1, 2, 3]);
    const long = bradPlaces(26.25, 18, 'in');
    expect(long.map(({ order }) => order)).toEqual([1, 3, 5, 6, 4, 2]);
    expect(long[0]?.at).toBeCloseTo(15 * 0.0475, 9);
    for (const [n, { at }] of long.entries()) if (n > 0) expect(at - (long[n - 1]?.at ?? 0)).toBeLessThanOrEqual(5 + 1e-9);
  });

  it('through a batten stay clear of the board\'s face', () => {
    expect(longestThroughBatten(0.75, 0.75, 'in')).toBe(1.375);
  });

  it.each([[0.0475, 11.6], [0.0625, 15.2], [0.072, 17.6]])('of %d in hold %d pounds an inch at G 0.50', (diameter, pounds) => {
    expect(withdrawalLoad(0.5, diameter, 1)).toBeCloseTo(pounds, 1); // FACTS.md F1, from FPL-093
  });

  it('hold 38 pounds an inch by the published example', () => {
    expect(withdrawalLoad(0.45, 0.203, 1)).toBeCloseTo(38.05, 1); // FACTS.md F1: G 0.45, D 0.203
  });
});

describe('marks to put a piece together by', () => {
  it('stand in order from one edge and lie on the board', () => {
    const marks = storeyRod(pieceOf(THIRTEEN), build);
    for (const along of ['down', 'across'] as const) {
      const places = marks.filter((mark) => mark.along === along).map(({ at }) => at);
      expect(places).toEqual([...places].sort((a, b) => a - b));
      for (const at of places) expect(at > 0 && at < (along === 'down' ? 19.5 : 37)).toBe(true);
    }
    expect(marks.find(({ words }) => words === 'rail A top')?.at).toBeCloseTo(3 * 1.5 + 0.375, 9);
  });

  it('put battens evenly, alike from both ends', () => {
    const places = battenPlaces(36, build);
    expect(places).toEqual([4.5, 13, 21.5, 30]);
    expect(battenPlaces(36, { batten: { ...build.batten, count: 1 } })).toEqual([17.25]);
  });
});

describe('hanging', () => {
  it('weighs wood by its density and coins by their mass', () => {
    // Own arithmetic: 10 × 10 × 1 in walnut is 1638.7 cm³ at 0.55 × 1.12 g/cm³.
    expect(woodMass([{ name: 'a', quantity: 1, length: 10, width: 10, thickness: 1, wood: 'walnut', grain: 'along' }], 'in')).toBeCloseTo(1638.7064 * 0.616, 3);
    // FACTS.md D2: a brass disc 38.1 × 3 mm is 29.1 g; a US quarter weighs 5.67 g.
    expect(coinMass({ units: 'mm', kinds: [{ name: 'm', diameter: 38.1, thickness: 3, count: 2, mass: null }] })).toBeCloseTo(58.1, 1);
    expect(coinMass({ units: 'mm', kinds: [{ name: 'q', diameter: 24.26, thickness: 1.75, count: 4, mass: 5.67 }] })).toBeCloseTo(22.68, 9);
  });

  it('asks four times the weight of its hardware, and a cleat for what is heavy', () => {
    expect(hangingFor(4535.9237, { width: 28, height: 16 }, 'in')).toMatchObject({ by: 'rings', rating: 20, down: 4, apart: 14 });
    expect(hangingFor(13_607.7711, { width: 28, height: 16 }, 'in')).toMatchObject({ by: 'cleat', rating: 60, apart: 16 });
  });

  it('rips both halves of a cleat from one board', () => {
    const { tall, short, thickness } = cleatFrom(4, 0.75, 0);
    expect(tall + short).toBeCloseTo(4, 9); // laid together again along the cut they are the board
    expect(tall - short).toBeCloseTo(thickness, 9);
  });
});
