/** What a person reads when a passkey did not work: they often just closed the browser's own window. */
export function passkeyTrouble(error: unknown): string {
  if (error instanceof Error && (error.name === 'NotAllowedError' || error.name === 'AbortError')) return 'The passkey was not used. Try again, or sign in with the password.';
  if (error instanceof Error && error.name === 'InvalidStateError') return 'This device already has a passkey here.';
  return problemOf(error).detail ?? '';
}
