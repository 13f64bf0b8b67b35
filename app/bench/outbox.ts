import type { BenchCut, BenchDay } from '#shared/shop/bench';
import type { CutInput } from '#shared/shop/cut';
import type { BenchStore, QueuedLog } from './store';

/** What became of one sending: taken, refused for good with the shop's words, or to be tried again later. */
export type Sent = { readonly kind: 'taken' } | { readonly kind: 'refused'; readonly words: string } | { readonly kind: 'later' };

/**
 * Sends one person's logged cuts in the order they were logged, each until it is taken. One that is refused is kept
 * with the shop's words and does not hold up the rest; the first that cannot be sent now ends the round. Sent twice
 * after a lost answer, a cut is still logged once: it bears its own id.
 *
 * @returns whether something was taken.
 */
export async function sendLogs(store: BenchStore, personId: string, send: (cut: CutInput) => Promise<Sent>): Promise<boolean> {
  let taken = false;
  for (const log of await store.logs()) {
    if (log.personId !== personId || log.refused !== null || log.number === undefined) continue;
    const answer = await send(log.cut);
    if (answer.kind === 'later') break;
    if (answer.kind === 'refused') await store.changeLog({ ...log, refused: answer.words });
    else {
      await store.dropLog(log.number);
      taken = true;
    }
  }
  return taken;
}

/** What an answer's status means for a logged cut: 4xx will not change by trying again, except these. */
export function judgeStatus(status: number, words: string): Sent {
  const later = status >= 500 || [401, 403, 408, 425, 429].includes(status);
  return later ? { kind: 'later' } : { kind: 'refused', words };
}

/** The day with what was logged since and has not reached the shop: rails that are cut leave the queue at once. */
export function withLogs(day: BenchDay, logs: readonly QueuedLog[]): BenchDay {
  const known = new Set(day.cuts.map(({ id }) => id));
  const fresh = logs.filter(({ cut, refused }) => refused === null && !known.has(cut.id));
  if (fresh.length === 0) return day;
  const cuts = fresh.flatMap(({ cut }): BenchCut[] => {
    const rail = day.rails.find(({ program }) => program.id === cut.programId);
    if (!rail) return [];
    const { id, outcome, reason = '', cutAt } = cut;
    return [{ id, railId: rail.id, rail: rail.name, mark: rail.program.mark, outcome, reason, cutAt, spec: rail.program.spec }];
  });
  const count = (railId: string, outcome: BenchCut['outcome']) => cuts.filter((cut) => cut.railId === railId && cut.outcome === outcome).length;
  const rails = day.rails
    .map((rail) => ({ ...rail, cutWell: rail.cutWell + count(rail.id, 'well'), spoiled: rail.spoiled + count(rail.id, 'spoiled') }))
    .filter(({ cutWell, quantity }) => cutWell < quantity);
  return { ...day, rails, cuts: [...day.cuts, ...cuts] };
}
