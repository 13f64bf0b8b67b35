import { z } from 'zod';
import { objectError } from '../measure/messages';

/** Rows of one page of a list. */
export const PAGE_ROWS = 50;
const MOST_ROWS = 200;

/**
 * What every list takes from its address: search, order, filter, and where the page begins. Pages follow one another by
 * `after`, what the last one gave as `next`: counting rows, or skipping them, would take longer in a longer list.
 */
export const listQuerySchema = z.strictObject({
  /** Names and marks that begin so. */
  q: z.string().trim().max(80, { error: 'Search for 80 characters or fewer.' }).default(''),
  sort: z.string().max(40).optional(),
  order: z.enum(['asc', 'desc'], { error: 'Use asc or desc.' }).optional(),
  status: z.string().max(40).optional(),
  after: z.string().max(400).optional(),
  limit: z.coerce.number().int().min(1).max(MOST_ROWS, { error: `Ask for ${MOST_ROWS} rows or fewer.` }).default(PAGE_ROWS),
  /** csv: every row, as a file. */
  format: z.enum(['json', 'csv'], { error: 'Use json or csv.' }).default('json'),
}, { error: objectError('q, sort, order, status, after, limit and format') });

export type ListQuery = z.output<typeof listQuerySchema>;
