import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { makeProgram } from '#shared/makeProgram';
import { slotRequestSchema } from '#shared/slot/request';
import { RAIL } from '../../api/support';
import { ROOT } from '../../support/server';

let folder: string;
beforeAll(() => (folder = mkdtempSync(join(tmpdir(), 'tallyrail-'))));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

const file = (name: string, text: string) => {
  writeFileSync(join(folder, name), text);
  return join(folder, name);
};
const readback = (...args: string[]) => spawnSync(process.execPath, ['node_modules/tsx/dist/cli.mjs', 'server/cli/readback.ts', ...args], { cwd: ROOT, encoding: 'utf8' });
const program = () => {
  const made = makeProgram(slotRequestSchema.parse(RAIL));
  if (!made.ok) throw new Error('The rail is good.');
  return made.program;
};

describe('npm run readback', () => {
  it('prints what was measured, and exits with 0 where nothing disagrees', () => {
    const { status, stdout } = readback(file('good.nc', program()), '--spec', 'fixtures/slots/readme-rail.json');
    expect(status).toBe(0);
    expect(stdout).toMatch(/^agrees +line +\d+ {2}Slot length: wanted 24\.5000, measured 24\.5000\.$/m);
    expect(stdout).not.toMatch(/^disagrees/m);
  });

  it('exits with 1 where something disagrees, and says which line', () => {
    const tooDeep = program().replaceAll('Z-0.1875', 'Z-0.2000');
    const { status, stdout } = readback(file('deep.nc', tooDeep), '--spec', 'fixtures/slots/readme-rail.json');
    expect(status).toBe(1);
    expect(stdout).toMatch(/^disagrees +line +\d+ {2}Slot depth: wanted 0\.1875, measured 0\.2000\./m);
  });

  it('exits with 1 where the program cannot be read', () => {
    const { status, stdout } = readback(file('odd.nc', 'G20 G90\nG1 X#1\nM30\n'), '--spec', 'fixtures/slots/readme-rail.json');
    expect(status).toBe(1);
    expect(stdout).toMatch(/^disagrees +line +2 .*Parameters/m);
  });

  it.each([
    [[], /^Use: npm run readback/],
    [['x.nc'], /^Use: npm run readback/],
    [['absent.nc', '--spec', 'fixtures/slots/readme-rail.json'], /^absent\.nc cannot be read/],
    [['README.md', '--spec', 'absent.json'], /^absent\.json cannot be read/],
    [['README.md', '--spec', 'README.md'], /^README\.md is not JSON/],
    [['README.md', '--spec', 'package.json'], /^package\.json is not a spec that can be cut:\n {2}\w+/],
    [['README.md', '--wrong'], /--wrong/],
  ])('exits with 2 for %j', (args, said) => {
    const { status, stdout, stderr } = readback(...args);
    expect(status).toBe(2);
    expect(stderr).toMatch(said);
    expect(stdout).toBe('');
  });
});
