import { Checkbox, FormGroup, HTMLSelect, InputGroup, SegmentedControl, TextArea } from '@blueprintjs/core';
import { ENTRY_SOURCES, type EntrySource, type PlanStep } from '@stubpost/shared';
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { SOURCE_WORDS } from '../../../components/words';
import { terminalsQuery } from '../../../lib/terminal-choice';
import { formatZoneLetters } from '../../../lib/time-display';
import type { TurnNow } from '../../../lib/turn/turn-now';
import { useNow } from '../../../lib/use-now';
import { crewQuery, setsQuery } from '../api/choices';
import { isWitnessed, type ActTarget } from '../model/entry-acts';
import { asksForCount, type DraftFault, type DraftField, type EntryDraft } from '../model/entry-draft';
import styles from './entry-dialog.module.css';
import { TrackNotice } from './track-notice';
import { speakerOf } from './use-entry-form';

export interface EntryFieldsProps {
  target: ActTarget;
  turn: TurnNow;
  steps: readonly PlanStep[];
  draft: EntryDraft;
  faults: readonly DraftFault[];
  fieldId: (field: string) => string;
  onChange: (part: Partial<EntryDraft>) => void;
}

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

interface FieldProps extends EntryFieldsProps {
  field: DraftField;
  label: string;
  hint?: string;
  isFirst?: boolean;
}

function Field({ field, label, hint, faults, fieldId, children }: FieldProps & { children: ReactNode }) {
  const fault = faults.find((one) => one.field === field);
  return (
    <FormGroup
      label={label}
      labelFor={fieldId(field)}
      helperText={fault?.words ?? hint}
      intent={fault === undefined ? 'none' : 'danger'}
    >
      {children}
    </FormGroup>
  );
}

type TextFieldName = {
  [Name in DraftField]: EntryDraft[Name] extends string
    ? string extends EntryDraft[Name]
      ? Name
      : never
    : never;
}[DraftField];

function TextField(props: FieldProps & { field: TextFieldName; list?: string; isNumber?: boolean }) {
  const { field, draft, faults, fieldId, onChange, isFirst = false, list, isNumber = false } = props;
  return (
    <Field {...props}>
      <InputGroup
        id={fieldId(field)}
        value={draft[field]}
        autoFocus={isFirst}
        autoComplete="off"
        aria-invalid={faults.some((fault) => fault.field === field)}
        {...(isNumber ? { inputMode: 'numeric' as const } : {})}
        {...(list === undefined ? {} : { list })}
        onValueChange={(value) => onChange({ [field]: value })}
      />
    </Field>
  );
}

