import { isWitnessed } from '../model/entry-acts';
import { CrewFields, ReliefFields, SetFields, TrackFields } from './choice-fields';
import styles from './entry-dialog.module.css';
import { TextField, type EntryFieldsProps } from './entry-field';
import { StepFields } from './step-fields';
import { NoteField, SourceFields, WhenField } from './when-fields';

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
      {(act === 'hold' || act === 'annulled' || act === 'withdrawn') && (
        <TextField {...props} field="reason" label="Reason" isFirst={act !== 'hold'} />
      )}
      {isWitnessed(act) && <SourceFields {...props} />}
      {act !== 'note' && <WhenField {...props} />}
    </div>
  );
}
