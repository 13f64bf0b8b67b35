/** A rail is drawn, then has a program of its newest revision, then is cut as often as wanted. */
export const RAIL_STATUSES = ['draft', 'ready', 'cut'] as const;
export type RailStatus = (typeof RAIL_STATUSES)[number];
