import { passwordAdvised, passwordLongest, passwordShortest } from '@stubpost/shared';

/** What is asked of a new password, before it is sent. */
export const PASSWORD_HINT = `At least ${passwordShortest} characters; ${passwordAdvised} or more are better. Any signs, a sentence if you like.`;

/** What can be said about a password without asking the service; null when nothing is wrong. */
export function passwordProblem(password: string): string | null {
  const length = [...password].length;
  if (length < passwordShortest) return `Too short: at least ${passwordShortest} characters.`;
  if (length > passwordLongest) return `Too long: at most ${passwordLongest} characters.`;
  return null;
}
