import { Button } from '@blueprintjs/core';
import type { ReactNode } from 'react';
import { formatSlackWords, formatTime } from '../../../lib/time-display';
import { clockText, timeText } from '../../../lib/turn/time-text';
import type { TurnNow } from '../../../lib/turn/turn-now';
import { isOver, shownSlack } from '../../../lib/turn/turn-times';
import type { ActTarget, EntryAct } from '../model/entry-acts';
import styles from './turn-panel.module.css';

export interface TurnFactsProps {
  turn: TurnNow;
  now: number;
  acts: ReadonlySet<EntryAct>;
  onAct: (act: EntryAct, rest?: Partial<ActTarget>) => void;
}

/** Forecast in words. */
export function ForecastWords({ turn, now }: Pick<TurnFactsProps, 'turn' | 'now'>) {
  if (isOver(turn) || turn.outboundTrain === null) return null;
  const { readyAt, zone } = turn;
  const slackSeconds = shownSlack(turn);
  if (turn.health === 'no-word' || readyAt === null) {
    return (
      <section aria-label="Forecast">
        <h3 className={styles.heading}>Forecast</h3>
        <p>
          No forecast: nothing heard
          {turn.lastHeardAt === null ? ' yet' : ` since ${clockText(turn.lastHeardAt, zone)}`}.
        </p>
      </section>
    );
  }
  const isReady = turn.steps.every(
    (step) => !step.holdsDeparture || step.doneAt !== null || step.state === 'not-needed',
  );
  return (
    <section aria-label="Forecast">
      <h3 className={styles.heading}>Forecast</h3>
      <p>
        <strong className={styles.large}>
          {isReady
            ? `Ready since ${clockText(readyAt, zone)}`
            : `Ready by ${formatTime(Math.max(readyAt, now), zone)}`}
        </strong>
        {slackSeconds !== null && `, ${formatSlackWords(slackSeconds)}`}
      </p>
      <p className={styles.fine}>From the plan’s times, at typical pace.</p>
    </section>
  );
}

/** Each fact of the turn, with what can be entered about it beside it. */
export function TurnFacts(props: TurnFactsProps) {
  const { turn, acts, onAct } = props;
  const button = (act: EntryAct, words: string, rest?: Partial<ActTarget>): ReactNode =>
    acts.has(act) ? (
      <Button key={words} size="small" onClick={() => onAct(act, rest)}>
        {words}
      </Button>
    ) : null;
  const isOpen = turn.annulled === null;
  return (
    <section aria-label="Train">
      <h3 className={styles.heading}>Train</h3>
      <dl className={styles.facts}>
        {turn.inboundTrain !== null && (
          <Fact term="Arrival" fact={arrivalWords(turn)}>
            {turn.arrivedAt === null && isOpen && button('arrival', 'Arrived')}
            {turn.arrivedAt === null && isOpen && button('expected-arrival', 'Expected')}
          </Fact>
        )}
        {turn.outboundTrain !== null && (
          <Fact term="Departure" fact={departureWords(turn)}>
            {turn.departedAt === null && isOpen && button('departure', 'Left')}
            {turn.departedAt === null && isOpen && button('hold', 'Hold')}
          </Fact>
        )}
        <Fact term="Track" fact={trackWords(turn)}>
          {isOpen && turn.departedAt === null && button('track', 'Move track')}
        </Fact>
        <Fact term="Set" fact={setWords(turn)}>
          {isOpen && turn.departedAt === null && button('set', 'Swap set')}
        </Fact>
        {(['conductor', 'engineer'] as const).map((as) => {
          const holder = turn.crew.find((member) => member.as === as);
          return (
            <Fact
              key={as}
              term={as === 'conductor' ? 'Conductor' : 'Engineer'}
              fact={holder?.name ?? 'nobody recorded'}
            >
              {isOpen && button('crew', holder === undefined ? 'Name' : 'Change', { as })}
              {isOpen && holder !== undefined && button('relief', 'Relief', { as })}
            </Fact>
          );
        })}
        {turn.blueSignal !== null || acts.has('blue-signal-up') ? (
          <Fact term="Blue signal" fact={blueWords(turn)}>
            {turn.blueSignal === null && isOpen && button('blue-signal-up', 'Put up')}
            {turn.blueSignal !== null && button('blue-signal-down', 'Take down')}
          </Fact>
        ) : null}
        {isOpen && turn.departedAt === null && acts.has('annulled') && (
          <Fact term="Turn" fact={turn.extra ? 'extra, entered by hand' : 'in the timetable'}>
            {button('annulled', 'Annul')}
          </Fact>
        )}
      </dl>
    </section>
  );
}

function Fact({ term, fact, children }: { term: string; fact: string; children: ReactNode }) {
  return (
    <div className={styles.fact}>
      <dt>{term}</dt>
      <dd>
        <span>{fact}</span>
        <span className={styles.factActs}>{children}</span>
      </dd>
    </div>
  );
}

function arrivalWords({ arrivedAt, expectedArrivalAt, scheduledArrivalAt, zone }: TurnNow): string {
  if (arrivedAt !== null) return clockText(arrivedAt, zone);
  if (expectedArrivalAt !== null) return `expected ${timeText(expectedArrivalAt, zone)}`;
  return scheduledArrivalAt === null ? '–' : `due ${timeText(scheduledArrivalAt, zone)}`;
}

function departureWords({ departedAt, heldUntil, holdReason, scheduledDepartureAt, zone }: TurnNow): string {
  if (departedAt !== null) return clockText(departedAt, zone);
  if (heldUntil !== null)
    return `held to ${timeText(heldUntil, zone)}${holdReason === null ? '' : `: ${holdReason}`}`;
  return scheduledDepartureAt === null ? '–' : `due ${timeText(scheduledDepartureAt, zone)}`;
}

function trackWords({ track, plannedTrack }: TurnNow): string {
  if (track === null) return 'none yet';
  return plannedTrack === null ? track : `${track}, planned ${plannedTrack}`;
}

function setWords({ set, cars }: TurnNow): string {
  if (set === null) return 'none yet';
  return cars.length === 0 ? set : `${set}, ${cars.length} ${cars.length === 1 ? 'car' : 'cars'}`;
}

function blueWords({ blueSignal, zone }: TurnNow): string {
  if (blueSignal === null) return 'none up';
  return `up${blueSignal.since === null ? '' : ` since ${timeText(blueSignal.since, zone)}`}, ${blueSignal.by}`;
}
