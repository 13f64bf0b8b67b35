import { describe, expect, it, test } from 'vitest';
import type { BenchDay } from '#shared/shop/bench';
import type { CutInput } from '#shared/shop/cut';
import { benchProgramOf } from '../../support/benchProgram';
import { courseOf, nextMark, stepOf } from '../../../app/bench/course';
import { measuredOf } from '../../../app/bench/measured';
import { judgeStatus, sendLogs, withLogs } from '../../../app/bench/outbox';
import type { BenchStore, QueuedLog } from '../../../app/bench/store';
import { goOn, readWatch, stopWatch } from '../../../app/bench/watch';
import { dueWords, markWords, passWords, seenWords, toCutWords } from '../../../app/bench/words';
import { benchFiles } from '#server/offline/worker';

const cut = (id: string, outcome: 'well' | 'spoiled' = 'well', programId = 'program-0'): CutInput => ({ id, programId, outcome, cutAt: '2026-12-01T09:40:00.000Z' });

/** A store in memory, with the logs it begins with. */
function storeWith(first: readonly QueuedLog[]): BenchStore & { readonly held: () => readonly QueuedLog[] } {
  let held = first.map((log, i) => ({ ...log, number: i + 1 }));
  return {
    held: () => held,
    readDay: async () => null, keepDay: async () => undefined, forgetDay: async () => undefined,
    logs: async () => held,
    addLog: async (log) => { held = [...held, { ...log, number: held.length + 1 }]; },
    changeLog: async (log) => { held = held.map((one) => (one.number === log.number ? { ...log, number: one.number } : one)); },
    dropLog: async (number) => { held = held.filter((log) => log.number !== number); },
  };
}
const logOf = (personId: string, id: string): QueuedLog => ({ personId, cut: cut(id), refused: null });

describe('logged cuts', () => {
  it('go out in order, each once, and only those of the person who is signed in', async () => {
    const store = storeWith([logOf('teo', 'a'), logOf('ines', 'b'), logOf('teo', 'c')]);
    const sent: string[] = [];
    expect(await sendLogs(store, 'teo', async ({ id }) => { sent.push(id); return { kind: 'taken' }; })).toBe(true);
    expect(sent).toEqual(['a', 'c']);
    expect(store.held().map((log) => log.cut.id)).toEqual(['b']);
    await sendLogs(store, 'teo', async ({ id }) => { sent.push(id); return { kind: 'taken' }; });
    expect(sent).toEqual(['a', 'c']);
  });
  it('wait from the first that cannot be sent, so that their order holds', async () => {
    const store = storeWith([logOf('teo', 'a'), logOf('teo', 'b'), logOf('teo', 'c')]);
    const sent: string[] = [];
    await sendLogs(store, 'teo', async ({ id }) => { sent.push(id); return id === 'b' ? { kind: 'later' } : { kind: 'taken' }; });
    expect(sent).toEqual(['a', 'b']);
    expect(store.held().map((log) => log.cut.id)).toEqual(['b', 'c']);
  });
  it('that are refused are kept with the words, hold nobody up, and are not sent again', async () => {
    const store = storeWith([logOf('teo', 'a'), logOf('teo', 'b')]);
    const answer = async ({ id }: CutInput) => (id === 'a' ? { kind: 'refused', words: 'No such program.' } as const : { kind: 'taken' } as const);
    await sendLogs(store, 'teo', answer);
    expect(store.held().map(({ cut: { id }, refused }) => [id, refused])).toEqual([['a', 'No such program.']]);
    await sendLogs(store, 'teo', async () => { throw new Error('must not be sent'); });
  });
  test.each([[401, 'later'], [429, 'later'], [503, 'later'], [422, 'refused'], [409, 'refused']] as const)('a %i is %s', (status, kind) => {
    expect(judgeStatus(status, 'why').kind).toBe(kind);
  });
});

describe('the day with what was logged since', () => {
  const program = benchProgramOf(0);
  const rail = { id: 'rail', name: 'Rail A', due: null, quantity: 2, cutWell: 0, spoiled: 0, revision: 1, program };
  const day: BenchDay = { rails: [rail], cuts: [], changed: [] };
  const logs = (...outcomes: readonly ('well' | 'spoiled')[]): QueuedLog[] => outcomes.map((outcome, i) => ({ personId: 'teo', cut: cut(`cut-${i}`, outcome, program.id), refused: null }));
  it('counts cuts, and lets a rail go with its last', () => {
    expect(withLogs(day, logs('well')).rails).toMatchObject([{ cutWell: 1, spoiled: 0 }]);
    expect(withLogs(day, logs('spoiled')).rails).toMatchObject([{ cutWell: 0, spoiled: 1 }]);
    const all = withLogs(day, logs('well', 'well'));
    expect(all.rails).toEqual([]);
    expect(all.cuts.map(({ id, mark }) => [id, mark])).toEqual([['cut-0', program.mark], ['cut-1', program.mark]]);
  });
  it('counts none twice that the shop has already, and none that was refused', () => {
    const [known] = withLogs(day, logs('well')).cuts;
    expect(withLogs({ ...day, cuts: known ? [known] : [] }, logs('well')).rails).toMatchObject([{ cutWell: 0 }]);
    expect(withLogs(day, logs('well').map((log) => ({ ...log, refused: 'no' })))).toBe(day);
  });
});

