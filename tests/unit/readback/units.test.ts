import { describe, expect, it } from 'vitest';
import { makeProgram } from '#shared/makeProgram';
import type { Finding } from '#shared/readback/finding';
import { RAIL_A, RAIL_MM, asked } from '../slot/asking';

const ROUND_A = { ...RAIL_A, ends: 'round', finishAllowance: 0.01, feed: 100, plungeFeed: 25 } as const;
const ROUND_MM = { ...RAIL_MM, ends: 'round', finishAllowance: 0.2, feed: 2500, plungeFeed: 600 } as const;

function measured(raw: object, programUnits: 'in' | 'mm' | null): readonly Finding[] {
  return makeProgram(asked({ ...raw, options: { programUnits } })).readback.findings;
}

/** NISTIR 6556 3.5.7: the units code converts no number, so what a program means depends on it alone. */
describe.each([['in', 'mm', ROUND_A, 0.0005], ['mm', 'in', ROUND_MM, 0.01]] as const)('a drawing in %s written in %s', (_units, other, raw, tolerance) => {
  const own = measured(raw, null);
  const converted = measured(raw, other);

  it('has the same findings, none of which disagrees', () => {
    expect(converted.map(({ rule, severity }) => [rule, severity])).toEqual(own.map(({ rule, severity }) => [rule, severity]));
    expect(own.filter(({ severity }) => severity === 'disagrees')).toEqual([]);
  });

  // A depth of one pass follows from the number of passes, below.
  it.each(own.filter(({ rule, quantity }) => quantity === 'length' && rule !== 'passDepth').map(({ rule }) => rule))('measures %s in the units of the drawing', (rule) => {
    const [here, there] = [own, converted].map((findings) => findings.find((finding) => finding.rule === rule));
    expect(there?.wanted).toEqual(here?.wanted);
    const figures = (finding: Finding | undefined) => [finding?.measured ?? []].flat().map(Number);
    expect(figures(there)).toHaveLength(figures(here).length);
    figures(here).forEach((figure, i) => expect(Math.abs(figure - (figures(there)[i] ?? NaN))).toBeLessThanOrEqual(tolerance));
  });

  it.each(['feed', 'plungeFeed'] as const)('measures %s in the units of the drawing', (rule) => {
    const [here, there] = [own, converted].map((findings) => Number(findings.find((finding) => finding.rule === rule)?.measured));
    // A feed is written with one decimal, downwards.
    expect(Math.abs((here ?? NaN) - (there ?? NaN))).toBeLessThanOrEqual(0.1 * (other === 'in' ? 25.4 : 1) + 0.01 * (here ?? NaN));
  });

  it('takes no pass deeper than the stepdown by more than half its own last decimal, and so perhaps one pass more', () => {
    // Issue, "The plan". 5 mm is 1968.5 steps of 0.0001 in: two passes of 2.5 mm (984.25 steps) reach 1968 of the 1969.
    const depths = (programUnits: 'in' | 'mm' | null) => makeProgram(asked({ ...raw, options: { programUnits } })).summary.passes;
    const step = other === 'in' ? 1e-4 * 25.4 : 1e-3 / 25.4;
    const written = depths(other);
    expect(depths(null)).toHaveLength(2);
    written.forEach((depth, i) => expect(depth - (written[i - 1] ?? 0)).toBeLessThanOrEqual(raw.stepdown + step / 2 + 1e-9));
    expect(Math.abs((written.at(-1) ?? 0) - raw.depth)).toBeLessThanOrEqual(step / 2 + 1e-9);
  });
});
