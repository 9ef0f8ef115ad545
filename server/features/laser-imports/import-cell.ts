import { parseQuantity } from '@shared/model/quantity';

import type { CellKind } from './import-columns';

/** A cell as understood, or what is wrong with it and what is allowed. */
export type CellReading =
  | { readonly ok: true; readonly value: string | number | boolean; readonly text?: string }
  | { readonly ok: false; readonly message: string; readonly allowed: string };

/** Reads a cell that is not empty. Nothing is guessed: what can be read in two ways is refused. */
export function readCell(given: string, cell: CellKind, saysUnit: boolean): CellReading {
  switch (cell.is) {
    case 'text':
      return { ok: true, value: given };
    case 'choice':
      return readChoice(given, cell);
    case 'date':
      return readDate(given);
    case 'flag':
      return readFlag(given);
    case 'year':
      return readYear(given);
    case 'number':
      return readNumber(given);
    case 'quantity':
      return readQuantity(given, cell, saysUnit);
  }
}

function readChoice(given: string, { of, also }: CellKind & { is: 'choice' }): CellReading {
  const word = given.toLowerCase();
  const found = of.find((one) => one.toLowerCase() === word) ?? also?.[word];
  if (found) return { ok: true, value: found };
  return {
    ok: false,
    message: `"${given}" is none of the words for this.`,
    allowed: of.join(', '),
  };
}

const DATE_FORM = 'year-month-day, for example 2026-12-01';

/** Only forms that can be read in one way, and only with the year. */
function readDate(given: string): CellReading {
  const match = /^(\d{4})-(\d{2})-(\d{2})$/.exec(given);
  if (match) {
    const date = new Date(`${given}T00:00:00.000Z`);
    if (!Number.isNaN(date.getTime()) && date.toISOString().startsWith(given)) {
      return { ok: true, value: given };
    }
    return { ok: false, message: `"${given}" is no day of the calendar.`, allowed: DATE_FORM };
  }
  const hasYear = /\d{4}/.test(given);
  const message = hasYear
    ? `"${given}" can be read in more than one way, or not at all.`
    : `"${given}" has no year of four digits.`;
  return { ok: false, message, allowed: DATE_FORM };
}

function readFlag(given: string): CellReading {
  const word = given.toLowerCase();
  if (['yes', 'true', '1'].includes(word)) return { ok: true, value: true };
  if (['no', 'false', '0'].includes(word)) return { ok: true, value: false };
  return { ok: false, message: `"${given}" is neither yes nor no.`, allowed: 'yes or no' };
}

function readYear(given: string): CellReading {
  const year = Number(given);
  if (/^\d{4}$/.test(given) && year >= 1960 && year <= 2100) return { ok: true, value: year };
  return {
    ok: false,
    message: `"${given}" is no year of a laser.`,
    allowed: 'a year from 1960 to 2100, four digits',
  };
}

function readNumber(given: string): CellReading {
  const value = Number(given);
  if (/^\d*\.?\d+(?:e[-+]?\d+)?$/i.test(given) && value > 0) return { ok: true, value };
  return {
    ok: false,
    message: `"${given}" is no number above 0.`,
    allowed: 'a number above 0 with a point for decimals, for example 0.22',
  };
}

function readQuantity(
  given: string,
  { kind, unit }: CellKind & { is: 'quantity' },
  saysUnit: boolean,
): CellReading {
  const reading = parseQuantity(given, kind, unit);
  if (reading.ok === 'ask') {
    const options = reading.options.map(({ label }) => label).join(', or ');
    return { ok: false, message: reading.question, allowed: `one of: ${options}` };
  }
  if (!reading.ok) return reading;
  if (!saysUnit && /^[-+\d.,\seE]+$/.test(given)) {
    return {
      ok: false,
      message: `"${given}" has no unit, and the header names none.`,
      allowed: `a number with its unit, for example "${given.trim()} ${unit}"`,
    };
  }
  return { ok: true, value: reading.value, text: reading.text };
}
