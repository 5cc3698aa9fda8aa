const time = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit' });
const weekday = new Intl.DateTimeFormat('en-GB', { weekday: 'short' });
const day = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'short', year: 'numeric' });
const full = new Intl.DateTimeFormat('en-GB', { dateStyle: 'full', timeStyle: 'short' });

/** A moment in the reader's own time zone, as short as it stays clear: `14:05` today, `Tue 16:20` this week, else `3 Nov 2026`. */
export function formatWhen(iso: string, now: Date): string {
  const moment = new Date(iso);
  const days = calendarDay(now) - calendarDay(moment);
  if (days === 0) return time.format(moment);
  if (days > 0 && days < 7) return `${weekday.format(moment)}\u00A0${time.format(moment)}`;
  return day.format(moment).replaceAll(' ', '\u00A0');
}

/** A moment in full, for a hover or a reader's voice. */
export function formatWhenInFull(iso: string): string {
  return full.format(new Date(iso));
}

/** Whole days since an arbitrary day, by the reader's calendar. */
function calendarDay(moment: Date): number {
  return Date.UTC(moment.getFullYear(), moment.getMonth(), moment.getDate()) / 86_400_000;
}
