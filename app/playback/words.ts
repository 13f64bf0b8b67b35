/** 94 → `1:34`. */
export function minutesSeconds(seconds: number): string {
  const whole = Math.round(seconds);
  return `${Math.floor(whole / 60)}:${String(whole % 60).padStart(2, '0')}`;
}

/** Where a playback stands, as it is read out: `pass 2 of 2, 0:34 of 1:02`. */
export function placeInWords(pass: number, passes: number, time: number, seconds: number): string {
  const at = `${minutesSeconds(time)} of ${minutesSeconds(seconds)}`;
  if (passes === 0) return at;
  return pass === 0 ? `before the first of ${passes} ${passes === 1 ? 'pass' : 'passes'}, ${at}` : `pass ${pass} of ${passes}, ${at}`;
}
