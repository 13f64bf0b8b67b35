import { formatSize } from '#shared/measure/length';
import { type SlotSpec, railLength } from '#shared/slot/spec';
import { type Doc, FONTS, MARGIN, write } from './paper';

const OBJECT = 1.5; // pt, DESIGN 5: object lines, thin lines, what is hidden
const THIN = 0.5;
const FOOT = 5; // pt: an open crow's foot

const said = (value: number, units: SlotSpec['units']) => formatSize(value, units).replace(/ (?:in|mm)$/, '');

/** A level size with open crow's feet; `from` and `to` are where the extension lines come down from the object at `object`. */
function level(doc: Doc, text: string, from: number, to: number, y: number, object: number): void {
  const way = y > object ? 1 : -1;
  for (const x of [from, to]) doc.moveTo(x, object + 3 * way).lineTo(x, y + 4 * way);
  const narrow = to - from < 34; // too narrow for feet and figure: both stand outside
  const turn = narrow ? -1 : 1;
  const feet = (x: number, toward: number) => doc.moveTo(x + toward * FOOT, y - 2).lineTo(x, y).lineTo(x + toward * FOOT, y + 2);
  feet(from, turn);
  feet(to, -turn);
  if (narrow) doc.moveTo(from - 12, y).lineTo(from, y).moveTo(to, y).lineTo(to + 12, y);
  else doc.moveTo(from, y).lineTo(to, y);
  doc.lineWidth(THIN).stroke('#000');
  figure(doc, text, (from + to) / 2, narrow ? y + way * 10 : y);
}

/** An upright size, its figure beside the line. */
function upright(doc: Doc, text: string, top: number, bottom: number, x: number, object: number): void {
  const way = x > object ? 1 : -1;
  for (const y of [top, bottom]) doc.moveTo(object + 3 * way, y).lineTo(x + 4 * way, y);
  const narrow = bottom - top < 20;
  const turn = narrow ? -1 : 1;
  const feet = (y: number, toward: number) => doc.moveTo(x - 2, y + toward * FOOT).lineTo(x, y).lineTo(x + 2, y + toward * FOOT);
  feet(top, turn);
  feet(bottom, -turn);
  if (narrow) doc.moveTo(x, top - 12).lineTo(x, top).moveTo(x, bottom).lineTo(x, bottom + 12);
  else doc.moveTo(x, top).lineTo(x, bottom);
  doc.lineWidth(THIN).stroke('#000');
  figure(doc, text, x + (narrow ? way * 16 : 0), (top + bottom) / 2);
}

/** A figure on white, so that no line runs through it. */
function figure(doc: Doc, text: string, x: number, y: number): void {
  const wide = doc.font(FONTS.bold).fontSize(11).widthOfString(text) + 5;
  doc.rect(x - wide / 2, y - 7, wide, 14).fill('#fff');
  doc.fillColor('#000');
  write(doc, text, x, y - 5, { font: 'bold', size: 11, align: 'middle' });
}

/** Machine zero: the quartered disc. */
function zeroDisc(doc: Doc, x: number, y: number, r: number): void {
  doc.circle(x, y, r).lineWidth(1).fillAndStroke('#fff', '#000');
  doc.path(`M${x} ${y}V${y - r}A${r} ${r} 0 0 1 ${x + r} ${y}ZM${x} ${y}V${y + r}A${r} ${r} 0 0 1 ${x - r} ${y}Z`).fill('#000');
}

