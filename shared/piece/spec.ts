import { z } from 'zod';
import { STYLES, type Style } from '../coin/fit';
import { LENGTH_HELP, formatSize, lengthIn, parseLength } from '../measure/length';
import { capital, objectError } from '../measure/messages';
import { UNITS, type Units, byUnits } from '../measure/units';
import { FLAG_ORDER, type Outline, PIECE_KINDS, type PieceKind, factsOf } from './kinds';

/** Every rail of a piece has one section; lengths in the piece's units. */
export interface RailSection {
  /** Out from the board. */
  readonly width: number;
  /** Up along the board. */
  readonly thickness: number;
  readonly grooveWidth: number;
  readonly grooveDepth: number;
  /** Solid wood at each end of the groove. */
  readonly stopMargin: number;
  /** How much shorter than its lane a rail is, at each end. */
  readonly laneMargin: number;
}

/** A piece: its board, which lanes carry a rail, and the rails' section. Lanes count from 1 at the top (a shelf: the front). */
export interface PieceSpec extends Outline {
  readonly units: Units;
  readonly kind: PieceKind;
  readonly style: Style;
  readonly railLanes: readonly number[];
  readonly section: RailSection;
  readonly gap: number;
}

const MOST_LANES = 40; // more planks than any wall piece has
const MOST_RAILS = 12; // what the assignment of coins is proved for
/** A piece from a shelf one coin deep to a whole wall; common practice, no source. */
const SIZE = { in: [1, 240], mm: [25, 6000] } as const;
/** Sizes within the section: below a sixty-fourth nothing is cut. */
const SMALL = { in: [1 / 64, 12], mm: [0.5, 300] } as const;

const WORDS = {
  width: 'board width', height: 'board height', unionWidth: 'union width', gap: 'gap between coins',
  railWidth: 'rail width', railThickness: 'rail thickness', grooveWidth: 'groove width', grooveDepth: 'groove depth', stopMargin: 'stop margin', laneMargin: 'margin at a rail\'s end',
} as const;
type Field = keyof typeof WORDS;

const size = (field: Field) => z.union([z.number(), z.string()], { error: (issue) => (issue.input === undefined ? `${capital(WORDS[field])} is missing. ${LENGTH_HELP}` : `${capital(WORDS[field])} is no size. ${LENGTH_HELP}`) });
const whole = (what: string, most: number) => z.number({ error: `Give ${what} as a whole number, 1 to ${most}.` }).int({ error: `Give ${what} as a whole number, 1 to ${most}.` }).min(1, { error: `Give ${what} as 1 to ${most}.` }).max(most, { error: `Give ${what} as 1 to ${most}.` });

