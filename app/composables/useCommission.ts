import type { InjectionKey } from 'vue';
import { newWork } from '#shared/commission/newWork';
import { type Work, type WorkInput, workSchema } from '#shared/commission/work';
import type { CommissionAnswer } from '~/utils/commission';

const copy = (work: WorkInput): WorkInput => JSON.parse(JSON.stringify(work));
const MOST_STEPS = 200; // steps back that are kept

/** One commission's record, fetched. Apart from what the page makes of it: after a wait a composable no longer knows its page. */
export async function fetchCommission(id: string) {
  const { data: commission, refresh, error } = await useFetch<CommissionAnswer>(`/api/commissions/${id}`, { deep: false });
  if (error.value || !commission.value) throw createError({ status: error.value?.status ?? 500, statusText: 'No such commission', fatal: true });
  return { commission, first: commission.value, refresh };
}

/** What the page makes of it: the work that is being changed, and what comes of it. */
export function useCommission(id: string, { commission, first, refresh }: Awaited<ReturnType<typeof fetchCommission>>) {
  const draft = ref<WorkInput>(first.work ? copy(first.work) : newWork(first.units, []));
  const judged = computed(() => workSchema.safeParse(draft.value));
  const problems = computed<Readonly<Record<string, string>>>(() =>
    Object.fromEntries((judged.value.success ? [] : judged.value.error.issues).map(({ path, message }) => [path.join('.'), message]).reverse()));
  /** The last work that could be read: the drawing stands while a size is being typed. */
  const work = shallowRef<Work | null>(null);
  watch(judged, ({ success, data }) => { if (success) work.value = data; }, { immediate: true });
  const { worked, drawn, standing, busy: working } = usePieceWorker(work);

  // Every change is a step; typing in one box is one.
  const [past, future] = [ref<string[]>([]), ref<string[]>([])];
  let typing = '';
  function edit(change: (draft: WorkInput) => void, box = ''): void {
    if (box === '' || box !== typing) past.value = [...past.value, JSON.stringify(draft.value)].slice(-MOST_STEPS);
    typing = box;
    future.value = [];
    const next = copy(draft.value);
    change(next);
    draft.value = next;
  }
  function step(from: Ref<string[]>, to: Ref<string[]>): void {
    const last = from.value.at(-1);
    if (last === undefined) return;
    to.value = [...to.value, JSON.stringify(draft.value)];
    from.value = from.value.slice(0, -1);
    draft.value = JSON.parse(last);
    typing = '';
  }
  const undo = () => step(past, future);
  const redo = () => step(future, past);

  const changed = computed(() => (commission.value?.work ? JSON.stringify(draft.value) !== JSON.stringify(commission.value.work) : draft.value.tally.kinds.length > 0));
  const [failure, busy, conflict] = [ref(''), ref(false), ref(false)];
  async function act(request: () => Promise<unknown>): Promise<boolean> {
    if (busy.value) return false;
    [busy.value, failure.value] = [true, ''];
    try {
      await request();
      await refresh();
      return true;
    } catch (refusal) {
      const { detail = '', errors = [] } = problemOf(refusal);
      conflict.value = isConflict(refusal);
      failure.value = [detail, ...errors.map(({ message }) => message)].join(' ');
      return false;
    } finally {
      busy.value = false;
    }
  }
  const at = (rest: string) => `/api/commissions/${id}${rest}`;
  const basedOn = ref(first.revision);
  async function save(): Promise<boolean> {
    const ok = await act(() => call(at('/revisions'), { method: 'POST', body: { work: draft.value, basedOn: basedOn.value } }));
    if (ok) [basedOn.value, conflict.value] = [commission.value?.revision ?? 0, false];
    return ok;
  }
  /** After a conflict: takes what the other saved, or goes on from it with what stands here. */
  async function meet(keepMine: boolean): Promise<void> {
    await refresh();
    basedOn.value = commission.value?.revision ?? 0;
    [conflict.value, failure.value] = [false, ''];
    if (!keepMine && commission.value?.work) edit((next) => Object.assign(next, copy(commission.value?.work ?? next)));
  }
  const makeRails = () => act(() => call(at('/rails'), { method: 'POST', body: { revision: commission.value?.revision ?? 0 } }));
  const patch = (body: object) => act(() => call(at(''), { method: 'PATCH', body }));
  const takeStep = (made: 'cutList' | 'assembly') => act(() => call(at('/made'), { method: 'POST', body: { step: made } }));
  const tick = (name: string, done: boolean) => act(() => call(at('/ticks'), { method: 'POST', body: { step: name, done } }));

  const { announce } = useSaying();
  watch(() => worked.value, (now) => {
    if (!now?.arranged.ok) return;
    const left = now.arranged.arrangement.assignment.unplaced.reduce((sum, { count, toCome }) => sum + count + toCome, 0);
    announce(left === 0 ? 'Every coin has its place.' : `${left} without a place.`);
  });
  const isOwner = useIsOwner();
  return { id, commission, draft, problems, work, worked, drawn, standing, working, edit, undo, redo, past, future, changed, failure, busy, conflict, act, save, meet, makeRails, patch, takeStep, tick, isOwner };
}

const isConflict = (error: unknown) => typeof error === 'object' && error !== null && 'status' in error && error.status === 409;

export type CommissionPage = ReturnType<typeof useCommission>;
export const COMMISSION: InjectionKey<CommissionPage> = Symbol('commission');

/** The commission of the page around. */
export function useThisCommission(): CommissionPage {
  const page = inject(COMMISSION);
  if (!page) throw new Error('A commission\'s part stands outside its page.');
  return page;
}
