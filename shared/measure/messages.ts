/** The message of an object schema: names a key that it does not know, or says what to give instead of something else. */
export function objectError(what: string) {
  return (issue: { readonly code: string; readonly keys?: readonly string[] | undefined }): string =>
    issue.code === 'unrecognized_keys'
      ? `There is no field called ${(issue.keys ?? []).map((key) => `"${key.slice(0, 40)}"`).join(', ')}. Check its spelling.`
      : `Give ${what}.`;
}
