import type { Lint } from './lintWords';
import { statedUnits } from './lintWords';
import type { JudgedOptions, LengthUnits, Rule, Violation } from './types';
import { blocksOf, hasWord, motionCode, namesAxis, type ProgramText } from './words';

const LONGEST_LINE = 72; // issue, "The text"; NISTIR 6556 3.3 allows 256
/** Upper-case ASCII without what other dialects act on inside a comment (FACTS A9, "comments"). */
const COMMENT_TEXT = /^[ !"#$&'*+,\-.0-9:<=>?@A-Z[\\\]^_]*$/;
/** Shown as XXX-XXX (issue, "Program mark"); 0, O, 1 and I look alike, so none is in a 28-letter alphabet without look-alikes. */
const MARK = /(^|[^A-Z0-9-])[2-9A-HJ-NP-Z]{3}-[2-9A-HJ-NP-Z]{3}($|[^A-Z0-9-])/;
const MONTH = '(JAN(UARY)?|FEB(RUARY)?|MAR(CH)?|APR(IL)?|MAY|JUNE?|JULY?|AUG(UST)?|SEPT?(EMBER)?|OCT(OBER)?|NOV(EMBER)?|DEC(EMBER)?)';
const DATES = [/\b\d{4}-\d{1,2}-\d{1,2}\b/, /\b\d{1,2}[-.]\d{1,2}[-.](19|20)\d\d\b/, /\b\d{1,2}:\d{2}\b/, /(?<![-\w])\d{1,2} ?[AP]M(?![-\w])/,
  new RegExp(`(?<![\\d.])\\d{1,2} ${MONTH}\\b`), new RegExp(`\\b${MONTH} \\d{1,2}(?![\\d.])`)];
/** Issue, "The text": every mode stated before the first motion (the G80 of group 1 states that none is in force). */
const MODES = [17, 40, 49, 54, 80, 90, 94];

function fault(rule: Rule, line: number, message: string): Violation {
  return { rule, line, message };
}

export const lineLength: Lint = program => program.lines
  .filter(line => line.text.length > LONGEST_LINE)
  .map(line => fault('line-length', line.line, `${line.text.length} characters, at most ${LONGEST_LINE}`));

/** One kind of line ending, to the last line; no other control characters (issue's option CRLF, common practice). */
export function lineEnding(program: ProgramText, wanted: 'lf' | 'crlf' = 'lf'): Violation[] {
  const found: Violation[] = [];
  if (!program.whole.endsWith('\n')) found.push(fault('line-ending', program.lines.length, 'the last line has no ending'));
  const ends = wanted === 'crlf' ? /^(?:[^\r\n]*\r\n)*$/ : /^[^\r]*$/;
  if (!ends.test(program.whole)) found.push(fault('line-ending', 0, `not all lines end in ${wanted}`));
  for (const line of program.lines) {
    if (/[^ -~]/.test(line.text)) found.push(fault('line-ending', line.line, 'a character that is not printable ASCII'));
  }
  return found;
}

/** NISTIR 6556 3.1: both or neither, alone, first and last. */
export function percent(program: ProgramText, wanted?: boolean): Violation[] {
  const at = program.lines.filter(line => line.text.includes('%') && !line.comments.some(comment => comment.text.includes('%')));
  const last = program.lines.length;
  const paired = at.length === 2 && at[0]?.line === 1 && at[1]?.line === last && at.every(line => line.text === '%');
  if (!paired && at.length > 0) return [fault('percent', at[0]?.line ?? 0, '% must stand alone on the first and on the last line, or nowhere')];
  return wanted !== undefined && wanted !== paired ? [fault('percent', 0, wanted ? 'no % lines' : '% lines not asked for')] : [];
}

/** NISTIR 6556 3.3.4: closed on its line, not nested. Issue and FACTS A9: own line, upper-case ASCII, no ( ) % ; / inside. */
export const comment: Lint = program => program.lines.flatMap(line => line.comments.flatMap((found) => {
  if (!found.closed) return [fault('comment', line.line, 'not closed on its line')];
  if (!COMMENT_TEXT.test(found.text)) return [fault('comment', line.line, `not plain upper-case text: ${found.text}`)];
  return line.text === `(${found.text})` ? [] : [fault('comment', line.line, 'not alone on its line')];
}));

/** Issue, "The text": no date or time of day, so that the same slot gives the same bytes. */
export const date: Lint = program => program.lines
  .filter(line => line.comments.some(found => DATES.some(form => form.test(found.text))))
  .map(line => fault('date', line.line, `a date or time of day: ${line.text}`));

/** Issue, "Program mark": it stands in the first comment. With comments off there is none anywhere. */
export function mark(program: ProgramText, comments = true): Violation[] {
  const all = program.lines.flatMap(line => line.comments.map(found => ({ line: line.line, text: found.text })));
  if (!comments) return all.length === 0 ? [] : [fault('mark', all[0]?.line ?? 0, 'a comment, though comments are off')];
  return MARK.test(all[0]?.text ?? '') ? [] : [fault('mark', all[0]?.line ?? 0, 'the first comment bears no program mark')];
}

/** NISTIR 6556 3.3.1: at most 5 digits. FACTS A9: omitted, or at most 9999; each block the same. */
export function lineNumber(program: ProgramText, wanted = false): Violation[] {
  return blocksOf(program).flatMap((block) => {
    const n = block.words.find(word => word.letter === 'N');
    if ((n !== undefined) !== wanted) return [fault('line-number', block.line, wanted ? 'no N word' : 'an N word not asked for')];
    return n === undefined || /^[1-9]\d{0,3}$/.test(n.text) ? [] : [fault('line-number', block.line, `N${n.text}: not a whole number up to 9999`)];
  });
}

/** Issue: every mode stated before the first motion. */
export const modes: Lint = (program) => {
  const blocks = blocksOf(program);
  const first = blocks.findIndex(block => namesAxis(block));
  const before = first < 0 ? blocks : blocks.slice(0, first);
  const line = blocks[first]?.line ?? 0;
  const missing = MODES.filter(code => !before.some(block => hasWord(block, 'G', code))).map(code => `G${code}`);
  if (!before.some(block => hasWord(block, 'G', 20) || hasWord(block, 'G', 21))) missing.push('G20 or G21');
  return missing.map(code => fault('modes', line, `${code} is not stated before the first motion`));
};

/** FACTS A9: G20 or G21 once, on its own line. Issue: the units asked for. */
export function units(program: ProgramText, wanted?: LengthUnits): Violation[] {
  const said = blocksOf(program).filter(block => hasWord(block, 'G', 20) || hasWord(block, 'G', 21));
  const found = said.slice(1).map(block => fault('units', block.line, 'units stated again'));
  const first = said[0];
  if (first !== undefined && first.words.filter(word => word.letter !== 'N').length > 1) found.push(fault('units', first.line, 'units not on their own line'));
  if (wanted !== undefined && statedUnits(program) !== wanted) found.push(fault('units', first?.line ?? 0, `not in ${wanted}`));
  return found;
}

/** FACTS A9: seconds here, milliseconds elsewhere; so none unless asked, and then only where the spindle has just started. */
export function dwell(program: ProgramText, wanted: NonNullable<JudgedOptions['spindleWait']> = 'none'): Violation[] {
  const blocks = blocksOf(program);
  const waits = blocks.filter(block => hasWord(block, 'G', 4) || block.words.some(word => word.letter === 'P'));
  if (wanted === 'none') return waits.map(block => fault('dwell', block.line, 'a wait not asked for'));
  if (waits.length === 0) return [fault('dwell', 0, 'no wait after the spindle starts')];
  return waits.flatMap((block) => {
    const p = block.words.find(word => word.letter === 'P');
    const others = block.words.filter(word => word.letter !== 'N' && word.letter !== 'P' && !(word.letter === 'G' && word.value === 4));
    const before = blocks[blocks.indexOf(block) - 1];
    if (p === undefined || p.value <= 0 || others.length > 0) return [fault('dwell', block.line, 'G4 and P above zero, alone')];
    if (before === undefined || !hasWord(before, 'M', 3)) return [fault('dwell', block.line, 'not where the spindle starts')];
    return (p.value >= 100) === (wanted === 'milliseconds') ? [] : [fault('dwell', block.line, `P${p.text} is not in ${wanted}`)];
  });
}

/** NISTIR 6556 3.6.1: nothing after M2 or M30 is executed. FACTS A9: alone on the last code line. */
export function end(program: ProgramText, wanted?: 'M30' | 'M2'): Violation[] {
  const blocks = blocksOf(program);
  const ends = blocks.filter(block => hasWord(block, 'M', 30) || hasWord(block, 'M', 2));
  const last = blocks.at(-1);
  if (last === undefined || ends.length !== 1 || ends[0] !== last) return [fault('end', last?.line ?? 0, 'M30 or M2 must be the last block, once')];
  const words = last.words.filter(word => word.letter !== 'N');
  if (words.length > 1) return [fault('end', last.line, 'M30 or M2 must stand alone')];
  return wanted === undefined || `M${words[0]?.value}` === wanted ? [] : [fault('end', last.line, `not ${wanted}`)];
}

/** gcode-parser, the independent parser: it and this judge must read the same words. */
export const parser: Lint = program => program.lines
  .filter(line => line.disagreement !== '')
  .map(line => fault('parser', line.line, `${line.text}: ${line.disagreement}`));

/** FACTS A9, "G0": some controllers move each axis at its own pace, so a rapid names Z alone, or X and Y. */
export const rapidWords: Lint = (program) => {
  let motion: number | undefined;
  return blocksOf(program).flatMap((block) => {
    motion = motionCode(block) ?? motion;
    const named = block.words.map(word => word.letter);
    const both = named.includes('Z') && (named.includes('X') || named.includes('Y'));
    return motion === 0 && both ? [fault('rapid-sideways', block.line, `${block.text}: a rapid in Z and sideways at once`)] : [];
  });
};
