const units: readonly [Intl.RelativeTimeFormatUnit, number][] = [
  ['year', 365 * 86_400],
  ['month', 30 * 86_400],
  ['week', 7 * 86_400],
  ['day', 86_400],
  ['hour', 3_600],
  ['minute', 60],
];

const relative = new Intl.RelativeTimeFormat('en', { numeric: 'auto' });
const exact = new Intl.DateTimeFormat('en-GB', { dateStyle: 'long', timeStyle: 'short' });
const day = new Intl.DateTimeFormat('en-GB', { dateStyle: 'medium' });

/** `3 days ago`, `in 2 hours`, `now`; the largest unit that fits. */
export function formatAge(iso: string, nowMs: number): string {
  const seconds = (Date.parse(iso) - nowMs) / 1000;
  for (const [unit, length] of units) {
    if (Math.abs(seconds) >= length) {
      return relative.format(Math.trunc(seconds / length), unit);
    }
  }
  return 'just now';
}

/** `1 December 2026 at 08:52`, in the reader's zone. */
export function formatExact(iso: string): string {
  return exact.format(new Date(iso));
}

/** `1 Dec 2026`, in the reader's zone. */
export function formatDay(iso: string): string {
  return day.format(new Date(iso));
}
