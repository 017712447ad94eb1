import type { Answer } from './answers';
import type { EntryOf } from './standing-entries';

/** Whether a relief was face to face, and whose word is still missing for it. */
export interface ReliefType {
  faceToFace: boolean;
  /** The person who has not yet said so; null when nobody's word is missing. */
  awaits: string | null;
}

const notFaceToFace: ReliefType = { faceToFace: false, awaits: null };

/**
 * Whether a relief was face to face: when its entry says so and it was written by somebody who is neither party, or
 * the other party agrees, or the other party's own entry says the same. A party that does not agree settles that it
 * was not.
 */
export function reliefTypeOf(
  relief: EntryOf<'relief'>,
  reliefs: readonly EntryOf<'relief'>[],
  answers: readonly Answer[],
): ReliefType {
  if (!relief.faceToFace || relief.in === null) return notFaceToFace;
  const parties = [relief.out.personId, relief.in.personId];
  const said = answers.filter(
    (answer) => answer.target === relief.id && answer.by !== null && parties.includes(answer.by.personId),
  );
  if (said.some((answer) => !answer.agrees)) return notFaceToFace;
  const writer = relief.by?.personId;
  if (writer === undefined || !parties.includes(writer)) return { faceToFace: true, awaits: null };
  const other = writer === relief.out.personId ? relief.in.personId : relief.out.personId;
  const confirmed =
    said.some((answer) => answer.by?.personId === other) ||
    reliefs.some((each) => each.by?.personId === other && saysTheSame(each, relief));
  return { faceToFace: confirmed, awaits: confirmed ? null : other };
}

function saysTheSame(a: EntryOf<'relief'>, b: EntryOf<'relief'>): boolean {
  return (
    a.faceToFace && a.as === b.as && a.out.personId === b.out.personId && a.in?.personId === b.in?.personId
  );
}
