import { Button, Dialog, DialogBody, DialogFooter } from '@blueprintjs/core';
import { useQuery } from '@tanstack/react-query';
import { useEffect, useId, useRef, type FormEvent } from 'react';
import { SafetyCaution } from '../../../components/caution';
import { FieldSummary } from '../../../components/field-summary';
import { ErrorState, LoadingRows } from '../../../components/page-states';
import { errorText } from '../../../lib/error-texts';
import type { TurnNow } from '../../../lib/turn/turn-now';
import { planQuery } from '../../../lib/turn/turn-queries';
import { useTurnAt } from '../../../lib/turn/use-turn-at';
import { actTitles, type ActTarget } from '../model/entry-acts';
import { airWords } from '../model/second-bar';
import styles from './entry-dialog.module.css';
import { EntryFields } from './entry-fields';
import { useEntryForm, type Recorded } from './use-entry-form';

export interface EntryDialogProps {
  /** What is entered; null closes the dialog. */
  target: ActTarget | null;
  onClose: () => void;
  onRecorded: (recorded: Recorded) => void;
}

/** The one dialog for everything that is entered about a turn, from the board and from the panel. */
export function EntryDialog({ target, onClose, onRecorded }: EntryDialogProps) {
  return (
    <Dialog
      isOpen={target !== null}
      onClose={onClose}
      title={target === null ? '' : actTitles[target.act]}
      className={styles.dialog}
      canOutsideClickClose={false}
      shouldReturnFocusOnClose={false}
      transitionDuration={0}
    >
      {target !== null && <LoadedForm target={target} onClose={onClose} onRecorded={onRecorded} />}
    </Dialog>
  );
}

type FormProps = { target: ActTarget; onClose: () => void; onRecorded: (recorded: Recorded) => void };

function LoadedForm(props: FormProps) {
  const { turn, error, refetch } = useTurnAt(props.target.turnId);
  if (turn !== undefined) return <EntryForm key={props.target.act} turn={turn} {...props} />;
  return (
    <DialogBody>
      {error === null ? (
        <LoadingRows what="the turn" rows={4} />
      ) : (
        <ErrorState error={error} onRetry={refetch} />
      )}
    </DialogBody>
  );
}

function EntryForm({ target, turn, onClose, onRecorded }: FormProps & { turn: TurnNow }) {
  const id = useId();
  const { data: plan } = useQuery(planQuery(turn.planId));
  const form = useEntryForm({ target, turn, plan, onRecorded });
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    form.submit();
  };
  const fieldId = (field: string): string => `${id}-${field}`;
  const problems = [
    ...form.faults.map(({ field, words }) => ({ fieldId: fieldId(field), words })),
    ...(form.problem === null ? [] : [{ fieldId: fieldId('when'), words: errorText(form.problem) }]),
  ];
  return (
    <form onSubmit={submit} noValidate>
      {form.waiting !== null && (
        <SecondBar
          words={form.waiting.words}
          beside={target.act === 'step' ? airWords(turn, plan?.steps ?? []) : null}
          isSending={form.isSending}
          onConfirm={form.confirm}
          onBack={form.notYet}
        />
      )}
      <DialogBody>
        <p className={styles.about}>
          <b>Train {turn.train}</b>
          {turn.track === null ? '' : `, track ${turn.track}`}
          {target.entryWords === undefined ? '' : `: ${target.entryWords}`}
        </p>
        <FieldSummary problems={problems} />
        <EntryFields
          target={target}
          turn={turn}
          steps={plan?.steps ?? []}
          draft={form.draft}
          faults={form.faults}
          fieldId={fieldId}
          onChange={form.change}
        />
        {target.act === 'step' && (
          <div className={styles.caution}>
            <SafetyCaution />
          </div>
        )}
      </DialogBody>
      <DialogFooter
        actions={
          <>
            <Button onClick={onClose}>Cancel</Button>
            <Button type="submit" intent="primary" loading={form.isSending} disabled={form.waiting !== null}>
              {form.problem === null ? submitWords(target) : 'Try again'}
            </Button>
          </>
        }
      />
    </form>
  );
}

const submitWords = ({ act }: ActTarget): string => (act === 'corrected' ? 'Ask for it' : 'Record');

interface SecondBarProps {
  words: string;
  beside: string | null;
  isSending: boolean;
  onConfirm: () => void;
  onBack: () => void;
}

/**
 * The second word for what cannot be taken lightly: at the other end of the dialog, with the fact repeated. The focus
 * goes to the group and not to its button, so that the key which asked for it cannot answer it as well.
 */
function SecondBar({ words, beside, isSending, onConfirm, onBack }: SecondBarProps) {
  const group = useRef<HTMLDivElement>(null);
  useEffect(() => group.current?.focus(), []);
  return (
    <div className={styles.second} role="group" aria-label={`Confirm: ${words}`} tabIndex={-1} ref={group}>
      {beside !== null && <p>{beside}</p>}
      <Button className={styles.secondBar ?? ''} loading={isSending} onClick={onConfirm}>
        {words}
      </Button>
      <Button variant="minimal" onClick={onBack}>
        Not this
      </Button>
    </div>
  );
}
