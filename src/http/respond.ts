import { createHash } from 'node:crypto';
import { encodeCsv } from '#src/lib/csv.ts';
import type { CsvColumn } from '#src/lib/csv.ts';

/** Answers that succeed. */

/** Published entries: caches may keep them for a minute, then ask again with the tag. */
const publicCaching = 'public, max-age=60';

interface Body {
  readonly text: string;
  readonly contentType: string;
  readonly headers?: Readonly<Record<string, string>>;
}

function entityTag(text: string): string {
  return `"${createHash('sha256').update(text).digest('base64url').slice(0, 27)}"`;
}

/** If-None-Match compares weakly: a list of tags, or * for any (RFC 9110, 13.1.2). */
function matchesTag(header: string | null, tag: string): boolean {
  if (header === null) return false;
  return header.split(',').some((part) => part.trim() === '*' || part.trim().replace(/^W\//, '') === tag);
}

function publicResponse(request: Request, { text, contentType, headers = {} }: Body): Response {
  const tag = entityTag(text);
  const shared = { ...headers, etag: tag, 'cache-control': publicCaching };
  if (matchesTag(request.headers.get('if-none-match'), tag))
    return new Response(null, { status: 304, headers: shared });
  return new Response(text, { status: 200, headers: { ...shared, 'content-type': contentType } });
}

/** A published entry or list as JSON, with its tag. */
export function publicJson(
  request: Request,
  body: unknown,
  headers: Readonly<Record<string, string>> = {},
): Response {
  return publicResponse(request, { text: JSON.stringify(body), contentType: 'application/json', headers });
}

/** Where the next page is (RFC 8288): the same question with another cursor. */
export function nextPageLink(url: URL, nextCursor: string | null): Readonly<Record<string, string>> {
  if (nextCursor === null) return {};
  const query = new URLSearchParams(url.searchParams);
  query.set('cursor', nextCursor);
  return { link: `<${url.pathname}?${query.toString()}>; rel="next"` };
}

export interface CsvTable<Row> {
  /** Name of the file a browser saves, without its ending. */
  readonly name: string;
  readonly columns: readonly CsvColumn<Row>[];
  readonly rows: readonly Row[];
  readonly headers?: Readonly<Record<string, string>>;
}

function csvHeaders(name: string): Readonly<Record<string, string>> {
  return { 'content-disposition': `attachment; filename="wanderlength-${name}.csv"` };
}

const csvContentType = 'text/csv; charset=utf-8; header=present';

/** A published table as CSV, with its tag. */
export function publicCsv<Row>(
  request: Request,
  { name, columns, rows, headers = {} }: CsvTable<Row>,
): Response {
  return publicResponse(request, {
    text: encodeCsv(columns, rows),
    contentType: csvContentType,
    headers: { ...headers, ...csvHeaders(name) },
  });
}

/** An answer to this request alone. */
export function freshJson(body: unknown, status = 200): Response {
  return new Response(JSON.stringify(body), {
    status,
    headers: { 'content-type': 'application/json', 'cache-control': 'no-store' },
  });
}

export function freshCsv<Row>({ name, columns, rows }: CsvTable<Row>): Response {
  return new Response(encodeCsv(columns, rows), {
    headers: { 'content-type': csvContentType, 'cache-control': 'no-store', ...csvHeaders(name) },
  });
}
