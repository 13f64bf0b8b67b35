import { type Units, byUnits } from '../measure/units';
import type { WorkInput } from './work';

/** What a new commission begins with once its coins are counted: a board of usual sizes, to be changed in the drawing. All common practice, no source. */
export function newWork(units: Units, kinds: WorkInput['tally']['kinds']): WorkInput {
  const size = (inch: string, millimetre: string) => byUnits(units, inch, millimetre);
  return {
    tally: { units, kinds },
    toCome: [],
    piece: {
      units, kind: 'plank-board', style: 'leaning', width: size('28', '700'), height: size('18', '450'), lanes: 9, railLanes: [3, 6, 9], gap: size('1/4', '6'),
      railWidth: size('1 1/4', '32'), railThickness: size('3/4', '19'), grooveWidth: size('3/8', '10'), grooveDepth: size('3/16', '5'), stopMargin: size('7/8', '22'), laneMargin: size('7/8', '22'),
    },
    pins: [],
    build: {
      boardThickness: size('3/4', '19'), odd: 'walnut', even: 'walnut', union: 'walnut', rails: 'white-oak', battens: 'poplar',
      batten: { count: 2, width: size('1 1/2', '38'), thickness: size('3/4', '19'), inset: size('1', '25') },
    },
    surface: { colour: 'none', finish: 'drying-oil', coats: 3, coatHours: 1 },
    gauge: 18,
    yard: { kerf: size('1/8', '3'), lengthsFeet: [6, 8], offcuts: [], centsPerBoardFoot: {} },
  };
}
