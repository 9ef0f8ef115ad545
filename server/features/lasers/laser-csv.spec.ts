import { parse } from 'csv-parse/sync';
import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { csvLine } from '../../http/csv';

/** What a spreadsheet takes for the beginning of a formula, full-width forms included. */
const TRIGGER = /^\s*[=+\-@\t\r\n＝＋－＠]/;

const nastyText = fc.oneof(
  fc.string({ unit: 'grapheme', maxLength: 20 }),
  fc
    .tuple(
      fc.constantFrom('=', '+', '-', '@', '\t', '\r', '\n', '＝', '＋', '－', '＠', ' =', '"', ','),
      fc.string(),
    )
    .map((parts) => parts.join('')),
);

function readBack(cells: readonly (string | number)[]): string[] {
  const [row] = parse(csvLine(cells), { relax_quotes: false }) as string[][];
  return row ?? [];
}

describe('cells of an export (RFC 4180)', () => {
  it('no text begins a formula, whatever people typed, and nothing else of it changes', () => {
    fc.assert(
      fc.property(fc.array(nastyText, { minLength: 2, maxLength: 6 }), (texts) => {
        const read = readBack(texts);
        expect(read).toHaveLength(texts.length);
        read.forEach((cell, index) => {
          const text = texts[index] ?? '';
          expect(TRIGGER.test(cell)).toBe(false);
          expect(cell === text || cell === `'${text}`).toBe(true);
        });
      }),
      { numRuns: 1500 },
    );
  });

  it('numbers are read back bit for bit, negative ones without an apostrophe', () => {
    fc.assert(
      fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (number) => {
        const [cell] = readBack([number, 'x']);
        expect(Object.is(Number(cell), number) || number === 0).toBe(true);
        expect(cell?.startsWith("'")).toBe(false);
      }),
      { numRuns: 3000 },
    );
  });
});
