import { readFileSync, readdirSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { makeProgram } from '#shared/makeProgram';
import { cutLength, cutLengthBound, expectSoundCut } from '../support/soundCut/index';
import { measureSlot } from './measureSlot';
import { asked } from './slot/asking';

/** What one fixture's program measures; the error is the most that any size or margin is off, in the drawing's units. */
interface Figures {
  readonly passes: number;
  readonly blocks: number;
  readonly cutLengthRatio: number;
  readonly error: number;
}

const folder = new URL('../../fixtures/slots/', import.meta.url);
const ledger: Readonly<Record<string, Figures>> = JSON.parse(readFileSync(new URL('expected.json', folder), 'utf8'));
const names = readdirSync(folder).filter((file) => file.endsWith('.json') && file !== 'expected.json').map((file) => file.replace('.json', '')).sort();

function figuresOf(name: string): Figures {
  const raw: object = JSON.parse(readFileSync(new URL(`${name}.json`, folder), 'utf8'));
  const made = makeProgram(asked(raw));
  if (!made.ok) throw new Error(`${name} disagrees`);
  const { program, spec } = made;
  expectSoundCut(program, spec);
  const slot = measureSlot(program, spec);
  const rail = spec.length + 2 * spec.stopMargin;
  const wall = (spec.railWidth - spec.width) / 2;
  const off = [
    slot.length - spec.length, slot.width - spec.width, slot.depth - spec.depth, slot.left - spec.stopMargin, rail - slot.right - spec.stopMargin,
    slot.front - wall, spec.railWidth - slot.back - wall,
  ];
  return {
    passes: slot.levels.length,
    blocks: program.split('\n').filter((line) => /^[GMS]/.test(line)).length,
    cutLengthRatio: Number((cutLength(program) / cutLengthBound(spec).bound).toFixed(4)),
    error: Number(Math.max(...off.map(Math.abs)).toFixed(6)),
  };
}

/**
 * A ratchet: fixtures/slots/expected.json holds the best that each fixture has measured. A figure that rises needs a reason,
 * and one that falls is written down, by hand in both cases.
 */
describe('the ledger of measured figures', () => {
  it('has a line for every slot in fixtures, and no other', () => {
    expect(Object.keys(ledger).sort()).toEqual(names);
    expect(names.length).toBeGreaterThanOrEqual(5);
  });

  it.each(names)('%s measures what the ledger says', (name) => {
    expect(figuresOf(name)).toEqual(ledger[name]);
  });

  it.each(Object.entries(ledger))('%s stays within what was asked', (name, { cutLengthRatio, error }) => {
    const { spec } = asked(JSON.parse(readFileSync(new URL(`${name}.json`, folder), 'utf8')) as object);
    // Sizes to 0.0005 in or 0.01 mm; cut length as the table bounds it ("The plan").
    expect(error).toBeLessThanOrEqual(spec.units === 'in' ? 0.0005 : 0.01);
    expect(cutLengthRatio).toBeLessThanOrEqual(cutLengthBound(spec).limit);
  });
});
