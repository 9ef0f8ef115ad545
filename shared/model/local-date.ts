/** A date of the calendar, year-month-day, as `localDateSchema` has it. */
export type LocalDate = string;

const DAY_MS = 86_400_000;

/** The date at `instant` in `zone`. */
export function localDateAt(instant: Date, zone: string): LocalDate {
  const parts = formatOf(zone).formatToParts(instant);
  const part = (type: string) => parts.find((one) => one.type === type)?.value ?? '';
  return `${part('year').padStart(4, '0')}-${part('month')}-${part('day')}`;
}

/** A formatter takes longer to make than to use: one for each zone. */
const FORMATS = new Map<string, Intl.DateTimeFormat>();

function formatOf(zone: string): Intl.DateTimeFormat {
  const known = FORMATS.get(zone);
  if (known) return known;
  const format = new Intl.DateTimeFormat('en-US', {
    timeZone: zone,
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
  });
  FORMATS.set(zone, format);
  return format;
}

/**
 * Months later, on the same day or on the last of a shorter month: 31 January and one month is the
 * last of February. Count from the anchor; chained steps drift.
 */
export function addMonths(date: LocalDate, months: number): LocalDate {
  const { year, month, day } = partsOf(date);
  const index = year * 12 + (month - 1) + months;
  const toYear = Math.floor(index / 12);
  const toMonth = index - toYear * 12;
  const lastDay = new Date(Date.UTC(toYear, toMonth + 1, 0)).getUTCDate();
  return dateText(Date.UTC(toYear, toMonth, Math.min(day, lastDay)));
}

export function addDays(date: LocalDate, days: number): LocalDate {
  return dateText(dayMs(date) + days * DAY_MS);
}

/** Whole days from `from` to `to`; negative when `to` is earlier. */
export function daysBetween(from: LocalDate, to: LocalDate): number {
  return Math.round((dayMs(to) - dayMs(from)) / DAY_MS);
}

const MONTHS =
  'January February March April May June July August September October November December';

/** "3 May 2027". */
export function dateWords(date: LocalDate): string {
  const { year, month, day } = partsOf(date);
  return `${day} ${MONTHS.split(' ')[month - 1]} ${year}`;
}

function partsOf(date: LocalDate): { year: number; month: number; day: number } {
  const match = /^(\d{4})-(\d{2})-(\d{2})$/.exec(date);
  if (!match) throw new RangeError(`Not a date: ${date}`);
  return { year: Number(match[1]), month: Number(match[2]), day: Number(match[3]) };
}

function dayMs(date: LocalDate): number {
  const { year, month, day } = partsOf(date);
  return Date.UTC(year, month - 1, day);
}

function dateText(ms: number): LocalDate {
  return new Date(ms).toISOString().slice(0, 10);
}
