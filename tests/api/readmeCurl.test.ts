import { execFileSync } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, inject, it } from 'vitest';
import { expectSoundCut } from '../support/soundCut';
import { ROOT } from '../support/server';
import { EXAMPLE_REQUEST } from '#server/openapi/document';
import { type ProgramBody, RAIL, post } from './support';

const readme = readFileSync(join(ROOT, 'README.md'), 'utf8');
const commands = [...readme.matchAll(/```sh\n(curl [\s\S]*?)```/g)].map(([, command]) => command ?? '');
const PRINTED_ADDRESS = 'http://127.0.0.1:3000';

const shell = (command: string) => execFileSync('sh', ['-c', command], { encoding: 'utf8' });

describe("the README's curl", () => {
  it('is there once, and states the rail width', () => {
    expect(commands).toHaveLength(1);
    expect(commands[0]).toContain('"railWidth": "1 1/4"');
    expect(commands[0]).toContain(PRINTED_ADDRESS);
  });

  it('as printed, port aside, gives a program that cuts the slot it asks for', async () => {
    const program = shell((commands[0] ?? '').replace(PRINTED_ADDRESS, inject('baseUrl')));
    expectSoundCut(program, RAIL);

    const sent = JSON.parse(/-d '([\s\S]*)'/.exec(commands[0] ?? '')?.[1] ?? '') as unknown;
    const answer = await (await post(sent)).json() as ProgramBody;
    expect(answer.program).toBe(program);
    expect(answer.readback.verdict).not.toBe('disagrees');
    expect(answer.summary.assumed).not.toContain('railWidth');
    // One rail, printed in three places.
    expect(sent).toEqual(EXAMPLE_REQUEST);
    expect(sent).toEqual(JSON.parse(readFileSync(join(ROOT, 'fixtures/slots/readme-rail.json'), 'utf8')));
  });
});
