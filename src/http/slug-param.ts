import type { ApiContext } from '#src/http/api-context.ts';
import { AppError } from '#src/lib/errors.ts';
import { materialSlugSchema } from '#src/schemas/material.ts';

/**
 * The slug in the address. What cannot be a slug names nothing: the same answer as for an unknown one.
 *
 * @throws AppError NOT_FOUND
 */
export function slugParam({ params }: ApiContext): string {
  const result = materialSlugSchema.safeParse(params['slug']);
  if (result.success) return result.data;
  throw new AppError(
    'NOT_FOUND',
    `There is no material ${JSON.stringify(params['slug'] ?? '')} in the store.`,
  );
}
