import type { Segments } from '#shared/playback/index';

/** Lines as the graphics card takes them: one entry for each piece. */
export interface PackedLines {
  readonly count: number;
  /** Three numbers each. */
  readonly from: Float32Array<ArrayBuffer>;
  readonly to: Float32Array<ArrayBuffer>;
  /** Two numbers each: travel at its ends. */
  readonly travel: Float32Array<ArrayBuffer>;
  /** 1 for a rapid, -1 for a finish lap, 0 for any other cut. */
  readonly kind: Float32Array<ArrayBuffer>;
}

/**
 * Cuts long pieces up and packs them. A line that runs the length of the rail is a sliver thousands of times longer than
 * wide, and in a near view the card's depth along such a one is off by more than the line lies over the wood.
 */
export function packLines({ count, ends, travel, rapid, finish }: Segments, longest: number): PackedLines {
  const parts = new Int32Array(count);
  let total = 0;
  for (let i = 0; i < count; i++) {
    const [ax = 0, ay = 0, az = 0, bx = 0, by = 0, bz = 0] = ends.subarray(i * 6, i * 6 + 6);
    total += parts[i] = Math.max(1, Math.ceil(Math.hypot(bx - ax, by - ay, bz - az) / longest));
  }
  const packed = { count: total, from: new Float32Array(total * 3), to: new Float32Array(total * 3), travel: new Float32Array(total * 2), kind: new Float32Array(total) };
  let at = 0;
  for (let i = 0; i < count; i++) {
    const n = parts[i] ?? 1;
    const between = (of: Float64Array, first: number, step: number, share: number) => (of[first] ?? 0) + ((of[first + step] ?? 0) - (of[first] ?? 0)) * share;
    for (let part = 0; part < n; part++, at++) {
      for (let k = 0; k < 3; k++) {
        packed.from[at * 3 + k] = between(ends, i * 6 + k, 3, part / n);
        packed.to[at * 3 + k] = between(ends, i * 6 + k, 3, (part + 1) / n);
      }
      packed.travel[at * 2] = between(travel, i * 2, 1, part / n);
      packed.travel[at * 2 + 1] = between(travel, i * 2, 1, (part + 1) / n);
      packed.kind[at] = (rapid[i] ?? 0) - (finish?.[i] ?? 0);
    }
  }
  return packed;
}
