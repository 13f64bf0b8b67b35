import { type H3Event, setResponseHeaders } from 'h3';
import type { MadeProgram } from '#shared/makeProgram';
import { findingLine } from './findingLine';
import { type FieldError, problem } from './problem';

type GoodProgram = Extract<MadeProgram, { readonly ok: true }>;

/** The program as a file to save; its name has only letters, digits, dots, hyphens and underscores. */
export function programFile(event: H3Event, made: Pick<GoodProgram, 'mark' | 'fileName' | 'program'>): string {
  setResponseHeaders(event, {
    'content-type': 'text/plain; charset=utf-8',
    'content-disposition': `attachment; filename="${made.fileName.replaceAll(/[^\w.-]/g, '_')}"`,
    'program-mark': made.mark,
  });
  return made.program;
}

/** The program with everything that was measured of it. */
export function programAnswer({ program, fileName, mark, sha256, spec, summary, readback }: GoodProgram) {
  return { program, fileName, mark, sha256, spec, summary, readback };
}

/** The answer in place of a program that does not cut what was drawn: the findings, and no text. */
export function withheld({ readback, spec }: MadeProgram) {
  const errors = readback.findings
    .filter(({ severity }) => severity === 'disagrees')
    .map((finding): FieldError => ({ path: `readback.${finding.rule}`, message: findingLine(finding, spec.units) }));
  return problem(500, 'The program was read back and does not agree with the spec, so it is withheld; readback has what was measured.', { errors, readback });
}
