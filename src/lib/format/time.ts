/*
 * Dates are written out in the language of the interface. The platform's own formats do it; a library for
 * three of them would weigh more than the page it is for.
 */
const language = 'en-GB';
const clock = new Intl.DateTimeFormat(language, { hour: '2-digit', minute: '2-digit' });
const dayAndClock = new Intl.DateTimeFormat(language, {
  day: 'numeric',
  month: 'long',
  hour: '2-digit',
  minute: '2-digit',
});
const wholeDay = new Intl.DateTimeFormat(language, { day: 'numeric', month: 'long', year: 'numeric' });

/** A moment for reading: the time today, else day and month, with the year when it is another. */
export function moment(instant: string, now: Date = new Date()): string {
  const date = new Date(instant);
  if (date.toDateString() === now.toDateString()) return clock.format(date);
  return date.getFullYear() === now.getFullYear()
    ? dayAndClock.format(date).replace(' at ', ', ')
    : wholeDay.format(date);
}

/** A day for reading, such as "12 March 2026". */
export function day(instant: string): string {
  return wholeDay.format(new Date(instant));
}
