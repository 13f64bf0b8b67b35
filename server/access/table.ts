import type { Role } from '#shared/types/people';

/** Whoever has not signed in. */
export type Anyone = 'visitor';

const EVERYONE = ['visitor', 'owner', 'hand', 'customer'] as const;
const SIGNED_IN = ['owner', 'hand', 'customer'] as const;
const SHOP = ['owner', 'hand'] as const;
const OWNER = ['owner'] as const;

/**
 * Every route of the API and who may call it: the one place where roles are held. What is not here does not exist.
 * Whose rows a caller sees is the services' affair: each takes the shop's id in its WHERE.
 */
export const ROUTES = {
  'POST /api/programs': EVERYONE,
  'GET /api/programs/{mark}': EVERYONE,
  'GET /api/openapi.json': EVERYONE,
  'POST /api/bench/empty': EVERYONE,
  'GET /api/_auth/session': EVERYONE,
  'DELETE /api/_auth/session': EVERYONE,

  'POST /api/account/sign-up': EVERYONE,
  'POST /api/account/confirm': EVERYONE,
  'POST /api/account/sign-in': EVERYONE,
  'POST /api/account/sign-out': EVERYONE,
  'POST /api/account/forgot': EVERYONE,
  'POST /api/account/reset': EVERYONE,
  'POST /api/account/join': EVERYONE,
  'POST /api/account/passkey': EVERYONE,
  'GET /api/account': EVERYONE,
  'POST /api/account/sign-out-everywhere': SIGNED_IN,
  'POST /api/account/password': SIGNED_IN,
  'GET /api/account/passkeys': SIGNED_IN,
  'POST /api/account/passkeys': SIGNED_IN,
  'DELETE /api/account/passkeys/{id}': SIGNED_IN,

  'GET /api/people': OWNER,
  'POST /api/people': OWNER,
  'PATCH /api/people/{id}': OWNER,
  'DELETE /api/people/{id}': OWNER,
  'POST /api/people/{id}/owner': OWNER,

  'GET /api/machines': SHOP,
  'POST /api/machines': OWNER,
  'GET /api/machines/{id}': SHOP,
  'PUT /api/machines/{id}': OWNER,
  'DELETE /api/machines/{id}': OWNER,
  'GET /api/bits': SHOP,
  'POST /api/bits': OWNER,
  'GET /api/bits/{id}': SHOP,
  'PUT /api/bits/{id}': OWNER,
  'DELETE /api/bits/{id}': OWNER,
  'POST /api/bits/{id}/replace': OWNER,
  'GET /api/bits/{id}/correction': SHOP,
  'POST /api/bits/{id}/correction': OWNER,
  'GET /api/woods': SHOP,
  'POST /api/woods': OWNER,
  'GET /api/woods/{id}': SHOP,
  'PUT /api/woods/{id}': OWNER,
  'DELETE /api/woods/{id}': OWNER,

  'GET /api/commissions': SHOP,
  'POST /api/commissions': OWNER,
  'GET /api/commissions/{id}': SHOP,
  'PATCH /api/commissions/{id}': OWNER,
  'DELETE /api/commissions/{id}': OWNER,
  'GET /api/commissions/{id}/revisions': SHOP,
  'POST /api/commissions/{id}/revisions': OWNER,
  'POST /api/commissions/{id}/rails': OWNER,
  'GET /api/commissions/{id}/stale': SHOP,
  'POST /api/commissions/{id}/made': SHOP,
  'POST /api/commissions/{id}/ticks': SHOP,
  'GET /api/rails': SHOP,
  'POST /api/rails': OWNER,
  'GET /api/rails/{id}': SHOP,
  'PUT /api/rails/{id}': OWNER,
  'PATCH /api/rails/{id}': OWNER,
  'DELETE /api/rails/{id}': OWNER,
  'GET /api/rails/{id}/revisions': SHOP,
  'GET /api/rails/{id}/sheet.pdf': SHOP,
  'POST /api/rails/{id}/check': OWNER,
  'POST /api/rails/{id}/programs': OWNER,
  'GET /api/shop/programs': SHOP,
  'GET /api/shop/programs/{id}': SHOP,
  'GET /api/shop/programs/{id}/file': SHOP,
  'GET /api/cuts': SHOP,
  'POST /api/cuts': SHOP,
  'GET /api/bench/today': SHOP,

  'GET /api/shop/deeds': OWNER,
  'GET /api/shop/export': OWNER,
  'GET /api/shop/backup': OWNER,
  'POST /api/shop/restore': OWNER,
  'GET /api/demo/mails': OWNER,
} as const satisfies Readonly<Record<string, readonly (Role | Anyone)[]>>;

export type RouteName = keyof typeof ROUTES;

/** Routes that take no cookie into account: whoever calls them from another site does nothing in anyone's name. */
export const WITHOUT_SESSION: ReadonlySet<string> = new Set<RouteName>([
  'POST /api/programs', 'GET /api/programs/{mark}', 'GET /api/openapi.json', 'POST /api/bench/empty',
]);

interface Route {
  readonly method: string;
  readonly parts: readonly string[];
  readonly name: string;
  readonly who: readonly (Role | Anyone)[];
}

const routes: readonly Route[] = Object.entries(ROUTES).map(([name, who]) => {
  const [method = '', path = ''] = name.split(' ');
  return { method, parts: path.split('/'), name, who };
});

/** The routes at an address: a part in braces is any text, and a part that is written out goes first. */
export function routesAt(address: string): readonly Route[] {
  const parts = address.replace(/\/$/, '').split('/');
  const fits = routes.filter((route) => route.parts.length === parts.length && route.parts.every((part, i) => part.startsWith('{') || part === parts[i]));
  const fixed = (route: Route) => route.parts.filter((part) => !part.startsWith('{')).length;
  const most = Math.max(0, ...fits.map(fixed));
  return fits.filter((route) => fixed(route) === most);
}

/** The methods of some routes, and those that follow from them. */
export function methodsOf(found: readonly Route[]): readonly string[] {
  if (found.length === 0) return [];
  const named = found.map(({ method }) => method);
  return [...named, ...(named.includes('GET') ? ['HEAD'] : []), 'OPTIONS'].sort();
}
