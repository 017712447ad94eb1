import { useState } from 'react';
import type { Instant, WireTurn } from '@stubpost/shared';
import { formatClock, formatTime } from '../../../lib/time-display';
import { notSoReasons } from '../model/reasons';
import { labelOf } from '../model/turn-records';
import { ClockField } from './clock-field';
import styles from './phone-parts.module.css';
import { ReasonField } from './reason-field';
import { useTurnScene } from './turn-context';
import { useHeadingFocus } from './use-heading-focus';
import type { Places } from './use-places';
import { useReason } from './use-reason';

export interface NotSoPlaceProps {
  asked: NonNullable<WireTurn['asksAgreement']>[number] | undefined;
  onNotSo: Places['recordQuietly'];
  onBack: () => void;
}

/** What was written from the radio is not so: not made at all, or at another time. Both accounts stay, the desk rules. */
export function NotSoPlace({ asked, onNotSo, onBack }: NotSoPlaceProps) {
  const { turn } = useTurnScene();
  const heading = useHeadingFocus();
  const { reason, field } = useReason();
  const [moment, setMoment] = useState<Instant | null>(null);
  if (asked === undefined) {
    return (
      <>
        <h1 tabIndex={-1} ref={heading}>
          Answered already
        </h1>
        <BackButton onBack={onBack} />
      </>
    );
  }
  const label = labelOf(turn, asked.step);
  const record = (): void => {
    const because = reason !== '' ? reason : `Other time: ${formatClock(moment ?? 0, turn.zone)}`;
    const objection = {
      draft: { kind: 'disagreed', target: asked.entryId, reason: because },
      label: `Not so: ${label}`,
    } as const;
    const account = { draft: { kind: 'step-done', step: asked.step }, label, earlier: moment } as const;
    if (moment === null) onNotSo(objection);
    else onNotSo(account, objection);
  };
  return (
    <>
      <div>
        <h1 tabIndex={-1} ref={heading}>
          Not so: {label}
        </h1>
        <p>
          Written by radio as made {formatTime(asked.at, turn.zone)}. Your account is kept beside it, and the
          desk rules.
        </p>
      </div>
      <ClockField label="When it was made, if it was" onMoment={setMoment} />
      <ReasonField reasons={notSoReasons} {...field} />
      <div className={styles.buttons}>
        <BackButton onBack={onBack} />
        <button
          type="button"
          className={styles.button}
          disabled={reason === '' && moment === null}
          onClick={record}
        >
          Not so
        </button>
      </div>
    </>
  );
}

function BackButton({ onBack }: { onBack: () => void }) {
  return (
    <button type="button" className={styles.button} onClick={onBack}>
      Back
    </button>
  );
}
