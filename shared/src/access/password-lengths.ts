/** Shortest password taken; longer ones are advised. Source: OWASP ASVS 5.0, 6.2.1. */
export const passwordShortest = 8;
/** Length we advise where a password is chosen. Our choice, between the 8 and 15 of OWASP ASVS 5.0, 6.2.1. */
export const passwordAdvised = 12;
/** Longest password taken, in characters; more than the 64 of OWASP ASVS 5.0, 6.2.9, bounded against abuse. */
export const passwordLongest = 128;
