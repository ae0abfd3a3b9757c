import { format, isToday, isThisYear } from 'date-fns';

/** A moment for reading: the time today, else day and month, with the year when it is another. */
export function moment(instant: string): string {
  const date = new Date(instant);
  if (isToday(date)) return format(date, 'HH:mm');
  return format(date, isThisYear(date) ? 'd MMMM, HH:mm' : 'd MMMM yyyy');
}

/** A day for reading, such as "12 March 2026". */
export function day(instant: string): string {
  return format(new Date(instant), 'd MMMM yyyy');
}
