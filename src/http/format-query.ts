import { z } from 'zod';

/** Tables answer JSON, or CSV with `?format=csv`. */
export const formatQuerySchema = z.strictObject({ format: z.enum(['json', 'csv']).default('json') });
