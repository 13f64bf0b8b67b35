import { convertLength } from './measure/units';
import { writeBody } from './program/body';
import { GRID } from './program/grid';
import { markIn, programMark, sha256Hex } from './program/mark';
import { programFileName, writeProgram } from './program/write';
import { type ReadResult, type Step, readProgram } from './reader';
import { stepsIn } from './reader/inUnits';
import type { Readback } from './readback/finding';
import { readBack, unreadable } from './readback/readBack';
import { linesBetween, movedDown } from './readback/sameSteps';
import { sentenceOf } from './readback/sentences';
import { type ChipLoadBand, advisedChipLoad, chipLoad } from './slot/chipLoad';
import type { SlotPath } from './slot/path';
import { planSlot } from './slot/plan';
import type { SlotRequest } from './slot/request';
import { type SlotSpec, railLength } from './slot/spec';
import { type Timeline, defaultDynamics, timeAssumes, timeOf } from './time';

/** What a page or a sheet shows beside the program; lengths in the spec's units, times in seconds. */
export interface ProgramSummary {
  readonly railLength: number;
  /** Depth reached by each pass. */
  readonly passes: readonly number[];
  /** Of the whole program, with acceleration, corners and spin-up. */
  readonly seconds: number;
  /** What the time took for granted, in words. */
  readonly timeAssumes: string;
  readonly cutLength: number;
  readonly rapidLength: number;
  readonly lines: number;
  readonly chipLoad: number;
  readonly chipLoadRange: ChipLoadBand;
  /** ft/min or m/min at the bit's edge. */
  readonly surfaceSpeed: number;
  /** in³/min or cm³/min at the bit's full width and the stepdown. */
  readonly removalRate: number;
  readonly assumed: readonly (keyof SlotSpec)[];
  readonly notes: readonly string[];
}

/** What every made program has, fit for download or not. */
interface Made {
  readonly spec: SlotSpec;
  readonly summary: ProgramSummary;
  readonly readback: Readback;
  /** What the reader saw, in the spec's units: for playback. */
  readonly steps: readonly Step[];
  readonly timeline: Timeline;
}

/** A program that has been read back: with its text only where no reading disagrees. */
export type MadeProgram =
  | (Made & {
      readonly ok: true;
      readonly program: string;
      readonly fileName: string;
      readonly mark: string;
      /** Hex, of the text's bytes. */
      readonly sha256: string;
    })
  | (Made & { readonly ok: false });

/**
 * From a slot request to a program that has been read back: plan, write, read, measure.
 *
 * The blocks alone are read and measured first, since only a reading can tell the time and the cautions that the
 * header bears. Then the final text is read by itself: where every step of it is the measured one, what was measured
 * holds; where any differs it is measured anew.
 *
 * @returns the text only if no reading disagrees.
 */
export function makeProgram(request: SlotRequest): MadeProgram {
  const { spec, options } = request;
  const units = options.programUnits ?? spec.units;
  const path = planSlot(spec, convertLength(GRID[units], units, spec.units));

  const body = writeBody(spec, options, path);
  const draft = read(writeProgram(request, path, body, null), request);
  const measured = measure(draft, request);
  const cautions = measured.findings.filter(({ severity }) => severity === 'caution').flatMap((finding) => sentenceOf(finding, spec.units).header ?? []);
  const draftTimeline = timed(draft, spec);
  const facts = { seconds: draftTimeline.seconds, cautions };
  const program = writeProgram(request, path, body, facts);
  const final = read(program, request);
  const lines = draft.ok && final.ok ? linesBetween(draft.program.steps, final.program.steps) : null;
  const readback = lines === null ? measure(final, request) : movedDown(measured, lines);

  const timeline = lines === null ? timed(final, spec) : { ...draftTimeline, steps: drawnSteps(final, spec) };
  const summary = summarise(request, path, timeline, final.ok ? final.program.lines : 0);
  const made = { spec, summary, readback, steps: timeline.steps, timeline };
  if (readback.verdict === 'disagrees') return { ok: false, ...made };
  const mark = markIn(program) ?? programMark(program); // without comments a text bears none
  return { ok: true, program, fileName: programFileName(spec, mark, options.fileEnding), mark, sha256: sha256Hex(program), ...made };
}

function read(text: string, { options }: SlotRequest): ReadResult {
  return readProgram(text, { dwellIn: options.spindleWait === 'milliseconds' ? 'milliseconds' : 'seconds' });
}

function measure(result: ReadResult, { spec, assumed }: SlotRequest): Readback {
  return result.ok ? readBack(result.program, spec, assumed.includes('railWidth')) : unreadable(result.error);
}

/** What the reader saw, in the spec's units; nothing where it refused. */
function drawnSteps(result: ReadResult, spec: SlotSpec): readonly Step[] {
  return result.ok ? stepsIn(spec.units, result.program) : [];
}

/** How long the steps take. */
function timed(result: ReadResult, spec: SlotSpec): Timeline {
  return timeOf(drawnSteps(result, spec), defaultDynamics(spec.units, spec.machine));
}

function summarise({ spec, assumed, notes }: SlotRequest, path: SlotPath, timeline: Timeline, lines: number): ProgramSummary {
  const edge = Math.PI * spec.bitDiameter * spec.spindleSpeed;
  const rate = spec.bitDiameter * spec.stepdown * spec.feed;
  return {
    railLength: railLength(spec),
    passes: path.levels,
    seconds: timeline.seconds,
    timeAssumes: timeAssumes(spec.units, spec.machine, timeline),
    cutLength: timeline.cutLength,
    rapidLength: timeline.rapidLength,
    lines,
    chipLoad: chipLoad(spec),
    chipLoadRange: advisedChipLoad(spec),
    surfaceSpeed: spec.units === 'in' ? edge / 12 : edge / 1000,
    removalRate: spec.units === 'in' ? rate : rate / 1000,
    assumed,
    notes,
  };
}
