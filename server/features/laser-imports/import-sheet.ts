import type { ImportError } from '@shared/model/laser-imports';
import { parse } from 'csv-parse/sync';

import { columnOf, COLUMNS, type FoundColumn, NOT_READ } from './import-columns';
import type { SheetRow } from './import-plan';

const MAX_ROWS = 2000;

export interface Sheet {
  readonly rows: readonly SheetRow[];
  readonly errors: readonly ImportError[];
}

/** The file as rows of cells by column. Errors of the file itself stand at its first row. */
export function readSheet(bytes: Uint8Array): Sheet {
  const text = decode(bytes);
  if (text === undefined) return refused('The file is not in UTF-8.', 'Save it as CSV UTF-8.');
  let records: string[][];
  try {
    records = parse(text, {
      bom: true,
      delimiter: delimiterOf(text),
      relax_column_count: true,
      skip_empty_lines: false,
      max_record_size: 100_000,
    });
  } catch (error) {
    // The parser throws on a quote that is never closed, or a record without end.
    const message = error instanceof Error ? error.message : 'It cannot be read.';
    return refused(`The file is not CSV: ${message}`, 'CSV with quotes in pairs.');
  }
  const [header, ...body] = records;
  if (!header || header.every((cell) => cell.trim() === '')) {
    return refused('The file is empty.', 'A header row and at least one laser.');
  }
  const filled = body
    .map((cells, index) => ({ cells, row: index + 2 }))
    .filter(({ cells }) => cells.some((cell) => cell.trim() !== ''));
  if (filled.length === 0) {
    return refused('The file has a header, but no laser.', 'At least one row below the header.');
  }
  if (filled.length > MAX_ROWS) {
    return refused(`The file has ${filled.length} rows.`, `At most ${MAX_ROWS} rows at once.`);
  }
  return sheetOf(header, filled);
}

function sheetOf(
  header: readonly string[],
  body: readonly { cells: readonly string[]; row: number }[],
): Sheet {
  const errors: ImportError[] = [];
  const columns = header.map((word) => columnOf(word));
  columns.forEach((found, index) =>
    errors.push(...headerErrors(header, columns, { found, index })),
  );
  for (const needed of ['maker', 'model']) {
    if (!columns.some((found) => found?.column.header === needed)) {
      errors.push({ row: 1, column: needed, given: '', message: 'This column is missing.' });
    }
  }
  const rows = body.map(({ cells, row }) => {
    if (cells.length > header.length && cells.slice(header.length).some((cell) => cell.trim())) {
      errors.push({
        row,
        column: `${header.length + 1}`,
        given: cells[header.length] ?? '',
        message: 'The row has more cells than the header.',
        allowed: `${header.length} cells; quote cells that hold the separator.`,
      });
    }
    return { row, cells: cellsOf(cells, columns) };
  });
  return { rows, errors };
}

interface HeaderCell {
  readonly found: FoundColumn | undefined;
  readonly index: number;
}

function headerErrors(
  header: readonly string[],
  columns: readonly (FoundColumn | undefined)[],
  { found, index }: HeaderCell,
): ImportError[] {
  const word = (header[index] ?? '').trim();
  if (!found) {
    if (word === '' || NOT_READ.has(word.toLowerCase())) return [];
    const allowed = COLUMNS.map((column) => column.header).join(', ');
    return [{ row: 1, column: word, given: word, message: 'This column is not known.', allowed }];
  }
  const before = columns.findIndex((other) => other?.column === found.column);
  if (before === index) return [];
  const message = `The column "${header[before]}" says the same already.`;
  return [{ row: 1, column: word, given: word, message }];
}

function cellsOf(cells: readonly string[], columns: readonly (FoundColumn | undefined)[]) {
  return columns.flatMap((found, index) => {
    const given = withoutGuard((cells[index] ?? '').trim());
    return found && given !== '' ? [{ found, given }] : [];
  });
}

/** Our export puts an apostrophe before text that a spreadsheet would run. */
function withoutGuard(given: string): string {
  return /^'[\s]*[=+\-@＝＋－＠]/.test(given) ? given.slice(1) : given;
}

function decode(bytes: Uint8Array): string | undefined {
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    // A TypeError: bytes that are not UTF-8.
    return undefined;
  }
}

/** Spreadsheets write the list separator of their country. */
function delimiterOf(text: string): string {
  const firstLine = text.slice(0, text.search(/\r|\n|$/));
  const counts = [',', ';', '\t'].map((mark) => [mark, firstLine.split(mark).length] as const);
  return counts.reduce((a, b) => (b[1] > a[1] ? b : a))[0];
}

function refused(message: string, allowed: string): Sheet {
  return { rows: [], errors: [{ row: 1, column: '', given: '', message, allowed }] };
}
