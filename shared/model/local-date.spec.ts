import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { addDays, addMonths, dateWords, daysBetween, localDateAt } from './local-date';

describe('months on the calendar', () => {
  it.each([
    ['2026-01-31', 1, '2026-02-28'],
    ['2024-01-31', 1, '2024-02-29'],
    ['2024-02-29', 12, '2025-02-28'],
    ['2024-02-29', 48, '2028-02-29'],
    ['2026-12-15', 1, '2027-01-15'],
    ['2026-01-15', -1, '2025-12-15'],
    ['2026-03-31', -1, '2026-02-28'],
  ])('%s and %d months is %s', (from, months, to) => {
    expect(addMonths(from, months)).toBe(to);
  });

  it('the day never grows, and shrinks only to the last of a shorter month', () => {
    const dates = fc
      .date({ min: new Date('1990-01-01'), max: new Date('2090-01-01'), noInvalidDate: true })
      .map((date) => date.toISOString().slice(0, 10));
    fc.assert(
      fc.property(dates, fc.integer({ min: -240, max: 240 }), (date, months) => {
        const result = addMonths(date, months);
        const day = Number(result.slice(8));
        expect(day).toBeLessThanOrEqual(Number(date.slice(8)));
        if (day < Number(date.slice(8))) expect(addDays(result, 1).slice(8)).toBe('01');
      }),
    );
  });
});

describe('the date of an instant', () => {
  it.each([
    ['2027-03-28T00:30:00.000Z', 'Europe/Berlin', '2027-03-28'],
    ['2026-12-01T23:30:00.000Z', 'Europe/Berlin', '2026-12-02'],
    ['2026-12-01T03:00:00.000Z', 'America/New_York', '2026-11-30'],
    ['2026-12-01T18:20:00.000Z', 'Asia/Kathmandu', '2026-12-02'],
  ])('%s in %s is %s', (instant, zone, date) => {
    expect(localDateAt(new Date(instant), zone)).toBe(date);
  });
});

it('days between and words', () => {
  expect(daysBetween('2026-12-01', '2027-01-01')).toBe(31);
  expect(daysBetween('2027-10-31', '2027-11-01')).toBe(1);
  expect(dateWords('2027-05-03')).toBe('3 May 2027');
});
