import { describe, expect, it } from 'vitest';
import { findPasses, passAt, pathSegments, stageSizes } from '#shared/playback/index';
import type { SlotSpec } from '#shared/slot/spec';
import { defaultDynamics, timeOf } from '#shared/time/index';
import { grooveSteps } from '../../support/steps/rail';
import { buildSteps } from '../../support/steps/steps';

const DYNAMICS = defaultDynamics('in', null);

describe('findPasses', () => {
  it('finds each depth of the cut, from where the bit leaves the one before', () => {
    const timeline = timeOf(grooveSteps([0.0625, 0.125, 0.1875]).steps, DYNAMICS);
    const passes = findPasses(timeline);
    expect(passes.map((pass) => pass.depth)).toEqual([-0.0625, -0.125, -0.1875]);
    expect(passes.map((pass) => pass.step)).toEqual([4, 9, 14]); // the ramps
    expect(passes[1]?.start).toBe(timeline.start[9]);
  });

  it('takes a short landing on a ramp for no pass', () => {
    const steps = buildSteps({ x: 0, y: 0, z: 0.1 }, 60).line({ x: 4, z: -0.05 }).line({ y: 0.1 }).line({ x: 0, z: -0.1 }).line({ x: 8 }).steps;
    expect(findPasses(timeOf(steps, DYNAMICS)).map((pass) => pass.depth)).toEqual([-0.1]);
  });

  it('finds none where nothing is cut', () => {
    expect(findPasses(timeOf(buildSteps().rapid({ x: 4 }).steps, DYNAMICS))).toEqual([]);
  });

  it('counts passes from 1, and 0 before the first', () => {
    const passes = [{ start: 5, step: 1, depth: -1 }, { start: 9, step: 2, depth: -2 }];
    expect([0, 5, 8.9, 9, 100].map((seconds) => passAt(passes, seconds))).toEqual([0, 1, 1, 2, 2]);
  });
});

describe('pathSegments', () => {
  it('leaves out the way from an unknown place and joins the rest end to end', () => {
    const timeline = timeOf(grooveSteps().steps, DYNAMICS);
    const { count, ends, travel } = pathSegments(timeline, 0.001);
    for (let i = 1; i < count; i++) {
      expect([...ends.subarray(i * 6, i * 6 + 3)]).toEqual([...ends.subarray(i * 6 - 3, i * 6)]);
      expect(travel[i * 2]).toBeCloseTo(travel[i * 2 - 1] ?? NaN, 9);
    }
    expect(travel[count * 2 - 1]).toBeCloseTo(timeline.cutLength + timeline.rapidLength, 9);
    expect([...ends.subarray(0, 3)]).toEqual([1.125, 0.5625, 0.5]);
  });

  it('keeps every chord within the tolerance of its arc', () => {
    const timeline = timeOf(buildSteps({ x: 2, y: 0, z: 0 }).arc({}, { x: 0, y: 0 }, 1).steps, DYNAMICS);
    const { count, ends } = pathSegments(timeline, 0.01);
    for (let i = 0; i < count; i++) {
      const [ax = 0, ay = 0, , bx = 0, by = 0] = ends.subarray(i * 6, i * 6 + 6);
      expect(Math.hypot(ax, ay)).toBeCloseTo(2, 9);
      const inside = 2 - Math.hypot((ax + bx) / 2, (ay + by) / 2);
      expect(inside).toBeGreaterThan(0);
      expect(inside).toBeLessThanOrEqual(0.01 + 1e-12);
    }
  });
});

describe('stageSizes', () => {
  const spec: SlotSpec = {
    units: 'in', name: '', length: 10, width: 0.375, depth: 0.1875, stopMargin: 1, bitDiameter: 0.25, stepdown: 0.125, railWidth: 1.25, railThickness: 0.75,
    ends: 'cornered', wood: 'white-oak', flutes: 2, spindleSpeed: 16000, feed: 100, plungeFeed: 25, rampAngle: 3, stepover: 0.4, finishAllowance: 0,
    direction: 'climb', cuttingLength: 1, bitKind: 'upcut', centreCutting: true, chipLoadRange: null, colletDiameter: 1, stickout: 1.25, clampHeight: 0.5,
    clampReach: 0.75, safeHeight: 0.75, workZero: 'corner', spindle: 'program', machine: null,
  };
  it('puts the rail at its work zero, top at Z zero', () => {
    expect(stageSizes(spec).rail).toEqual({ x0: 0, x1: 12, y0: 0, y1: 1.25, z0: -0.75, z1: 0 });
    expect(stageSizes({ ...spec, workZero: 'centre' }).rail).toEqual({ x0: -6, x1: 6, y0: -0.625, y1: 0.625, z0: -0.75, z1: 0 });
  });
  it('keeps clear both ends as far as the clamps reach, and neither where they do not reach in', () => {
    expect(stageSizes(spec).keepOut).toMatchObject([{ x0: 0, x1: 0.75, z1: 0.5 }, { x0: 11.25, x1: 12, z1: 0.5 }]);
    expect(stageSizes({ ...spec, clampReach: 0 }).keepOut).toEqual([]);
  });
  it('converts to the units of the program', () => {
    const sizes = stageSizes(spec, 'mm');
    expect(sizes.bitDiameter).toBeCloseTo(6.35, 9);
    expect(sizes.rail.x1).toBeCloseTo(304.8, 9);
  });
});
