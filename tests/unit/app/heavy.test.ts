import { describe, expect, test } from 'vitest';
import { makeProgram } from '#shared/makeProgram';
import { buildRemoval, packFalls, stageSizes } from '#shared/playback/index';
import { slotRequestSchema } from '#shared/slot/request';
import { sendReading, readingOf, type Parcel } from '../../../app/core/parcels';
import { answer } from '../../../app/core/answer';
import { packLines } from '../../../app/playback/packLines';
import { placeInProgram } from '../../../app/playback/pointed';
import { pieceOf, segmentsOf, workOut } from '../../../app/playback/workOut';
import { type Draft, FIRST_DRAFT, withPick, withText } from '../../../app/utils/draft';
import { linesOf, stepFrom } from '../../../app/utils/lines';
import { rawRequestOf } from '../../../app/utils/rawRequest';

const made = (draft: Draft = FIRST_DRAFT) => makeProgram(slotRequestSchema.parse(rawRequestOf(draft)));
const FINISHED = withText(FIRST_DRAFT, 'finishAllowance', '0.01');

describe('a block and its step', () => {
  const { steps } = made();
  test('each running line leads to its first step, and a line between to the next', () => {
    for (let line = 0; line <= (steps.at(-1)?.at.line ?? 0) + 2; line++) {
      const plainly = steps.findIndex(({ at }) => at.line >= line);
      expect(stepFrom(steps, line)).toBe(plainly < 0 ? steps.length : plainly);
    }
    expect(stepFrom([], 5)).toBe(0);
  });

  test('the running lines are each named once, in order', () => {
    expect(linesOf(steps)).toEqual([...new Set(steps.map(({ at }) => at.line))].sort((a, b) => a - b));
  });
});

describe('the picture that is worked out apart', () => {
  const { timeline, spec } = made(FINISHED);
  const segments = segmentsOf(timeline, spec);
  const sizes = stageSizes(spec);
  const work = workOut(segments, sizes);
  let next = work.next();
  while (!next.done) next = work.next();
  const { lines, field } = next.value;
  const removal = buildRemoval(segments, sizes.bitDiameter, sizes.rail);
  if (!field || !removal) throw new Error('nothing is cut');

  test('has the net of the removal: its places, its falls, two triangles a cell', () => {
    const { columns, rows } = removal.grid;
    expect(field.falls).toEqual(packFalls(removal.falls, columns, rows));
    expect([field.position[3 * 7], field.position[3 * 7 + 1]]).toEqual([...removal.places.subarray(14, 16)].map(Math.fround));
    expect(field.index.length).toBe((columns - 1) * (rows - 1) * 6);
    expect([...field.index.subarray(0, 6)]).toEqual([0, 1, columns + 1, 0, columns + 1, columns]);
    expect(Math.max(...field.index.subarray(-6))).toBe(columns * rows - 1);
  });

  test('has the whole path in pieces no longer than asked, each where the last one ended', () => {
    const longest = pieceOf(sizes.rail);
    let far = 0;
    for (let i = 0; i < lines.count; i++) {
      const [from, to] = [lines.from.subarray(i * 3, i * 3 + 3), lines.to.subarray(i * 3, i * 3 + 3)];
      const length = Math.hypot(...[0, 1, 2].map((k) => (to[k] ?? 0) - (from[k] ?? 0)));
      expect(length).toBeLessThan(longest * 1.0001);
      far += length;
    }
    expect(far).toBeCloseTo(timeline.cutLength + timeline.rapidLength, 1);
    const packed = packLines(segments, Infinity);
    expect(packed.count).toBe(segments.count);
    expect(new Set(packed.kind)).toEqual(new Set([-1, 0, 1]));
  });
});

describe('a reading from the core', () => {
  test('arrives whole, its arrays handed over, with what is drawn of it', () => {
    const sent: Parcel[] = [];
    const said = [...answer(rawRequestOf(FINISHED))].at(-1);
    if (said?.kind !== 'made') throw new Error('no program was made');
    const handed: Transferable[] = [];
    sendReading(3, said, (parcel, buffers) => { sent.push(parcel); handed.push(...buffers); });
    const last = sent.at(-1);
    if (last?.kind !== 'made') throw new Error('no program was sent');
    const steps = sent.flatMap((parcel) => (parcel.kind === 'steps' ? parcel.steps : []));
    const reading = readingOf(last, steps);
    expect(reading.made).toEqual(said.made);
    expect(reading.ways).toEqual(said.ways);
    expect(handed).toContain(said.ways?.segments.ends.buffer);
    expect(new Set(handed).size).toBe(handed.length);
  });
});

describe('the place of a reading in the program', () => {
  const point = { x: 2, y: 0.5, z: -0.1 };
  test('is the same from the corner, moved from the middle, and turned into the program\'s units', () => {
    const { spec } = made();
    expect(placeInProgram(point, spec, 'in')).toEqual(point);
    const centred = made(withPick(FIRST_DRAFT, 'workZero', 'centre')).spec;
    expect(placeInProgram(point, centred, 'in')).toEqual({ x: 2 - 26.25 / 2, y: 0.5 - 1.25 / 2, z: -0.1 });
    expect(placeInProgram(point, spec, 'mm')?.x).toBeCloseTo(50.8, 9);
    expect(placeInProgram({ ...point, z: NaN }, spec, 'in')).toBeNull();
  });
});
