import type { SlotRequestInput } from '#shared/slot/request';
import type { RailStatus } from '#shared/shop/railStatus';

/** A rail as the shop's page shows it. */
export interface ShopRail {
  readonly id: string;
  readonly name: string;
  readonly status: RailStatus;
  readonly revision: number;
  readonly quantity: number;
  readonly due: string | null;
  readonly cutWell: number;
  readonly draft: string;
  readonly request: SlotRequestInput;
  readonly programs: readonly { readonly id: string; readonly mark: string; readonly revision: number; readonly madeBy: string; readonly madeAt: string }[];
  readonly cuts: readonly { readonly id: string; readonly mark: string; readonly by: string; readonly outcome: 'well' | 'spoiled'; readonly reason: string; readonly cutAt: string }[];
}

export interface Revision {
  readonly number: number;
  readonly draft: string;
  readonly request: SlotRequestInput;
  readonly note: string;
  readonly savedBy: string;
  readonly savedAt: string;
}

/** The drawing that a revision keeps: as it was typed, or from its request where no page typed it. */
export const draftOfRevision = ({ draft, request }: Pick<Revision, 'draft' | 'request'>) => (draft && draftFrom(`#${draft}`)) || draftOfRequest(request);

/** One rail of the shop: put on the page's drawing, and saved from it as its next revision. */
export async function useShopRail(id: string) {
  const slot = useSlotStore();
  // Both before the first wait: after it Nuxt no longer knows which page asks.
  const [{ data: rail, refresh, error }, { data: history, refresh: refreshHistory }] = await Promise.all([
    useFetch<ShopRail>(`/api/rails/${id}`),
    useFetch<{ readonly revisions: readonly Revision[] }>(`/api/rails/${id}/revisions`),
  ]);
  if (error.value) throw createError({ status: error.value.status ?? 500, statusText: 'No such rail', fatal: true });

  const kept = computed(() => (rail.value ? linkOf(draftOfRevision(rail.value)) : ''));
  /** What is on the page is not what is kept. */
  const changed = computed(() => rail.value !== undefined && linkOf(slot.draft) !== kept.value);
  if (rail.value) slot.load(draftOfRevision(rail.value));

  const failure = ref('');
  const busy = ref(false);
  async function act(work: () => Promise<unknown>): Promise<boolean> {
    if (busy.value) return false;
    [busy.value, failure.value] = [true, ''];
    try {
      await work();
      await Promise.all([refresh(), refreshHistory()]);
      return true;
    } catch (refusal) {
      const { detail = '', errors = [] } = problemOf(refusal);
      failure.value = [detail, ...errors.map(({ message }) => message)].join(' ');
      return false;
    } finally {
      busy.value = false;
    }
  }
  const save = (note: string) => act(() => call(`/api/rails/${id}`, { method: 'PUT', body: { draft: linkOf(slot.draft).slice(1), request: slot.raw, note, basedOn: rail.value?.revision ?? 0 } }));
  return { rail, revisions: computed(() => history.value?.revisions ?? []), changed, failure, busy, act, save };
}
