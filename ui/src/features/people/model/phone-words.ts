/** How a number is typed, and what it is for. */
export const PHONE_HINT = 'With country code, such as +1 555 010 4471. Text messages about alerts go there.';

/** What is wrong with a number that cannot be read. */
export const PHONE_PROBLEM = 'Telephone: a plus sign, the country code, the number.';
