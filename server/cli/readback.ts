import { readFileSync } from 'node:fs';
import { parseArgs } from 'node:util';
import { readBack, unreadable } from '#shared/readback/readBack';
import { verdictSentence } from '#shared/readback/sentences';
import { readProgram } from '#shared/reader/program';
import { slotRequestSchema } from '#shared/slot/request';
import { findingLine } from '#server/utils/findingLine';

const USAGE = 'Use: npm run readback -- file.nc --spec spec.json';

/** Exit codes: a script can tell a program that is wrong from a question that is. */
const AGREES = 0;
const DISAGREES = 1;
const NOT_READ = 2;

/** A file's text; where there is none, the reason in one line. */
function textOf(file: string): string {
  try {
    return readFileSync(file, 'utf8');
  } catch (error) {
    throw new Error(`${file} cannot be read: ${error instanceof Error ? error.message : String(error)}`, { cause: error });
  }
}

function specOf(file: string) {
  let json: unknown;
  try {
    json = JSON.parse(textOf(file));
  } catch (error) {
    if (error instanceof SyntaxError) throw new Error(`${file} is not JSON: ${error.message}`, { cause: error });
    throw error;
  }
  const result = slotRequestSchema.safeParse(json);
  if (result.success) return result.data;
  const problems = result.error.issues.map(({ path, message }) => `  ${path.join('.') || 'spec'}: ${message}`);
  throw new Error([`${file} is not a spec that can be cut:`, ...problems].join('\n'));
}

function readbackOf(file: string, specFile: string): number {
  const { spec, options, assumed } = specOf(specFile);
  const read = readProgram(textOf(file), { dwellIn: options.spindleWait === 'milliseconds' ? 'milliseconds' : 'seconds' });
  const { verdict, findings } = read.ok ? readBack(read.program, spec, assumed.includes('railWidth')) : unreadable(read.error);
  for (const finding of findings) {
    console.log(`${finding.severity.padEnd(12)}  line ${String(finding.at.line).padStart(5)}  ${findingLine(finding, spec.units)}`);
  }
  console.log(`\n${verdictSentence(findings)}`);
  return verdict === 'disagrees' ? DISAGREES : AGREES;
}

try {
  const { values: { spec }, positionals: [file] } = parseArgs({ allowPositionals: true, options: { spec: { type: 'string' } } });
  if (!file || !spec) throw new Error(USAGE);
  process.exitCode = readbackOf(file, spec);
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = NOT_READ;
}
