import type { ReactNode } from 'react';
import { formatClock } from '../../../lib/time-display';
import { carList } from '../model/act-form';
import { defectLine } from '../model/defect-words';
import styles from './phone-parts.module.css';
import { useTurnScene } from './turn-context';

/** How the train stands, for whoever takes it over: handbrakes set and released, what is bad, a blue signal, what is open. */
export function Standing() {
  const { turn } = useTurnScene();
  const open = turn.steps.filter((step) => step.doneAt === null && step.state !== 'not-needed');
  const defects = turn.defects ?? [];
  return (
    <dl className={styles.lines}>
      <Row name="Handbrakes">{brakeWords(turn.securement)}</Row>
      <Row name="Defects">
        {defects.length === 0 ? 'none reported' : defects.map((defect) => defectLine(defect)).join('; ')}
      </Row>
      {turn.blueSignal !== null && (
        <Row name="Blue signal">up since {formatClock(turn.blueSignal.since, turn.zone)}</Row>
      )}
      <Row name="Open">{openWords(open.map((step) => step.shortLabel))}</Row>
    </dl>
  );
}

function Row({ name, children }: { name: string; children: ReactNode }) {
  return (
    <div className={styles.line}>
      <dt>{name}</dt>
      <dd className={styles.push}>{children}</dd>
    </div>
  );
}

/** The next two open steps by name, the others by number: "Ends changed, In leaving cab and 5 more". */
function openWords(labels: readonly string[]): string {
  if (labels.length === 0) return 'no step';
  const named = labels.slice(0, 2).join(', ');
  return labels.length > 2 ? `${named} and ${labels.length - 2} more` : named;
}

/** "2 set, cars 1408 and 1412", "2 set, 1 released, car 1412 still set", "none recorded". */
function brakeWords(securement: ReturnType<typeof useTurnScene>['turn']['securement']): string {
  const set = securement?.set ?? null;
  if (securement === undefined || set === null) return 'none recorded';
  const released = securement.released ?? 0;
  const cars = securement.carsStillSet;
  const carWords = cars.length === 0 ? '' : `, ${cars.length === 1 ? 'car' : 'cars'} ${carList(cars)}`;
  if (released === 0) return `${set} set${carWords}`;
  return released >= set
    ? `${set} set, all released`
    : `${set} set, ${released} released${carWords} still set`;
}