describe('what should be happening', () => {
  const { text, spec, summary } = benchProgramOf(0);
  const course = courseOf({ text, spec, dwellIn: 'seconds' });
  it('is read off the text: as long as the readback said, with a mark for each pass and the end', () => {
    expect(course?.seconds).toBeCloseTo(summary.seconds, 6);
    expect(course?.marks.map(({ kind, pass }) => [kind, pass])).toEqual([['pass', 1], ['pass', 2], ['end', 2]]);
  });
  it('tells each moment in words', () => {
    const at = (seconds: number) => (course ? stepOf(course, seconds) : null);
    const begin = at(0);
    const [first, second] = course?.marks ?? [];
    const late = at((second?.seconds ?? 0) + 6);
    expect(begin && seenWords(begin)).toBe('The spindle comes up to speed.');
    expect(late && passWords(late, 'in')).toBe('Pass 2 of 2, 3/16 in down.');
    expect(first && markWords(first)).toMatch(/^Pass 1 at 0:0\d$/);
    expect(course && nextMark(course, course.seconds + 1)).toBeNull();
    expect(course && stepOf(course, course.seconds + 1)?.role).toBe('done');
  });
  it('is nothing where the text cannot be read', () => {
    expect(courseOf({ text: 'G1 X1 Q\n', spec, dwellIn: 'seconds' })).toBeNull();
  });
});

describe('the stopwatch', () => {
  const marks = [{ seconds: 5, kind: 'stop', pass: 0 }, { seconds: 20, kind: 'pass', pass: 1 }, { seconds: 40, kind: 'end', pass: 1 }] as const;
  const still = { gathered: 0, since: null, stopsBehind: 0 };
  it('runs, is stopped, and goes on from where it stood', () => {
    const run = goOn(still, [], 1000);
    expect(readWatch(run, [], 4000)).toEqual({ seconds: 3, held: false });
    const stopped = stopWatch(run, [], 4000);
    expect(readWatch(stopped, [], 99_000).seconds).toBe(3);
    expect(readWatch(goOn(stopped, [], 10_000), [], 11_000).seconds).toBe(4);
  });
  it("stands at the program's own stop however long the hand takes, and goes on past it", () => {
    const run = goOn(still, marks, 0);
    expect(readWatch(run, marks, 60_000)).toEqual({ seconds: 5, held: true });
    const on = goOn(run, marks, 60_000);
    expect(readWatch(on, marks, 63_000)).toEqual({ seconds: 8, held: false });
  });
});

describe('the first one off', () => {
  const spec = { units: 'in', width: 0.375, depth: 0.1875 } as const;
  it('says nothing before it is measured, and what is missing while it is', () => {
    expect(measuredOf(spec, 'width', ['', ' ', ''])).toEqual({ state: 'empty' });
    expect(measuredOf(spec, 'width', ['0.376', '', ''])).toMatchObject({ state: 'open', words: 'Two places are still to measure.' });
    expect(measuredOf(spec, 'width', ['0.376', 'x', ''])).toMatchObject({ state: 'open', wrong: [1] });
    expect(measuredOf(spec, 'depth', ['0', '0.18', '0.18'])).toMatchObject({ state: 'open', wrong: [0] });
  });
  it('reads a comma and the trade\'s notation, and carries on or stops', () => {
    expect(measuredOf(spec, 'width', ['0,377', '3/8', '9.5 mm'])).toMatchObject({ state: 'read', reading: { code: 'within' } });
    expect(measuredOf(spec, 'width', ['0.387', '0.387', '0.387'])).toMatchObject({ state: 'read', reading: { sentence: 'Stop. 0.012 too wide for these coins.' } });
    expect(measuredOf(spec, 'depth', ['0.17', '0.17', '0.17'])).toMatchObject({ state: 'read', reading: { code: 'tooShallow' } });
  });
});

describe('words of the bench', () => {
  const today = new Date(2026, 11, 1, 15);
  test.each([['2026-12-01', 'due today'], ['2026-12-02', 'due tomorrow'], ['2026-12-18', 'due Fri 18 Dec'], ['2026-11-30', '1 day late'], ['2026-11-20', '11 days late']])('%s is %s', (due, words) => {
    expect(dueWords(due, today)).toBe(words);
  });
  test.each([[0, 'nothing to cut'], [1, 'one rail to cut'], [4, 'four rails to cut'], [12, '12 rails to cut']])('%i: %s', (count, words) => {
    expect(toCutWords(count)).toBe(words);
  });
});

describe('what a tablet keeps of the page', () => {
  const parts = {
    'entry.mjs': { file: 'e.js', src: 'entry.mjs', isEntry: true, imports: ['_v'], dynamicImports: ['pages/index.vue', 'pages/bench/index.vue'], css: ['e.css'], assets: ['f.woff2'] },
    '_v': { file: 'v.js' },
    'pages/index.vue': { file: 'i.js', src: 'pages/index.vue', imports: ['_three'] },
    'pages/bench/index.vue': { file: 'b.js', src: 'pages/bench/index.vue', imports: ['_v', '_shared'], dynamicImports: ['_lazy'], css: ['b.css'] },
    '_shared': { file: 's.js' }, '_lazy': { file: 'l.js', imports: ['_shared'] }, '_three': { file: 't.js' },
  };
  it('is the entry and the bench with all they import, and no other page', () => {
    expect([...benchFiles(parts)].sort()).toEqual(['b.css', 'b.js', 'e.css', 'e.js', 'f.woff2', 'l.js', 's.js', 'v.js'].map((file) => `_nuxt/${file}`));
  });
});