/** A piece as a form or a request gives it; sizes in the trade's notation or as numbers in `units`. */
export const pieceSchema = z
  .strictObject({
    units: z.enum(UNITS, { error: `Use ${UNITS.join(' or ')} for the piece's units.` }),
    kind: z.enum(PIECE_KINDS, { error: `Use ${PIECE_KINDS.join(', ')} for the kind of piece.` }),
    style: z.enum(STYLES, { error: `Use ${STYLES.join(' or ')} for the style.` }),
    width: size('width'),
    height: size('height'),
    lanes: whole('the number of lanes', MOST_LANES).optional(),
    unionWidth: size('unionWidth').optional(),
    railLanes: z.array(whole('a rail\'s lane', MOST_LANES), { error: 'Give the rails\' lanes as a list.' }).min(1, { error: 'The piece has no rail. Choose at least one lane.' })
      .max(MOST_RAILS, { error: `The piece has more than ${MOST_RAILS} rails. Make two pieces of it.` }),
    gap: size('gap'),
    railWidth: size('railWidth'),
    railThickness: size('railThickness'),
    grooveWidth: size('grooveWidth'),
    grooveDepth: size('grooveDepth'),
    stopMargin: size('stopMargin'),
    laneMargin: size('laneMargin'),
  }, { error: objectError('the piece as one object') })
  .transform((value, context): PieceSpec => {
    const { units, kind } = value;
    const refuse = (field: string, message: string) => context.addIssue({ code: 'custom', path: [field], message });
    const read = (field: Field, raw: number | string, [least, most]: readonly [number, number]): number => {
      const written = typeof raw === 'number' ? { value: raw, units: null } : parseLength(raw);
      if (!written) {
        refuse(field, `${capital(WORDS[field])} is "${String(raw).slice(0, 40)}". That is not a size we can read. ${LENGTH_HELP}`);
        return NaN;
      }
      const length = lengthIn(units, written);
      if (length < least || length > most) refuse(field, `The ${WORDS[field]} is ${formatSize(length, units)}. Use ${formatSize(least, units)} to ${formatSize(most, units)}.`);
      return length;
    };
    const facts = factsOf(kind);
    const lanes = facts.lanes ?? value.lanes;
    if (lanes === undefined) refuse('lanes', `Say how many ${facts.lane}s the ${facts.words} has.`);
    if (facts.lanes !== null && value.lanes !== undefined && value.lanes !== facts.lanes) refuse('lanes', `A ${facts.words} has ${facts.lanes} ${facts.lane}s.`);
    const width = read('width', value.width, SIZE[units]);
    const section = {
      width: read('railWidth', value.railWidth, SMALL[units]), thickness: read('railThickness', value.railThickness, SMALL[units]),
      grooveWidth: read('grooveWidth', value.grooveWidth, SMALL[units]), grooveDepth: read('grooveDepth', value.grooveDepth, SMALL[units]),
      stopMargin: read('stopMargin', value.stopMargin, SMALL[units]), laneMargin: read('laneMargin', value.laneMargin, [0, byUnits(units, 24, 600)]),
    };
    if (section.grooveWidth >= section.width) refuse('grooveWidth', `The groove is ${formatSize(section.grooveWidth, units)} wide and the rail ${formatSize(section.width, units)}. Use a narrower groove.`);
    if (section.grooveDepth >= section.thickness) refuse('grooveDepth', `The groove is ${formatSize(section.grooveDepth, units)} deep and the rail ${formatSize(section.thickness, units)} thick. Use a shallower groove.`);
    const railLanes = [...value.railLanes].sort((a, b) => a - b);
    const above = railLanes.find((lane) => lane > (lanes ?? MOST_LANES));
    if (above !== undefined) refuse('railLanes', `A rail stands on ${facts.lane} ${above} and the piece has ${lanes}. Use 1 to ${lanes}.`);
    if (new Set(railLanes).size < railLanes.length) refuse('railLanes', `Two rails stand on one ${facts.lane}. Give each its own.`);
    return {
      units, kind, style: value.style, width, height: read('height', value.height, SIZE[units]), lanes: lanes ?? NaN,
      unionWidth: value.unionWidth === undefined ? (facts.unionShare ?? 0) * width : read('unionWidth', value.unionWidth, [0, width]),
      railLanes, section, gap: read('gap', value.gap, [0, byUnits(units, 6, 150)]),
    };
  });

export type PieceInput = z.input<typeof pieceSchema>;

/** How far a board's own proportion is from the order's 1.9, as a share of it; null where no rule fixes one. */
export function offProportion({ kind, width, height }: Pick<PieceSpec, 'kind' | 'width' | 'height'>): number | null {
  const { proportion } = factsOf(kind);
  return proportion === null ? null : width / height / proportion - 1;
}

/** The largest board of a kind that a wall takes with `margin` left free all round; `proportion` null fills the wall. */
export function boardForWall(wall: { readonly width: number; readonly height: number }, margin: number, proportion: number | null): { width: number; height: number } | null {
  const [width, height] = [wall.width - 2 * margin, wall.height - 2 * margin];
  if (!(width > 0 && height > 0)) return null;
  if (proportion === null) return { width, height };
  return width / height > proportion ? { width: height * proportion, height } : { width, height: width / proportion };
}

/** A flag board of stripes of one width: thirteen of them high, the order's proportion wide. */
export function boardForStripe(stripe: number): { width: number; height: number } {
  const height = stripe * FLAG_ORDER.stripes;
  return { width: height * FLAG_ORDER.fly, height };
}