/** The rail from above, whole and to proportion, with its sizes; gives where the next line may stand. */
export function drawPlan(doc: Doc, spec: SlotSpec, top: number): number {
  const long = railLength(spec);
  const [left, right] = [MARGIN + 14, doc.page.width - MARGIN - 14]; // 14 pt: the feet of a narrow stop margin stand outside
  const scale = Math.min((right - left) / long, 90 / spec.railWidth); // 90 pt: a short wide rail leaves room for the rest
  const [x0, x1] = [(left + right - long * scale) / 2, (left + right + long * scale) / 2];
  const [y0, y1] = [top + 26, top + 26 + spec.railWidth * scale];
  const [s0, s1] = [x0 + spec.stopMargin * scale, x1 - spec.stopMargin * scale];
  const middle = (y0 + y1) / 2;
  const half = (spec.width * scale) / 2;
  const corner = spec.ends === 'round' ? half : Math.min(half, (spec.bitDiameter * scale) / 2);
  doc.rect(x0, y0, x1 - x0, y1 - y0).lineWidth(OBJECT).stroke('#000');
  doc.roundedRect(s0, middle - half, s1 - s0, 2 * half, corner).lineWidth(OBJECT).stroke('#000');
  doc.moveTo(x0 - 6, middle).lineTo(x1 + 6, middle).lineWidth(THIN).dash(9, { space: 2.5 }).stroke('#000').undash();
  level(doc, said(long, spec.units), x0, x1, top + 8, y0);
  level(doc, said(spec.stopMargin, spec.units), x0, s0, y1 + 20, y1);
  level(doc, said(spec.length, spec.units), s0, s1, y1 + 20, y1);
  level(doc, said(spec.stopMargin, spec.units), s1, x1, y1 + 20, y1);
  const corners = spec.workZero === 'corner';
  zeroDisc(doc, corners ? x0 : (x0 + x1) / 2, corners ? y1 : middle, 5);
  return y1 + 44;
}

/** The rail cut through, at a larger scale, looking at its left end: front on the left. Fits 180 × 110 pt from (x, y). */
export function drawSection(doc: Doc, spec: SlotSpec, x: number, y: number): void {
  const scale = Math.min(96 / spec.railWidth, 62 / spec.railThickness);
  const [wide, thick] = [spec.railWidth * scale, spec.railThickness * scale];
  const [x0, y0] = [x + 90 - wide / 2, y + 26];
  const [g0, g1] = [x0 + (wide - spec.width * scale) / 2, x0 + (wide + spec.width * scale) / 2];
  const floor = y0 + spec.depth * scale;
  doc.moveTo(x0, y0).lineTo(g0, y0).lineTo(g0, floor).lineTo(g1, floor).lineTo(g1, y0).lineTo(x0 + wide, y0).lineTo(x0 + wide, y0 + thick).lineTo(x0, y0 + thick).closePath();
  doc.save().clip();
  for (let at = x0 - thick; at < x0 + wide; at += 7) doc.moveTo(at, y0 + thick).lineTo(at + thick, y0);
  doc.lineWidth(0.45).stroke('#000').restore();
  doc.moveTo(x0, y0).lineTo(g0, y0).lineTo(g0, floor).lineTo(g1, floor).lineTo(g1, y0).lineTo(x0 + wide, y0).lineTo(x0 + wide, y0 + thick).lineTo(x0, y0 + thick).closePath();
  doc.lineWidth(2).stroke('#000');
  level(doc, said(spec.width, spec.units), g0, g1, y + 10, y0);
  upright(doc, said(spec.depth, spec.units), y0, floor, x0 + wide + 16, x0 + wide);
  upright(doc, said(spec.railThickness, spec.units), y0, y0 + thick, x0 - 18, x0);
  level(doc, said(spec.railWidth, spec.units), x0, x0 + wide, y0 + thick + 18, y0 + thick);
}

/** Where work zero is: the disc large, on a corner of the rail or on its middle. Fits 150 × 90 pt. */
export function drawZero(doc: Doc, spec: SlotSpec, x: number, y: number): void {
  const corner = spec.workZero === 'corner';
  const [zx, zy] = corner ? [x + 34, y + 66] : [x + 70, y + 44];
  doc.path(corner ? `M${x + 130} ${y + 22}H${zx}V${zy}H${x + 130}` : `M${x + 14} ${y + 22}H${x + 126}V${y + 66}H${x + 14}Z`).lineWidth(OBJECT).stroke('#000');
  const arrow = (to: readonly [number, number], feet: string) => doc.path(`M${zx} ${zy}L${to[0]} ${to[1]}${feet}`).lineWidth(1).stroke('#000');
  arrow([zx + 58, zy], `m-6 -2.5l6 2.5l-6 2.5`);
  arrow([zx, zy - 58], `m-2.5 6l2.5 -6l2.5 6`);
  zeroDisc(doc, zx, zy, 12);
  write(doc, 'X', zx + 50, zy + 5, { font: 'bold', size: 10 });
  write(doc, 'Y', zx + 5, zy - 60, { font: 'bold', size: 10 });
}
