import { Button } from '@blueprintjs/core';
import type { WireStepPlan, WireTerminal } from '@stubpost/shared';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { SafetyCaution } from '../../../components/caution';
import { Figure } from '../../../components/figure';
import { ErrorState, LoadingRows } from '../../../components/page-states';
import { useMay } from '../../../lib/session';
import { dateAt, formatDuration } from '../../../lib/time-display';
import { useNow } from '../../../lib/use-now';
import { plansQuery } from '../api/plans';
import { inForceOn, stepFacts } from '../model/compare-plans';
import { planFigures } from '../model/plan-figures';
import { PlanCompare } from './plan-compare';
import { PlanEditor } from './plan-editor';
import styles from './setup.module.css';
import { StepsTable } from './steps-table';
import { VersionList, fromWords } from './version-list';

/** Step plans of a terminal: the version in force, all others, and the way to a new one. */
export function PlanPart({ terminal }: { terminal: WireTerminal }) {
  const { data, error, refetch } = useQuery(plansQuery(terminal.code));
  const [editing, setEditing] = useState<WireStepPlan | null>(null);
  const [shownId, setShownId] = useState<string | null>(null);
  const today = dateAt(useNow(60), terminal.zone);
  if (error !== null) return <ErrorState error={error} onRetry={() => void refetch()} />;
  if (data === undefined) return <LoadingRows what="step plans" onRetry={() => void refetch()} />;
  const versions = [...data].sort((a, b) => b.version - a.version);
  const inForce = inForceOn(versions, today);
  const shown = versions.find(({ id }) => id === shownId) ?? inForce ?? versions[0];
  if (shown === undefined) return <p>No step plan yet.</p>;
  if (editing !== null) {
    return (
      <PlanEditor
        key={editing.id}
        terminal={terminal}
        from={editing}
        onDone={(made) => {
          setEditing(null);
          if (made !== null) setShownId(made.id);
        }}
      />
    );
  }
  return (
    <div className={styles.plan}>
      <div className={styles.stack}>
        <ShownPlan plan={shown} terminal={terminal} onEdit={() => setEditing(shown)} />
        <PlanCompare key={shown.id} shown={shown} versions={versions} />
        <SafetyCaution />
      </div>
      <VersionList
        versions={versions}
        shownId={shown.id}
        inForceId={inForce?.id ?? null}
        zone={terminal.zone}
        onShow={setShownId}
      />
    </div>
  );
}

function ShownPlan({
  plan,
  terminal,
  onEdit,
}: {
  plan: WireStepPlan;
  terminal: WireTerminal;
  onEdit: () => void;
}) {
  const mayEdit = useMay('plans.edit', terminal.code);
  const [chosenKey, setChosenKey] = useState<string | null>(null);
  const figures = planFigures(plan.steps, false);
  const chosen = plan.steps.find(({ key }) => key === chosenKey);
  return (
    <section className="sp-panel" aria-labelledby="plan-shown">
      <header>
        <h2 id="plan-shown">
          {plan.name}, version {plan.version}, {fromWords(plan)}
        </h2>
        {mayEdit && (
          <Button intent="primary" onClick={onEdit}>
            New version from this one
          </Button>
        )}
      </header>
      <div className={styles.figures}>
        <Figure
          label="Shortest turn"
          value={formatDuration(figures.shortestSeconds)}
          remark="arrival to departure, at typical durations"
        />
        <Figure label="Steps" value={plan.steps.length} />
      </div>
      <StepsTable
        rows={plan.steps.map((step) => ({ id: step.key, step, isWrong: false }))}
        latestFinishes={figures.latestFinishes}
        chosenId={chosenKey}
        onChoose={(key) => setChosenKey(key === chosenKey ? null : key)}
      />
      {chosen !== undefined && (
        <dl className={styles.facts}>
          {stepFacts(chosen).map(([what, value]) => (
            <FactRow key={what} what={what} value={value} />
          ))}
        </dl>
      )}
      {!mayEdit && <p className="muted">Only the supervisor of {terminal.name} can make a new version.</p>}
    </section>
  );
}

function FactRow({ what, value }: { what: string; value: string }) {
  return (
    <>
      <dt>{what}</dt>
      <dd>{value}</dd>
    </>
  );
}
