/** The instant at which a local date begins in a zone: 2026-03-29 in Berlin → 2026-03-28T23:00:00.000Z. */
export function startOfDay(localDate: string, zone: string): string {
  const midnight = Date.parse(`${localDate}T00:00:00Z`);
  const first = midnight - offsetMs(midnight, zone);
  // The offset at the instant found decides, where the clock changes near midnight.
  return new Date(midnight - offsetMs(first, zone)).toISOString();
}

/** How far the zone's clock is ahead of UTC at an instant, ms. */
function offsetMs(instantMs: number, zone: string): number {
  const format = new Intl.DateTimeFormat('en-US', {
    timeZone: zone,
    hourCycle: 'h23',
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    hour: '2-digit',
    minute: '2-digit',
    second: '2-digit',
  });
  const parts = Object.fromEntries(
    format.formatToParts(instantMs).map(({ type, value }) => [type, value]),
  );
  const { year, month, day, hour, minute, second } = parts;
  const local = Date.parse(`${year}-${month}-${day}T${hour}:${minute}:${second}Z`);
  return local - Math.floor(instantMs / 1000) * 1000;
}
