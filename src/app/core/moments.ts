/** Hours and minutes as this person's clock shows them. */
export const clockTime = (moment: Date): string => moment.toLocaleTimeString('en-GB', { hour: '2-digit', minute: '2-digit' });

/** What a clock on this wall showed at a moment, written as if it were UTC: as the dates of photos are kept. */
export const clockReading = (moment: Date): string => new Date(moment.getTime() - moment.getTimezoneOffset() * 60_000).toISOString();

/** A moment as one says it: the time alone today, the day as well before. */
export function sayMoment(moment: Date, now = new Date()): string {
  if (moment.toDateString() === now.toDateString()) return `at ${clockTime(moment)}`;
  return `on ${moment.toLocaleDateString('en-GB', { day: 'numeric', month: 'long' })} at ${clockTime(moment)}`;
}