function StepFields(props: EntryFieldsProps) {
  const { turn, steps, draft, fieldId, onChange } = props;
  const plan = steps.find((step) => step.key === draft.step);
  const reads = draft.cannot ? [] : (plan?.reads ?? []);
  const isCounted = reads.includes('count') || reads.includes('cars');
  const choose = (key: string): void =>
    onChange({ step: key, cars: [], count: '', saidBy: speakerOf(turn, props.target, key) });
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

function SourceFields(props: EntryFieldsProps) {
  const { turn, draft, onChange, fieldId } = props;
  const sources = ENTRY_SOURCES.filter((source) => source !== 'by-feed');
  return (
    <>
      <SegmentedControl
        aria-label="How it is known"
        value={draft.source}
        onValueChange={(value) => onChange({ source: value as EntrySource })}
        options={sources.map((source) => ({ label: sentence(SOURCE_WORDS[source]), value: source }))}
      />
      {draft.source === 'by-radio' && (
        <>
          <TextField {...props} field="saidBy" label="Who said it" list={`${fieldId('saidBy')}-crew`} />
          <datalist id={`${fieldId('saidBy')}-crew`}>
            {turn.crew.map((member) => (
              <option key={member.as} value={member.name} />
            ))}
          </datalist>
        </>
      )}
    </>
  );
}

const sentence = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

const namedFirst = ['expected-arrival', 'hold', 'track', 'set', 'crew', 'relief', 'annulled', 'withdrawn'];

function WhenField(props: EntryFieldsProps) {
  const { target, turn, draft, steps } = props;
  const zone = formatZoneLetters(useNow(60), turn.zone);
  const isOrder = namedFirst.includes(target.act);
  const plan = steps.find((step) => step.key === draft.step);
  const isFirst = !isOrder && !draft.cannot && !(target.act === 'step' && asksForCount(plan));
  const label = isOrder ? 'Said when' : 'When it happened';
  return (
    <TextField
      {...props}
      field="when"
      label={label}
      hint={`Empty: now. 2: two minutes ago. 17:24: then, ${zone}`}
      isFirst={isFirst}
    />
  );
}

function NoteField(props: EntryFieldsProps) {
  const { draft, fieldId, onChange } = props;
  return (
    <Field {...props} field="note" label="Note">
      <TextArea
        id={fieldId('note')}
        fill
        autoFocus
        autoResize
        maxLength={1000}
        value={draft.note}
        onChange={(event) => onChange({ note: event.target.value })}
      />
    </Field>
  );
}

function TrackFields(props: EntryFieldsProps) {
  const { turn, draft, fieldId } = props;
  const { data } = useQuery(terminalsQuery);
  const tracks = data?.find((terminal) => terminal.code === turn.terminal)?.tracks ?? [];
  return (
    <>
      <TextField
        {...props}
        field="track"
        label="To track"
        list={`${fieldId('track')}-list`}
        isFirst
        hint={turn.track === null ? 'No track yet' : `Now track ${turn.track}`}
      />
      <datalist id={`${fieldId('track')}-list`}>
        {tracks.map((track) => (
          <option key={track.label} value={track.label} />
        ))}
      </datalist>
      <TrackNotice turn={turn} to={draft.track.trim()} tracks={tracks} />
    </>
  );
}

function SetFields(props: EntryFieldsProps) {
  const { turn, fieldId } = props;
  const { data } = useQuery(setsQuery);
  return (
    <>
      <TextField
        {...props}
        field="set"
        label="Set"
        list={`${fieldId('set')}-list`}
        isFirst
        hint={turn.set === null ? 'No set yet' : `Now set ${turn.set}`}
      />
      <datalist id={`${fieldId('set')}-list`}>
        {(data ?? []).map((set) => (
          <option key={set.id} value={set.label} />
        ))}
      </datalist>
    </>
  );
}

function JobField(props: EntryFieldsProps) {
  const { draft, turn, onChange, target } = props;
  const change = (as: EntryDraft['as']): void => {
    const holder = turn.crew.find((member) => member.as === as);
    onChange({ as, person: '', out: target.act === 'relief' ? (holder?.personId ?? '') : '' });
  };
  return (
    <SegmentedControl
      aria-label="Job"
      value={draft.as}
      onValueChange={(value) => change(value as EntryDraft['as'])}
      options={[
        { label: 'Conductor', value: 'conductor' },
        { label: 'Engineer', value: 'engineer' },
      ]}
    />
  );
}

function PersonField(props: EntryFieldsProps & { label: string; none?: string; isFirst?: boolean }) {
  const { turn, draft, fieldId, onChange, label, none } = props;
  const { data, isError } = useQuery(crewQuery(turn.terminal));
  const people = (data ?? []).filter((member) => member.as.includes(draft.as));
  return (
    <Field
      {...props}
      field="person"
      label={label}
      hint={isError ? 'The list of names cannot be read now' : ''}
    >
      <HTMLSelect
        id={fieldId('person')}
        fill
        autoFocus={props.isFirst === true}
        value={draft.person}
        onChange={(event) => onChange({ person: event.target.value })}
      >
        <option value="">{none ?? 'Choose'}</option>
        {people.map((member) => (
          <option key={member.id} value={member.id}>
            {member.name}
          </option>
        ))}
      </HTMLSelect>
    </Field>
  );
}

function CrewFields(props: EntryFieldsProps) {
  return (
    <>
      <JobField {...props} />
      <PersonField {...props} label="Has this turn" isFirst />
    </>
  );
}

function ReliefFields(props: EntryFieldsProps) {
  const { turn, draft, fieldId, onChange } = props;
  const holders = turn.crew.filter((member) => member.as === draft.as);
  return (
    <>
      <JobField {...props} />
      <Field {...props} field="out" label="Goes">
        <HTMLSelect
          id={fieldId('out')}
          fill
          value={draft.out}
          onChange={(event) => onChange({ out: event.target.value })}
        >
          <option value="">{holders.length === 0 ? 'Nobody is recorded for this job' : 'Choose'}</option>
          {holders.map((member) => (
            <option key={member.personId} value={member.personId}>
              {member.name}
            </option>
          ))}
        </HTMLSelect>
      </Field>
      <PersonField {...props} label="Comes" none="Nobody takes over" isFirst />
      <Checkbox
        checked={draft.faceToFace}
        disabled={draft.person === ''}
        label="Face to face: both have said so"
        onChange={() => onChange({ faceToFace: !draft.faceToFace })}
      />
    </>
  );
}
