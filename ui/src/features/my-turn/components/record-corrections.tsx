import type { WireCorrection } from '@stubpost/shared';
import { formatClock } from '../../../lib/time-display';
import { readingWords } from '../model/act-form';
import styles from './phone-parts.module.css';
import { useTurnScene } from './turn-context';

/** What was asked to be corrected about one record, old and new side by side, and how it was decided and by whom. */
export function RecordCorrections({ recordKey }: { recordKey: string }) {
  const { turn } = useTurnScene();
  const asked = (turn.corrections ?? []).filter(({ what }) => what === recordKey);
  if (asked.length === 0) return null;
  return (
    <section className={styles.said} aria-label="Corrections">
      <h2>{asked.length === 1 ? 'Correction' : 'Corrections'}</h2>
      {asked.map((correction) => (
        <div key={correction.entryId}>
          <p>
            <del>{valueWords(correction.oldAt, correction.oldReading, turn.zone)}</del>{' '}
            <b>{newWords(correction, turn.zone)}</b>
          </p>
          <p>
            Asked {formatClock(correction.askedAt, turn.zone)}
            {correction.by === null ? '' : ` by ${correction.by.name}`}: {correction.reason}.
          </p>
          <p>{decisionWords(correction, turn.zone)}</p>
        </div>
      ))}
    </section>
  );
}

function valueWords(at: string | null, reading: WireCorrection['oldReading'], zone: string): string {
  const read = readingWords(reading);
  return [at === null ? '' : formatClock(at, zone), read].filter((part) => part !== '').join(', ');
}

function newWords(correction: WireCorrection, zone: string): string {
  if (correction.kind === 'withdrawn') return 'taken back';
  const words = valueWords(correction.newAt, correction.newReading, zone);
  return words === '' ? 'as it was' : words;
}

/** "Waiting for the supervisor.", "Approved 18:02:10 by Reyes.", "Declined 18:02:10 by Reyes: no word of it on the radio." */
function decisionWords(
  { state, decidedAt, decidedBy, declinedBecause }: WireCorrection,
  zone: string,
): string {
  if (state === 'waiting') return 'Waiting for the supervisor. Until then the first entry counts.';
  const time = decidedAt === undefined ? '' : ` ${formatClock(decidedAt, zone)}`;
  const who = decidedBy === undefined || decidedBy === null ? '' : ` by ${decidedBy.name}`;
  const because = declinedBecause === undefined ? '' : `: ${declinedBecause}`;
  return state === 'approved' ? `Approved${time}${who}.` : `Declined${time}${who}${because}.`;
}
