import { Button, Checkbox, FormGroup } from '@blueprintjs/core';
import { DateInput3 } from '@blueprintjs/datetime2';
import type { CalendarDate, WireTimetable, WireTimetableHead, WireTimetableSummary } from '@stubpost/shared';
import { enUS } from 'date-fns/locale/en-US';
import { useState } from 'react';
import { FieldSummary, type FieldProblem } from '../../../components/field-summary';
import { announce } from '../../../lib/announcer';
import { errorText } from '../../../lib/error-texts';
import { formatServiceDate, formatServiceDateWithYear } from '../../../lib/time-display';
import { useActivate, useRollBack } from '../api/timetable-acts';
import { fromPickerDate, parsePickerDate, toPickerDate } from '../model/picker-date';
import { activationFrom, fromFieldId, type ActivationDraft } from '../model/terminal-draft';
import { formatCount, oddStart, shortName } from '../model/timetable-words';
import styles from './timetables.module.css';

interface ActivationBarProps {
  timetable: WireTimetable;
  summary: WireTimetableSummary;
  draft: ActivationDraft;
  today: CalendarDate;
  /** The timetable that runs today. */
  running: WireTimetableHead | undefined;
  onDraft: (change: Partial<ActivationDraft>) => void;
}

/** From when a timetable runs, and the way back. */
export function ActivationBar(props: ActivationBarProps) {
  const { timetable, summary, draft, today, running, onDraft } = props;
  const [tried, setTried] = useState<{ draft: ActivationDraft; problems: FieldProblem[] } | null>(null);
  const activate = useActivate(timetable.id);
  const rollBack = useRollBack(timetable.id);
  const isPending = activate.isPending || rollBack.isPending;
  const submit = (): void => {
    const { request, problems: found } = activationFrom(draft);
    setTried({ draft, problems: found });
    if (request === null) return;
    activate.mutate(request, {
      onSuccess: () => announce(`${timetable.fileName} is active from ${formatServiceDate(request.from)}`),
    });
  };
  const error = activate.error ?? rollBack.error;
  return (
    // Not a form: the Enter that ends typing a date must not make a timetable active.
    <section className="sp-panel" aria-label="Make active">
      {/* What was wrong is gone with the first change; the next try says what still is. */}
      {tried !== null && tried.draft === draft && <FieldSummary problems={tried.problems} />}
      {error !== null && (
        <p className="sp-problems" role="alert">
          {errorText(error)}
        </p>
      )}
      <div className={styles.lastRow}>
        <FormGroup label="Active from, service date" labelFor={fromFieldId}>
          <DateInput3
            value={draft.from}
            onChange={(value) => onDraft({ from: value === null ? null : value.slice(0, 10) })}
            formatDate={fromPickerDate}
            parseDate={parsePickerDate}
            locale={enUS}
            highlightCurrentDay
            minDate={toPickerDate('2000-01-01')}
            maxDate={toPickerDate('2099-12-31')}
            showTimezoneSelect={false}
            inputProps={{ id: fromFieldId, placeholder: undefined }}
          />
        </FormGroup>
        <p className={styles.lastWords}>{standing(timetable, running, draft.from)}</p>
        <div className="sp-actions">
          {timetable.rollBackTo !== null && (
            <Button
              disabled={isPending}
              onClick={() =>
                rollBack.mutate(undefined, { onSuccess: (back) => announce(`${back.fileName} runs again`) })
              }
            >
              {rollBack.isPending
                ? 'Taking back'
                : `Take back to ${shortName(timetable.rollBackTo.fileName)}`}
            </Button>
          )}
          <Button intent="primary" disabled={isPending} onClick={submit}>
            {activate.isPending ? 'Making active' : activateWords(draft.from)}
          </Button>
        </div>
      </div>
      {summary.guessedTurns > 0 && (
        <Checkbox
          checked={draft.acceptGuesses}
          onChange={(event) => onDraft({ acceptGuesses: event.currentTarget.checked })}
        >
          Take the {formatCount(summary.guessedTurns)} guessed turns too: trains without a block, paired first
          in, first out
        </Checkbox>
      )}
      <OddStart words={oddStart(summary, draft.from, today)} />
    </section>
  );
}

function OddStart({ words }: { words: string | null }) {
  return words === null ? null : <p className="sp-caution">{words}</p>;
}

function activateWords(from: CalendarDate | null): string {
  return from === null ? 'Make active' : `Make active from ${formatServiceDate(from)}`;
}

function standing(
  timetable: WireTimetable,
  running: WireTimetableHead | undefined,
  from: CalendarDate | null,
): string {
  if (timetable.state === 'active' && timetable.activeFrom !== null) {
    return `Active from ${formatServiceDateWithYear(timetable.activeFrom)}. Activating again takes the terminals above.`;
  }
  if (running === undefined) return 'No timetable runs yet.';
  const until = from === null ? '' : ' until then';
  return `${shortName(running.fileName)} runs${until}. One action takes this back. Turns that have begun stay as they are.`;
}
