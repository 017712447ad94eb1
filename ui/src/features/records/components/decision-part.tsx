import { Button, FormGroup, InputGroup } from '@blueprintjs/core';
import { mayRecord, type ListedCorrection, type WireTerminal } from '@stubpost/shared';
import { useId, useState, type FormEvent } from 'react';
import { errorText } from '../../../lib/error-texts';
import { usePerson } from '../../../lib/session';
import { useDecide } from '../api/corrections';
import { mayDecide } from '../model/correction-view';
import styles from './corrections.module.css';

export interface DecisionPartProps {
  correction: ListedCorrection;
  terminal: WireTerminal;
  onOpen: (turnId: string) => void;
}

/** The decision, for those who may; for the others who does. */
export function DecisionPart({ correction, terminal, onOpen }: DecisionPartProps) {
  const person = usePerson();
  const [isDeclining, setDeclining] = useState(false);
  const decide = useDecide(correction);
  const right = mayDecide(correction, {
    id: person.id,
    isSupervisorHere: mayRecord(person, 'correction-approved', terminal.code),
  });
  const waits = correction.state === 'waiting';
  return (
    <>
      {waits && right === 'no' && (
        <p className={styles.notice}>Only the supervisor of {terminal.name} can approve this.</p>
      )}
      {waits && right === 'own' && (
        <p className={styles.notice}>You asked for this yourself: somebody else has to decide on it.</p>
      )}
      {decide.error !== null && (
        <p className="sp-problems" role="alert">
          {errorText(decide.error)}
        </p>
      )}
      {waits && right === 'yes' && isDeclining && (
        <DeclineForm
          isSending={decide.isPending}
          onDecline={(reason) => decide.mutate({ isApproved: false, reason })}
          onBack={() => setDeclining(false)}
        />
      )}
      <div className="sp-actions">
        {waits && right === 'yes' && !isDeclining && (
          <>
            <Button
              intent="primary"
              loading={decide.isPending}
              onClick={() => decide.mutate({ isApproved: true })}
            >
              Approve
            </Button>
            <Button onClick={() => setDeclining(true)}>Decline</Button>
          </>
        )}
        <Button variant="minimal" onClick={() => onOpen(correction.turnId)}>
          Open the turn
        </Button>
      </div>
    </>
  );
}

interface DeclineProps {
  isSending: boolean;
  onDecline: (reason: string) => void;
  onBack: () => void;
}

/** A no carries its reason. */
function DeclineForm({ isSending, onDecline, onBack }: DeclineProps) {
  const id = useId();
  const [reason, setReason] = useState('');
  const [isAsked, setAsked] = useState(false);
  const isMissing = isAsked && reason.trim() === '';
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    setAsked(true);
    if (reason.trim() !== '') onDecline(reason.trim());
  };
  return (
    <form onSubmit={submit} noValidate className={styles.decline}>
      <FormGroup
        label="Why it is declined"
        labelFor={id}
        intent={isMissing ? 'danger' : 'none'}
        helperText={isMissing ? 'Give the reason' : undefined}
      >
        <InputGroup
          id={id}
          autoFocus
          value={reason}
          maxLength={300}
          aria-invalid={isMissing}
          onValueChange={setReason}
        />
      </FormGroup>
      <Button type="submit" loading={isSending}>
        Decline it
      </Button>
      <Button variant="minimal" onClick={onBack}>
        Back
      </Button>
    </form>
  );
}
