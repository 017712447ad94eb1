import { addSeconds, secondsBetween, type Instant, type TurnFacts } from '@stubpost/shared';
import type { Act } from '../story/act';
import { stepEntryId } from './act-entry';

/** What becomes of an act whose time has come: it is told, put off, or left out because somebody else acted. */
export type Decision = { kind: 'tell'; act: Act } | { kind: 'wait' } | { kind: 'leave-out' };

/** What is looked at before an act is told. */
export interface ActScene {
  act: Act;
  /** What the record says of the turn now; visitors may have written in it. */
  facts: TurnFacts;
  /** Id of the conductor whom the story has put on the turn. */
  storyConductorId: string;
  now: Instant;
}

/** A train whose crew never gets ready stays for this long, then the story ends. */
const longestWaitSeconds = 3600;
/** Between the word that a held or visited train may go and its wheels turning. */
const startSeconds = 6;

const tell = (act: Act): Decision => ({ kind: 'tell', act });
const leaveOut: Decision = { kind: 'leave-out' };

/** Whether a visitor has put themselves on the turn: then the crew's work is theirs to record. */
function isVisited({ facts, storyConductorId }: ActScene): boolean {
  const conductor = facts.crew.find((member) => member.as === 'conductor');
  return conductor !== undefined && conductor.personId !== storyConductorId && !conductor.carriedOver;
}

function decideDeparture(scene: ActScene): Decision {
  const { act, facts, now } = scene;
  if (facts.departureAt !== null) return leaveOut;
  const lastStep = Math.max(act.observedAt, ...Object.values(facts.doneAt));
  const missing = facts.steps.some((step) => step.holdsDeparture && facts.doneAt[step.key] === undefined);
  if (missing && isVisited(scene)) {
    return secondsBetween(act.observedAt, now) < longestWaitSeconds ? { kind: 'wait' } : leaveOut;
  }
  const goes = addSeconds(Math.max(lastStep, facts.heldUntil ?? 0), startSeconds);
  const observedAt =
    lastStep > act.observedAt || (facts.heldUntil ?? 0) > act.observedAt ? goes : act.observedAt;
  if (observedAt > now) return { kind: 'wait' };
  return tell({ ...act, observedAt });
}

/** Decides about one act, so that the demo's crews give way to whoever takes part. */
export function decideAct(scene: ActScene): Decision {
  const { act, facts } = scene;
  if (facts.annulled !== null) return leaveOut;
  switch (act.content.kind) {
    case 'departure':
      return decideDeparture(scene);
    case 'arrival':
      return facts.arrivalAt === null ? tell(act) : leaveOut;
    case 'step-done':
      return facts.doneAt[act.content.step] === undefined && !isVisited(scene) ? tell(act) : leaveOut;
    case 'crew': {
      const { as } = act.content;
      const taken = facts.crew.some((member) => member.as === as && !member.carriedOver);
      return taken ? leaveOut : tell(act);
    }
    case 'agreed':
    case 'corrected': {
      const target = stepEntryId(facts.planned.id, act.content.step);
      const isThere = facts.entries.some((entry) => entry.id === target);
      return isThere && !isVisited(scene) ? tell(act) : leaveOut;
    }
    default:
      return tell(act);
  }
}
