import { inflateSync } from 'node:zlib';

/** A straight line of a drawn path, in millimetres on the paper, from the top left corner. */
export interface Line {
  readonly from: readonly [number, number];
  readonly to: readonly [number, number];
}
/** One path as it was painted: its straight lines, and the box round all its points. */
export interface Path {
  readonly painted: 'stroke' | 'fill';
  readonly lines: readonly Line[];
  readonly width: number;
  readonly height: number;
}
export interface PdfPage {
  readonly width: number;
  readonly height: number;
  readonly paths: readonly Path[];
}

const MM_PER_POINT = 25.4 / 72;
type Matrix = readonly [number, number, number, number, number, number];
const ONE: Matrix = [1, 0, 0, 1, 0, 0];
/** `inner` first, then `outer` (ISO 32000-1, 8.3.4). */
const times = ([a, b, c, d, e, f]: Matrix, [A, B, C, D, E, F]: Matrix): Matrix =>
  [a * A + b * C, a * B + b * D, c * A + d * C, c * B + d * D, e * A + f * C + E, e * B + f * D + F];

/** Numbers of points that a path operator takes: move, line, curves. */
const POINTS: Readonly<Record<string, number>> = { m: 1, l: 1, c: 3, v: 2, y: 2 };
const PAINT: Readonly<Record<string, Path['painted'] | 'none'>> = {
  'S': 'stroke', 's': 'stroke', 'B': 'stroke', 'B*': 'stroke', 'b': 'stroke', 'f': 'fill', 'F': 'fill', 'f*': 'fill', 'n': 'none',
};
const TOKEN = /\((?:\\.|[^\\()])*\)|<<|>>|<[0-9A-Fa-f\s]*>|[[\]]|\/[^\s/<>[\]()]*|[^\s/<>[\]()]+/g;

function pathsOf(content: string, height: number): Path[] {
  const paths: Path[] = [];
  const saved: Matrix[] = [];
  let matrix = ONE;
  let operands: number[] = [];
  let lines: Line[] = [];
  let all: (readonly [number, number])[] = [];
  let [at, start]: (readonly [number, number])[] = [[0, 0], [0, 0]];
  const place = (x = 0, y = 0): readonly [number, number] => {
    const [, , , , px, py] = times([1, 0, 0, 1, x, y], matrix);
    return [px * MM_PER_POINT, height - py * MM_PER_POINT];
  };
  const lineTo = (to: readonly [number, number]) => {
    lines.push({ from: at ?? to, to });
    at = to;
  };
  for (const [token] of content.matchAll(TOKEN)) {
    if (/^[-+.\d]/.test(token)) {
      operands.push(Number(token));
      continue;
    }
    const [a = 0, b = 0, c = 0, d = 0, e = 0, f = 0] = operands;
    const count = POINTS[token];
    const painted = PAINT[token];
    if (token === 'q') saved.push(matrix);
    else if (token === 'Q') matrix = saved.pop() ?? ONE;
    else if (token === 'cm') matrix = times([a, b, c, d, e, f], matrix);
    else if (count !== undefined) {
      const points = Array.from({ length: count }, (_, i) => place(operands[2 * i], operands[2 * i + 1]));
      const end = points.at(-1) ?? place();
      all.push(...points);
      if (token === 'm') start = end;
      if (token === 'l') lineTo(end);
      at = end;
    } else if (token === 'h' && start) lineTo(start);
    else if (token === 're') {
      const corners = [place(a, b), place(a + c, b), place(a + c, b + d), place(a, b + d)];
      all.push(...corners);
      [at] = corners;
      for (const corner of [...corners.slice(1), corners[0] ?? place()]) lineTo(corner);
    } else if (painted) {
      const [xs, ys] = [all.map(([x]) => x), all.map(([, y]) => y)];
      const span = (values: readonly number[]) => Math.max(...values) - Math.min(...values);
      if (painted !== 'none' && all.length > 0) paths.push({ painted, lines, width: span(xs), height: span(ys) });
      [lines, all] = [[], []];
    }
    operands = [];
  }
  return paths;
}

/** Pages of a PDF as Chromium writes it: plain objects, contents deflated. Read without a package, so that the measure is our own. */
export function pagesOf(pdf: Buffer): PdfPage[] {
  const file = pdf.toString('latin1');
  const objects = new Map([...file.matchAll(/(?:^|\s)(\d+) 0 obj\b([\s\S]*?)\bendobj\b/g)].map(([, id = '', body = '']) => [id, body]));
  return [...objects.values()].filter((body) => /\/Type\s*\/Page\b/.test(body)).map((page) => {
    const box = /\/MediaBox\s*\[\s*\S+\s+\S+\s+(\S+)\s+([^\s\]]+)/.exec(page);
    const [width, height] = [Number(box?.[1]) * MM_PER_POINT, Number(box?.[2]) * MM_PER_POINT];
    const stream = objects.get(/\/Contents\s+(\d+)/.exec(page)?.[1] ?? '') ?? '';
    const [begin = ''] = /^[\s\S]*?stream\r?\n/.exec(stream) ?? [];
    const packed = stream.slice(begin.length, begin.length + Number(/\/Length\s+(\d+)/.exec(begin)?.[1]));
    return { width, height, paths: pathsOf(/FlateDecode/.test(begin) ? inflateSync(Buffer.from(packed, 'latin1')).toString('latin1') : packed, height) };
  });
}

const lengthOf = ({ from, to }: Line) => Math.hypot(to[0] - from[0], to[1] - from[1]);

/** Check bars on a page: a level line with so many upright ticks on it in the same path; lengths in millimetres. */
export function checkBars(page: PdfPage, ticks: number): number[] {
  return page.paths.filter(({ painted, lines }) => {
    const level = lines.filter(({ from, to }) => Math.abs(to[1] - from[1]) < 0.01);
    return painted === 'stroke' && level.length === 1 && lines.length === ticks + 1;
  }).map(({ lines }) => Math.max(...lines.map(lengthOf)));
}
