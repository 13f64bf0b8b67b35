import { inject } from 'vitest';

/** The README's rail, in numbers: a spec that makes a program. */
export const RAIL = {
  units: 'in', name: 'Rail A', wood: 'white-oak',
  length: 24.5, width: 0.375, depth: 0.1875, stopMargin: 0.875, railWidth: 1.25, railThickness: 0.75,
  bitDiameter: 0.25, stepdown: 0.09375, spindleSpeed: 16000, feed: 100, plungeFeed: 25,
} as const;

/** A spec that may be made but not handed out: a hole as long as it is wide leaves no room to ramp, and the bit cannot plunge. */
export const NEEDS_A_PLUNGE = { ...RAIL, length: 0.25, width: 0.25, bitDiameter: 0.25, centreCutting: false } as const;

export interface ProblemBody {
  readonly type: string;
  readonly title: string;
  readonly status: number;
  readonly detail: string;
  readonly errors?: readonly { readonly path: string; readonly message: string }[];
  readonly readback?: { readonly verdict: string; readonly findings: readonly { readonly rule: string; readonly severity: string }[] };
}

export interface ProgramBody {
  readonly program: string;
  readonly fileName: string;
  readonly mark: string;
  readonly sha256: string;
  readonly spec: Readonly<Record<string, unknown>>;
  readonly summary: { readonly assumed: readonly string[] };
  readonly readback: { readonly verdict: string };
}

export const url = (path: string) => `${inject('baseUrl')}${path}`;

/** Posts a body as it is; text stays text, anything else becomes JSON. */
export function post(body: unknown, headers: Readonly<Record<string, string>> = {}, to = url('/api/programs')): Promise<Response> {
  return fetch(to, {
    method: 'POST',
    headers: { 'content-type': 'application/json', ...headers },
    body: typeof body === 'string' ? body : JSON.stringify(body),
  });
}

/** The answer as a problem, its form checked: every error under /api has it. */
export async function problemOf(response: Response): Promise<ProblemBody> {
  const type = response.headers.get('content-type');
  if (type !== 'application/problem+json') throw new Error(`Not a problem: ${response.status} ${type}: ${(await response.text()).slice(0, 200)}`);
  const body = await response.json() as ProblemBody;
  if (body.status !== response.status || body.type !== 'about:blank' || !body.title || !body.detail) throw new Error(`A problem without its parts: ${JSON.stringify(body)}`);
  return body;
}
