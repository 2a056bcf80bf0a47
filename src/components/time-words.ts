/** Dates and durations in words, the same on the server and in the browser: everything is reckoned in UTC. */

const DAY_MS = 86_400_000;
const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'] as const;

/** 2026-12-04 gives "4 Dec 2026". */
export function dayWords(iso: string): string {
  const date = new Date(iso.length === 10 ? `${iso}T00:00:00Z` : iso);
  return `${date.getUTCDate()} ${MONTHS[date.getUTCMonth()]} ${date.getUTCFullYear()}`;
}

/** "4 Dec 2026, 14:05 UTC". */
export function momentWords(iso: string): string {
  return `${dayWords(iso)}, ${iso.slice(11, 16)} UTC`;
}

/** How far a due date is from a day: "due today", "in 3 days", "2 days late". */
export function dueWords(dueOn: string | null, todayIso: string): string {
  if (dueOn === null) return 'no date';
  const days = Math.round(
    (Date.parse(`${dueOn.slice(0, 10)}T00:00:00Z`) - Date.parse(`${todayIso.slice(0, 10)}T00:00:00Z`)) /
      DAY_MS,
  );
  if (days === 0) return 'due today';
  if (days === 1) return 'due tomorrow';
  if (days > 0) return `in ${days} days`;
  return days === -1 ? '1 day late' : `${-days} days late`;
}

/** 4,980 s gives "1 h 23 min"; under ten minutes the seconds stay. */
export function durationWords(seconds: number): string {
  const whole = Math.round(seconds);
  if (whole < 60) return `${whole} s`;
  const minutes = Math.floor(whole / 60);
  if (minutes < 10) return whole % 60 === 0 ? `${minutes} min` : `${minutes} min ${whole % 60} s`;
  const rounded = Math.round(whole / 60);
  if (rounded < 60) return `${rounded} min`;
  return rounded % 60 === 0 ? `${rounded / 60} h` : `${Math.floor(rounded / 60)} h ${rounded % 60} min`;
}
