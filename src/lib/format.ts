// Figures and dates as people read them, in their own language's order.

/** Bytes with three figures at most: `4.2 MB`. */
export function formatBytes(bytes: number): string {
  const units = ['bytes', 'kB', 'MB', 'GB'] as const;
  let size = bytes;
  let step = 0;
  while (size >= 999.5 && step < units.length - 1) {
    size /= 1000;
    step += 1;
  }
  const text = step === 0 || size >= 99.95 ? String(Math.round(size)) : size.toFixed(1).replace(/\.0$/, '');
  return `${text} ${units[step]}`;
}

export function formatCount(n: number, locale?: string): string {
  return new Intl.NumberFormat(locale).format(n);
}

/** `1 scene`, `3 scenes`. */
export function countOf(n: number, one: string, many = `${one}s`, locale?: string): string {
  return `${formatCount(n, locale)} ${n === 1 ? one : many}`;
}

const DAY = 24 * 60 * 60 * 1000;

/** A moment: `16:20` today, `yesterday, 16:20`, `14 May, 16:20` this year, else with the year. */
export function formatWhen(iso: string, now: Date, locale?: string): string {
  const at = new Date(iso);
  const time = new Intl.DateTimeFormat(locale, { hour: 'numeric', minute: '2-digit' }).format(at);
  const startOfDay = (d: Date): number => new Date(d.getFullYear(), d.getMonth(), d.getDate()).getTime();
  const days = Math.round((startOfDay(now) - startOfDay(at)) / DAY);
  if (days === 0) return `today, ${time}`;
  if (days === 1) return `yesterday, ${time}`;
  const date = new Intl.DateTimeFormat(locale, {
    day: 'numeric',
    month: 'short',
    ...(at.getFullYear() === now.getFullYear() ? {} : { year: 'numeric' }),
  }).format(at);
  return `${date}, ${time}`;
}

/** The same in full, with the zone, for whoever needs to be sure. */
export function formatWhenFully(iso: string, locale?: string): string {
  return new Intl.DateTimeFormat(locale, { dateStyle: 'full', timeStyle: 'long' }).format(new Date(iso));
}
