import type { WireStep, WireTurn } from '@stubpost/shared';
import { formatClock } from '../../../lib/time-display';
import { readingWords } from '../model/act-form';
import { hasLeft } from '../model/next-act';
import { RadioSign } from './phone-icons';
import styles from './phone-parts.module.css';
import { useTurnScene } from './turn-context';

/** An entry that may be taken back, as the page that asks for the reason needs it. */
export interface EntryToWithdraw {
  entryId: string;
  words: string;
}

/** The newest record of the turn with the way to take it back; by radio it says so and who said it. */
export function LastEntry({ onWithdraw }: { onWithdraw: (entry: EntryToWithdraw) => void }) {
  const { turn, entries, me } = useTurnScene();
  const step = newestStep(turn);
  if (step === null || step.doneAt === null) return null;
  const words = recordWords({ ...step, reading: null }, turn.zone);
  const isOwn = step.entryId !== null && entries.find(({ id }) => id === step.entryId)?.by?.id === me.id;
  const canWithdraw = isOwn && !hasLeft(turn);
  return (
    <div className={styles.line}>
      {step.source === 'by-radio' && <RadioSign />}
      <span className={styles.grows}>{words}</span>
      {canWithdraw && step.entryId !== null && (
        <button
          type="button"
          className={`${styles.line} ${styles.push} ${styles.underlined}`}
          style={{ width: 'auto' }}
          onClick={() => onWithdraw({ entryId: step.entryId ?? '', words })}
        >
          Withdraw
        </button>
      )}
    </div>
  );
}

function newestStep(turn: WireTurn): WireStep | null {
  return turn.steps.reduce<WireStep | null>(
    (newest, step) =>
      step.doneAt !== null && (newest === null || step.doneAt >= (newest.doneAt ?? '')) ? step : newest,
    null,
  );
}

/** A recorded step in one line: "Handbrake set 17:19:52", "Cab brake check by radio, 17:22:00, said by Lindqvist". */
export function recordWords(step: WireStep, zone: string): string {
  if (step.doneAt === null) return step.shortLabel;
  const at = formatClock(step.doneAt, zone);
  const reading = readingWords(step.reading);
  const what = reading === '' ? step.shortLabel : `${step.shortLabel}, ${reading},`;
  if (step.source === 'by-radio')
    return `${what} by radio, ${at}${step.saidBy === null ? '' : `, said by ${step.saidBy}`}`;
  if (step.source === 'entered-later') return `${what} ${at}, entered later`;
  return step.source === 'by-feed' ? `${what} ${at}, by feed` : `${what} ${at}`;
}
