import { isWitnessed, type EntryAct } from '../model/entry-acts';
import { CrewFields, ReliefFields, SetFields, TrackFields } from './choice-fields';
import { CorrectionFields, WhyFields } from './correction-fields';
import styles from './entry-dialog.module.css';
import { TextField, type EntryFieldsProps } from './entry-field';
import { StepFields } from './step-fields';
import { NoteField, SourceFields, WhenField } from './when-fields';

/** Made with the form itself: nobody asks when. */
const madeNow: readonly EntryAct[] = ['note', 'withdrawn', 'corrected'];

/** The fields that the chosen form asks for. The first one that must be typed has the focus. */
export function EntryFields(props: EntryFieldsProps) {
  const { act } = props.target;
  return (
    <div className={styles.fields}>
      {act === 'step' && <StepFields {...props} />}
      {(act === 'expected-arrival' || act === 'hold') && (
        <TextField
          {...props}
          field="ahead"
          label={act === 'hold' ? 'Held until' : 'Expected at'}
          hint="17:44, or +5 for in five minutes"
          isFirst
        />
      )}
      {act === 'track' && <TrackFields {...props} />}
      {act === 'set' && <SetFields {...props} />}
      {act === 'crew' && <CrewFields {...props} />}
      {act === 'relief' && <ReliefFields {...props} />}
      {act === 'note' && <NoteField {...props} />}
      {(act === 'hold' || act === 'annulled') && (
        <TextField {...props} field="reason" label="Reason" isFirst={act !== 'hold'} />
      )}
      {act === 'corrected' && <CorrectionFields {...props} />}
      {act === 'withdrawn' && <WhyFields {...props} />}
      {isWitnessed(act) && <SourceFields {...props} />}
      {!madeNow.includes(act) && <WhenField {...props} />}
    </div>
  );
}
