import { createHash, randomBytes } from 'node:crypto';

/** An id that nobody can guess or count through. */
export const newId = (): string => randomBytes(12).toString('base64url');

/** A secret for a link; only its hash is kept. */
export const newSecret = (): string => randomBytes(32).toString('base64url');
export const hashOf = (secret: string): string => createHash('sha256').update(secret).digest('hex');
