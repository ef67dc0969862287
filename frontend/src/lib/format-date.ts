const day = new Intl.DateTimeFormat(undefined, { dateStyle: 'medium' });
const moment = new Intl.DateTimeFormat(undefined, { dateStyle: 'medium', timeStyle: 'medium' });
const exact = new Intl.DateTimeFormat(undefined, { dateStyle: 'full', timeStyle: 'long' });

/** The day in the reader's own way of writing it; the text itself where it is no date. */
export function formatDay(iso: string): string {
  const date = new Date(iso);
  return Number.isNaN(date.getTime()) ? iso : day.format(date);
}

/** Day and time to the second, where several things happen in a day. */
export function formatMoment(iso: string): string {
  const date = new Date(iso);
  return Number.isNaN(date.getTime()) ? iso : moment.format(date);
}

/** The whole time, for those who point at it. */
export function formatExact(iso: string): string {
  const date = new Date(iso);
  return Number.isNaN(date.getTime()) ? iso : exact.format(date);
}
