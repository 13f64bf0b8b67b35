/** One case of a case file: what is read, and the answer line by line. */
export interface ReaderCase {
  readonly name: string;
  readonly input: string;
  readonly expected: readonly string[];
}

const ARROW = '==>';

/**
 * Parses a case file: `# name`, the input as it stands, `==>`, the expected lines. `## ` starts a remark before the first case.
 * A malformed file, or one without a case, is a failure: a case that is not run cannot fail.
 */
export function parseCases(text: string): ReaderCase[] {
  const [preamble = '', ...parts] = text.split(/^# /m);
  if (preamble.split('\n').some((line) => line !== '' && !line.startsWith('## '))) throw new Error('case file: text before the first case');
  if (parts.length === 0) throw new Error('case file: no case');
  const cases = parts.map(parseCase);
  if (new Set(cases.map(({ name }) => name)).size < cases.length) throw new Error('case file: two cases of one name');
  return cases;
}

function parseCase(part: string): ReaderCase {
  const [name = '', ...lines] = part.split('\n');
  const arrow = lines.indexOf(ARROW);
  if (name.trim() === '') throw new Error('case file: a case without a name');
  if (arrow < 0 || lines.lastIndexOf(ARROW) !== arrow) throw new Error(`case file: "${name}" needs one ${ARROW}`);
  const expected = lines.slice(arrow + 1).filter((line) => line !== '');
  if (expected.length === 0) throw new Error(`case file: "${name}" expects nothing`);
  return { name, input: lines.slice(0, arrow).join('\n'), expected };
}
