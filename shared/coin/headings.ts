import { UNITS, type Units } from '../measure/units';

/** What a column of a tally can hold. */
export const TALLY_COLUMNS = ['name', 'diameter', 'thickness', 'count', 'mass'] as const;
export type TallyColumn = (typeof TALLY_COLUMNS)[number];

/** Columns without which a tally cannot be read. */
export const NEEDED_COLUMNS: readonly TallyColumn[] = ['name', 'diameter', 'thickness', 'count'];

/** Headings by which people call each column; compared without case, blanks, dots and units. */
const SYNONYMS: Readonly<Record<TallyColumn, readonly string[]>> = {
  name: ['name', 'kind', 'coin', 'coin name', 'kind of coin', 'type', 'title', 'description', 'item', 'medal', 'which'],
  diameter: ['diameter', 'dia', 'diam', 'ø', 'across', 'size', 'coin size', 'size across', 'width', 'd'],
  thickness: ['thickness', 'thick', 'thk', 'edge', 'rim', 'height', 't'],
  count: ['count', 'quantity', 'qty', 'number', 'no', 'pieces', 'pcs', 'how many', 'amount', 'coins', 'n', '#'],
  mass: ['mass', 'weight', 'grams', 'mass each', 'weight each'],
};

/** A heading's words, with a unit written behind or in brackets taken off: `Dia. (mm)` is `dia` in mm. */
export interface Heading {
  readonly column: TallyColumn | null;
  readonly units: Units | null;
}

const UNIT = /(?:^|[\s([,/])(in|inch|inches|mm|millimetres?|millimeters?|g|grams?|grammes?)[)\]]?\s*$/i;

/** Which column a heading names, and the unit it puts to its numbers. */
export function readHeading(text: string): Heading {
  const unit = UNIT.exec(text);
  const bare = (unit && unit.index > 0 ? text.slice(0, unit.index) : text).toLowerCase().replace(/[.:_()[\]*"]/g, ' ').replace(/\s+/g, ' ').trim();
  const column = TALLY_COLUMNS.find((name) => SYNONYMS[name].includes(bare)) ?? null;
  const letter = unit?.[1]?.toLowerCase() ?? '';
  const units = letter.startsWith('in') ? UNITS[0] : letter.startsWith('m') ? UNITS[1] : null;
  return { column, units };
}
