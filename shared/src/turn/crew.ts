import type { Instant } from '../lib/instant';
import type { Answer } from './answers';
import { CREW_ROLES, type CrewRole, type Entry, type EntryAuthor } from './entry';
import { reliefTypeOf } from './reliefs';
import { compareEntries, ofKind, type EntryOf } from './standing-entries';

/** Who is on a turn for one job. */
export interface CrewOnTurn {
  as: CrewRole;
  personId: string;
  name: string;
  /** Since when; null when carried over from the set's turn before. */
  since: Instant | null;
  /** True when nobody has said so for this turn yet. */
  carriedOver: boolean;
}

/** A relief, or the end of one that stood open. */
export interface ReliefFact {
  at: Instant;
  as: CrewRole;
  /** The entry that says so. */
  entryId: string;
  /** Who went; null where a crew entry ended a relief that stood open. */
  out: EntryAuthor | null;
  /** Who came; null when nobody took over. */
  in: EntryAuthor | null;
  /** Whether somebody took over. */
  takenOver: boolean;
  /** Whether it was face to face by the word of both, or of somebody who is neither. */
  faceToFace: boolean;
  /** Id of the person whose word that it was face to face is missing; null when none is. */
  awaits: string | null;
  /** Whether any crew was left on the turn afterwards. */
  crewLeft: boolean;
}

/** The crew of a turn and how it changed hands. */
export interface CrewFacts {
  crew: CrewOnTurn[];
  reliefs: ReliefFact[];
}

type CrewEntry = EntryOf<'crew'> | EntryOf<'relief'>;

/**
 * Follows crew entries and reliefs in observed order; the latest counts for each job, of two at the same time the one
 * with the smaller id. A relief with nobody coming in leaves the job empty; the next crew entry for it takes over.
 */
export function followCrew(
  entries: readonly Entry[],
  carriedOver: readonly CrewOnTurn[],
  answers: readonly Answer[],
): CrewFacts {
  const written = ofKind(entries, 'relief');
  const changes: CrewEntry[] = [...ofKind(entries, 'crew'), ...written].sort(latestLast);
  const onTurn = new Map<CrewRole, CrewOnTurn>(carriedOver.map((member) => [member.as, member]));
  const open = new Set<CrewRole>();
  const reliefs: ReliefFact[] = [];
  for (const change of changes) {
    const person = change.kind === 'crew' ? change.person : change.in;
    if (person === null) onTurn.delete(change.as);
    else onTurn.set(change.as, memberOf(change, person));
    const endsOpenRelief = change.kind === 'crew' && open.has(change.as);
    if (change.kind === 'relief' || endsOpenRelief) {
      const type =
        change.kind === 'relief'
          ? reliefTypeOf(change, written, answers)
          : { faceToFace: false, awaits: null };
      reliefs.push({
        at: change.observedAt,
        as: change.as,
        entryId: change.id,
        out: change.kind === 'relief' ? change.out : null,
        in: person,
        takenOver: person !== null,
        ...type,
        crewLeft: onTurn.size > 0,
      });
    }
    if (person === null) open.add(change.as);
    else open.delete(change.as);
  }
  return { crew: CREW_ROLES.flatMap((role) => onTurn.get(role) ?? []), reliefs };
}

/** Observed order in which, of two at the same time, the smaller id comes last and so counts. */
function latestLast(a: Entry, b: Entry): number {
  return a.observedAt - b.observedAt || -compareEntries(a, b);
}

function memberOf(change: CrewEntry, person: { personId: string; name: string }): CrewOnTurn {
  const { personId, name } = person;
  return { as: change.as, personId, name, since: change.observedAt, carriedOver: false };
}
