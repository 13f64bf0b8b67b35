import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type Data, FOLLOWS_FROM, type Inputs, STEPS, type Step, canonical, hashesOf, staleSteps } from '#shared/piece/stale';

const inputs: Inputs = {
  coins: [{ name: 'a', thickness: 3, count: 2 }], fit: { style: 'leaning' }, piece: { width: 700 }, rails: { lanes: [4, 8] }, programs: { bit: 6 }, cutList: { kerf: 3 }, assembly: { gauge: 18 }, quote: { rate: 40 },
};
const allMade = Object.fromEntries(STEPS.map((step) => [step, inputs]));

describe('what a change makes stale', () => {
  it('is nothing while nothing changed, in whatever order the data was written', () => {
    expect(staleSteps(allMade, inputs)).toEqual([]);
    expect(staleSteps(allMade, { ...inputs, coins: [{ count: 2, thickness: 3, name: 'a' }] })).toEqual([]);
  });

  // The chain, written out by hand: what each step reaches.
  it.each<[Step, Step[]]>([
    ['coins', ['coins', 'fit', 'piece', 'rails', 'programs', 'cutList', 'assembly', 'quote']],
    ['fit', ['fit', 'piece', 'rails', 'programs', 'cutList', 'assembly', 'quote']],
    ['piece', ['piece', 'rails', 'programs', 'cutList', 'assembly', 'quote']],
    ['rails', ['rails', 'programs', 'cutList', 'assembly', 'quote']],
    ['programs', ['programs', 'quote']],
    ['cutList', ['cutList', 'assembly', 'quote']],
    ['assembly', ['assembly', 'quote']],
    ['quote', ['quote']],
  ])('of %s reaches %j', (step, reached) => {
    const stale = staleSteps(allMade, { ...inputs, [step]: 'changed' });
    expect(stale.map((each) => each.step)).toEqual(reached);
    for (const { because } of stale) expect(because).toEqual([step]);
  });

  it('leaves alone what was never made, and what was made anew from the new inputs', () => {
    const now = { ...inputs, coins: [{ name: 'a', thickness: 3.5, count: 2 }] };
    expect(staleSteps({}, now)).toEqual([]);
    expect(staleSteps({ ...allMade, coins: now, fit: now }, now).map(({ step }) => step)).toEqual(['piece', 'rails', 'programs', 'cutList', 'assembly', 'quote']);
  });

  it('names every change that reaches a step', () => {
    const now = { ...inputs, coins: 'other', cutList: 'other', programs: 'other' };
    expect(staleSteps(allMade, now).find(({ step }) => step === 'assembly')?.because).toEqual(['coins', 'cutList']);
  });

  it('goes from earlier steps to later ones only', () => {
    for (const step of STEPS) for (const before of FOLLOWS_FROM[step]) expect(STEPS.indexOf(before)).toBeLessThan(STEPS.indexOf(step));
  });

  it('writes unlike data unlike, and the same data the same', () => {
    const data = fc.jsonValue();
    const plain = (value: unknown): Data => JSON.parse(JSON.stringify(value));
    fc.assert(fc.property(data, data, (a, b) => {
      expect(canonical(plain(a)) === canonical(plain(b))).toBe(isSame(plain(a), plain(b)));
      expect(JSON.parse(canonical(plain(a)))).toEqual(plain(a));
    }));
    expect(canonical(NaN)).not.toBe(canonical(null));
  });

  it('has a hash of its own for every step', () => {
    expect(new Set(Object.values(hashesOf({ ...inputs, fit: inputs.coins, piece: inputs.coins }))).size).toBe(STEPS.length);
  });
});

/** Same data by a comparison of its own. */
function isSame(a: Data | undefined, b: Data | undefined): boolean {
  if (a === null || b === null || a === undefined || b === undefined || typeof a !== 'object' || typeof b !== 'object') return Object.is(a, b) || a === b;
  const [left, right] = [Object.entries(a), Object.entries(b)];
  return Array.isArray(a) === Array.isArray(b) && left.length === right.length && left.every(([key, value]) => right.some(([other, same]) => key === other && isSame(value, same)));
}
