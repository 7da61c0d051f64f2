const format = (options: Intl.DateTimeFormatOptions) =>
  new Intl.DateTimeFormat('en-GB', { timeZone: 'UTC', ...options });

const short = format({ day: 'numeric', month: 'short' });
const shortWithYear = format({ day: 'numeric', month: 'short', year: 'numeric' });
const long = format({ day: 'numeric', month: 'long' });
const longWithYear = format({ day: 'numeric', month: 'long', year: 'numeric' });
const exact = format({ dateStyle: 'long', timeStyle: 'short' });

const thisYear = (moment: Date): boolean => moment.getUTCFullYear() === new Date().getUTCFullYear();

/** "3 Nov", with the year where it is another one. */
export function shortDay(moment: string): string {
  const date = new Date(moment);
  return (thisYear(date) ? short : shortWithYear).format(date).replace('Sept', 'Sep');
}

/** "3 November", with the year where it is another one. */
export function longDay(moment: string): string {
  const date = new Date(moment);
  return (thisYear(date) ? long : longWithYear).format(date);
}

/** For a tooltip: day and time. */
export const exactMoment = (moment: string): string => `${exact.format(new Date(moment))} UTC`;

/** "Tobias Renk" as "T. Renk"; a name of one word stays. */
export function shortName(name: string): string {
  const words = name.trim().split(/\s+/);
  const last = words.at(-1) ?? '';
  const initial = Array.from(words[0] ?? '')[0] ?? '';
  return words.length < 2 ? name : `${initial}. ${last}`;
}

const small = ['No', 'One', 'Two', 'Three', 'Four', 'Five', 'Six', 'Seven', 'Eight', 'Nine', 'Ten', 'Eleven', 'Twelve'];

/** A count at the beginning of a sentence: "Nine", "25". */
export const countFirst = (count: number): string => small[count] ?? String(count);

/** A count within a sentence: "nine", "25". */
export const countWithin = (count: number): string => countFirst(count).toLowerCase();
