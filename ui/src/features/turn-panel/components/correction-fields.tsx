import { HTMLSelect, SegmentedControl } from '@blueprintjs/core';
import { clockText } from '../../../lib/turn/time-text';
import { WHYS, type Why } from '../model/why';
import styles from './entry-dialog.module.css';
import { Field, TextField, type EntryFieldsProps } from './entry-field';

const whyWords: Record<Why, string> = {
  'wrong step': 'Wrong step',
  'wrong train': 'Wrong train',
  'wrong time': 'Wrong time',
  other: 'Other',
};

/** Why an entry is taken back or corrected: one of a few, and further words. */
export function WhyFields(props: EntryFieldsProps) {
  const { draft, fieldId, onChange } = props;
  return (
    <>
      <Field {...props} field="why" label="Reason">
        <HTMLSelect
          id={fieldId('why')}
          fill
          autoFocus={props.target.act === 'withdrawn'}
          value={draft.why}
          onChange={(event) => onChange({ why: WHYS.find((why) => why === event.target.value) ?? '' })}
        >
          <option value="">Choose</option>
          {WHYS.map((why) => (
            <option key={why} value={why}>
              {whyWords[why]}
            </option>
          ))}
        </HTMLSelect>
      </Field>
      <TextField
        {...props}
        field="reason"
        label={draft.why === 'other' ? 'In words' : 'In words, if more is to be said'}
      />
    </>
  );
}

/** What was recorded beside what should have been, or that it should not be there at all. */
export function CorrectionFields(props: EntryFieldsProps) {
  const { target, turn, draft, onChange } = props;
  const count = target.entryReading?.count;
  return (
    <>
      <p className={styles.notice}>
        The train has left: a supervisor other than you decides. Until then the record stays as it is.
      </p>
      <SegmentedControl
        aria-label="What is asked for"
        value={draft.takesBack ? 'take-back' : 'change'}
        onValueChange={(value) => onChange({ takesBack: value === 'take-back' })}
        options={[
          { label: 'Change it', value: 'change' },
          { label: 'Take it back', value: 'take-back' },
        ]}
      />
      {!draft.takesBack && (
        <div className={styles.sides}>
          <dl aria-label="Recorded">
            <dt>Recorded time</dt>
            <dd>{target.entryAt === undefined ? '–' : clockText(target.entryAt, turn.zone)}</dd>
            {count !== undefined && (
              <>
                <dt>Recorded count</dt>
                <dd>{count}</dd>
              </>
            )}
          </dl>
          <div>
            <TextField {...props} field="newTime" label="Should be" hint="17:24 or 17:24:05" isFirst />
            {count !== undefined && <TextField {...props} field="count" label="Count should be" isNumber />}
          </div>
        </div>
      )}
      <WhyFields {...props} />
    </>
  );
}
