import type { LocationQueryRaw, LocationQueryValue } from 'vue-router';

/** Cursors kept in the address, so that it stays short: as many pages can be gone back one by one. */
const KEPT = 8;

const one = (value: LocationQueryValue | LocationQueryValue[] | undefined): string => [value].flat()[0] ?? '';

/**
 * Where a reader stands in a list, kept in the page's address: what is searched for, in which order, on which page.
 * `after` stands there once for each page gone through, the newest last.
 */
export function useListPlace() {
  const route = useRoute();
  const trail = computed(() => [route.query.after ?? []].flat().filter((cursor) => cursor !== null));
  const place = computed(() => ({
    q: one(route.query.q), sort: one(route.query.sort), order: one(route.query.order), status: one(route.query.status),
    page: Math.max(1, Math.trunc(Number(one(route.query.page))) || 1),
  }));
  /** The address with something changed; blanks fall out, and whatever changes the rows begins at the first page. */
  const withChange = (change: LocationQueryRaw, keepsPage = false): { readonly query: LocationQueryRaw } => {
    const all = { ...route.query, ...(keepsPage ? {} : { after: undefined, page: undefined }), ...change };
    return { query: Object.fromEntries(Object.entries(all).filter(([, value]) => value !== '' && value !== undefined && value !== null)) };
  };
  /** What the route is asked: nothing that is blank. */
  const asked = computed(() => {
    const { q, sort, order, status } = place.value;
    return Object.fromEntries(Object.entries({ q, sort, order, status }).filter(([, value]) => value !== ''));
  });
  const query = computed(() => ({ ...asked.value, ...(trail.value.length > 0 && { after: trail.value[trail.value.length - 1] }) }));

  const first = computed(() => withChange({}));
  const nextPage = (next: string) => withChange({ after: [...trail.value, next].slice(-KEPT), page: place.value.page + 1 }, true);
  /** Null where there is none before, or where the address no longer knows it. */
  const previous = computed(() => {
    const { page } = place.value;
    if (page === 2) return first.value;
    return page > 2 && trail.value.length > 1 ? withChange({ after: trail.value.slice(0, -1), page: page - 1 }, true) : null;
  });
  return { place, asked, query, withChange, first, nextPage, previous };
}
