/** An instant or a date as people at the site read it: "30 Nov 2026". */
export function siteDate(instant: string, zone: string): string {
  return formatter({ day: 'numeric', month: 'short', year: 'numeric' }, zone, instant);
}

/** An instant with its minute and its zone: "30 Nov 2026, 15:05 Europe/Berlin". */
export function siteInstant(instant: string, zone: string): string {
  const time = formatter({ hour: '2-digit', minute: '2-digit', hourCycle: 'h23' }, zone, instant);
  return `${siteDate(instant, zone)}, ${time} ${zone}`;
}

/** A local date has no zone: it is the same day everywhere. */
function formatter(options: Intl.DateTimeFormatOptions, zone: string, instant: string): string {
  const isLocalDate = !instant.includes('T');
  return new Intl.DateTimeFormat('en-GB', {
    ...options,
    timeZone: isLocalDate ? 'UTC' : zone,
  }).format(new Date(instant));
}
