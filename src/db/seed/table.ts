import { parse, CsvError } from 'csv-parse/sync';

/** One thing wrong with a seed file: where it stands, what it says, and what would be right. */
export interface SeedProblem {
  readonly file: string;
  /** Line of the file, the header being line 1. */
  readonly line: number;
  readonly column: string | null;
  readonly value: string | null;
  readonly remedy: string;
}

export function describeProblem({ file, line, column, value, remedy }: SeedProblem): string {
  const where = column === null ? `${file}, line ${line}` : `${file}, line ${line}, column ${column}`;
  return value === null ? `${where}: ${remedy}` : `${where}: "${value}". ${remedy}`;
}

/** The seed files cannot be loaded. The message has a line for each problem. */
export class SeedError extends Error {
  readonly problems: readonly SeedProblem[];

  constructor(problems: readonly SeedProblem[]) {
    const shown = problems.slice(0, 50).map(describeProblem);
    const hidden = problems.length - shown.length;
    super([...shown, ...(hidden > 0 ? [`… and ${hidden} more.`] : [])].join('\n'));
    this.name = 'SeedError';
    this.problems = problems;
  }
}

export interface CsvRecord {
  readonly line: number;
  /** Blank cells are null. */
  readonly cells: Readonly<Record<string, string | null>>;
}

/** Reads one CSV file whose header must be exactly `columns`. Problems are added to `problems`. */
export function readTable(
  { file, text, columns }: { file: string; text: string; columns: readonly string[] },
  problems: SeedProblem[],
): readonly CsvRecord[] {
  const rows = parseRows(file, text, problems);
  if (rows === null) return [];
  const [header, ...body] = rows;
  const headerText = header?.cells.join(',') ?? '';
  if (headerText !== columns.join(',')) {
    problems.push({
      file,
      line: 1,
      column: null,
      value: headerText,
      remedy: `The header must be ${columns.join(',')}.`,
    });
    return [];
  }
  return body.flatMap(({ line, cells }) => {
    if (cells.length !== columns.length) {
      problems.push({
        file,
        line,
        column: null,
        value: null,
        remedy: `The row has ${cells.length} cells; the header has ${columns.length}. Quote a cell that holds a comma.`,
      });
      return [];
    }
    return [
      {
        line,
        cells: Object.fromEntries(columns.map((column, index) => [column, emptyToNull(cells[index] ?? '')])),
      },
    ];
  });
}

function emptyToNull(cell: string): string | null {
  const trimmed = cell.trim();
  return trimmed === '' ? null : trimmed;
}

interface RawRow {
  readonly line: number;
  readonly cells: readonly string[];
}

function parseRows(file: string, text: string, problems: SeedProblem[]): readonly RawRow[] | null {
  const rows: RawRow[] = [];
  let lineOfRow = 1;
  try {
    parse(text, {
      bom: true,
      relax_column_count: true,
      skip_empty_lines: false,
      on_record: (cells: string[], { lines }) => {
        rows.push({ line: lineOfRow, cells });
        lineOfRow = lines + 1;
        return null;
      },
    });
    return rows.filter(({ cells }) => cells.length > 1 || cells[0] !== '');
  } catch (error) {
    if (!(error instanceof CsvError)) throw error;
    problems.push({
      file,
      // Where the row begins that never ends.
      line: lineOfRow,
      column: null,
      value: null,
      remedy: `The file is not RFC 4180 CSV: ${error.message}`,
    });
    return null;
  }
}
