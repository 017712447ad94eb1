import type { WireTurnMatters } from '@stubpost/shared';
import { SOURCE_WORDS } from '../../../components/words';
import { clockText } from '../../../lib/turn/time-text';
import type { TurnNow } from '../../../lib/turn/turn-now';

/** One thing on which a person has to rule. */
export type Question = NonNullable<WireTurnMatters['inQuestion']>[number];
export type QuestionAccount = Question['accounts'][number];

/** What is in question stands in a block of its own, with the choice: whether a remark is about something else. */
export const isOutsideQuestions = (remark: string): boolean => !remark.endsWith('Which one?');

/** What is in question: "Arrival", or the step's short label. */
export function subjectOf(question: Question, turn: TurnNow): string {
  if (question.step === 'arrival') return 'Arrival';
  if (question.step === 'departure') return 'Departure';
  return turn.steps.find((step) => step.key === question.step)?.shortLabel ?? question.step;
}

/** "17:22:10 by hand (Ortiz)". */
export function accountWords({ at, source, by, saidBy }: QuestionAccount, zone: string): string {
  const who = saidBy ?? by;
  return `${clockText(Date.parse(at), zone)} ${SOURCE_WORDS[source]}${who === null ? '' : ` (${who})`}`;
}

/**
 * The question in one sentence: "Two times for cab brake check: 17:22:10 by hand (Ortiz), 17:25:00 by radio (desk).
 * Which one?" Where a person objects to the only account, that is the question.
 */
export function questionWords(question: Question, turn: TurnNow): string {
  const { accounts } = question;
  const subject = subjectOf(question, turn);
  const said = accounts.map((account) => accountWords(account, turn.zone)).join(', ');
  if (accounts.length < 2) return `${subject} ${said}: not agreed. Does it count?`;
  const number = accounts.length === 2 ? 'Two' : String(accounts.length);
  return `${number} times for ${subject.charAt(0).toLowerCase()}${subject.slice(1)}: ${said}. Which one?`;
}
