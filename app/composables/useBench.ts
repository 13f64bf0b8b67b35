import { FetchError } from 'ofetch';
import type { BenchDay } from '#shared/shop/bench';
import type { CutInput } from '#shared/shop/cut';
import { type Sent, judgeStatus, sendLogs, withLogs } from '~/bench/outbox';
import { type QueuedLog, openStore } from '~/bench/store';

/** Sending goes on in one tab at a time, and in each only once. */
async function alone<Result>(act: () => Promise<Result>): Promise<Result> {
  return 'locks' in navigator ? await navigator.locks.request('tallyrail-bench-logs', act) : await act();
}

async function send(cut: CutInput): Promise<Sent> {
  try {
    await call('/api/cuts', { method: 'POST', body: cut });
    return { kind: 'taken' };
  } catch (error) {
    if (!(error instanceof FetchError)) throw error;
    const { detail = '', errors = [] } = problemOf(error);
    return error.status === undefined ? { kind: 'later' } : judgeStatus(error.status, errors[0]?.message ?? detail);
  }
}

/**
 * The day at the bench: the shop's where there is a network, else as this tablet kept it. A cut is written into the
 * tablet's own store first and sent from there, so that no network and no closed page loses one.
 */
export function useBench() {
  const { account, refresh: refreshAccount } = useAccount();
  const fetched = useState<BenchDay | null>('bench-day', () => null);
  const asOf = useState<string | null>('bench-as-of', () => null);
  const offline = useState('bench-offline', () => false);
  const logs = useState<readonly QueuedLog[]>('bench-logs', () => []);
  const problem = useState('bench-problem', () => '');
  const store = openStore();

  const mine = computed(() => logs.value.filter(({ personId }) => personId === account.value?.person?.id));
  const day = computed(() => fetched.value && withLogs(fetched.value, mine.value));
  const waiting = computed(() => mine.value.filter(({ refused }) => refused === null));
  const refused = computed(() => mine.value.filter((log) => log.refused !== null));

  async function readLogs(): Promise<void> {
    logs.value = await store.logs();
  }
  /** Sends what is kept, then fetches the day anew; without a network shows the kept one. */
  async function refresh(): Promise<void> {
    const person = account.value?.person;
    if (!person) return;
    try {
      await alone(() => sendLogs(store, person.id, send));
      const today = await call<BenchDay>('/api/bench/today');
      const now = new Date().toISOString();
      const { id, name, role, shop } = person;
      await store.keepDay({ person: { id, name, role, shop, demo: account.value?.demo ?? false }, asOf: now, day: today });
      noteKeptFor(id);
      [fetched.value, asOf.value, offline.value, problem.value] = [today, now, false, ''];
    } catch (error) {
      await fallBack(error, person.id);
    }
    await readLogs();
  }
  async function fallBack(error: unknown, personId: string): Promise<void> {
    if (isUnreachable(error)) {
      const kept = await store.readDay();
      offline.value = true;
      if (kept?.person.id === personId) [fetched.value, asOf.value] = [kept.day, kept.asOf];
      return;
    }
    const { detail = '' } = problemOf(error);
    problem.value = detail;
    if (error instanceof FetchError && error.status === 401) {
      fetched.value = null;
      await refreshAccount();
      await navigateTo({ path: '/sign-in', query: { to: '/bench' } });
    }
  }
  /** Keeps a cut on the tablet, then sends it if it can. */
  async function log(cut: CutInput): Promise<void> {
    const person = account.value?.person;
    if (!person) return;
    await store.addLog({ personId: person.id, cut, refused: null });
    await readLogs();
    await refresh();
  }
  /** Takes a refused log away, once its words were read. */
  async function drop(number: number | undefined): Promise<void> {
    if (number !== undefined) await store.dropLog(number);
    await readLogs();
  }
  /** Signs out: what was kept is forgotten at once, the session ends now or as soon as there is a network. */
  async function leave(): Promise<void> {
    [fetched.value, asOf.value, logs.value] = [null, null, []];
    noteLeaving(true);
    await forgetDay();
    try {
      await call('/api/account/sign-out', { method: 'POST' });
    } catch (error) {
      if (!isUnreachable(error)) throw error;
      offline.value = true;
      if (account.value) account.value = { ...account.value, person: null };
      return;
    }
    noteLeaving(false);
    await refreshAccount();
    await navigateTo('/sign-in');
  }
  return { day, asOf, offline, problem, waiting, refused, refresh, log, drop, leave };
}
