import { type Data, type Inputs, type Stale, type Step, staleSteps } from '../piece/stale';
import { type Work, kindsOf } from './work';

/** What each step of a commission is worked out from, of its own: the steps it follows from come on top. */
export function inputsOf(work: Work): Inputs {
  const { piece, build, yard, surface } = work;
  const { section } = piece;
  const coins: Data = kindsOf(work).map(({ name, diameter, thickness, count, mass, toCome }) => ({ name, diameter, thickness, count, mass, toCome }));
  return {
    coins,
    fit: { style: piece.style, width: section.grooveWidth, depth: section.grooveDepth, railWidth: section.width },
    piece: {
      kind: piece.kind, width: piece.width, height: piece.height, lanes: piece.lanes, unionWidth: piece.unionWidth, railLanes: [...piece.railLanes], gap: piece.gap,
      thickness: section.thickness, stopMargin: section.stopMargin, laneMargin: section.laneMargin, pins: work.pins.map(({ rail, kind, count }) => ({ rail, kind, count })),
    },
    rails: { wood: build.rails },
    programs: null,
    cutList: { build: { ...build, batten: { ...build.batten } }, kerf: yard.kerf, lengths: [...yard.lengthsFeet], offcuts: yard.offcuts.map((offcut) => ({ ...offcut })) },
    assembly: { colour: surface.colour, finish: surface.finish, coats: surface.coats, coatHours: surface.coatHours, gauge: work.gauge },
    quote: { ...yard.centsPerBoardFoot },
  };
}

/** What is stale of a commission whose steps were made from these works. */
export function staleOf(made: Readonly<Partial<Record<Step, Work>>>, now: Work): Stale[] {
  const from = Object.entries(made).map(([step, work]) => [step, inputsOf(work)] as const);
  return staleSteps(Object.fromEntries(from), inputsOf(now));
}

/** A step in words. */
export const STEP_WORDS: Readonly<Record<Step, string>> = {
  coins: 'the tally', fit: 'the groove', piece: 'the piece', rails: 'the rails', programs: 'the programs', cutList: 'the cut list', assembly: 'the assembly sheet', quote: 'the quote',
};

/** Why a step is stale, in a sentence. */
export function staleSentence({ step, because }: Stale): string {
  const words = because.map((each) => STEP_WORDS[each]);
  const causes = words.length > 1 ? `${words.slice(0, -1).join(', ')} and ${words.at(-1)}` : words[0] ?? 'something before it';
  const [first = '', ...rest] = STEP_WORDS[step];
  return `${first.toUpperCase()}${rest.join('')} ${STEP_WORDS[step].endsWith('s') ? 'were' : 'was'} made before ${causes} changed.`;
}
