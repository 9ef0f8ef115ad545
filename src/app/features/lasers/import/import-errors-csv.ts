import type { ImportError } from '@shared/model/laser-imports';

const HEAD = ['row', 'column', 'given', 'message', 'allowed'];

/** The errors of a dry run as a CSV (RFC 4180) that a spreadsheet opens without running formulas. */
export function importErrorsCsv(errors: readonly ImportError[]): string {
  const rows = errors.map(({ row, column, given, message, allowed }) => [
    String(row),
    column,
    given,
    message,
    allowed ?? '',
  ]);
  return [HEAD, ...rows].map((row) => row.map(cell).join(',')).join('\r\n') + '\r\n';
}

function cell(text: string): string {
  // A cell that begins like a formula is data here: the quote says so to the spreadsheet.
  const inert = /^[=+\-@\t\r]/.test(text) ? `'${text}` : text;
  return /[",\r\n]/.test(inert) ? `"${inert.replaceAll('"', '""')}"` : inert;
}
