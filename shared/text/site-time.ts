/** An instant or a date as people at the site read it: "30 Nov 2026". */
export function siteDate(instant: string, zone: string): string {
  const options = { day: 'numeric', month: 'short', year: 'numeric' } as const;
  const parts = formatter(options, zone, instant).formatToParts(new Date(instant));
  const part = (type: string) => parts.find((one) => one.type === type)?.value ?? '';
  return `${part('day')} ${part('month')} ${part('year')}`;
}

/** An instant with its minute and its zone: "30 Nov 2026, 15:05 Europe/Berlin". */
export function siteInstant(instant: string, zone: string): string {
  const options = { hour: '2-digit', minute: '2-digit', hourCycle: 'h23' } as const;
  const time = formatter(options, zone, instant).format(new Date(instant));
  return `${siteDate(instant, zone)}, ${time} ${zone}`;
}

/** A local date has no zone: it is the same day everywhere. */
function formatter(
  options: Intl.DateTimeFormatOptions,
  zone: string,
  instant: string,
): Intl.DateTimeFormat {
  const isLocalDate = !instant.includes('T');
  return new Intl.DateTimeFormat('en-US', { ...options, timeZone: isLocalDate ? 'UTC' : zone });
}
