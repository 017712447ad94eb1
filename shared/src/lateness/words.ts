import type { Doer } from '../plan/step-plan';
import type { AssessedStep, AssessedTurn } from './assessed-turn';

/** A role and, where it is known, the name: "conductor M. Tolland", "engineer", "crew". */
export function personWords(turn: Pick<AssessedTurn, 'crew'>, doer: Doer): string {
  const member = turn.crew.find((each) => each.as === doer);
  return member === undefined ? doer : `${doer} ${member.name}`;
}

/** Whom to call: the name where it is known, "the engineer" where it is not. */
export function calledWords(turn: Pick<AssessedTurn, 'crew'>, doer: Doer): string {
  const words = personWords(turn, doer);
  return words === doer ? `the ${doer}` : words;
}

/** Who acts on something a crew member must do: the desk first, for it reads the alert. */
export function deskAnd(turn: Pick<AssessedTurn, 'crew'>, doer: Doer): string {
  return `dispatcher, ${personWords(turn, doer)}`;
}

/** The steps that were not recorded, in the order of the plan. */
export function openSteps(turn: AssessedTurn): AssessedStep[] {
  return turn.steps.filter((step) => step.doneAt === null);
}
