import { type SlotRequest, slotRequestSchema } from '#shared/slot/request';

/** Rail A: 26 1/4 × 1 1/4 × 3/4 in, a groove 3/8 wide and 3/16 deep. Nothing is wrong with it. */
export const RAIL_A = {
  units: 'in', length: 24.5, width: 0.375, depth: 0.1875, stopMargin: 0.875, bitDiameter: 0.25, stepdown: 0.09375, railWidth: 1.25,
} as const;

/** The same kind of rail on a metric drawing. */
export const RAIL_MM = {
  units: 'mm', length: 600, width: 9, depth: 5, stopMargin: 20, bitDiameter: 6, stepdown: 2.5, railWidth: 30,
} as const;

/** The request that a raw spec becomes; a spec that is refused is a mistake of the test's. */
export function asked(raw: object): SlotRequest {
  const parsed = slotRequestSchema.safeParse(raw);
  if (!parsed.success) throw new Error(`refused: ${parsed.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`).join(' ')}`);
  return parsed.data;
}

/** What is said against a raw value: path and message of every problem. */
export function refusals(raw: unknown): { path: string; message: string }[] {
  const parsed = slotRequestSchema.safeParse(raw);
  return parsed.success ? [] : parsed.error.issues.map(({ path, message }) => ({ path: path.join('.'), message }));
}
