import { describe, expect, it } from 'vitest';

import { siteDate, siteInstant } from './site-time';

describe('time at the site', () => {
  it('says the day in the zone of the site', () => {
    expect(siteDate('2026-11-30T23:30:00.000Z', 'Europe/Berlin')).toBe('1 Dec 2026');
    expect(siteDate('2026-11-30T23:30:00.000Z', 'America/New_York')).toBe('30 Nov 2026');
  });

  it('keeps a local date as it is', () => {
    expect(siteDate('2026-12-01', 'America/New_York')).toBe('1 Dec 2026');
    expect(siteDate('2026-09-01', 'America/New_York')).toBe('1 Sep 2026');
  });

  it('says the minute with its zone', () => {
    expect(siteInstant('2026-11-30T14:05:00.000Z', 'Europe/Berlin')).toBe(
      '30 Nov 2026, 15:05 Europe/Berlin',
    );
    expect(siteInstant('2026-11-30T23:00:00.000Z', 'Europe/Berlin')).toBe(
      '1 Dec 2026, 00:00 Europe/Berlin',
    );
  });
});
