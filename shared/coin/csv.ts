import Papa from 'papaparse';
import { parseLength } from '../measure/length';
import type { Units } from '../measure/units';
import { type Heading, NEEDED_COLUMNS, TALLY_COLUMNS, type TallyColumn, readHeading } from './headings';
import { type CoinKind, type Tally, TALLY_LIMITS, discProblem, nameKey, readCoinSize } from './tally';

/** What is wrong in one line of the text; line 1 is the first. */
export interface CsvProblem {
  readonly line: number;
  readonly field: TallyColumn | 'line';
  readonly message: string;
}

/** A text read as a tally. `tally` is null while anything is wrong: nothing is half-imported; `kinds` shows what could be read. */
export interface CsvTally {
  readonly tally: Tally | null;
  readonly kinds: readonly (CoinKind & { readonly line: number })[];
  readonly problems: readonly CsvProblem[];
  /** Headings that name no column of a tally: passed over, and said. */
  readonly ignored: readonly string[];
}

interface Row {
  readonly line: number;
  readonly cells: readonly string[];
}

/** A tally of 40 kinds is a few kilobytes; more is another file. */
const LONGEST_TEXT = 100_000;

/** A tally to fill in: the headings, and two lines that show the notation. */
export function tallyTemplate(units: Units): string {
  const sizes = units === 'in' ? [['1 3/4', '1/8'], ['1 1/2', '0.118']] : [['44.5', '3.2'], ['38', '3']];
  const lines = sizes.map(([diameter, thickness], index) => `Example ${index + 1},${diameter},${thickness},${10 - index},`);
  return `${[`Name,Diameter (${units}),Thickness (${units}),Count,Mass (g)`, ...lines].join('\r\n')}\r\n`;
}

/** Rows with the line each begins in: a quoted cell may hold line ends. */
function rowsOf(text: string): { rows: Row[]; problems: CsvProblem[]; comma: boolean } {
  const rows: Row[] = [];
  const problems: CsvProblem[] = [];
  let [from, line, comma] = [0, 1, false];
  Papa.parse<string[]>(text, {
    delimitersToGuess: [',', ';', '\t', '|'],
    step({ data, errors, meta }) {
      comma = meta.delimiter !== ',';
      rows.push({ line, cells: data.map((cell) => cell.trim()) });
      for (const { type, message } of errors) if (type === 'Quotes') problems.push({ line, field: 'line', message: `${message}. Put a quote mark before and behind the whole cell.` });
      line += text.slice(from, meta.cursor).split(/\r\n|\r|\n/).length - 1;
      from = meta.cursor;
    },
  });
  return { rows: rows.filter(({ cells }) => cells.some((cell) => cell !== '')), problems, comma };
}

