/**
 * How dates and amounts are written on screen. Calendar days are taken apart as text, never through a
 * `Date` at local midnight: west of Greenwich that is the day before.
 */
const monthNames = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
] as const;

function splitDay(day: string): { year: number; month: string; date: number } | null {
  const match = /^(\d{4})-(\d{2})-(\d{2})/.exec(day);
  const month = monthNames[Number(match?.[2]) - 1];
  if (!match || !month) return null;
  return { year: Number(match[1]), month, date: Number(match[3]) };
}

/** `2025-06-03` as "3 June 2025"; text that is no day is given back as it is. */
export function formatDay(day: string): string {
  const parts = splitDay(day);
  return parts ? `${parts.date} ${parts.month} ${parts.year}` : day;
}

/** `2025-06-03` as "3 Jun 2025", for tables. */
export function formatShortDay(day: string): string {
  const parts = splitDay(day);
  return parts ? `${parts.date} ${parts.month.slice(0, 3)} ${parts.year}` : day;
}

/** `2025-06` as "June 2025". */
export function formatMonth(month: string): string {
  const parts = splitDay(`${month}-01`);
  return parts ? `${parts.month} ${parts.year}` : month;
}

/** A day, or a dash where there is none. */
export function formatDayOrDash(day: string | null): string {
  return day ? formatShortDay(day) : '–';
}

/** "3 June 2025, 14:05" in the given time zone, otherwise in that of the reader's device. */
export function formatInstant(at: string, timeZone?: string): string {
  const parts = new Intl.DateTimeFormat('en-GB', {
    day: 'numeric',
    month: 'long',
    year: 'numeric',
    hour: '2-digit',
    minute: '2-digit',
    hourCycle: 'h23',
    ...(timeZone ? { timeZone } : {}),
  }).formatToParts(new Date(at));
  const part = (type: string): string => parts.find((p) => p.type === type)?.value ?? '';
  return `${part('day')} ${part('month')} ${part('year')}, ${part('hour')}:${part('minute')}`;
}

/** Whole days from one calendar day to another; negative when `to` is earlier. */
export function countDaysBetween(from: string, to: string): number {
  return Math.round((Date.parse(`${to}T00:00:00Z`) - Date.parse(`${from}T00:00:00Z`)) / 86_400_000);
}

/** How far off a day is, in words: "today", "in 12 days", "in 3 months", "2 years ago". */
export function formatDistance(from: string, to: string): string {
  const days = countDaysBetween(from, to);
  if (days === 0) return 'today';
  if (days === 1) return 'tomorrow';
  if (days === -1) return 'yesterday';
  const far = Math.abs(days);
  const words =
    far < 60
      ? formatCount(far, 'day')
      : far < 730
        ? formatCount(Math.round(far / 30.44), 'month')
        : formatCount(Math.floor(far / 365.25), 'year');
  return days > 0 ? `in ${words}` : `${words} ago`;
}

/** A number with thin separators: 12 345. */
export function formatNumber(value: number): string {
  return String(value).replace(/\B(?=(\d{3})+(?!\d))/g, '\u202f');
}

/** "1 sheet", "12 sheets"; `many` where adding an s is wrong. */
export function formatCount(count: number, one: string, many = `${one}s`): string {
  return `${formatNumber(count)} ${count === 1 ? one : many}`;
}

/** Bytes as kB or MB. */
export function formatBytes(bytes: number): string {
  if (bytes < 1_000_000) return `${Math.max(1, Math.round(bytes / 1000))} kB`;
  return `${(bytes / 1_000_000).toFixed(1)} MB`;
}

/** Grams as g below a kilogram, otherwise as kg. */
export function formatGrams(grams: number): string {
  return grams < 1000 ? `${grams} g` : `${(grams / 1000).toFixed(1)} kg`;
}

const countryNames = new Intl.DisplayNames(['en'], { type: 'region' });

/** A country's name by its two letters. */
export function formatCountry(code: string): string {
  try {
    return countryNames.of(code) ?? code;
  } catch {
    return code;
  }
}
