import type { Units } from '#shared/measure/units';
import type { Finding } from '#shared/readback/finding';
import { sentenceOf } from '#shared/readback/sentences';

/** A finding on one line: what was looked at, the figures there are, and what to do. */
export function findingLine(finding: Finding, units: Units): string {
  const { text, wanted, measured, cure } = sentenceOf(finding, units);
  const figures = [wanted && `wanted ${wanted}`, measured && `measured ${measured}`].filter(Boolean).join(', ');
  const said = `${text.replace(/\.$/, '')}${figures && `: ${figures}`}.`;
  return cure ? `${said} ${cure}` : said;
}
