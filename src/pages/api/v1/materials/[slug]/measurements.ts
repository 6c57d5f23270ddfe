import { defineApiRoute } from '#src/http/api-route.ts';
import { measurementColumns } from '#src/http/csv-columns.ts';
import { formatQuerySchema } from '#src/http/format-query.ts';
import { parseQuery } from '#src/http/parse.ts';
import { publicCsv, publicJson } from '#src/http/respond.ts';
import { slugParam } from '#src/http/slug-param.ts';
import { listMeasurements } from '#src/services/measurements.ts';

export const { GET, HEAD, OPTIONS, ALL } = defineApiRoute({
  GET: async (context) => {
    const { request, url, locals } = context;
    const { format } = parseQuery(formatQuerySchema, url);
    const slug = slugParam(context);
    const measurements = await listMeasurements(locals.db, locals.actor, slug);
    if (format === 'json') return publicJson(request, measurements);
    return publicCsv(request, {
      name: `${slug}-measurements`,
      columns: measurementColumns,
      rows: measurements.items.flatMap((series) => series.points.map((point) => ({ series, point }))),
    });
  },
});
