/** An id for a cut, made here so that a cut sent twice is logged once. Over plain HTTP there is no crypto.randomUUID. */
export function newCutId(): string {
  const bytes = crypto.getRandomValues(new Uint8Array(18));
  return btoa(String.fromCharCode(...bytes)).replaceAll('+', '-').replaceAll('/', '_');
}
