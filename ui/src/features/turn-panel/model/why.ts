/** Why an entry is taken back or corrected. */
export const WHYS = ['wrong step', 'wrong train', 'wrong time', 'other'] as const;
export type Why = (typeof WHYS)[number];

/** The reason as the log keeps it: the choice, and further words behind it; for *other* the words alone. */
export function reasonText(why: Why, words: string): string {
  const more = words.trim();
  if (why === 'other') return more;
  return more === '' ? why : `${why}: ${more}`;
}
