import { defineApiRoute } from '#src/http/api-route.ts';
import { materialColumns } from '#src/http/csv-columns.ts';
import { parseQuery } from '#src/http/parse.ts';
import { nextPageLink, publicCsv, publicJson } from '#src/http/respond.ts';
import { materialListQuerySchema } from '#src/schemas/material.ts';
import { pageLimitMax } from '#src/schemas/pagination.ts';
import { searchMaterials, tabulateMaterials } from '#src/services/materials.ts';

export const { GET, HEAD, OPTIONS, ALL } = defineApiRoute({
  GET: async ({ request, url, locals }) => {
    const query = parseQuery(materialListQuerySchema, url);
    if (query.format === 'json') {
      const page = await searchMaterials(locals.db, locals.actor, query);
      return publicJson(request, page, nextPageLink(url, page.next_cursor));
    }
    // A table for a spreadsheet is wanted whole: as long as one page may be, unless a limit is asked for.
    const limit = url.searchParams.get('limit') ? query.limit : pageLimitMax;
    const page = await tabulateMaterials(locals.db, locals.actor, { ...query, limit });
    return publicCsv(request, {
      name: 'materials',
      columns: materialColumns,
      rows: page.items,
      headers: nextPageLink(url, page.next_cursor),
    });
  },
});
