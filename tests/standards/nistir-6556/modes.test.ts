// The modal state of the steps: NISTIR 6556 Table 8 (order), 3.6.1 (program end), 3.5.19 (inverse time), 2.1.2.6 (helix).
import { describe, expect, it } from 'vitest';
import { ORIGIN, accepted, lengthOf, motions, refusal, total } from './reading';

describe('the program end (3.6.1)', () => {
  const busy = 'G20 G55 G18 G91 G93 M49 G40 G64\nM3 S1000\nM8\nG2 X1 I0.5 F2';
  it.each([2, 30])('M%i has its nine effects, and leaves the length units alone', (code) => {
    const { steps } = accepted(`${busy}\nM${code}\n`);
    const before = steps.at(-2)?.modes;
    expect(before).toMatchObject({ workOffset: 55, plane: 18, distance: 91, feedMode: 93, overrides: 49, spindle: 'clockwise', motion: 2, coolant: 'flood' });
    expect(steps.at(-1)).toMatchObject({
      kind: 'end',
      code,
      modes: {
        workOffset: 54, // 1
        plane: 17, // 2
        distance: 90, // 3
        feedMode: 94, // 4
        overrides: 48, // 5
        radiusCompensation: 40, // 6
        spindle: 'stopped', // 7
        motion: 1, // 8
        coolant: 'off', // 9
        units: 'in',
        spindleSpeed: 1000,
        pathControl: 64,
      },
    });
  });
});

describe('the order of execution (Table 8)', () => {
  it('sets F before the motion and before other units make the number another feed', () => {
    expect(motions(accepted('G1 X10 F600\nM2'))[0]?.feed).toBe(600);
    expect(motions(accepted('G20 F60\nG1 X1\nM2'))[0]?.feed).toBeNull(); // 60 mm/min, then inches
    expect(motions(accepted('G20\nG1 X1 F60\nM2'))[0]?.feed).toBe(60);
  });

  it('stops the spindle before the retract, and ends the program after it', () => {
    const { steps } = accepted('G21 S18000 M3\nG1 Z-1 F100\nG0 Z10 M5 M2\n');
    expect(steps.map(({ kind, modes }) => `${kind} ${modes.spindle}`)).toEqual([
      'spindle clockwise',
      'line clockwise',
      'spindle stopped',
      'rapid stopped',
      'end stopped',
    ]);
  });

  it('shows a motion the modes of its own line', () => {
    const [first, second] = motions(accepted('G0 X1 G91 G61.1\nX1 G90\nM2'));
    expect(first?.modes).toMatchObject({ motion: 0, distance: 91, pathControl: 61.1 });
    expect(second?.modes).toMatchObject({ motion: 0, distance: 90, pathControl: 61.1 });
  });

  it('stops the spindle with the tool change (3.6.3)', () => {
    const { steps } = accepted('M3 S100\nT3 M6\nM2');
    expect(steps[1]).toMatchObject({ kind: 'toolChange', modes: { spindle: 'stopped', selectedTool: 3 } });
  });

  it('has one object for equal modes', () => {
    const [a, b, c, d] = motions(accepted('G1 X1 F100\nX2\nG0 X3\nG1 X4\nM2'));
    expect(b?.modes).toBe(a?.modes);
    expect(d?.modes).toBe(a?.modes);
    expect(c?.modes).not.toBe(a?.modes);
  });
});

describe('feed', () => {
  it('is null before any F word: the report has no error for it (3.5.2, 3.7.1)', () => {
    expect(motions(accepted('G1 X1\nM2'))[0]?.feed).toBeNull();
  });

  it('under G93 makes the motion take 1/F minutes (3.5.19): F2.0 is half a minute', () => {
    const [line, arc] = motions(accepted('G93 G1 X30 Y40 F2.0\nG3 X40 I5 F4 Z10\nM2'));
    if (!line || !arc) return expect.fail('two motions');
    expect(lengthOf(line) / (line.feed ?? NaN)).toBeCloseTo(0.5, 12);
    expect(lengthOf(arc) / (arc.feed ?? NaN)).toBeCloseTo(0.25, 12);
  });

  it('under G93 is ignored on a line that does not cut (3.5.19)', () => {
    expect(refusal('G93\nF2\nG1 X1\nM2')).toBe('inverseTimeFeed 3:1');
    expect(motions(accepted('G93 G0 X1 F2\nM2'))[0]).toMatchObject({ feed: null, modes: { feed: null } });
  });

  it('is not carried from one feed mode to the other', () => {
    expect(motions(accepted('G93 G1 X1 F2\nG94 X2\nM2'))[1]?.feed).toBeNull();
    expect(motions(accepted('G94 G1 X1 F2\nG94 X2\nM2'))[1]?.feed).toBe(2);
  });

  it('counts along the helix (2.1.2.6)', () => {
    const [helix] = motions(accepted('G3 X0 I5 Z-3 F100\nM2'));
    if (!helix) return expect.fail('one motion');
    expect(helix.feed).toBe(100);
    expect(lengthOf(helix)).toBeCloseTo(Math.hypot(10 * Math.PI, 3), 10);
  });

  it('lets 2000 segments of 0.1 mm at 1000 mm/min take 12 s (5.3)', () => {
    const lines = Array.from({ length: 2000 }, (_, n) => `X${((n + 1) / 10).toFixed(1)}`);
    const cuts = motions(accepted(`G21 F1000\nG1 ${lines.join('\n')}\nM2\n`));
    expect(cuts).toHaveLength(2000);
    expect(total(cuts.map((cut) => (lengthOf(cut) / (cut.feed ?? NaN)) * 60))).toBeCloseTo(12, 8);
  });
});

describe('units (3.5.7)', () => {
  it('are the first motion’s, and the start is stated in them', () => {
    const program = accepted('G21\nG20\nG0 X1\nM2', { start: { x: 0.5, y: 0, z: 2 } });
    expect(program.units).toBe('in');
    expect(motions(program)[0]).toMatchObject({ from: { x: 0.5, y: 0, z: 2 }, to: { x: 1, y: 0, z: 2 } });
  });

  it('are the option’s before any G20 or G21', () => {
    expect(accepted('G0 X1\nM2').units).toBe('mm');
    expect(accepted('G0 X1\nM2', { start: ORIGIN, units: 'in' }).units).toBe('in');
    expect(refusal('G0 X1\nG21\nM2', { start: ORIGIN, units: 'in' })).toBe('unitsChange 2:1');
  });

  it('set the arc tolerance: 0.001 is too far off in inches and not in millimetres (3.5.3.2)', () => {
    expect(motions(accepted('G2 X1 Y1.001 I1 F1\nM2'))).toHaveLength(1);
    expect(refusal('G20 G2 X1 Y1.001 I1 F1\nM2')).toBe('arcRadiiDiffer 1:1');
    expect(refusal('G2 X1 Y1.001 I1 F1\nM2', { start: ORIGIN, units: 'in' })).toBe('arcRadiiDiffer 1:1');
  });
});
