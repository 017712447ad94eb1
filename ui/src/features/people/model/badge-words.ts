/** What a badge may look like, and what it is for. */
export const BADGE_HINT = 'Letters, digits or dashes; empty for none. The person sets a PIN at “Me”.';
