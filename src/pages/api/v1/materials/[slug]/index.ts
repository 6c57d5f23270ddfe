import { defineApiRoute } from '#src/http/api-route.ts';
import { valueColumns } from '#src/http/csv-columns.ts';
import { formatQuerySchema } from '#src/http/format-query.ts';
import { parseQuery } from '#src/http/parse.ts';
import { publicCsv, publicJson } from '#src/http/respond.ts';
import { slugParam } from '#src/http/slug-param.ts';
import { getMaterial } from '#src/services/materials.ts';

export const { GET, HEAD, OPTIONS, ALL } = defineApiRoute({
  GET: async (context) => {
    const { request, url, locals } = context;
    const { format } = parseQuery(formatQuerySchema, url);
    const material = await getMaterial(locals.db, locals.actor, slugParam(context));
    if (format === 'json') return publicJson(request, material);
    return publicCsv(request, { name: material.slug, columns: valueColumns, rows: material.values });
  },
});
