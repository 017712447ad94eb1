import { Button } from '@blueprintjs/core';
import type { WireSet } from '@stubpost/shared';
import { useState, type FormEvent } from 'react';
import { v4 as makeId } from 'uuid';
import { FieldSummary, type FieldProblem } from '../../../components/field-summary';
import { errorText } from '../../../lib/error-texts';
import { usePutSet } from '../api/sets';
import { draftOfSet, newUnitDraft, readSet, type SetDraft, type UnitDraft } from '../model/set-draft';
import { SelectField, TextField } from './setup-field';
import styles from './setup.module.css';
import { UnitTable, unitFieldId } from './unit-table';

/** What one set is made of, in order from the end at the bumping post. */
export function SetForm({ set, onSaved }: { set: WireSet; onSaved: (saved: WireSet) => void }) {
  const isNew = set.version === 0;
  const [draft, setDraft] = useState<SetDraft>(() => draftOfSet(set, makeId));
  const [summary, setSummary] = useState<FieldProblem[]>([]);
  const put = usePutSet();
  const read = readSet(draft);
  const setUnits = (units: UnitDraft[]): void => setDraft({ ...draft, units });

  const submit = (event: FormEvent): void => {
    event.preventDefault();
    setSummary(
      read.problems.map(({ unitId, field, words }) => ({
        fieldId: unitId === null ? 'set-label' : unitFieldId(unitId, field),
        words,
      })),
    );
    if (read.problems.length > 0) return;
    const version = isNew ? {} : { version: set.version };
    put.mutate(
      { label: draft.label.trim(), request: { ...read.request, ...version } },
      { onSuccess: onSaved },
    );
  };
  return (
    <form className="sp-panel" onSubmit={submit} noValidate aria-labelledby="set-form">
      <header>
        <h2 id="set-form">{isNew ? 'New set' : `Set ${set.label}`}</h2>
        <span className="muted">from the post outwards</span>
      </header>
      <FieldSummary problems={summary} />
      {put.isError && (
        <p className="sp-problems" role="alert">
          {errorText(put.error)}
        </p>
      )}
      {isNew && (
        <TextField
          id="set-label"
          label="Set"
          hint="As the crews call it"
          maxLength={20}
          value={draft.label}
          onChange={(label) => setDraft({ ...draft, label })}
          problem={summary.find(({ fieldId }) => fieldId === 'set-label')?.words}
        />
      )}
      {draft.units.length > 0 && (
        <UnitTable units={draft.units} problems={read.problems} onChange={setUnits} />
      )}
      <div className="sp-actions">
        <Button onClick={() => setUnits([...draft.units, newUnitDraft(makeId())])}>Add a unit</Button>
      </div>
      {draft.units.length > 0 && (
        <div className={styles.narrowField}>
          <SelectField
            id="set-leading"
            label="Leads on leaving"
            value={draft.leadingUnit}
            options={[
              { value: '', label: 'not known' },
              ...draft.units.map(({ id, number }) => ({
                value: id,
                label: number.trim() === '' ? 'new unit' : number,
              })),
            ]}
            onChange={(leadingUnit) => setDraft({ ...draft, leadingUnit })}
          />
        </div>
      )}
      <div className="sp-actions">
        <Button type="submit" intent="primary" loading={put.isPending}>
          Save set
        </Button>
      </div>
    </form>
  );
}
