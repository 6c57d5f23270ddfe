import { z } from 'zod';
import { defineApiRoute } from '#src/http/api-route.ts';
import { parseQuery } from '#src/http/parse.ts';
import { freshJson } from '#src/http/respond.ts';
import { checkHealth } from '#src/services/health.ts';

const querySchema = z.strictObject({});

export const { GET, HEAD, OPTIONS, ALL } = defineApiRoute({
  GET: async ({ locals, url }) => {
    parseQuery(querySchema, url);
    return freshJson(await checkHealth(locals.db));
  },
});
