import { stringify } from 'csv-stringify/sync';

import type { Download } from './download';

/** A cell of a table: numbers stay numbers, text cannot become a formula. */
export type Cell = string | number | boolean | null | undefined;

export interface CsvColumn<Row> {
  /** Our contract's field name with its unit: `wavelengthNm`. */
  readonly header: string;
  readonly cell: (row: Row) => Cell;
}

/** A list as RFC 4180 CSV in UTF-8, written as it is read. */
export function csvDownload<Row>(
  fileName: string,
  columns: readonly CsvColumn<Row>[],
  rows: Iterable<Row> | AsyncIterable<Row>,
): Download {
  return { fileName, mediaType: 'text/csv; charset=utf-8', body: csvLines(columns, rows) };
}

async function* csvLines<Row>(
  columns: readonly CsvColumn<Row>[],
  rows: Iterable<Row> | AsyncIterable<Row>,
): AsyncGenerator<string> {
  let before = csvLine(columns.map((column) => column.header));
  // One line behind: a filter that is refused shows before the header is on its way.
  for await (const row of rows) {
    yield before;
    before = csvLine(columns.map((column) => column.cell(row)));
  }
  yield before;
}

/** One line; text that a spreadsheet would run as a formula gets an apostrophe in front. */
export function csvLine(cells: readonly Cell[]): string {
  return stringify([cells.map(safeCell)], { record_delimiter: 'windows', quoted_match: /[\r\n]/ });
}

/** Characters with which spreadsheets begin a formula, full-width forms included. */
const FORMULA_START = /^[\s]*[=+\-@\t\r\n＝＋－＠]/;

function safeCell(cell: Cell): string {
  if (cell === null || cell === undefined) return '';
  if (typeof cell !== 'string') return String(cell);
  return FORMULA_START.test(cell) ? `'${cell}` : cell;
}
