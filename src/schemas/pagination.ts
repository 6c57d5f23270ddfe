import { z } from 'zod';

/** Lists answer at most this many rows a page: enough for the whole store in one request, small enough to stay quick. */
export const pageLimitMax = 200;

export const paginationQueryShape = {
  limit: z.coerce.number().int().min(1).max(pageLimitMax).default(50),
  cursor: z.string().max(400).optional(),
};

export interface Page<Item> {
  readonly items: readonly Item[];
  readonly next_cursor: string | null;
}
