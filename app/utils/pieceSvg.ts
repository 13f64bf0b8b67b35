import type { Work } from '#shared/commission/work';
import type { Arrangement } from '#shared/piece/arrange';
import { factsOf } from '#shared/piece/kinds';
import { drawnCoins, drawnStrips } from './pieceView';

const escaped = (text: string) => text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('"', '&quot;');
const n = (value: number) => String(Number(value.toFixed(4)));

/** The piece from the front as an SVG at true size: its width and height are in real units, one unit of the drawing is one of the piece's. */
export function pieceSvg(work: Work, arrangement: Arrangement, title: string): string {
  const { piece, build } = work;
  const { units, width, height, section } = piece;
  const thin = units === 'in' ? 0.01 : 0.25;
  const over = Math.max(0, ...drawnCoins(work, arrangement).map(({ y, r }) => r - y)); // coins above the top edge
  const rect = (x: number, y: number, w: number, h: number, label: string) => `<rect x="${n(x)}" y="${n(y)}" width="${n(w)}" height="${n(h)}"><title>${escaped(label)}</title></rect>`;
  const strips = drawnStrips(work).map((strip) => rect(strip.x, strip.y, strip.width, strip.height, strip.wood));
  const behind = factsOf(piece.kind).behind;
  const rails = arrangement.rails.map((rail) => behind
    ? rect(rail.left + section.stopMargin, rail.top + (section.thickness - section.grooveWidth) / 2, rail.grooveLength, section.grooveWidth, `groove ${rail.name}`)
    : rect(rail.left, rail.top, rail.length, section.thickness, `rail ${rail.name}, ${build.rails}`));
  const coins = drawnCoins(work, arrangement).filter(({ lost }) => !lost).map(({ x, y, r, kind, toCome }) => `<circle cx="${n(x)}" cy="${n(y)}" r="${n(r)}"${toCome ? ` stroke-dasharray="${n(thin * 6)}"` : ''}><title>${escaped(kind)}</title></circle>`);
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" width="${n(width)}${units}" height="${n(height + over)}${units}" viewBox="0 ${n(-over)} ${n(width)} ${n(height + over)}">`,
    `<title>${escaped(title)}</title>`,
    `<g fill="none" stroke="#000" stroke-width="${n(thin)}">`, ...strips, ...coins, '<g fill="#fff">', ...rails, '</g></g>', '</svg>', '',
  ].join('\n');
}
