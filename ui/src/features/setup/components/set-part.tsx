import { Button } from '@blueprintjs/core';
import type { WireSet } from '@stubpost/shared';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { ErrorState, LoadingRows } from '../../../components/page-states';
import { setsQuery } from '../api/sets';
import { setSummary } from '../model/set-draft';
import { SetForm } from './set-form';
import styles from './setup.module.css';

/** A set that is not there yet. */
const newSet: WireSet = { id: 'new', version: 0, label: '', units: [], leadingUnit: null, offAirSince: null };

/** Equipment sets: what they are made of. The phone asks for handbrakes by the cars of the set. */
export function SetPart() {
  const { data, error, refetch } = useQuery(setsQuery);
  const [chosenLabel, setChosenLabel] = useState<string | null>(null);
  const [savedLabel, setSavedLabel] = useState<string | null>(null);
  if (error !== null) return <ErrorState error={error} onRetry={() => void refetch()} />;
  if (data === undefined) return <LoadingRows what="sets" onRetry={() => void refetch()} />;
  const sets = [...data].sort((a, b) => a.label.localeCompare(b.label, 'en', { numeric: true }));
  const chosen = chosenLabel === '' ? newSet : sets.find(({ label }) => label === chosenLabel);
  return (
    <div className={styles.sets}>
      <section className="sp-panel" aria-labelledby="sets">
        <header>
          <h2 id="sets">Sets</h2>
          <Button onClick={() => setChosenLabel('')}>Add a set</Button>
        </header>
        {savedLabel !== null && <p role="status">Set {savedLabel} is saved.</p>}
        {sets.length === 0 && <p>No sets yet.</p>}
        {sets.length > 0 && <SetTable sets={sets} chosenLabel={chosenLabel} onChoose={setChosenLabel} />}
      </section>
      {chosen !== undefined && (
        <SetForm
          key={`${chosen.id} ${chosen.version}`}
          set={chosen}
          onSaved={({ label }) => {
            setChosenLabel(label);
            setSavedLabel(label);
          }}
        />
      )}
    </div>
  );
}

interface SetTableProps {
  sets: readonly WireSet[];
  chosenLabel: string | null;
  onChoose: (label: string) => void;
}

function SetTable({ sets, chosenLabel, onChoose }: SetTableProps) {
  return (
    <table className="sp-table">
      <thead>
        <tr>
          <th scope="col">Set</th>
          <th scope="col">From the post outwards</th>
          <th scope="col">Leads on leaving</th>
        </tr>
      </thead>
      <tbody>
        {sets.map((set) => (
          <tr key={set.id} className={set.label === chosenLabel ? styles.chosen : undefined}>
            <th scope="row">
              <button
                type="button"
                className={styles.pick}
                aria-pressed={set.label === chosenLabel}
                onClick={() => onChoose(set.label)}
              >
                {set.label}
              </button>
            </th>
            <td>{setSummary(set)}</td>
            <td>{set.leadingUnit ?? 'not known'}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
