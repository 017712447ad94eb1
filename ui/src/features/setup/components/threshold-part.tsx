import { Button, Checkbox } from '@blueprintjs/core';
import type { WireTerminal, WireTerminalSettings } from '@stubpost/shared';
import { useQuery } from '@tanstack/react-query';
import { useState, type FormEvent } from 'react';
import { FieldSummary, type FieldProblem } from '../../../components/field-summary';
import { ErrorState, LoadingRows } from '../../../components/page-states';
import { errorText } from '../../../lib/error-texts';
import { formatStamp } from '../../../lib/time-display';
import { settingsQuery, useChangeSettings } from '../api/terminals';
import { draftOfThresholds, readThresholds, thresholdFields } from '../model/threshold-draft';
import { TextField } from './setup-field';
import styles from './setup.module.css';

/** What a terminal counts as late and silent, and what its phones ask for first. */
export function ThresholdPart({ terminal }: { terminal: WireTerminal }) {
  const { data, error, refetch } = useQuery(settingsQuery(terminal.code));
  const [isSaved, setSaved] = useState(false);
  if (error !== null) return <ErrorState error={error} onRetry={() => void refetch()} />;
  if (data === undefined) return <LoadingRows what="thresholds" onRetry={() => void refetch()} />;
  return (
    <>
      {isSaved && <p role="status">Saved.</p>}
      <ThresholdForm key={data.version} terminal={terminal} settings={data} onSaved={() => setSaved(true)} />
    </>
  );
}

interface FormProps {
  terminal: WireTerminal;
  settings: WireTerminalSettings;
  onSaved: () => void;
}

function ThresholdForm({ terminal, settings, onSaved }: FormProps) {
  const [draft, setDraft] = useState(() => draftOfThresholds(settings.thresholds));
  const [briefingRequired, setBriefingRequired] = useState(settings.briefingRequired);
  const [summary, setSummary] = useState<FieldProblem[]>([]);
  const change = useChangeSettings(terminal.code);
  const { thresholds, problems } = readThresholds(draft);
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    setSummary(problems.map(({ field, words }) => ({ fieldId: field, words })));
    if (problems.length === 0)
      change.mutate({ version: settings.version, thresholds, briefingRequired }, { onSuccess: onSaved });
  };
  return (
    <form className={`sp-panel ${styles.form}`} onSubmit={submit} noValidate aria-labelledby="thresholds">
      <header>
        <h2 id="thresholds">Thresholds of {terminal.name}</h2>
        <span className="muted">{changedWords(settings, terminal.zone)}</span>
      </header>
      <FieldSummary problems={summary} />
      {change.isError && (
        <p className="sp-problems" role="alert">
          {errorText(change.error)}
        </p>
      )}
      <div className={styles.fields}>
        {thresholdFields.map(({ key, label, hint, unit }) => (
          <TextField
            key={key}
            id={key}
            label={label}
            hint={hint}
            unit={unit}
            inputMode="numeric"
            value={draft[key]}
            onChange={(text) => setDraft({ ...draft, [key]: text })}
            problem={problems.find(({ field }) => field === key)?.words}
          />
        ))}
      </div>
      <Checkbox
        checked={draft.onTimeInclusive}
        label="A departure exactly at the threshold is on time"
        onChange={() => setDraft({ ...draft, onTimeInclusive: !draft.onTimeInclusive })}
      />
      <Checkbox
        checked={briefingRequired}
        label="The phone asks for the safety briefing before what is recorded in the controlling cab"
        onChange={() => setBriefingRequired(!briefingRequired)}
      />
      <div className="sp-actions">
        <Button type="submit" intent="primary" loading={change.isPending}>
          Save
        </Button>
      </div>
    </form>
  );
}

function changedWords({ changedAt, changedBy }: WireTerminalSettings, zone: string): string {
  if (changedAt === null) return 'Shipped values: each railroad sets its own';
  return `Changed ${formatStamp(changedAt, zone)}${changedBy === null ? '' : ` by ${changedBy}`}`;
}
