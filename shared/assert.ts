/** Stops on a broken invariant: a bug of ours, never something a person typed. The only `throw` in shared/. */
export function assert(condition: unknown, invariant: string): asserts condition {
  if (!condition) throw new Error(`Broken invariant: ${invariant}`);
}
