/** The message of an object schema: names a key that it does not know, or says what to give instead of something else. */
export function objectError(what: string) {
  return (issue: { readonly code: string; readonly keys?: readonly string[] | undefined }): string =>
    issue.code === 'unrecognized_keys'
      ? `There is no field called ${(issue.keys ?? []).map((key) => `"${key.slice(0, 40)}"`).join(', ')}. Check its spelling.`
      : `Give ${what}.`;
}

export const capital = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1);

/** What a message quotes of a value that cannot be used; long texts are cut. */
export function quote(value: unknown): string {
  if (typeof value === 'string') return `"${value.slice(0, 40)}"`;
  if (Array.isArray(value)) return 'a list';
  return typeof value === 'object' && value !== null ? 'an object' : String(value);
}

// eslint-disable-next-line no-control-regex -- refusing control characters is what this is for
export const CONTROL = /[\u0000-\u001f\u007f-\u009f\u2028\u2029]/;
