import { sql } from 'drizzle-orm';
import { check, integer, pgTable, text } from 'drizzle-orm/pg-core';
import { isOneOf, verificationColumn, verificationValues } from './columns.ts';

/** Bibliography. The key is public: it stands in addresses and exports. */
export const source = pgTable(
  'source',
  {
    key: text('key').primaryKey(),
    authors: text('authors'),
    year: integer('year'),
    title: text('title'),
    container: text('container'),
    volume: text('volume'),
    page: text('page'),
    doi: text('doi'),
    /** Whether the bibliographic details themselves were checked. Null for what was worked out here. */
    verification: verificationColumn(),
  },
  (table) => [
    check('source_key_form', sql`${table.key} ~ '^[a-z0-9][a-z0-9.-]*$'`),
    check('source_year', sql`${table.year} is null or ${table.year} between 1600 and 2200`),
    check('source_doi_form', sql`${table.doi} is null or ${table.doi} ~ '^10\\.[0-9]{4,9}/.+$'`),
    check(
      'source_verification',
      sql`${table.verification} is null or ${isOneOf(table.verification, verificationValues)}`,
    ),
  ],
);
