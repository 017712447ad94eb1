import { SegmentedControl, TextArea } from '@blueprintjs/core';
import { ENTRY_SOURCES, type EntrySource } from '@stubpost/shared';
import { SOURCE_WORDS } from '../../../components/words';
import { formatZoneLetters } from '../../../lib/time-display';
import { useNow } from '../../../lib/use-now';
import { asksForCount } from '../model/entry-draft';
import { Field, TextField, type EntryFieldsProps } from './entry-field';

/** How it is known, and over the radio who said it. */
export function SourceFields(props: EntryFieldsProps) {
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

const namedFirst = ['expected-arrival', 'hold', 'track', 'set', 'crew', 'relief', 'annulled'];

/** When it happened, on the terminal's clock. Empty means now; no time stands in it by itself. */
export function WhenField(props: EntryFieldsProps) {
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

/** Free words. */
export function NoteField(props: EntryFieldsProps) {
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
