import { Button, HTMLSelect, InputGroup } from '@blueprintjs/core';
import {
  unitKinds,
  unitKindWords,
  type SetProblem,
  type UnitDraft,
  type UnitField,
} from '../model/set-draft';
import styles from './setup.module.css';

/** Id of a field of a unit, for the links of the summary. */
export function unitFieldId(unitId: string, field: SetProblem['field']): string {
  return `unit-${unitId}-${field}`;
}

const columns: { field: UnitField; name: string }[] = [
  { field: 'lengthFeet', name: 'Length, ft' },
  { field: 'tons', name: 'Tons' },
  { field: 'handbrakePounds', name: 'Handbrake, lb' },
];

export interface UnitTableProps {
  units: readonly UnitDraft[];
  problems: readonly SetProblem[];
  onChange: (units: UnitDraft[]) => void;
}

/** One row a vehicle. What is not known stays empty. */
export function UnitTable({ units, problems, onChange }: UnitTableProps) {
  const change = (id: string, part: Partial<UnitDraft>): void =>
    onChange(units.map((unit) => (unit.id === id ? { ...unit, ...part } : unit)));
  const move = (id: string, by: -1 | 1): void => {
    const at = units.findIndex((unit) => unit.id === id);
    const unit = units[at];
    if (unit !== undefined && at + by >= 0 && at + by < units.length)
      onChange(units.toSpliced(at, 1).toSpliced(at + by, 0, unit));
  };
  return (
    <div className="sp-table-scroll">
      <table className="sp-table">
        <thead>
          <tr>
            <th scope="col">Number</th>
            <th scope="col">Kind</th>
            {columns.map(({ field, name }) => (
              <th key={field} scope="col">
                {name}
              </th>
            ))}
            <th scope="col">
              <span className="unseen">Place and removal</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {units.map((unit) => (
            <Row
              key={unit.id}
              unit={unit}
              problems={problems.filter(({ unitId }) => unitId === unit.id)}
              onChange={(part) => change(unit.id, part)}
              onMove={(by) => move(unit.id, by)}
              onRemove={() => onChange(units.filter(({ id }) => id !== unit.id))}
            />
          ))}
        </tbody>
      </table>
    </div>
  );
}

interface RowProps {
  unit: UnitDraft;
  problems: readonly SetProblem[];
  onChange: (part: Partial<UnitDraft>) => void;
  onMove: (by: -1 | 1) => void;
  onRemove: () => void;
}

function Row({ unit, problems, onChange, onMove, onRemove }: RowProps) {
  const name = unit.number.trim() === '' ? 'new unit' : unit.number;
  return (
    <tr>
      <UnitCell
        unit={unit}
        field="number"
        label={`Number of ${name}`}
        problems={problems}
        onChange={onChange}
      />
      <td>
        <HTMLSelect
          aria-label={`Kind of ${name}`}
          value={unit.kind}
          options={unitKinds.map((value) => ({ value, label: unitKindWords[value] }))}
          onChange={(event) => {
            const kind = unitKinds.find((each) => each === event.currentTarget.value);
            if (kind !== undefined) onChange({ kind });
          }}
        />
      </td>
      {columns.map((column) => (
        <UnitCell
          key={column.field}
          unit={unit}
          field={column.field}
          label={`${column.name} of ${name}`}
          problems={problems}
          onChange={onChange}
        />
      ))}
      <td className={styles.nowrap}>
        <Button size="small" aria-label={`Move ${name} up`} onClick={() => onMove(-1)}>
          Up
        </Button>{' '}
        <Button size="small" aria-label={`Move ${name} down`} onClick={() => onMove(1)}>
          Down
        </Button>{' '}
        <Button size="small" aria-label={`Remove ${name}`} onClick={onRemove}>
          Remove
        </Button>
      </td>
    </tr>
  );
}

interface UnitCellProps {
  unit: UnitDraft;
  field: UnitField;
  label: string;
  problems: readonly SetProblem[];
  onChange: (part: Partial<UnitDraft>) => void;
}

function UnitCell({ unit, field, label, problems, onChange }: UnitCellProps) {
  const id = unitFieldId(unit.id, field);
  const problem = problems.find((each) => each.field === field)?.words;
  return (
    <td className={styles.cell}>
      <div className={`${styles.narrow} ${problem === undefined ? '' : styles.wrongField}`}>
        <InputGroup
          id={id}
          aria-label={label}
          aria-invalid={problem !== undefined}
          {...(problem === undefined ? {} : { 'aria-describedby': `${id}-help` })}
          inputMode={field === 'number' ? 'text' : 'decimal'}
          autoComplete="off"
          value={unit[field]}
          onValueChange={(text) => onChange({ [field]: text })}
        />
      </div>
      {problem !== undefined && (
        <span id={`${id}-help`} className={`small ${styles.wrong}`}>
          {problem}
        </span>
      )}
    </td>
  );
}
