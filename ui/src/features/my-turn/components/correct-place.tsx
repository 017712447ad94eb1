import { useState } from 'react';
import type { Instant } from '@stubpost/shared';
import { emptyForm, fieldsOf, NUMBER_FIELDS, readingOf, withNone, type ActForm } from '../model/act-form';
import type { EntryDraft } from '../model/entry-draft';
import { correctionReasons } from '../model/reasons';
import { recordLine } from '../model/record-words';
import type { TurnRecord } from '../model/turn-records';
import { ClockField } from './clock-field';
import { CorrectReading } from './correct-reading';
import styles from './phone-parts.module.css';
import { ReasonField } from './reason-field';
import { useTurnScene } from './turn-context';
import { useHeadingFocus } from './use-heading-focus';
import { useReason } from './use-reason';

export interface CorrectPlaceProps {
  record: TurnRecord;
  onAsk: (draft: EntryDraft, label: string) => void;
  onBack: () => void;
}

/** After the departure: what a record should be, and why. A supervisor decides; the first entry stays either way. */
export function CorrectPlace({ record, onAsk, onBack }: CorrectPlaceProps) {
  const { turn, steps } = useTurnScene();
  const heading = useHeadingFocus();
  const { reason, field } = useReason();
  const [isNone, setNone] = useState(false);
  const [moment, setMoment] = useState<Instant | null>(null);
  const [form, setForm] = useState<ActForm>(emptyForm);
  const step = steps.find(({ key }) => key === record.key);
  const fields = step === undefined ? [] : fieldsOf(step, turn.cars);
  // Cars that were not touched stay as they were.
  const reading = readingOf(fields, form.cars.length === 0 ? withNone(form, 'cars') : form);
  const says = isNone || moment !== null || reading !== undefined;
  const ask = (): void => {
    const target = record.entryId;
    const draft: EntryDraft = isNone
      ? { kind: 'withdrawn', target, reason }
      : {
          kind: 'corrected',
          target,
          reason,
          ...(moment === null ? {} : { shouldBeAt: moment }),
          ...(reading === undefined ? {} : { reading }),
        };
    onAsk(draft, `Correction asked: ${record.label}`);
  };
  return (
    <>
      <div>
        <h1 tabIndex={-1} ref={heading}>
          Ask for correction
        </h1>
        <p>{recordLine(record, turn.zone)}. It stays in the log; a supervisor decides what counts.</p>
      </div>
      <section className={styles.choices} aria-labelledby="should-be">
        <h2 id="should-be" className={styles.part}>
          What it should be
        </h2>
        {!isNone && <ClockField label="Made at, if the time is wrong" onMoment={setMoment} />}
        {!isNone && fields.length > 0 && (
          <CorrectReading
            fields={NUMBER_FIELDS.filter((each) => fields.includes(each))}
            asksCars={fields.includes('cars')}
            form={form}
            onForm={setForm}
          />
        )}
        <button
          type="button"
          className={`${styles.button} ${styles.wide}`}
          aria-pressed={isNone}
          onClick={() => setNone(!isNone)}
        >
          It was not made on this train
        </button>
      </section>
      <ReasonField reasons={correctionReasons} {...field} />
      <div className={styles.buttons}>
        <button type="button" className={styles.button} onClick={onBack}>
          Back
        </button>
        <button type="button" className={styles.button} disabled={!says || reason === ''} onClick={ask}>
          Ask for it
        </button>
      </div>
    </>
  );
}
