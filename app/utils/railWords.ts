import type { RailStatus } from '#shared/shop/railStatus';

/** A rail's status in words. */
export const RAIL_STATUS_WORDS: Readonly<Record<RailStatus, string>> = { draft: 'draft, no program yet', ready: 'ready to cut', cut: 'cut' };
