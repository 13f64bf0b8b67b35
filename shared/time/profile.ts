/**
 * One move from speed `entry` to speed `exit` over `length`, no faster than `cap`: speeding up, running on, slowing down.
 * Uniformly accelerated motion: v² = v₀² + 2 a s (any mechanics handbook).
 */
export function peakSpeed(length: number, entry: number, exit: number, cap: number, acceleration: number): number {
  if (acceleration === Infinity) return cap;
  // No less than its ends: the root may round below them where the whole length goes into one ramp.
  return Math.max(entry, exit, Math.min(cap, Math.sqrt((entry * entry + exit * exit) / 2 + acceleration * length)));
}

/** Seconds such a move takes. */
export function moveSeconds(length: number, entry: number, peak: number, exit: number, acceleration: number): number {
  if (length === 0) return 0;
  if (acceleration === Infinity) return length / peak;
  const ramps = (2 * peak * peak - entry * entry - exit * exit) / (2 * acceleration);
  return (2 * peak - entry - exit) / acceleration + Math.max(0, length - ramps) / peak;
}

/** How far such a move has come after `seconds`; never runs backwards, and is the whole length at its end. */
export function travelled(seconds: number, total: number, length: number, entry: number, peak: number, exit: number, acceleration: number): number {
  if (seconds <= 0 && total > 0) return 0;
  if (seconds >= total) return length;
  if (acceleration === Infinity) return Math.min(length, peak * seconds);
  const rising = (peak - entry) / acceleration;
  const risen = (peak * peak - entry * entry) / (2 * acceleration);
  if (seconds < rising) return Math.min(length, risen, seconds * (entry + (acceleration * seconds) / 2));
  const falling = (peak - exit) / acceleration;
  const fallen = length - (peak * peak - exit * exit) / (2 * acceleration);
  const left = total - seconds;
  // The last leg is counted from its end, so that it arrives there exactly.
  if (left < falling) return Math.max(risen, fallen, length - left * (exit + (acceleration * left) / 2));
  return Math.min(Math.max(risen, fallen), risen + peak * (seconds - rising));
}
