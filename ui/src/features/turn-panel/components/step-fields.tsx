import { Checkbox, HTMLSelect, SegmentedControl } from '@blueprintjs/core';
import { asksForCount } from '../model/entry-draft';
import styles from './entry-dialog.module.css';
import { Field, TextField, type EntryFieldsProps } from './entry-field';

/** Which step, whether it was done, and what it asks to be counted or read off. */
export function StepFields(props: EntryFieldsProps) {
  const { turn, steps, draft, fieldId, onChange } = props;
  const plan = steps.find((step) => step.key === draft.step);
  const reads = draft.cannot ? [] : (plan?.reads ?? []);
  const isCounted = reads.includes('count') || reads.includes('cars');
  const choose = (key: string): void => onChange({ step: key, cars: [], count: '' });
  return (
    <>
      <Field {...props} field="step" label="Step">
        <HTMLSelect
          id={fieldId('step')}
          fill
          value={draft.step}
          onChange={(event) => choose(event.target.value)}
        >
          <option value="">Choose</option>
          {turn.steps.map((step) => (
            <option key={step.key} value={step.key}>
              {step.label}
              {step.doneAt === null ? '' : ' (recorded)'}
            </option>
          ))}
        </HTMLSelect>
      </Field>
      <SegmentedControl
        aria-label="What happened"
        value={draft.cannot ? 'cannot' : 'done'}
        onValueChange={(value) => onChange({ cannot: value === 'cannot' })}
        options={[
          { label: 'Done', value: 'done' },
          { label: 'Cannot be done', value: 'cannot' },
        ]}
      />
      {draft.cannot && <TextField {...props} field="reason" label="Why not" isFirst />}
      {isCounted && (
        <TextField
          {...props}
          field="count"
          label="Handbrakes, how many"
          isFirst={asksForCount(plan)}
          isNumber
        />
      )}
      {isCounted && turn.cars.length > 0 && <CarBoxes {...props} />}
      {reads.includes('brakePipePsi') && (
        <TextField {...props} field="brakePipePsi" label="Brake pipe, psi, if read off" isNumber />
      )}
      {reads.includes('leakage') && <LeakageFields {...props} />}
    </>
  );
}

function CarBoxes({ turn, draft, onChange }: EntryFieldsProps) {
  const toggle = (car: string): void => {
    const cars = turn.cars.filter((one) => (one === car) !== draft.cars.includes(one));
    onChange({ cars, count: cars.length === 0 ? '' : String(cars.length) });
  };
  return (
    <fieldset className={styles.cars}>
      <legend>On which cars, from the bumping post</legend>
      {turn.cars.map((car) => (
        <Checkbox
          key={car}
          inline
          checked={draft.cars.includes(car)}
          label={car}
          onChange={() => toggle(car)}
        />
      ))}
    </fieldset>
  );
}

function LeakageFields(props: EntryFieldsProps) {
  return (
    <div className={styles.three}>
      <TextField {...props} field="p0" label="Start, psi" isNumber />
      <TextField {...props} field="p1" label="End, psi" isNumber />
      <TextField {...props} field="seconds" label="Length, s" isNumber />
    </div>
  );
}
