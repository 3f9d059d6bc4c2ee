// The title of a yard's day: "Tuesday 17 March: six jobs".

const WORDS = [
  'no',
  'one',
  'two',
  'three',
  'four',
  'five',
  'six',
  'seven',
  'eight',
  'nine',
  'ten',
  'eleven',
  'twelve',
];

/** "Tuesday 17 March" in a zone; the reader's own when left out. */
export function dayTitle(now: string, zone?: string): string {
  const parts = new Intl.DateTimeFormat('en-US', {
    weekday: 'long',
    day: 'numeric',
    month: 'long',
    ...(zone ? { timeZone: zone } : {}),
  }).formatToParts(new Date(now));
  const part = (type: Intl.DateTimeFormatPartTypes): string =>
    parts.find((one) => one.type === type)?.value ?? '';
  return `${part('weekday')} ${part('day')} ${part('month')}`;
}

/** Counts in titles are words as far as there are short ones. */
export const jobCount = (count: number): string => `${WORDS[count] ?? count} ${count === 1 ? 'job' : 'jobs'}`;
