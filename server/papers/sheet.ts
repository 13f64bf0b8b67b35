import { encode } from 'uqr';
import { formatDecimal } from '#shared/measure/length';
import { byUnits } from '#shared/measure/units';
import { sentenceOf } from '#shared/readback/sentences';
import type { BenchProgram } from '#shared/shop/bench';
import { LAST_WORD, ROUTER_CAUTIONS } from '#shared/shop/cautions';
import { STOPPED_STEPS, setupLines, sheetSteps } from '#shared/shop/setup';
import { touchOff } from '#shared/shop/touchOff';
import { type Doc, FONTS, MARGIN, type PaperSize, bytesOf, newPaper, rule, tickBox, widthOf, write } from './paper';
import { drawPlan, drawSection, drawZero } from './railDrawing';

/** What the sheet of a rail is made from. */
export interface SheetOf {
  readonly rail: { readonly name: string; readonly revision: number; readonly quantity: number; readonly due: string | null };
  readonly shop: string;
  readonly program: BenchProgram;
  /** Opens the rail at the bench. */
  readonly link: string;
}

const MARK_SIZE = 63; // pt: 84 px, to be read across a room
const UNIT_WORDS = { in: 'inches', mm: 'millimetres' } as const;

function heading(doc: Doc, words: string, x: number, y: number): number {
  return write(doc, words, x, y, { font: 'bold', size: 12 }) + 1;
}

/** Name, mark, and where the mark must stand in the file. */
function head(doc: Doc, { rail, shop, program }: SheetOf): number {
  const right = doc.page.width - MARGIN;
  const markLeft = right - widthOf(doc, program.mark, 'mark', MARK_SIZE);
  doc.font(FONTS.mark).fontSize(MARK_SIZE).lineWidth(1.6).text(program.mark, markLeft, MARGIN - 6, { lineBreak: false, fill: true, stroke: true });
  write(doc, 'Tallyrail setup sheet', MARGIN, MARGIN, { font: 'bold', size: 10 });
  const long = rail.name.length > 24;
  const under = write(doc, rail.name, MARGIN, MARGIN + 15, { font: 'bold', size: long ? 14 : 20, width: markLeft - MARGIN - 14 });
  const count = rail.quantity > 1 ? `${rail.quantity} to cut. ` : '';
  const last = write(doc, `${count}Revision ${program.revision}${rail.due ? `, due ${rail.due}` : ''}. ${shop}.`, MARGIN, under, { width: markLeft - MARGIN - 14 });
  const y = Math.max(last + 4, MARGIN + 58);
  rule(doc, y, 2.2);
  const { spec, machine } = program;
  const apart = spec.units === machine.units ? '' : ` The program is in ${UNIT_WORDS[machine.units].toUpperCase()}.`;
  const older = program.revision < rail.revision;
  if (older) write(doc, `The drawing was changed since: it is at revision ${rail.revision} now. Do not cut from this sheet.`, MARGIN, y + 5, { font: 'bold', size: 12 });
  const file = write(doc, `File ${program.fileName}. Its first line must say (PROGRAM MARK ${program.mark}). All sizes in ${UNIT_WORDS[spec.units]}.${apart}`, MARGIN, y + (older ? 22 : 5), { width: right - MARGIN, size: 10 });
  rule(doc, file + 2, 0.75);
  return file + 8;
}

function drawings(doc: Doc, program: BenchProgram, top: number): number {
  const { spec } = program;
  const under = drawPlan(doc, spec, top);
  drawSection(doc, spec, MARGIN + 24, under);
  drawZero(doc, spec, MARGIN + 214, under + 6);
  const words = spec.workZero === 'corner' ? 'X0 Y0: the front left corner of the rail.' : "X0 Y0: the middle of the rail's top.";
  const left = MARGIN + 372;
  const wide = doc.page.width - MARGIN - left;
  let y = write(doc, 'Work zero', left, under + 10, { font: 'bold', size: 11 });
  for (const line of [words, "Z0: the rail's top.", 'The black-and-white disc marks it. The front edge is toward you, the fence along the back.']) y = write(doc, line, left, y + 2, { width: wide });
  return Math.max(y, under + 110);
}

/** A column to write in: `size` is its text's. */
interface Column {
  readonly x: number;
  readonly width: number;
  readonly size: number;
}

function setup(doc: Doc, program: BenchProgram, { x, width, size }: Column, y: number): number {
  let at = heading(doc, 'Setup', x, y);
  for (const { name, value } of setupLines(program)) {
    write(doc, name, x, at + 2, { size });
    at = write(doc, value, x + 92, at + 2, { font: 'bold', size, width: width - 92 });
    rule(doc, at, 0.4, x, x + width);
  }
  return at + 6;
}

function ticked(doc: Doc, lines: readonly string[], { x, width, size }: Column, y: number): number {
  return lines.reduce((at, line) => {
    tickBox(doc, x, at + 2.5, size);
    return write(doc, line, x + 15, at + 2.5, { size, width: width - 15 }) + 1.5;
  }, y);
}

