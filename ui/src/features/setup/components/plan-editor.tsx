import { Button } from '@blueprintjs/core';
import type { WireStepPlan, WireTerminal } from '@stubpost/shared';
import { useMemo, useState, type FormEvent } from 'react';
import { v4 as makeId } from 'uuid';
import { SafetyCaution } from '../../../components/caution';
import { FieldSummary, type FieldProblem } from '../../../components/field-summary';
import { Figure } from '../../../components/figure';
import { errorText } from '../../../lib/error-texts';
import { formatDuration } from '../../../lib/time-display';
import { useAddVersion } from '../api/plans';
import {
  draftOfStep,
  newStepDraft,
  readPlan,
  withChanged,
  withMoved,
  withoutStep,
  type DraftProblem,
  type StepDraft,
} from '../model/plan-draft';
import { planFigures } from '../model/plan-figures';
import { TextField } from './setup-field';
import styles from './setup.module.css';
import { StepForm, stepFieldId } from './step-form';
import { StepsTable } from './steps-table';

const nameId = 'plan-name';
const fromId = 'plan-from';

export interface PlanEditorProps {
  terminal: WireTerminal;
  /** The version the new one starts from. */
  from: WireStepPlan;
  /** Made, or null when it was left. */
  onDone: (made: WireStepPlan | null) => void;
}

/** A new version of a plan: all steps, checked as a whole while they are typed, in force from a day on. */
export function PlanEditor({ terminal, from, onDone }: PlanEditorProps) {
  const [rows, setRows] = useState<StepDraft[]>(() =>
    from.steps.map((step) => draftOfStep(step, `step-${makeId()}`)),
  );
  const [chosenId, setChosenId] = useState<string | null>(rows[0]?.id ?? null);
  const [name, setName] = useState(from.name);
  const [effectiveFrom, setEffectiveFrom] = useState('');
  const [summary, setSummary] = useState<FieldProblem[]>([]);
  const add = useAddVersion(terminal.code);

  const { steps, problems } = useMemo(() => readPlan(rows), [rows]);
  const figures = useMemo(() => planFigures(steps, problems.length > 0), [steps, problems]);
  const chosen = rows.find(({ id }) => id === chosenId);
  // A time that cannot be read yet, or steps that wait for one another, leave nothing to add up.
  const isReckoned = !problems.some(({ field }) => field === 'typical' || field === 'after');
  const heads = headProblems(name, effectiveFrom);

  const submit = (event: FormEvent): void => {
    event.preventDefault();
    const found = [...heads, ...problems.map((problem) => summaryOf(problem, rows))];
    setSummary(found);
    const firstWrong = problems[0]?.stepId;
    if (firstWrong !== undefined && firstWrong !== null) setChosenId(firstWrong);
    if (found.length > 0) return;
    add.mutate({ key: from.key, name: name.trim(), effectiveFrom, steps }, { onSuccess: onDone });
  };
  const addStep = (): void => {
    const row = newStepDraft(`step-${makeId()}`);
    setRows([...rows, row]);
    setChosenId(row.id);
  };

  return (
    <form onSubmit={submit} noValidate className={styles.plan}>
      <div className={styles.stack}>
        <section className="sp-panel" aria-labelledby="plan-new">
          <header>
            <h2 id="plan-new">
              New version of {from.name}, from version {from.version}
            </h2>
          </header>
          <FieldSummary problems={summary} />
          {add.isError && (
            <p className="sp-problems" role="alert">
              {errorText(add.error)}
            </p>
          )}
          <div className={styles.row}>
            <TextField
              id={nameId}
              label="Name of the plan"
              value={name}
              onChange={setName}
              maxLength={80}
              problem={summary.find(({ fieldId }) => fieldId === nameId)?.words}
            />
            <TextField
              id={fromId}
              type="date"
              label="In force from"
              hint="Service day. Turns on which something is recorded keep the version of their day."
              value={effectiveFrom}
              onChange={setEffectiveFrom}
              problem={summary.find(({ fieldId }) => fieldId === fromId)?.words}
            />
          </div>
          <div className={styles.figures} aria-live="polite">
            <Figure
              label="Shortest turn"
              value={isReckoned ? formatDuration(figures.shortestSeconds) : '–'}
              remark="arrival to departure, at typical durations"
            />
            <Figure label="To mend" value={problems.length === 0 ? 'nothing' : problems.length} />
          </div>
          <StepsTable
            rows={steps.map((step, index) => rowOf(rows[index]?.id ?? step.key, step, problems))}
            latestFinishes={figures.latestFinishes}
            chosenId={chosenId}
            onChoose={setChosenId}
          />
          <div className="sp-actions">
            <Button onClick={addStep}>Add a step</Button>
            <Button type="submit" intent="primary" loading={add.isPending}>
              Put in force
            </Button>
            <Button onClick={() => onDone(null)}>Leave without saving</Button>
          </div>
        </section>
        <SafetyCaution />
      </div>
      {chosen !== undefined && (
        <StepForm
          key={chosen.id}
          draft={chosen}
          others={rows.filter(({ id }) => id !== chosen.id)}
          problems={problems.filter(({ stepId }) => stepId === chosen.id)}
          onChange={(change) => setRows(withChanged(rows, chosen.id, change))}
          onMove={(by) => setRows(withMoved(rows, chosen.id, by))}
          onRemove={() => {
            setRows(withoutStep(rows, chosen.id));
            setChosenId(rows.find(({ id }) => id !== chosen.id)?.id ?? null);
          }}
        />
      )}
    </form>
  );
}

function headProblems(name: string, effectiveFrom: string): FieldProblem[] {
  return [
    ...(name.trim() === '' ? [{ fieldId: nameId, words: 'Name of the plan is missing.' }] : []),
    ...(effectiveFrom === '' ? [{ fieldId: fromId, words: 'The day it comes into force is missing.' }] : []),
  ];
}

function summaryOf({ stepId, field, words }: DraftProblem, rows: readonly StepDraft[]): FieldProblem {
  const row = rows.find(({ id }) => id === stepId);
  if (row === undefined || field === null) return { fieldId: nameId, words };
  const name = row.shortLabel === '' ? 'New step' : row.shortLabel;
  return { fieldId: stepFieldId(row.id, field), words: words.startsWith(name) ? words : `${name}: ${words}` };
}

function rowOf(
  id: string,
  step: ReturnType<typeof readPlan>['steps'][number],
  problems: readonly DraftProblem[],
) {
  return { id, step, isWrong: problems.some(({ stepId }) => stepId === id) };
}
