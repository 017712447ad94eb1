import {
  type AlertCause,
  type AlertMemory,
  type AlertStep,
  type Finding,
  type Instant,
  assess,
  assessedTurnOf,
  forecastInputOf,
  forecastTurn,
  isAssessed,
  lateSlackSeconds,
  nextAlertStep,
  noAlertMemory,
} from '@stubpost/shared';
import type { TerminalRules } from './lateness-rules';
import type { WatchedTurn } from './watched-turn';

/** Causes that are looked for on a turn. */
export const TURN_CAUSES = [
  'late-departure',
  'unsecured',
  'no-required-record',
  'running-test',
  'blue-signal',
  'no-word',
  'crew',
] as const satisfies readonly AlertCause[];

/** What one look at a turn means for one cause. */
export interface CauseStep extends AlertStep {
  cause: AlertCause;
  before: AlertMemory;
  finding: Finding | null;
}

/** Memories by cause, of one turn. A cause that is missing was never seen. */
export type TurnMemories = ReadonlyMap<AlertCause, AlertMemory>;

/** Looks at a turn once: for each cause what to do, and what to remember. Nothing is written here. */
export function lookAt(
  turn: WatchedTurn,
  rules: TerminalRules,
  memories: TurnMemories,
  now: Instant,
): CauseStep[] {
  const forecast = forecastTurn(forecastInputOf(turn.facts), now);
  const assessed = assessedTurnOf(turn.facts, forecast, now);
  const findings = new Map(assess(assessed, rules.lateness, now).map((finding) => [finding.cause, finding]));
  const lateSlack = isAssessed(assessed, now) ? lateSlackSeconds(assessed) : null;
  return TURN_CAUSES.map((cause) => {
    const before = memories.get(cause) ?? noAlertMemory;
    const finding = findings.get(cause) ?? null;
    const slackSeconds = cause === 'late-departure' ? lateSlack : null;
    return { cause, before, finding, ...nextAlertStep(before, { finding, slackSeconds }, now, rules.holds) };
  });
}

/** Whether a look leaves anything to be written down. */
export function isNews(step: CauseStep): boolean {
  return step.action !== 'none' || !sameMemory(step.before, step.memory);
}

/** Whether a memory is that of a cause that was never seen. */
export function isBlank(memory: AlertMemory): boolean {
  return sameMemory(memory, noAlertMemory);
}

function sameMemory(a: AlertMemory, b: AlertMemory): boolean {
  return (
    a.standing === b.standing &&
    a.shortSince === b.shortSince &&
    a.enoughSince === b.enoughSince &&
    a.told === b.told
  );
}
