import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { countBlocks } from '#shared/slot/blockCount';
import { planSlot } from '#shared/slot/plan';
import type { SlotPath } from '#shared/slot/path';
import { type SlotSpec, isOneBit } from '#shared/slot/spec';
import { type RawSpec, rawSpecArbitrary } from '../../support/randomSpecs';
import { RAIL_A, asked } from './asking';

const SEED = 24; // fixed, so that a failure is the same for everybody; fast-check prints it with the case
const RUNS = 150;

describe.each([['in', 1e-4], ['mm', 1e-3]] as const)('any slot planned in %s', (units, grid) => {
  const holds = (check: (path: SlotPath, spec: SlotSpec, raw: RawSpec) => void) =>
    fc.assert(fc.property(rawSpecArbitrary(units), (raw) => {
      const { spec } = asked(raw);
      check(planSlot(spec, grid), spec, raw);
    }), { seed: SEED, numRuns: RUNS });

  it('has equal passes that end exactly at the depth, and no more of them than the stepdown asks for', () => {
    holds(({ levels }, { depth, stepdown }) => {
      const passes = levels.map((level, i) => level - (levels[i - 1] ?? 0));
      expect(Math.abs((levels.at(-1) ?? 0) - depth)).toBeLessThanOrEqual(grid / 2 + 1e-9);
      expect(Math.max(...passes) - Math.min(...passes)).toBeLessThanOrEqual(grid * 1.001);
      // Half the last decimal may be added to a pass (issue, "The plan").
      expect(Math.max(...passes)).toBeLessThanOrEqual(stepdown + grid / 2 + 1e-9);
      // In whole steps of the last decimal: a depth within half a step, over passes of at most the stepdown and half a step.
      const fewest = Math.ceil(Math.ceil(depth / grid - 0.5 - 1e-6) / Math.max(1, Math.floor(stepdown / grid + 0.5 + 1e-6)));
      expect(passes.length).toBe(fewest);
    });
  });

  it('starts 0.02 in or 0.5 mm above the top and never rises again', () => {
    holds(({ start, moves }) => {
      expect(start.z).toBe(units === 'in' ? 0.02 : 0.5);
      let z = start.z;
      for (const { to } of moves) {
        expect(to.z).toBeLessThanOrEqual(z + 1e-9);
        z = to.z;
      }
    });
  });

  it('goes down along ramps no steeper than asked, or straight down where no ramp fits', () => {
    holds(({ start, moves }, { rampAngle, length, bitDiameter }) => {
      let from = start;
      for (const { to, role } of moves) {
        const fall = from.z - to.z;
        const along = Math.hypot(to.x - from.x, to.y - from.y);
        if (fall > 1e-9) {
          expect(role).toBe(along === 0 ? 'plunge' : 'ramp');
          if (along === 0) expect(length - bitDiameter).toBeLessThan(0.2 * bitDiameter);
          // One step of Z and of each coordinate is rounding.
          else expect(fall - grid).toBeLessThanOrEqual((along + 2 * grid) * Math.tan((rampAngle * Math.PI) / 180) + 1e-9);
        } else {
          expect(role === 'pass' || role === 'finish').toBe(true);
        }
        from = to;
      }
    });
  });

  it('has a last pass that goes round level after its ramp', () => {
    holds(({ moves }, { depth }) => {
      const lastRamp = moves.findLastIndex(({ role }) => role === 'ramp' || role === 'plunge');
      const after = moves.slice(lastRamp + 1);
      expect(after.length).toBeGreaterThan(0);
      for (const { to } of after) expect(Math.abs(to.z + depth)).toBeLessThanOrEqual(grid / 2 + 1e-9);
    });
  });

  it('keeps the middle of the bit inside the walls, and reaches both ends', () => {
    holds(({ moves }, spec) => {
      const rail = spec.length + 2 * spec.stopMargin;
      const zero = spec.workZero === 'corner' ? { x: rail / 2, y: spec.railWidth / 2 } : { x: 0, y: 0 };
      const halfX = (spec.length - spec.bitDiameter) / 2;
      const halfY = isOneBit(spec) ? 0 : (spec.width - spec.bitDiameter) / 2;
      const xs = moves.map(({ to }) => to.x - zero.x);
      const ys = moves.map(({ to }) => to.y - zero.y);
      const slack = 1.01 * grid; // the slot's middle and half size are each rounded once
      expect(Math.abs(Math.max(...xs) - halfX)).toBeLessThanOrEqual(slack);
      expect(Math.abs(Math.min(...xs) + halfX)).toBeLessThanOrEqual(slack);
      const across = isOneBit(spec) ? 0.0025 / (units === 'in' ? 1 : 1 / 25.4) : 0;
      expect(Math.abs(Math.max(...ys) - halfY)).toBeLessThanOrEqual(slack + across);
      expect(Math.abs(Math.min(...ys) + halfY)).toBeLessThanOrEqual(slack + across);
    });
  });

  it('turns by a quarter circle at most, both ends equally far from the centre', () => {
    holds(({ start, moves }) => {
      let from: { readonly x: number; readonly y: number } = start;
      for (const { to, arc } of moves) {
        if (arc) {
          const [a, b] = [{ x: from.x - arc.centre.x, y: from.y - arc.centre.y }, { x: to.x - arc.centre.x, y: to.y - arc.centre.y }];
          expect(Math.abs(Math.hypot(a.x, a.y) - Math.hypot(b.x, b.y))).toBeLessThanOrEqual(1e-9);
          const angle = Math.atan2(arc.turn * (a.x * b.y - a.y * b.x), a.x * b.x + a.y * b.y);
          expect(angle).toBeGreaterThanOrEqual(-1e-9);
          expect(angle).toBeLessThanOrEqual(Math.PI / 2 + 1e-9);
        }
        from = to;
      }
    });
  });

  it('has a finish lap where one is asked, and none elsewhere', () => {
    holds(({ moves }, { finishAllowance }) => {
      expect(moves.some(({ role }) => role === 'finish')).toBe(finishAllowance > 0);
    });
  });

  it('is counted about right without planning it: never a tenth too few, never twice too many', () => {
    holds(({ moves }, spec) => {
      const count = countBlocks(spec);
      expect(moves.length).toBeLessThanOrEqual(1.1 * count);
      expect(count).toBeLessThanOrEqual(2 * moves.length + 60); // 60: header, modes, start and end
    });
  });
});

describe('a slot no longer than its bit', () => {
  const { spec } = asked({ ...RAIL_A, length: 0.375, width: 0.375, bitDiameter: 0.375, ends: 'round' });

  it('is bored straight down, pass by pass', () => {
    const { start, moves, levels } = planSlot(spec, 1e-4);
    const plunges = moves.filter(({ role }) => role === 'plunge');
    expect(plunges.map(({ to }) => -to.z)).toEqual(levels);
    for (const { to } of moves) expect([to.x, to.y]).toEqual([start.x, start.y]);
  });
});
