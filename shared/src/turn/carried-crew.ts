import type { CrewOnTurn } from './crew';
import type { TurnFacts } from './facts';

/**
 * The crew that a set takes along to its next turn, until somebody says otherwise there. A person who was relieved is
 * not among them; a tie-up and an annulled turn hand nobody on.
 */
export function crewToCarry(facts: TurnFacts): CrewOnTurn[] {
  if (facts.planned.kind === 'tie-up' || facts.annulled !== null) return [];
  return facts.crew.map((member) => ({ ...member, since: null, carriedOver: true }));
}
