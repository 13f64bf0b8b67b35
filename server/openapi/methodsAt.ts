import { openApiDocument } from './document';

/** Routes that are nobody's to call: the session module's, and the one the benches compare with. */
const UNDESCRIBED = {
  '/api/_auth/session': { get: true, delete: true },
  '/api/bench/empty': { post: true },
} as const;

const methods = new Map(Object.entries({ ...openApiDocument.paths, ...UNDESCRIBED }).map(([path, operations]) => {
  const described = Object.keys(operations).map((method) => method.toUpperCase());
  return [path.split('/'), [...described, ...(described.includes('GET') ? ['HEAD'] : []), 'OPTIONS'].sort()];
}));

/** The methods an address takes, by the API's own description; none where nothing is there. */
export function methodsAt(address: string): readonly string[] {
  const parts = address.replace(/\/$/, '').split('/');
  for (const [path, allowed] of methods) {
    if (path.length === parts.length && path.every((part, i) => part.startsWith('{') || part === parts[i])) return allowed;
  }
  return [];
}
