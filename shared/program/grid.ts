import type { Units } from '../measure/units';

/** One step of the last decimal written: four decimals in inches, three in millimetres. */
export const GRID: Readonly<Record<Units, number>> = { in: 1e-4, mm: 1e-3 };
