import type { Instant } from '../lib/instant';
import { compareEntries, ofKind, type EntryOf } from './standing-entries';
import { CREW_ROLES, type CrewRole, type Entry } from './entry';

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
  /** Whether somebody took over. */
  takenOver: boolean;
  faceToFace: boolean;
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
export function followCrew(entries: readonly Entry[], carriedOver: readonly CrewOnTurn[]): CrewFacts {
  const changes: CrewEntry[] = [...ofKind(entries, 'crew'), ...ofKind(entries, 'relief')].sort(latestLast);
  const onTurn = new Map<CrewRole, CrewOnTurn>(carriedOver.map((member) => [member.as, member]));
  const open = new Set<CrewRole>();
  const reliefs: ReliefFact[] = [];
  for (const change of changes) {
    const person = change.kind === 'crew' ? change.person : change.in;
    if (person === null) onTurn.delete(change.as);
    else onTurn.set(change.as, memberOf(change, person));
    const endsOpenRelief = change.kind === 'crew' && open.has(change.as);
    if (change.kind === 'relief' || endsOpenRelief) {
      reliefs.push({
        at: change.observedAt,
        as: change.as,
        takenOver: person !== null,
        faceToFace: change.kind === 'relief' && change.faceToFace,
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
