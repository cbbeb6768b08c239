import { stringify } from 'csv-stringify/sync';
import { escaped } from './escape.ts';

/** Lines as RFC 4180 has them; no cell is a formula to the spreadsheet that opens it. */
export const csvText = (rows: readonly (readonly string[])[]): string =>
  stringify(
    rows.map((row) => row.map(escaped)),
    { record_delimiter: '\r\n' },
  );
