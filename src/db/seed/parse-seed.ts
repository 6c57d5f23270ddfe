import type { z } from 'zod';
import { checkSeed } from './check-seed.ts';
import { seedFiles, type SeedData, type SeedFileName, type SeedRow } from './files.ts';
import { readTable, SeedError, type CsvRecord, type SeedProblem } from './table.ts';

/** The texts of all seed files, by name. */
export type SeedTexts = Readonly<Record<SeedFileName, string>>;

/**
 * Reads and checks the seed files without a database.
 * @throws SeedError naming file, line, column, value and remedy of everything that is wrong.
 */
export function parseSeed(texts: SeedTexts): SeedData {
  const problems: SeedProblem[] = [];
  const rows = <File extends SeedFileName>(file: File): readonly SeedRow<File>[] =>
    parseFile(file, texts[file], problems);
  const data: SeedData = {
    'sources.csv': rows('sources.csv'),
    'isotopes.csv': rows('isotopes.csv'),
    'materials.csv': rows('materials.csv'),
    'property-values.csv': rows('property-values.csv'),
    'elastic-constants.csv': rows('elastic-constants.csv'),
    'zone-boundary-frequencies.csv': rows('zone-boundary-frequencies.csv'),
    'thermal-expansion.csv': rows('thermal-expansion.csv'),
    'transitions.csv': rows('transitions.csv'),
    'caveats.csv': rows('caveats.csv'),
    'samples.csv': rows('samples.csv'),
    'measurements.csv': rows('measurements.csv'),
    'measurement-points.csv': rows('measurement-points.csv'),
    'scattering-parameters.csv': rows('scattering-parameters.csv'),
  };
  // Rows that could not be read would only cause a second, misleading message for each row that refers to them.
  if (problems.length === 0) problems.push(...checkSeed(data));
  if (problems.length > 0) throw new SeedError(problems);
  return data;
}

function parseFile<File extends SeedFileName>(
  file: File,
  text: string,
  problems: SeedProblem[],
): readonly SeedRow<File>[] {
  const schema: z.ZodType = seedFiles[file];
  const columns = Object.keys(seedFiles[file].shape);
  return readTable({ file, text, columns }, problems).flatMap((record) => {
    const result = schema.safeParse(record.cells);
    if (!result.success) {
      problems.push(...result.error.issues.map((issue) => problemOf(file, record, issue)));
      return [];
    }
    // The schema of this very file made the data; TypeScript loses that on the way through the union of all files.
    return [{ ...(result.data as object), line: record.line } as SeedRow<File>];
  });
}

function problemOf(file: string, { line, cells }: CsvRecord, issue: z.core.$ZodIssue): SeedProblem {
  const column = typeof issue.path[0] === 'string' ? issue.path[0] : null;
  return {
    file,
    line,
    column,
    value: column === null ? null : (cells[column] ?? ''),
    remedy: issue.message,
  };
}
