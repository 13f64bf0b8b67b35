import PDFDocument from 'pdfkit';

// One printed page: black on white, in points from its top left corner, with the fonts that every PDF reader has.

export const PAPERS = ['letter', 'a4'] as const;
export type PaperSize = (typeof PAPERS)[number];

export const MARGIN = 0.4 * 72; // pt: what every printer reaches
export const FONTS = { text: 'Helvetica', bold: 'Helvetica-Bold', slant: 'Helvetica-Oblique', mark: 'Courier-Bold' } as const;
export type Font = keyof typeof FONTS;
export type Doc = InstanceType<typeof PDFDocument>;

/** An empty page. */
export function newPaper(size: PaperSize, title: string): Doc {
  return new PDFDocument({ size: size === 'a4' ? 'A4' : 'LETTER', margin: 0, pdfVersion: '1.7', lang: 'en-US', displayTitle: true, info: { Title: printable(title), Creator: 'Tallyrail' } });
}

/** The finished document's bytes. */
export function bytesOf(doc: Doc): Promise<Buffer> {
  return new Promise((resolve, reject) => {
    const parts: Buffer[] = [];
    doc.on('data', (part: Buffer) => parts.push(part));
    doc.on('end', () => resolve(Buffer.concat(parts)));
    doc.on('error', reject);
    doc.end();
  });
}

/** Beyond Latin-1 the page's fonts have these. */
const MORE = new Set('–—‘’“”•…™€ŠšŽžŒœŸƒ†‡‰‹›');
const has = (letter: string) => MORE.has(letter) || /^[ -~\u00a0-\u00ff]$/.test(letter);

/** A text in letters that the page's fonts have: without the accents they lack, and a question mark for what is left. */
export function printable(text: string): string {
  return [...text.normalize('NFC')].map((letter) => {
    if (has(letter)) return letter;
    if (letter === '−') return '-';
    const bare = letter.normalize('NFKD').replaceAll(/\p{M}/gu, '');
    return [...bare].every(has) && bare !== '' ? bare : '?';
  }).join('');
}

export interface Written {
  readonly font?: Font;
  readonly size?: number;
  /** Lines are broken at this width; without it there is one line. */
  readonly width?: number;
  readonly align?: 'left' | 'right' | 'middle';
}

/** A piece that is never broken: letters, and a fraction's two numbers where it ends in one. */
interface Piece {
  readonly text: string;
  readonly fraction: readonly [string, string] | null;
  readonly after: string;
}

/** `26 1/4 in,` in pieces: a whole number stays with its fraction. */
export function piecesOf(text: string): Piece[] {
  const words = printable(text).match(/(?:\d+ )?\d+\/\d+(?![\w/])\S*|\S+/g) ?? [];
  return words.map((word) => {
    const match = /^(\(?)(?:(\d+) )?(\d+)\/(\d+)(\D.*)?$/.exec(word);
    if (!match) return { text: word, fraction: null, after: '' };
    const [, open = '', whole = '', upper = '', lower = '', after = ''] = match;
    return { text: open + whole, fraction: [upper, lower], after };
  });
}

const SMALL = 0.74; // of the text's size: a fraction's numbers

/** Writes a text with its top at `y` and gives where the next line's top would be. Fractions stand as fractions. */
export function write(doc: Doc, text: string, x: number, y: number, { font = 'text', size = 9.5, width, align = 'left' }: Written = {}): number {
  const set = (scale = 1) => doc.font(FONTS[font]).fontSize(size * scale);
  const long = (part: string, scale = 1) => (part === '' ? 0 : set(scale).widthOfString(part));
  const slash = () => long('/', SMALL);
  const widthOf = ({ text: head, fraction, after }: Piece) => long(head) + (fraction ? long(fraction[0], SMALL) + slash() + long(fraction[1], SMALL) : 0) + long(after);
  const gap = long('n') * 0.5;
  const lines: Piece[][] = [[]];
  let reach = 0;
  for (const piece of piecesOf(text)) {
    const own = widthOf(piece);
    if (width !== undefined && reach > 0 && reach + gap + own > width) {
      lines.push([]);
      reach = 0;
    }
    lines.at(-1)?.push(piece);
    reach += (reach > 0 ? gap : 0) + own;
  }
  lines.forEach((line, i) => {
    const total = line.reduce((sum, piece) => sum + widthOf(piece), 0) + gap * (line.length - 1);
    let at = align === 'right' ? x - total : align === 'middle' ? x - total / 2 : x;
    const top = y + i * size * 1.28;
    const put = (part: string, down = 0, scale = 1) => {
      if (part === '') return;
      set(scale).text(part, at, top + down * size, { lineBreak: false });
      at += long(part, scale);
    };
    for (const { text: head, fraction, after } of line) {
      put(head);
      if (fraction) {
        put(fraction[0], -0.06, SMALL);
        put('/', 0.13, SMALL);
        put(fraction[1], 0.3, SMALL);
      }
      put(after);
      at += gap;
    }
  });
  return y + lines.length * size * 1.28;
}

/** How wide a text is on one line. */
export function widthOf(doc: Doc, text: string, font: Font, size: number): number {
  return doc.font(FONTS[font]).fontSize(size).widthOfString(printable(text));
}

export function rule(doc: Doc, y: number, weight: number, from = MARGIN, to = doc.page.width - MARGIN): void {
  doc.moveTo(from, y).lineTo(to, y).lineWidth(weight).stroke('#000');
}

/** A box to tick by pen. */
export function tickBox(doc: Doc, x: number, y: number, side = 9): void {
  doc.rect(x, y, side, side).lineWidth(1).stroke('#000');
}
