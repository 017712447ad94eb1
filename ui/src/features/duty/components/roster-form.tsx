import { Button } from '@blueprintjs/core';
import type { WireDutyRoster } from '@stubpost/shared';
import { useState } from 'react';
import { errorText } from '../../../lib/error-texts';
import { dateAt, formatStamp } from '../../../lib/time-display';
import { readNow } from '../../../lib/use-now';
import { useChangeRoster } from '../api/roster';
import { quietProblem, type RosterDraft, requestOf, withShifts } from '../model/roster-draft';
import { AddShift } from './add-shift';
import { QuietEditor } from './quiet-editor';
import { ShiftTable } from './shift-table';
import { StepEditor } from './step-editor';
import { ToldNow } from './told-now';
import styles from './duty.module.css';

interface RosterFormProps {
  roster: WireDutyRoster;
  mayEdit: boolean;
  onSaved: () => void;
}

function changedWords({ changedAt, changedBy, zone }: WireDutyRoster): string {
  if (changedAt === null) return 'Not changed yet: the steps are the shipped ones';
  return `Changed ${formatStamp(changedAt, zone)}${changedBy === null ? '' : ` by ${changedBy}`}`;
}

/** The roster as one draft: nothing counts until it is saved. */
export function RosterForm({ roster, mayEdit, onSaved }: RosterFormProps) {
  const [draft, setDraft] = useState<RosterDraft>(roster);
  const [problem, setProblem] = useState<string | null>(null);
  const change = useChangeRoster(roster.terminal);
  const isChanged = draft !== roster;
  const put = (part: Partial<RosterDraft>): void => setDraft({ ...draft, ...part });
  const save = (): void => {
    const wrong = quietProblem(draft);
    setProblem(wrong);
    if (wrong === null) change.mutate(requestOf(draft, roster.version), { onSuccess: onSaved });
  };
  const today = dateAt(readNow(), roster.zone);
  return (
    <>
      {problem !== null && (
        <p className="sp-problems" role="alert">
          {problem}
        </p>
      )}
      {change.isError && (
        <p className="sp-problems" role="alert">
          {errorText(change.error)}
        </p>
      )}
      <div className={styles.split}>
        <section className="sp-panel" aria-labelledby="on-duty">
          <header>
            <h2 id="on-duty">On duty</h2>
            <span className="muted">{changedWords(roster)}</span>
          </header>
          <ShiftTable
            draft={draft}
            zone={roster.zone}
            onRemove={
              mayEdit ? (gone) => put({ shifts: draft.shifts.filter((shift) => shift !== gone) }) : undefined
            }
          />
          {mayEdit && (
            <AddShift
              people={draft.people}
              zone={roster.zone}
              today={today}
              onAdd={(added) => put({ shifts: withShifts(draft.shifts, added) })}
            />
          )}
        </section>
        <ToldNow draft={draft} zone={roster.zone} />
        <section className="sp-panel" aria-labelledby="steps">
          <header>
            <h2 id="steps">Steps</h2>
          </header>
          <StepEditor steps={draft.steps} isReadOnly={!mayEdit} onChange={(steps) => put({ steps })} />
        </section>
        <section className="sp-panel" aria-labelledby="quiet">
          <header>
            <h2 id="quiet">Quiet hours</h2>
          </header>
          <QuietEditor people={draft.people} isReadOnly={!mayEdit} onChange={(people) => put({ people })} />
          <footer>
            Whoever is on the desk is told all the same. When everybody else is quiet, Act now counts more.
          </footer>
        </section>
      </div>
      {mayEdit && (
        <div className={`sp-actions ${styles.save}`}>
          <Button intent="primary" loading={change.isPending} disabled={!isChanged} onClick={save}>
            Save the roster
          </Button>
          {isChanged && <span>Not saved yet.</span>}
          {isChanged && <Button onClick={() => setDraft(roster)}>Put back</Button>}
        </div>
      )}
    </>
  );
}