/** `38,1` is 38.1 where commas do not part the cells. */
const withPoint = (cell: string, comma: boolean) => (comma && /^\d+,\d+(\s*[a-z"]+)?$/i.test(cell) ? cell.replace(',', '.') : cell);

function readCount(cell: string): number | string {
  if (/^\d+$/.test(cell) && Number(cell) >= 1 && Number(cell) <= TALLY_LIMITS.count) return Number(cell);
  return cell === '' ? `The count is missing. Use 1 to ${TALLY_LIMITS.count}.` : `The count is "${cell.slice(0, 40)}". Use a whole number, 1 to ${TALLY_LIMITS.count}.`;
}

function readMass(cell: string): number | string | null {
  const written = cell.replace(/\s*(g|grams?)$/i, '');
  if (written === '') return null;
  const mass = /^\d*\.?\d+$/.test(written) ? Number(written) : NaN;
  return mass > 0 && mass <= TALLY_LIMITS.mass ? mass : `The mass is "${cell.slice(0, 40)}". Use grams, up to ${TALLY_LIMITS.mass}, or leave it empty.`;
}

function readName(cell: string, line: number, seen: Map<string, number>): string | { readonly problem: string } {
  if (cell === '') return { problem: 'The name is missing. Say what the customer calls this coin.' };
  if (cell.length > TALLY_LIMITS.name) return { problem: `The name is too long. Use ${TALLY_LIMITS.name} characters or fewer.` };
  const before = seen.get(nameKey(cell));
  if (before !== undefined) return { problem: `"${cell}" stands in line ${before} too. Give each kind its own name, or one line with the whole count.` };
  seen.set(nameKey(cell), line);
  return cell;
}

/** Problems of the heading line, and where each column stands. */
function readHeadings({ line, cells }: Row): { places: Map<TallyColumn, number>; headings: Heading[]; ignored: string[]; problems: CsvProblem[] } {
  const headings = cells.map(readHeading);
  const places = new Map<TallyColumn, number>();
  const problems: CsvProblem[] = [];
  headings.forEach(({ column }, place) => {
    if (column === null) return;
    const before = places.get(column);
    if (before === undefined) places.set(column, place);
    else problems.push({ line, field: column, message: `"${cells[before]}" and "${cells[place]}" both look like the ${column}. Keep one.` });
  });
  for (const column of NEEDED_COLUMNS) {
    if (!places.has(column)) problems.push({ line, field: column, message: `No heading names the ${column}. Call one column ${column}; the template has them all.` });
  }
  return { places, headings, ignored: cells.filter((cell, place) => cell !== '' && headings[place]?.column === null), problems };
}

/**
 * Reads a tally from CSV: columns in any order, headings matched by synonyms, commas, semicolons, tabs or bars between
 * cells. A size's own unit counts first, then its heading's, then `units`; the tally is in `units`.
 */
export function readTally(text: string, units: Units): CsvTally {
  const refuse = (problems: readonly CsvProblem[], ignored: readonly string[] = []): CsvTally => ({ tally: null, kinds: [], problems, ignored });
  if (text.length > LONGEST_TEXT) return refuse([{ line: 1, field: 'line', message: `The text has ${text.length} characters. A tally has at most ${LONGEST_TEXT}; is this the right file?` }]);
  const { rows, problems: broken, comma } = rowsOf(text.replace(/^\uFEFF/, ''));
  const [first, ...lines] = rows;
  if (!first) return refuse([{ line: 1, field: 'line', message: 'The text is empty. The first line has the headings, each further line one kind of coin.' }]);
  const { places, headings, ignored, problems: unheaded } = readHeadings(first);
  if (unheaded.length > 0) return refuse([...broken, ...unheaded], ignored);

  const problems = [...broken];
  const seen = new Map<string, number>();
  const kinds = lines.flatMap(({ line, cells }) => {
    const before = problems.length;
    const cell = (column: TallyColumn) => cells[places.get(column) ?? -1] ?? '';
    const say = <Value>(field: TallyColumn, value: Value | string): Value | null => {
      if (typeof value !== 'string') return value;
      problems.push({ line, field, message: value });
      return null;
    };
    const size = (column: 'diameter' | 'thickness') => {
      const raw = withPoint(cell(column), comma);
      const headed = headings[places.get(column) ?? -1]?.units;
      const bare = parseLength(raw)?.units === null;
      return say(column, readCoinSize(column, headed && bare ? `${raw} ${headed}` : raw, units));
    };
    if (cells.length > first.cells.length && cells.slice(first.cells.length).some((extra) => extra !== '')) {
      problems.push({ line, field: 'line', message: `The line has ${cells.length} cells and the headings ${first.cells.length}. Put quote marks round a cell that holds a comma.` });
    }
    const name = readName(cell('name'), line, seen);
    if (typeof name !== 'string') problems.push({ line, field: 'name', message: name.problem });
    const [diameter, thickness] = [size('diameter'), size('thickness')];
    const count = say('count', readCount(cell('count')));
    const mass = say('mass', readMass(cell('mass')));
    const disc = diameter !== null && thickness !== null ? discProblem({ diameter, thickness }, units) : null;
    if (disc) problems.push({ line, field: 'thickness', message: disc });
    if (problems.length > before || typeof name !== 'string' || diameter === null || thickness === null || count === null) return [];
    return [{ name, diameter, thickness, count, mass, line }];
  });
  if (lines.length === 0) problems.push({ line: first.line, field: 'line', message: 'Below the headings stands no coin. Give each kind a line.' });
  if (lines.length > TALLY_LIMITS.kinds) problems.push({ line: first.line, field: 'line', message: `The tally has ${lines.length} kinds; the most is ${TALLY_LIMITS.kinds}. Put like coins together.` });
  const tally = problems.length > 0 ? null : { units, kinds: kinds.map(({ line: _line, ...kind }) => kind) };
  return { tally, kinds, problems, ignored };
}

/** A tally as CSV that `readTally` reads back to the same tally. */
export function writeTally({ units, kinds }: Tally): string {
  const headings = TALLY_COLUMNS.map((column) => (column === 'diameter' || column === 'thickness' ? `${column} (${units})` : column === 'mass' ? 'mass (g)' : column));
  return `${Papa.unparse([headings, ...kinds.map((kind) => TALLY_COLUMNS.map((column) => kind[column] ?? ''))], { newline: '\r\n', escapeFormulae: false })}\r\n`;
}