/** Every caution of the router, and those of this program's readback, each with its box. */
function cautions(doc: Doc, { cautions: found, spec }: BenchProgram, { x, width, size }: Column, y: number): number {
  const inside = { x: x + 8, width: width - 16, size };
  let at = ticked(doc, ROUTER_CAUTIONS, inside, heading(doc, 'Before the spindle turns', x + 8, y + 6));
  at = write(doc, LAST_WORD, x + 8, at + 2, { font: 'bold', size, width: width - 16 });
  if (found.length > 0) at = write(doc, found.map((finding) => `Caution: ${sentenceOf(finding, spec.units).text.replace(/\.$/, '')}.`).join(' '), x + 8, at + 2, { size: size - 0.6, width: width - 16 });
  doc.rect(x, y, width, at - y + 5).lineWidth(1.5).stroke('#000');
  return at + 11;
}

/** Three places of width and of depth, and who cut it how. */
function blanks(doc: Doc, { spec }: BenchProgram, y: number): number {
  const right = doc.page.width - MARGIN;
  rule(doc, y, 1.5);
  const drawn = (value: number) => formatDecimal(value, spec.units, byUnits(spec.units, 4, 2));
  const groups = [
    { words: `Width, drawn ${drawn(spec.width)}: left, middle, right end`, from: 0, share: 0.35, parts: 3 },
    { words: `Depth, drawn ${drawn(spec.depth)}: left, middle, right end`, from: 0.36, share: 0.35, parts: 3 },
    { words: 'Cut by', from: 0.72, share: 0.13, parts: 1 },
    { words: 'Good / spoiled', from: 0.86, share: 0.14, parts: 1 },
  ];
  for (const { words, from, share, parts } of groups) {
    const [x, wide] = [MARGIN + from * (right - MARGIN), share * (right - MARGIN)];
    write(doc, words, x, y + 5, { size: 8.6 });
    for (let i = 0; i < parts; i++) rule(doc, y + 36, 0.6, x + (i * wide) / parts, x + ((i + 0.9) * wide) / parts);
  }
  return y + 44;
}

/** Bars to hold a rule against: 4 in and 100 mm, a line each with its ticks. */
export const CHECK_BARS = [{ words: '4 in', length: 4 * 72, parts: 4 }, { words: '100 mm', length: (100 / 25.4) * 72, parts: 10 }] as const;

function foot(doc: Doc, link: string): void {
  const bottom = doc.page.height - MARGIN;
  const right = doc.page.width - MARGIN;
  const side = 66;
  CHECK_BARS.forEach(({ words, length, parts }, i) => {
    const y = bottom - 52 + i * 21;
    doc.moveTo(MARGIN, y).lineTo(MARGIN + length, y);
    for (let tick = 0; tick <= parts; tick++) {
      const [x, high] = [MARGIN + (tick * length) / parts, tick === 0 || tick === parts ? 6 : 3];
      doc.moveTo(x, y - high).lineTo(x, y + high);
    }
    doc.lineWidth(0.75).stroke('#000');
    write(doc, words, MARGIN + length + 6, y - 4, { font: 'bold', size: 9 });
  });
  write(doc, 'The bars are 4 inches and 100 millimetres long when printed at 100 %.', MARGIN, bottom - 17, { size: 8.6 });
  write(doc, 'The square opens this rail at the bench.', MARGIN, bottom - 7, { size: 8.6 });
  const { data, size } = encode(link, { ecc: 'M', border: 2 });
  const dot = side / size;
  data.forEach((row, y) => row.forEach((dark, x) => { if (dark) doc.rect(right - side + x * dot, bottom - side + y * dot, dot, dot); }));
  doc.fill('#000');
}

/** Sizes of the columns' text, pt: the largest at which everything stands on one page. */
const SIZES = [9.4, 8.8, 8.2, 7.6] as const;
const FOOT = 122; // pt: blanks, bars and square

/** Everything above the blanks; gives how far down it came. */
function upper(doc: Doc, of: SheetOf, size: number): number {
  const { program } = of;
  const y = drawings(doc, program, head(doc, of));
  rule(doc, y, 1.5);
  const middle = doc.page.width / 2;
  const width = middle - MARGIN - 10;
  const [left, right] = [{ x: MARGIN, width, size }, { x: middle + 10, width, size }];
  const underLeft = cautions(doc, program, left, setup(doc, program, left, y + 6));
  const steps = sheetSteps(program, touchOff(program.spec, program.machine.units));
  const underSteps = ticked(doc, steps, right, heading(doc, 'At the machine', right.x, y + 6));
  const underRight = ticked(doc, STOPPED_STEPS, right, heading(doc, 'If it stops half-way', right.x, underSteps + 5));
  return Math.max(underLeft, underRight);
}

/** The setup sheet of a rail as a PDF of one page, black on white. */
export function sheetPdf(of: SheetOf, paper: PaperSize): Promise<Buffer> {
  const fresh = () => newPaper(paper, `${of.rail.name}, setup sheet ${of.program.mark}`);
  const room = (doc: Doc) => doc.page.height - MARGIN - FOOT;
  const fits = SIZES.find((size) => {
    const trial = fresh();
    return upper(trial, of, size) <= room(trial);
  });
  const doc = fresh();
  const end = upper(doc, of, fits ?? SIZES[3]);
  blanks(doc, of.program, Math.max(end, room(doc)));
  foot(doc, of.link);
  return bytesOf(doc);
}
