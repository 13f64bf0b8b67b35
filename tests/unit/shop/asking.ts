import type { z } from 'zod';

/** What a schema says against a raw value: path and message of every problem. */
export function said(schema: z.ZodType, raw: unknown): { path: string; message: string }[] {
  const parsed = schema.safeParse(raw);
  return parsed.success ? [] : parsed.error.issues.map(({ path, message }) => ({ path: path.join('.'), message }));
}

/** One rule of refusal: what fires it, what its message names, and a neighbour that is fine. */
export interface Refusal {
  readonly rule: string;
  readonly path: string;
  readonly bad: object;
  readonly names: readonly string[];
  readonly good: object;
}

/** PRODUCT, demo scenario: a 32 × 32 × 4 in router table. */
export const TABLE = {
  units: 'in', name: 'Router table', workArea: { x: 32, y: 32, z: 4 }, topFeed: { x: 200, y: 200, z: 100 }, acceleration: 20,
  spindleRange: [8000, 24000], spindle: 'program',
  holdings: [{ kind: 'end clamps', height: '1/2', reach: '1/2' }, { kind: 'side vise', widest: 4, height: 0, reach: 0 }],
} as const;

/** PRODUCT, demo scenario: 1/4 in, 2 flutes. */
export const QUARTER = {
  units: 'in', name: '1/4 two-flute', diameter: '1/4', flutes: 2, cuttingLength: '3/4', kind: 'upcut', colletDiameter: '1 1/4', stickout: '1 1/4', centreCutting: true,
} as const;
