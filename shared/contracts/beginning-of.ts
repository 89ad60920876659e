/** The beginning of a text, without half characters (a surrogate that has lost its other half), which no database keeps. */
export const beginningOf = (text: string, max: number): string =>
  text.slice(0, max).replace(/\p{Cs}/gu, '').trim();
