/** Comma-separated values as RFC 4180 has them: CRLF, quotes doubled, a header row. */

export type CsvCell = string | number | boolean | null | undefined;

export interface CsvColumn<Row> {
  /** Name with its unit, such as `kappa_W_mK`. */
  readonly header: string;
  readonly cell: (row: Row) => CsvCell;
}

/** Text that a spreadsheet would run as a formula gets an apostrophe in front, which spreadsheets read as "text". */
function defuse(text: string): string {
  return /^[=+\-@\t\r]/.test(text) ? `'${text}` : text;
}

function encodeCell(cell: CsvCell): string {
  if (cell === null || cell === undefined) return '';
  if (typeof cell === 'number') return Number.isFinite(cell) ? String(cell) : '';
  const text = typeof cell === 'string' ? defuse(cell) : String(cell);
  return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}

/** Header row and one row for each entry; blanks where nothing is known. */
export function encodeCsv<Row>(columns: readonly CsvColumn<Row>[], rows: readonly Row[]): string {
  const lines = [
    columns.map(({ header }) => encodeCell(header)),
    ...rows.map((row) => columns.map(({ cell }) => encodeCell(cell(row)))),
  ];
  return lines.map((cells) => `${cells.join(',')}\r\n`).join('');
}
