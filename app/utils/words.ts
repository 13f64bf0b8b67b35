import type { Finding, Readback, Severity } from '#shared/readback/finding';

const COUNTS = ['No', 'One', 'Two', 'Three', 'Four', 'Five', 'Six', 'Seven', 'Eight', 'Nine', 'Ten'];

/** `One`, `Two`, … `11`: small counts at the head of a sentence are words. */
export const countWord = (count: number): string => COUNTS[count] ?? String(count);

export const plural = (count: number, one: string, many = `${one}s`): string => `${count} ${count === 1 ? one : many}`;

/** Seconds as the clock on a machine shows them: `1:02`, `1:01:02`. */
export function clock(seconds: number): string {
  const whole = Math.max(0, Math.round(seconds));
  const [hours, minutes, rest] = [Math.floor(whole / 3600), Math.floor((whole % 3600) / 60), whole % 60];
  const two = (value: number) => String(value).padStart(2, '0');
  return hours > 0 ? `${hours}:${two(minutes)}:${two(rest)}` : `${minutes}:${two(rest)}`;
}

/** The same in words: `1 minute 2 seconds`. */
export function spokenClock(seconds: number): string {
  const whole = Math.max(0, Math.round(seconds));
  const [minutes, rest] = [Math.floor(whole / 60), whole % 60];
  return [minutes > 0 ? plural(minutes, 'minute') : '', rest > 0 || minutes === 0 ? plural(rest, 'second') : ''].filter(Boolean).join(' ');
}

const count = (readback: Readback, severity: Severity) => readback.findings.filter((finding) => finding.severity === severity).length;

/** The readback in one sentence: how many readings, and what stands out among them. */
export function verdictOf(readback: Readback): string {
  const total = plural(readback.findings.length, 'reading');
  const [differ, cautions, open] = [count(readback, 'disagrees'), count(readback, 'caution'), count(readback, 'not measured')];
  const parts = [
    differ > 0 ? `${differ} ${differ === 1 ? 'differs' : 'differ'} from the drawing` : '',
    cautions > 0 ? plural(cautions, 'caution') : '',
    open > 0 ? `${open} not measured` : '',
  ].filter(Boolean);
  return parts.length === 0 ? `${total}, all agree.` : `${total}, ${parts.join(', ')}.`;
}

export const cautionsOf = (readback: Readback): readonly Finding[] => readback.findings.filter(({ severity }) => severity === 'caution');
export const differing = (readback: Readback): readonly Finding[] => readback.findings.filter(({ severity }) => severity === 'disagrees');

export { LAST_WORD, ROUTER_CAUTIONS } from '#shared/shop/cautions';
