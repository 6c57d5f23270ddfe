import { defineApiRoute } from '#src/http/api-route.ts';
import { estimateColumns } from '#src/http/csv-columns.ts';
import { formatQuerySchema } from '#src/http/format-query.ts';
import { parseBody, parseQuery } from '#src/http/parse.ts';
import { freshCsv, freshJson } from '#src/http/respond.ts';
import { estimateRequestSchema } from '#src/schemas/estimate.ts';
import { estimateConductivity } from '#src/services/estimates.ts';

export const { POST, OPTIONS, ALL } = defineApiRoute({
  POST: async ({ request, url, locals }) => {
    const { format } = parseQuery(formatQuerySchema, url);
    const body = await parseBody(estimateRequestSchema, request);
    const estimate = await estimateConductivity(locals.db, locals.actor, body);
    if (format === 'json') return freshJson(estimate);
    return freshCsv({
      name: `${estimate.material ?? 'estimate'}-${estimate.model}`,
      columns: estimateColumns(estimate),
      rows: estimate.points,
    });
  },
});
