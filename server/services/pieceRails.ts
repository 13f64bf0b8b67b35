import { and, eq, isNull } from 'drizzle-orm';
import { canonical } from '#shared/piece/stale';
import { railRequests } from '#shared/commission/railsOfPiece';
import { plannedDays, scheduleOf } from '#shared/commission/schedule';
import { workSchema } from '#shared/commission/work';
import { railSchema } from '#shared/shop/rail';
import { type SlotRequest, type SlotRequestInput, slotRequestSchema } from '#shared/slot/request';
import { type Write, allOrNothing } from '../db/client';
import { railRevisions, rails } from '../db/schema';
import { useDatabase } from '../db/shop';
import { problem } from '../utils/problem';
import { newestWork } from './commissions';
import { type Actor, deed } from './deeds';
import { made } from './pieceRevisions';
import { newRail, newRevision, railAway } from './rails';

interface Drawn {
  readonly input: SlotRequestInput;
  readonly slot: SlotRequest;
}

/** A piece's rail as the shop drew it on: sizes are the piece's, bit and feeds stay what the rail had where they still go. */
function drawnOn(kept: SlotRequestInput | undefined, fresh: SlotRequestInput, label: string): Drawn {
  const { bitDiameter: _bit, stepdown: _step, ...sizes } = fresh;
  for (const input of [...(kept?.units === fresh.units ? [{ ...kept, ...sizes, name: kept.name ?? sizes.name }] : []), fresh]) {
    const judged = slotRequestSchema.safeParse(input);
    if (judged.success) return { input, slot: judged.data };
  }
  const judged = slotRequestSchema.safeParse(fresh);
  const errors = judged.error?.issues.map(({ path, message }) => ({ path: `rail ${label}.${path.join('.')}`, message })) ?? [];
  throw problem(422, `Rail ${label} cannot be drawn so. ${errors[0]?.message ?? ''}`.trim(), { errors });
}

/** The same slot as another's. */
const same = (kept: SlotRequestInput, slot: SlotRequest) => {
  const judged = slotRequestSchema.safeParse(kept);
  return judged.success && canonical(JSON.parse(JSON.stringify(judged.data.spec))) === canonical(JSON.parse(JSON.stringify(slot.spec)));
};

/**
 * Makes a piece's rails, or revises them: all or none. A rail that is drawn so already stays as it is, its program and
 * its cuts with it; one that the piece no longer has is put away.
 *
 * @returns null where the work was saved again since revision `revision`.
 */
export async function makeRails(by: Actor, commission: { readonly id: string; readonly name: string; readonly due: string | null }, revision: number, today: string) {
  const database = useDatabase();
  const newest = await newestWork(by.shopId, commission.id);
  if (!newest || newest.number !== revision) return null;
  const work = workSchema.parse(newest.work);
  const schedule = scheduleOf(work, commission.due, today);
  const due = commission.due && schedule ? plannedDays(work, schedule, commission.due).cutting ?? null : null;
  const there = await database.select({ id: rails.id, name: rails.name, label: rails.label, revision: rails.revision, request: railRevisions.request })
    .from(rails).innerJoin(railRevisions, and(eq(railRevisions.railId, rails.id), eq(railRevisions.number, rails.revision)))
    .where(and(eq(rails.shopId, by.shopId), eq(rails.commissionId, commission.id), isNull(rails.archivedAt)));
  const wanted = railRequests(work, commission.name);
  const count = { drawn: 0, revised: 0, kept: 0, away: 0 };
  const writes = wanted.flatMap(({ label, request: fresh }): readonly Write[] => {
    const kept = there.find((rail) => rail.label === label);
    const drawn = drawnOn(kept?.request, fresh, label);
    if (!kept) {
      count.drawn++;
      return newRail(by, railSchema.parse({ request: drawn.input, due }), { commissionId: commission.id, label }).writes;
    }
    if (same(kept.request, drawn.slot)) {
      count.kept++;
      return [];
    }
    count.revised++;
    return newRevision(by, kept.id, kept.revision + 1, { draft: '', request: drawn, note: `From revision ${revision} of the piece.` });
  });
  const gone = there.filter(({ label }) => wanted.every((rail) => rail.label !== label));
  count.away = gone.length;
  await allOrNothing(database, [...writes, ...gone.flatMap((rail) => railAway(by, rail)), made(by, commission.id, 'rails', revision), deed(by, 'made the rails of commission', commission.name)]);
  return count;
}
