/**
 * A number of whole steps of the last decimal as a word's value: always with its point, never an exponent, never "-0".
 * `decimals` 4 turns 9375 into 0.9375.
 */
export function formatSteps(steps: number, decimals: number): string {
  return steps === 0 ? (0).toFixed(decimals) : (steps / 10 ** decimals).toFixed(decimals);
}

/** Rounds down to the one decimal that a feed is written with: a written feed is never above the asked one. */
export function formatFeed(feed: number): string {
  return (Math.floor(feed * 10 + 1e-6) / 10).toFixed(1);
}

/** What keeps a text from being comment text as it stands; most of a header has none of it. */
const UNFIT = /[^A-Z0-9 .,+'-]| {2}|^ | $/;

/**
 * A person's text as comment text: upper-case ASCII, and none of the characters that could close the comment or be
 * read as a word, a delimiter or a block delete where a controller reads comments loosely.
 */
export function commentText(text: string): string {
  const plain = text.toUpperCase();
  if (!UNFIT.test(plain)) return plain;
  return plain
    .normalize('NFKD')
    .replace(/\p{M}+/gu, '') // accents
    .replace(/[^A-Z0-9 .,+'-]+/g, ' ')
    .replace(/ {2,}/g, ' ')
    .trim();
}

/** Longest line written; NISTIR 6556 3.3 allows 256 characters, some controllers far fewer (common practice, no source). */
export const LONGEST_LINE = 72;

/** A comment on its own line, or several where the text is long: broken between words, each closed on its line. */
export function commentLines(text: string): string[] {
  const room = LONGEST_LINE - 2;
  const whole = commentText(text);
  if (whole.length <= room) return whole ? [`(${whole})`] : [];
  const lines: string[] = [];
  let line = '';
  for (const word of whole.split(' ').flatMap((long) => long.match(new RegExp(`.{1,${room}}`, 'g')) ?? [])) {
    const longer = line ? `${line} ${word}` : word;
    if (longer.length > room && line) lines.push(line);
    line = longer.length > room ? word : longer;
  }
  return [...lines, line].map((words) => `(${words})`);
}
