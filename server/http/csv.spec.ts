import { parse } from 'csv-parse/sync';
import fc from 'fast-check';
import { expect, it } from 'vitest';

import { csvLine } from './csv';

const text = fc.oneof(
  fc.string({ unit: 'grapheme' }),
  fc.string({
    unit: fc.constantFrom(
      '=',
      '+',
      '-',
      '@',
      '\t',
      '\r',
      '\n',
      '＝',
      '＋',
      '－',
      '＠',
      ' ',
      '"',
      ',',
      'a',
    ),
  }),
);

it('no text becomes a formula, and what is read back is what was meant', () => {
  fc.assert(
    fc.property(fc.array(text, { minLength: 2, maxLength: 5 }), (cells) => {
      const [read = []] = parse(csvLine(cells), { relax_column_count: true }) as string[][];
      expect(read).toHaveLength(cells.length);
      for (const [index, cell] of read.entries()) {
        expect(cell).not.toMatch(/^[=+\-@\t\r\n＝＋－＠]/);
        expect([cells[index], `'${cells[index]}`]).toContain(cell);
      }
    }),
    { numRuns: 1000 },
  );
});

it('numbers stay numbers to the last bit, negative ones included', () => {
  fc.assert(
    fc.property(fc.double({ noNaN: true, noDefaultInfinity: true }), (number) => {
      const [[cell] = []] = parse(csvLine([number, 'x'])) as string[][];
      expect(Object.is(Number(cell), number) || number === 0).toBe(true);
    }),
  );
  expect(csvLine([-3.2, true, null, undefined, ''])).toBe('-3.2,true,,,\r\n');
});
