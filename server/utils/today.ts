/** Today's date in universal time, `2026-12-18`. */
export const today = (): string => new Date().toISOString().slice(0, 10);
