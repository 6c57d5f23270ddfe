import { parse } from 'csv-parse/sync';
import { describe, expect, it } from 'vitest';
import { encodeCsv } from '#src/lib/csv.ts';

interface Row {
  readonly text: string | null;
  readonly value: number | null;
}

const columns = [
  { header: 'text', cell: (row: Row) => row.text },
  { header: 'value_K', cell: (row: Row) => row.value },
];

describe('a CSV file', () => {
  it('comes back as it was through an independent reader', () => {
    const rows: readonly Row[] = [
      { text: 'plain', value: 1.5 },
      { text: 'comma, quote " and\r\nline', value: -2e-7 },
      { text: 'γ₍T₎ Ångström', value: null },
      { text: null, value: 0 },
    ];
    const read: unknown = parse(encodeCsv(columns, rows), { columns: true });
    expect(read).toEqual([
      { text: 'plain', value_K: '1.5' },
      { text: 'comma, quote " and\r\nline', value_K: '-2e-7' },
      { text: 'γ₍T₎ Ångström', value_K: '' },
      { text: '', value_K: '0' },
    ]);
  });

  it('ends each line with CRLF, the last one too (RFC 4180)', () => {
    expect(encodeCsv(columns, [{ text: 'a', value: 1 }])).toBe('text,value_K\r\na,1\r\n');
  });

  it.each(['=1+1', '+1', '-1', '@SUM(A1)', '\t=1'])(
    'does not let a spreadsheet run %j as a formula',
    (text) => {
      const rows: unknown = parse(encodeCsv(columns, [{ text, value: null }]), { columns: true });
    expect(rows).toEqual([{ text: `'${text}`, value_K: '' }]);
    },
  );

  it('leaves negative numbers alone: they are numbers, not formulas', () => {
    expect(encodeCsv(columns, [{ text: null, value: -1.5 }])).toContain(',-1.5\r\n');
  });
});
