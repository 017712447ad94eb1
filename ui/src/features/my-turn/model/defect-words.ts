import type { WireTurn } from '@stubpost/shared';

type Defect = NonNullable<WireTurn['defects']>[number];

/** What is bad, as a person says it. Tokens are the log's. */
export function causeWords(cause: string): string {
  return `${cause.charAt(0).toUpperCase()}${cause.slice(1).replaceAll('-', ' ')}`;
}

/** "1406 door", "set: heating, car 3 is cold". */
export function defectLine({ car, cause, note }: Pick<Defect, 'car' | 'cause' | 'note'>): string {
  const where = car === null ? 'set:' : car;
  const words = note === undefined || note === '' ? '' : `, ${note}`;
  return `${where} ${cause.replaceAll('-', ' ')}${words}`;
}
