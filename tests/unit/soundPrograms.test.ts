import fc from 'fast-check';
import { parseStringSync } from 'gcode-parser';
import { describe, expect, it } from 'vitest';
import { type MadeProgram, makeProgram } from '#shared/makeProgram';
import { readBlocks } from '#shared/reader/index';
import type { SlotSpec } from '#shared/slot/spec';
import { type RawSpec, rawSpecArbitrary } from '../support/randomSpecs';
import { type JudgedOptions, expectSoundCut } from '../support/soundCut/index';
import { asked } from './slot/asking';

const SEED = 500; // fixed, so that a failure is the same for everybody; fast-check prints it with the case
/** A failure is shown as it was found: to shrink one costs minutes. Run its seed and path without this to do so. */
const AS_FOUND = { endOnFailure: true };
const UNITS = ['in', 'mm'] as const;
const GRID = { in: 1e-4, mm: 1e-3 }; // the last decimal written
const CHUNKS = Array.from({ length: 6 }, (_, i) => i);
const CHUNK = 45; // 6 × 45 in each of two units: 540 slots

/** Makes a program; what disagrees is the failure's message. */
function make(raw: RawSpec, options: JudgedOptions = {}): Extract<MadeProgram, { ok: true }> {
  const made = makeProgram(asked({ ...raw, options }));
  if (made.ok) return made;
  const off = made.readback.findings.filter(({ severity }) => severity === 'disagrees');
  throw new Error(off.map(({ rule, at, wanted, measured, reason }) => `${rule}, line ${at.line}: wanted ${String(wanted)}, measured ${String(measured)}, ${reason ?? ''}`).join('\n'));
}

/** The words of every block, by the independent parser and by our reader. */
function expectSameWords(program: string): void {
  const theirs = parseStringSync(program)
    .map(({ ln, words }) => [...(ln === undefined ? [] : [['N', ln] as const]), ...words]).filter((words) => words.length > 0);
  const read = readBlocks(program);
  const ours = read.ok ? read.blocks.map((block) => [...(block.number === null ? [] : [['N', block.number]]), ...block.words.map(({ letter, value }) => [letter, value])]) : [];
  expect(ours).toEqual(theirs);
}

describe.each(UNITS)('any slot drawn in %s', (units) => {
  it.each(CHUNKS)('makes a program that nothing is wrong with (part %i)', (chunk) => {
    fc.assert(fc.property(rawSpecArbitrary(units), (raw) => {
      const made = make(raw);
      expect(made.readback.findings.filter(({ severity }) => severity === 'disagrees')).toEqual([]);
      expectSoundCut(made.program, raw);
      expectSameWords(made.program);
    }), { seed: SEED + chunk, numRuns: CHUNK, ...AS_FOUND });
  });

  const options: fc.Arbitrary<JudgedOptions> = fc.record({
    lineNumbers: fc.boolean(), lineEndings: fc.constantFrom('lf' as const, 'crlf' as const), percent: fc.boolean(), comments: fc.boolean(), speedWord: fc.boolean(),
    spindleWait: fc.constantFrom('none' as const, 'seconds' as const, 'milliseconds' as const), end: fc.constantFrom('M30' as const, 'M2' as const),
    chordTolerance: fc.constantFrom(0, units === 'in' ? 0.0002 : 0.004, units === 'in' ? 0.0005 : 0.01), programUnits: fc.constantFrom(null, ...UNITS),
  }, { requiredKeys: [] });

  it.each([0, 1])('makes such a program at any options (part %i)', (chunk) => {
    fc.assert(fc.property(rawSpecArbitrary(units), options, (raw, chosen) => {
      // No M3, so no wait for it either.
      const asks = raw.spindle === 'hand' ? { ...chosen, spindleWait: 'none' as const } : chosen;
      const { program } = make(raw, asks);
      expectSoundCut(program, raw, asks);
      expectSameWords(program);
    }), { seed: SEED + 100 + chunk, numRuns: 40, ...AS_FOUND });
  });
});

interface Leg { readonly x: number; readonly y: number; readonly z: number; readonly kind: string; readonly turn: number; readonly feed: number | null }

/** Where each motion ends, and what the rest of it is; without motions of two steps or less, which rounding makes or unmakes. */
function motionsOf({ steps }: MadeProgram, step: number): Leg[] {
  const legs: Leg[] = [];
  for (const one of steps) {
    if (!('to' in one)) continue;
    const last = legs.at(-1);
    if (last && last.z === one.to.z && Math.hypot(one.to.x - last.x, one.to.y - last.y) <= 2.1 * step) continue;
    legs.push({ ...one.to, kind: one.kind, turn: one.arc?.turn ?? 0, feed: one.feed });
  }
  return legs;
}

