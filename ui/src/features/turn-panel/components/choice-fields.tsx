import { Checkbox, HTMLSelect, SegmentedControl } from '@blueprintjs/core';
import { useQuery } from '@tanstack/react-query';
import { terminalsQuery } from '../../../lib/terminal-choice';
import { crewQuery, setsQuery } from '../api/choices';
import type { EntryDraft } from '../model/entry-draft';
import { Field, TextField, type EntryFieldsProps } from './entry-field';
import { TrackNotice } from './track-notice';

/** To which track, and what the move would mean. */
export function TrackFields(props: EntryFieldsProps) {
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

/** Which set. */
export function SetFields(props: EntryFieldsProps) {
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

/** Who has the turn from now on, for which job. */
export function CrewFields(props: EntryFieldsProps) {
  return (
    <>
      <JobField {...props} />
      <PersonField {...props} label="Has this turn" isFirst />
    </>
  );
}

/** Who goes, who comes, and whether they met. */
export function ReliefFields(props: EntryFieldsProps) {
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
