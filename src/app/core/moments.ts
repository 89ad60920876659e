/** Hours and minutes as this person's clock shows them. */
export const clockTime = (moment: Date): string => moment.toLocaleTimeString('en-GB', { hour: '2-digit', minute: '2-digit' });

/** A moment as one says it: the time alone today, the day as well before. */
export function sayMoment(moment: Date, now = new Date()): string {
  if (moment.toDateString() === now.toDateString()) return `at ${clockTime(moment)}`;
  return `on ${moment.toLocaleDateString('en-GB', { day: 'numeric', month: 'long' })} at ${clockTime(moment)}`;
}
