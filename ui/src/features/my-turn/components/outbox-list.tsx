import type { ReactNode } from 'react';
import { formatClock } from '../../../lib/time-display';
import type { EntryPlace, OutboxLine } from '../model/outbox-lines';
import styles from './outbox.module.css';
import { OnPhoneSign, OpenSign, SeenSign, SentSign } from './phone-icons';
import parts from './phone-parts.module.css';

const PLACES: Record<EntryPlace, { words: string; sign: ReactNode; isWeighty: boolean }> = {
  'on-phone': { words: 'on phone', sign: <OnPhoneSign />, isWeighty: true },
  sent: { words: 'sent', sign: <SentSign />, isWeighty: false },
  seen: { words: 'seen by desk', sign: <SeenSign />, isWeighty: false },
  refused: { words: 'not taken', sign: <OpenSign />, isWeighty: true },
  'refused-read': { words: 'not taken, read', sign: <OpenSign />, isWeighty: false },
};

const SOURCES = {
  'by-hand': 'by hand',
  'by-radio': 'by radio',
  'by-feed': 'by feed',
  'entered-later': 'entered later',
} as const;

/** One entry: what, about which train, when, and where it is. */
function OutboxRow({ line, zone, onRead }: { line: OutboxLine; zone: string; onRead: (id: string) => void }) {
  const place = PLACES[line.place];
  const where = place.isWeighty ? <b>{place.words}</b> : place.words;
  const known = [
    line.about,
    line.sequence === null ? SOURCES[line.source] : `no. ${line.sequence.toLocaleString('en-US')}`,
  ];
  return (
    <li className={styles.row}>
      <span className={styles.sign}>{place.sign}</span>
      <div className={styles.words}>
        <p className={styles.pair}>
          <b>{line.label}</b>
          <span>{formatClock(line.observedAt, zone)}</span>
        </p>
        <p className={styles.pair}>
          <span>{known.filter((part) => part !== '').join(', ')}</span>
          <span>{where}</span>
        </p>
        {line.refusal !== null && <p>Not taken: {line.refusal}</p>}
        {line.place === 'refused' && (
          <button
            type="button"
            className={`${parts.line} ${parts.underlined}`}
            onClick={() => onRead(line.id)}
          >
            I have read it
          </button>
        )}
      </div>
    </li>
  );
}

/** Entries of this phone, newest act first. */
export function OutboxList({
  lines,
  zone,
  onRead,
}: {
  lines: readonly OutboxLine[];
  zone: string;
  onRead: (id: string) => void;
}) {
  return (
    <ul className={styles.list} aria-label="Entries made on this phone">
      {lines.map((line) => (
        <OutboxRow key={line.id} line={line} zone={zone} onRead={onRead} />
      ))}
    </ul>
  );
}