describe.each(UNITS)('metamorphic, drawn in %s', (units) => {
  const holds = (check: (raw: RawSpec) => void, numRuns = 40) => fc.assert(fc.property(rawSpecArbitrary(units), check), { seed: SEED + 200, numRuns, ...AS_FOUND });
  const step = 2.61 * GRID[units]; // half a step for the rail's middle, which is rounded, and two for motions left out

  it('work zero in the middle is the same cut, moved by half the rail', () => {
    holds((raw) => {
      const corner = make({ ...raw, workZero: 'corner' });
      const centre = make({ ...raw, workZero: 'centre' });
      const [dx, dy] = [raw.stopMargin + raw.length / 2, corner.spec.railWidth / 2];
      const [here, there] = [motionsOf(corner, GRID[units]), motionsOf(centre, GRID[units])];
      expect(there.length).toBe(here.length);
      here.forEach((motion, i) => {
        const other = there[i];
        expect({ kind: other?.kind, turn: other?.turn, feed: other?.feed, z: other?.z }).toEqual({ kind: motion.kind, turn: motion.turn, feed: motion.feed, z: motion.z });
        if (Number.isNaN(motion.x)) return;
        expect(Math.abs((other?.x ?? NaN) + dx - motion.x)).toBeLessThanOrEqual(step);
        expect(Math.abs((other?.y ?? NaN) + dy - motion.y)).toBeLessThanOrEqual(step);
      });
      expect(centre.readback.verdict).toBe(corner.readback.verdict);
    });
  });

  it('conventional mirrors climb across the rail', () => {
    holds((raw) => {
      const { finishAllowance: _, ...plain } = raw;
      const climb = make({ ...plain, direction: 'climb' });
      const conventional = make({ ...plain, direction: 'conventional' });
      const middle = plain.workZero === 'centre' ? 0 : climb.spec.railWidth / 2;
      const [here, there] = [motionsOf(climb, GRID[units]), motionsOf(conventional, GRID[units])];
      expect(there.length).toBe(here.length);
      here.forEach((motion, i) => {
        const other = there[i];
        expect([other?.kind, Math.abs((other?.turn ?? 0) + motion.turn), other?.z]).toEqual([motion.kind, 0, motion.z]);
        if (Number.isNaN(motion.x)) return;
        expect(Math.abs((other?.x ?? NaN) - motion.x)).toBeLessThanOrEqual(step);
        expect(Math.abs((other?.y ?? NaN) + motion.y - 2 * middle)).toBeLessThanOrEqual(2 * step); // the middle counts twice
      });
      expect(conventional.summary.cutLength).toBeCloseTo(climb.summary.cutLength, units === 'in' ? 2 : 1);
    });
  });
});

/** Every length of an inch drawing in millimetres, defaults and all, so that both drawings mean the same rail. */
function inMillimetres(spec: SlotSpec): SlotSpec {
  const mm = (value: number) => value * 25.4;
  return {
    ...spec, units: 'mm', length: mm(spec.length), width: mm(spec.width), depth: mm(spec.depth), stopMargin: mm(spec.stopMargin), bitDiameter: mm(spec.bitDiameter),
    stepdown: mm(spec.stepdown), railWidth: mm(spec.railWidth), railThickness: mm(spec.railThickness), cuttingLength: mm(spec.cuttingLength), colletDiameter: mm(spec.colletDiameter),
    stickout: mm(spec.stickout), clampHeight: mm(spec.clampHeight), clampReach: mm(spec.clampReach), safeHeight: mm(spec.safeHeight), finishAllowance: mm(spec.finishAllowance),
    feed: mm(spec.feed), plungeFeed: mm(spec.plungeFeed),
  };
}

describe('an inch drawing and the same in millimetres', () => {
  it('agree in every finding, and in what was measured', () => {
    fc.assert(fc.property(rawSpecArbitrary('in'), (raw) => {
      const off = Math.abs(raw.width - raw.bitDiameter) * 25.4;
      // Where the inch's limit is not quite the millimetre's: 0.005 in or 0.12 mm, 0.0005 in or 0.01 mm.
      fc.pre(!(off >= 0.12 && off <= 0.128) && !(off >= 0.01 && off <= 0.0128));
      const inch = make(raw);
      const metric = makeProgram(asked(inMillimetres(inch.spec)));
      expect(metric.readback.findings.map(({ rule, severity, reason }) => [rule, severity, reason])).toEqual(inch.readback.findings.map(({ rule, severity, reason }) => [rule, severity, reason]));
      inch.readback.findings.forEach((finding, i) => {
        const other = metric.readback.findings[i];
        if (finding.quantity !== 'length' || typeof finding.measured !== 'number') return;
        // A stepdown between two last decimals may need one pass more in one unit than in the other.
        if (finding.rule === 'passDepth' && metric.summary.passes.length !== inch.summary.passes.length) return;
        // Each is written to its own last decimal; 0.0005 in is what a size may be off.
        expect(Math.abs(finding.measured * 25.4 - Number(other?.measured)), finding.rule).toBeLessThanOrEqual(0.0005 * 25.4 + 1e-9);
      });
    }), { seed: SEED + 300, numRuns: 60, ...AS_FOUND });
  });
});
