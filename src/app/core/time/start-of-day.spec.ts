import { startOfDay } from './start-of-day';

describe('the beginning of a day at the site', () => {
  it.each([
    ['2026-12-01', 'Europe/Berlin', '2026-11-30T23:00:00.000Z'],
    ['2026-03-29', 'Europe/Berlin', '2026-03-28T23:00:00.000Z'],
    ['2026-03-30', 'Europe/Berlin', '2026-03-29T22:00:00.000Z'],
    ['2026-10-26', 'Europe/Berlin', '2026-10-25T23:00:00.000Z'],
    ['2026-07-04', 'America/New_York', '2026-07-04T04:00:00.000Z'],
    ['2026-12-01', 'Asia/Kolkata', '2026-11-30T18:30:00.000Z'],
    ['2026-12-01', 'UTC', '2026-12-01T00:00:00.000Z'],
  ])('%s in %s begins at %s', (date, zone, instant) => {
    expect(startOfDay(date, zone)).toBe(instant);
  });
});
