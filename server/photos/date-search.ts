export interface Period {
  readonly from: Date;
  /** Exclusive. */
  readonly to: Date;
}

const months = [
  'january',
  'february',
  'march',
  'april',
  'may',
  'june',
  'july',
  'august',
  'september',
  'october',
  'november',
  'december',
];
const shortest = 3;

const yearOf = (word: string) => (/^(18|19|20|21)\d\d$/.test(word) ? Number(word) : null);
const monthOf = (word: string) => {
  const month = word.length < shortest ? -1 : months.findIndex((name) => name.startsWith(word));
  return month < 0 ? null : month;
};

/** The year or month that a search such as "2024", "May 2024", "2024 may" or "2024-05" names, UTC; null when it names none. */
export function periodNamed(search: string): Period | null {
  const text = search.trim().toLowerCase();
  const year = yearOf(text);
  if (year !== null) return { from: new Date(Date.UTC(year, 0)), to: new Date(Date.UTC(year + 1, 0)) };

  const numbered = /^(\d{4})-(\d{1,2})$/.exec(text);
  if (numbered) return month(yearOf(numbered[1]), Number(numbered[2]) - 1);

  const words = text.split(/\s+/);
  if (words.length !== 2) return null;
  return month(yearOf(words[1]), monthOf(words[0])) ?? month(yearOf(words[0]), monthOf(words[1]));
}

const month = (year: number | null, index: number | null): Period | null =>
  year === null || index === null || index < 0 || index > 11
    ? null
    : { from: new Date(Date.UTC(year, index)), to: new Date(Date.UTC(year, index + 1)) };
