import { Button, Checkbox } from '@blueprintjs/core';
import { isInCab, longestInstruction, type ReadingKey } from '@stubpost/shared';
import { keyFromName, type DraftProblem, type StepDraft, type StepField } from '../model/plan-draft';
import { ANCHOR_WORDS, DOER_WORDS, KIND_WORDS, PLACE_WORDS, READING_WORDS, optionsOf } from './plan-words';
import { LongTextField, SelectField, TextField } from './setup-field';
import styles from './setup.module.css';

export interface StepFormProps {
  draft: StepDraft;
  /** Other rows: what this step may wait for. */
  others: readonly StepDraft[];
  problems: readonly DraftProblem[];
  onChange: (change: Partial<StepDraft>) => void;
  onMove: (by: -1 | 1) => void;
  onRemove: () => void;
}

/** Id of the field of a step, for the links of the summary. */
export function stepFieldId(stepId: string, field: StepField): string {
  return `${stepId}-${field}`;
}

/** Every field of one step. */
export function StepForm({ draft, others, problems, onChange, onMove, onRemove }: StepFormProps) {
  const at = (field: StepField) => ({
    id: stepFieldId(draft.id, field),
    problem: problems.find((each) => each.field === field)?.words,
  });
  const nameIt = (label: string): void => {
    const followsName = draft.key === '' || draft.key === keyFromName(draft.label);
    onChange({ label, ...(followsName ? { key: keyFromName(label) } : {}) });
  };
  return (
    <section className="sp-panel" aria-labelledby="step-form">
      <header>
        <h2 id="step-form">{draft.shortLabel === '' ? 'New step' : draft.shortLabel}</h2>
      </header>
      <TextField {...at('label')} label="Name" value={draft.label} onChange={nameIt} maxLength={120} />
      <div className={styles.row}>
        <TextField
          {...at('shortLabel')}
          label="Short name"
          hint="Columns and the phone’s bar"
          value={draft.shortLabel}
          onChange={(shortLabel) => onChange({ shortLabel })}
          maxLength={30}
        />
        <TextField
          {...at('key')}
          label="Key"
          hint="Stays the same across versions"
          value={draft.key}
          onChange={(key) => onChange({ key })}
          maxLength={40}
        />
      </div>
      <div className={styles.row}>
        <SelectField
          {...at('kind')}
          label="Kind"
          value={draft.kind}
          options={optionsOf(KIND_WORDS)}
          onChange={(kind) => onChange({ kind })}
        />
        <SelectField
          {...at('doer')}
          label="Done by"
          value={draft.doer}
          options={optionsOf(DOER_WORDS)}
          onChange={(doer) => onChange({ doer })}
        />
        <SelectField
          {...at('place')}
          label="Where"
          value={draft.place}
          options={optionsOf(PLACE_WORDS)}
          onChange={(place) => onChange({ place, inCab: isInCab({ place }) })}
        />
      </div>
      <div className={styles.row}>
        <SelectField
          {...at('anchor')}
          label="Counted from"
          value={draft.anchor}
          options={optionsOf(ANCHOR_WORDS)}
          onChange={(anchor) => onChange({ anchor })}
        />
        <TextField
          {...at('offset')}
          label="Due"
          hint="min:s; −4:00 is before"
          value={draft.offset}
          onChange={(offset) => onChange({ offset })}
        />
        <TextField
          {...at('tolerance')}
          label="Tolerance"
          hint="min:s past due"
          value={draft.tolerance}
          onChange={(tolerance) => onChange({ tolerance })}
        />
      </div>
      <div className={styles.row}>
        <TextField
          {...at('short')}
          label="Short"
          hint="min:s"
          value={draft.short}
          onChange={(short) => onChange({ short })}
        />
        <TextField
          {...at('typical')}
          label="Typical"
          hint="min:s"
          value={draft.typical}
          onChange={(typical) => onChange({ typical })}
        />
        <TextField
          {...at('long')}
          label="Long"
          hint="min:s"
          value={draft.long}
          onChange={(long) => onChange({ long })}
        />
      </div>
      <TextField
        {...at('notBefore')}
        label="Not before"
        hint="min:s from the departure, such as −6:00; empty: any time"
        value={draft.notBefore}
        onChange={(notBefore) => onChange({ notBefore })}
      />
      <AfterChoice
        draft={draft}
        others={others}
        problem={at('after').problem}
        onChange={(after) => onChange({ after })}
      />
      <Checkbox
        id={stepFieldId(draft.id, 'holdsDeparture')}
        checked={draft.holdsDeparture}
        label="Holds the departure"
        onChange={() => onChange({ holdsDeparture: !draft.holdsDeparture })}
      />
      {at('holdsDeparture').problem !== undefined && (
        <p className={styles.wrong}>{at('holdsDeparture').problem}</p>
      )}
      <Checkbox
        id={stepFieldId(draft.id, 'inCab')}
        checked={draft.inCab}
        label="Recorded in the controlling cab: the briefing comes first where it is asked for"
        onChange={() => onChange({ inCab: !draft.inCab })}
      />
      <ReadingChoice draft={draft} onChange={(reads) => onChange({ reads })} />
      <LongTextField
        {...at('instruction')}
        label="Instruction"
        hint={`The railroad’s own words, shown on the phone with the plan’s version. Plain text, at most ${longestInstruction.toLocaleString('en-US')} characters.`}
        value={draft.instruction}
        onChange={(instruction) => onChange({ instruction })}
      />
      <div className="sp-actions">
        <Button onClick={() => onMove(-1)}>Move up</Button>
        <Button onClick={() => onMove(1)}>Move down</Button>
        <Button onClick={onRemove}>Leave out</Button>
      </div>
    </section>
  );
}

const toggled = <Item extends string>(items: readonly Item[], item: Item): Item[] =>
  items.includes(item) ? items.filter((each) => each !== item) : [...items, item];

interface AfterProps {
  draft: StepDraft;
  others: readonly StepDraft[];
  problem: string | undefined;
  onChange: (after: string[]) => void;
}

function AfterChoice({ draft, others, problem, onChange }: AfterProps) {
  const choices = [
    { key: 'arrival', label: 'The arrival' },
    ...others
      .filter(({ key }) => key !== '')
      .map(({ key, shortLabel }) => ({ key, label: shortLabel === '' ? key : shortLabel })),
    { key: 'departure', label: 'The departure' },
  ];
  return (
    <fieldset id={stepFieldId(draft.id, 'after')} tabIndex={-1}>
      <legend className={styles.legend}>After</legend>
      <div className={styles.choices}>
        {choices.map(({ key, label }) => (
          <Checkbox
            key={key}
            checked={draft.after.includes(key)}
            label={label}
            onChange={() => onChange(toggled(draft.after, key))}
          />
        ))}
      </div>
      {problem !== undefined && <p className={styles.wrong}>{problem}</p>}
    </fieldset>
  );
}

function ReadingChoice({ draft, onChange }: { draft: StepDraft; onChange: (reads: ReadingKey[]) => void }) {
  return (
    <fieldset>
      <legend className={styles.legend}>Reads off or counts</legend>
      <div className={styles.choices}>
        {optionsOf(READING_WORDS).map(({ value, label }) => (
          <Checkbox
            key={value}
            checked={draft.reads.includes(value)}
            label={label}
            onChange={() => onChange(toggled(draft.reads, value))}
          />
        ))}
      </div>
    </fieldset>
  );
}
