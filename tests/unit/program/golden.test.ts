import { existsSync, readFileSync, readdirSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { makeProgram } from '#shared/makeProgram';
import { expectSoundCut } from '../../support/soundCut/index';
import { asked } from '../slot/asking';

const fixtures = (path: string) => new URL(`../../../fixtures/${path}`, import.meta.url);
const names = readdirSync(fixtures('programs')).filter((file) => file.endsWith('.nc')).map((file) => file.replace(/\.nc$/, ''));

/**
 * Whole texts, read by a person once and kept: fixtures/slots/<name>.json makes fixtures/programs/<name>.nc, byte for byte.
 * Nothing writes these files. A change to the text is made here by hand, after looking at what it means at a machine.
 */
describe('golden programs', () => {
  it('are there', () => {
    expect(names).toContain('readme-rail');
  });

  it.each(names)('%s is what its slot makes', (name) => {
    expect(existsSync(fixtures(`slots/${name}.json`))).toBe(true);
    const raw: object = JSON.parse(readFileSync(fixtures(`slots/${name}.json`), 'utf8'));
    const made = makeProgram(asked(raw));
    expect(made.ok && made.program).toBe(readFileSync(fixtures(`programs/${name}.nc`), 'utf8'));
    expectSoundCut(made.ok ? made.program : '', made.spec);
  });
});
