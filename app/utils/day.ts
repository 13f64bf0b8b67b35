/** A calendar day (`2026-12-18`) as a list shows it: `Fri 18 Dec 2026`. It is nobody's moment, so no time zone moves it. */
export function dayWords(day: string | null): string {
  if (day === null) return '';
  return new Date(`${day}T00:00:00Z`).toLocaleDateString('en-GB', { weekday: 'short', day: 'numeric', month: 'short', year: 'numeric', timeZone: 'UTC' }).replaceAll(',', '');
}
