import { type H3Event, getRequestURL, setResponseHeaders } from 'h3';
import { settings } from './settings';

/** A PDF to look at or to save, named after the program it belongs to. */
export function answerPdf(event: H3Event, programName: string, pdf: Buffer): Buffer {
  const name = programName.replace(/\.\w+$/, '').replaceAll(/[^\w.-]/g, '_');
  setResponseHeaders(event, { 'content-type': 'application/pdf', 'content-disposition': `inline; filename="${name}.pdf"` });
  return pdf;
}

/** Opens a rail at the bench, which says so where the sheet's program is no longer the rail's newest. */
export function benchLink(event: H3Event, railId: string, mark: string): string {
  const link = new URL('/bench', settings.TALLYRAIL_ORIGIN ?? getRequestURL(event).origin);
  link.search = new URLSearchParams({ rail: railId, mark }).toString();
  return link.href;
}
