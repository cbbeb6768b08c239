import { CsvError, parse } from 'csv-parse/sync';
import type { FileFault } from '../../card/index.ts';
import { unescaped } from './escape.ts';

/** Most rows of one file. Judgement: far more than any crib; a larger file is another file. */
export const MOST_ROWS = 10_000;
/** Longest text. Judgement: ten thousand full rows are a third of it. */
export const LONGEST_FILE = 8_000_000;

export type TableRow = { readonly line: number; readonly cells: readonly string[] };
export type Table = { readonly headings: readonly string[]; readonly rows: readonly TableRow[] };

type Parsed = { readonly record: string[]; readonly info: { readonly lines: number } };

/** Reads a file as spreadsheets write it: with commas, semicolons or tabs, with or without a mark. */
export const readTable = (text: string): Table | FileFault => {
  if (text.length > LONGEST_FILE) return { why: 'tooLong', most: LONGEST_FILE };
  const parsed = parsedRows(text);
  if ('why' in parsed) return parsed;
  const [head, ...rows] = parsed;
  if (head === undefined || rows.length === 0) return { why: 'empty' };
  if (rows.length > MOST_ROWS) return { why: 'tooManyRows', most: MOST_ROWS };
  return {
    headings: head.record.map((cell) => cell.trim()),
    rows: rows.map(({ record, info }) => ({
      line: info.lines,
      cells: record.map((cell) => unescaped(cell).trim()),
    })),
  };
};

const parsedRows = (text: string): readonly Parsed[] | FileFault => {
  try {
    // The types of the package do not know what `info` makes of a row.
    return parse(text, {
      bom: true,
      delimiter: delimiterOf(text),
      info: true,
      relax_column_count: true,
      skip_empty_lines: true,
      skip_records_with_empty_values: true,
      // One more than is taken, and the headings.
      to: MOST_ROWS + 2,
    }) as unknown as readonly Parsed[];
  } catch (error) {
    if (!(error instanceof CsvError)) throw error;
    return { why: 'notATable', line: Number(error['lines']) || 1 };
  }
};

/** The sign that parts most of the headings. */
const delimiterOf = (text: string): string => {
  const [first = ''] = text.replace(/^\ufeff?\s*/u, '').split(/\r?\n/u, 1);
  const count = (sign: string): number => first.split(sign).length - 1;
  return [',', ';', '\t'].reduce((best, sign) => (count(sign) > count(best) ? sign : best));
};
