import type { Health, Priority, TurnState } from '@stubpost/shared';
import { HEALTH_WORDS, PRIORITY_WORDS, TURN_STATE_WORDS } from './words';

/** How a turn stands, when somebody must know: shape, word and colour. On plan there is no flag. */
export function HealthFlag({
  health,
  detail,
}: {
  health: Health;
  /** After the word: "3 min". */ detail?: string;
}) {
  if (health === 'on-plan') return null;
  const words = detail === undefined ? HEALTH_WORDS[health] : `${HEALTH_WORDS[health]} ${detail}`;
  return <span className={`flag ${health}`}>{words}</span>;
}

/** Whose move it is: shape and word in ink. Only a standing "Act now" is filled. */
export function PriorityMark({
  priority,
  over = false,
}: {
  priority: Priority;
  /** The alert no longer stands. */ over?: boolean;
}) {
  return <span className={`flag ${priority}${over ? ' over' : ''}`}>{PRIORITY_WORDS[priority]}</span>;
}

/** A blue signal is up: the flag on its staff, the only blue there is. */
export function BlueSignalFlag({ words = 'Blue signal' }: { words?: string }) {
  return <span className="flag blue-signal">{words}</span>;
}

/** The state of a turn in the word of the glossary. */
export function StateWord({ state }: { state: TurnState }) {
  if (state === 'annulled') return <span className="flag annulled">{TURN_STATE_WORDS.annulled}</span>;
  return <span className="nowrap">{TURN_STATE_WORDS[state]}</span>;
}
