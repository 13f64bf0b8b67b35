import { describe, expect, it } from 'vitest';
import { type ProgramBody, RAIL, post, problemOf, url } from './support';

interface Lookup {
  readonly mark: string;
  readonly programs: readonly { readonly sha256: string; readonly fileName: string; readonly program: string; readonly spec: object; readonly createdAt: string }[];
}

const find = (mark: string) => fetch(url(`/api/programs/${mark}`));

describe('GET /api/programs/{mark}', () => {
  it('finds a program that was made, as it was', async () => {
    const made = await (await post({ ...RAIL, name: 'Rail B' })).json() as ProgramBody;
    const found = await (await find(made.mark)).json() as Lookup;
    expect(found.mark).toBe(made.mark);
    const { createdAt, ...program } = found.programs.find((one) => one.sha256 === made.sha256) ?? { createdAt: '' };
    expect(program).toEqual({ sha256: made.sha256, fileName: made.fileName, program: made.program, spec: made.spec });
    expect(new Date(createdAt).toISOString()).toBe(createdAt);
  });

  it('keeps one program once', async () => {
    const rail = { ...RAIL, name: 'Rail C' };
    const { mark } = await (await post(rail)).json() as ProgramBody;
    await Promise.all(Array.from({ length: 8 }, () => post(rail)));
    expect((await (await find(mark)).json() as Lookup).programs).toHaveLength(1);
  });

  it('lists every program that bears the mark: N words, % and line endings are not part of it', async () => {
    const rail = { ...RAIL, name: 'Rail D' };
    const made: ProgramBody[] = [];
    for (const options of [{}, { lineNumbers: true }, { percent: false }, { lineEndings: 'crlf' }]) {
      made.push(await (await post({ ...rail, options })).json() as ProgramBody);
    }
    expect(new Set(made.map(({ mark }) => mark)).size).toBe(1);
    const found = await (await find(made[0]?.mark ?? '')).json() as Lookup;
    expect(found.programs.map(({ sha256 }) => sha256)).toEqual(made.map(({ sha256 }) => sha256));
  });

  it('reads a mark as people type it', async () => {
    const { mark } = await (await post(RAIL)).json() as ProgramBody;
    for (const typed of [mark.toLowerCase(), mark.replace('-', ''), mark.replace('-', ' '), ` ${mark} `]) {
      const response = await find(encodeURIComponent(typed));
      expect(response.status, typed).toBe(200);
      expect((await response.json() as Lookup).mark).toBe(mark);
    }
  });

  it('says that no program bears a mark', async () => {
    expect((await problemOf(await find('AAA-AAA'))).status).toBe(404);
  });

  it.each(['K74', 'K74-QDMX', 'OI0-115', "'%20OR%201=1--", '%00', '%zz', 'K74%2FQDM', '%F0%9F%92%A9', 'A'.repeat(2000)])('says that %s is no mark', async (typed) => {
    const { status, errors } = await problemOf(await find(typed));
    expect(status).toBe(422);
    expect(errors?.[0]?.path).toBe('mark');
  });
});
