import { formatSize } from '#shared/measure/length';
import type { Units } from '#shared/measure/units';
import type { Role, StopwatchMark } from '#shared/shop/stopwatch';
import { clock } from '../utils/words';
import type { CourseStep } from './course';

/** What one should see at the machine, as a sentence. */
const SEEN: Readonly<Record<Role, string>> = {
  'spinning up': 'The spindle comes up to speed.',
  'waiting': 'The program waits for your hand.',
  'moving clear': 'The bit travels above the rail.',
  'entering': 'The bit ramps down into the wood.',
  'cutting': 'The bit goes round the groove.',
  'finish lap': 'The finish lap runs along the walls.',
  'raising': 'The bit comes up out of the wood.',
  'done': 'The program is at its end.',
};

/** `Pass 2 of 3, 3/16 in down.`, or nothing before the first. */
export function passWords({ pass, of, depth }: Pick<CourseStep, 'pass' | 'of' | 'depth'>, units: Units): string {
  return pass === 0 || depth === null ? '' : `Pass ${pass} of ${of}, ${formatSize(depth, units)} down.`;
}

export const seenWords = ({ role }: Pick<CourseStep, 'role'>): string => SEEN[role];

/** What comes next and when: `Pass 2 at 0:34.` */
export function markWords({ kind, pass, seconds }: StopwatchMark): string {
  const what = { 'pass': `Pass ${pass}`, 'finish lap': 'Finish lap', 'stop': 'A stop for your hand', 'end': 'Done' }[kind];
  return `${what} at ${clock(seconds)}`;
}

/** A display's figure with a true minus. */
export const shown = (text: string): string => text.replace('-', '−');

/** `Wed 2 Dec`, of a day as the tablet has it. */
export const dayWords = (date: Date): string => date.toLocaleDateString('en-GB', { weekday: 'short', day: 'numeric', month: 'short' });
/** `9:40`. */
export const timeWords = (date: Date): string => `${date.getHours()}:${String(date.getMinutes()).padStart(2, '0')}`;

/** `four rails to cut`. */
export function toCutWords(count: number): string {
  const words = ['nothing', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten'][count] ?? String(count);
  return `${words}${count === 0 ? '' : count === 1 ? ' rail' : ' rails'} to cut`;
}

/** A due day against today: `due today`, `due Fri 18 Dec`, `2 days late`. */
export function dueWords(due: string, today: Date): string {
  const [year = 0, month = 1, day = 1] = due.split('-').map(Number);
  const date = new Date(year, month - 1, day);
  const days = Math.round((date.getTime() - new Date(today.getFullYear(), today.getMonth(), today.getDate()).getTime()) / 86_400_000);
  if (days < 0) return days === -1 ? '1 day late' : `${-days} days late`;
  return days === 0 ? 'due today' : days === 1 ? 'due tomorrow' : `due ${dayWords(date)}`;
}
