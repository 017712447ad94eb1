import { FormGroup, HTMLSelect, InputGroup } from '@blueprintjs/core';
import { DateInput3 } from '@blueprintjs/datetime2';
import { enUS } from 'date-fns/locale/en-US';
import { useId, useState } from 'react';
import { formatLimit, parseLimit } from '../model/figures-text';
import { fromPickerDate, toPickerDate, type HistorySearch } from '../model/history-search';
import styles from './history.module.css';

const formatDay = (day: Date): string => fromPickerDate(day);
const parseDay = (text: string): Date | false => {
  const match = /^(\d{4})-(\d{2})-(\d{2})$/.exec(text.trim());
  return match === null ? false : toPickerDate(text.trim());
};

function LimitField({ seconds, onChange }: { seconds: number; onChange: (seconds: number) => void }) {
  const id = useId();
  const [text, setText] = useState(formatLimit(seconds));
  const read = parseLimit(text);
  return (
    <FormGroup
      label="On time up to, min:s"
      labelFor={id}
      helperText={read === null ? 'Minutes and seconds, such as 0:59' : undefined}
      intent={read === null ? 'danger' : 'none'}
    >
      <InputGroup
        id={id}
        className={styles.limit}
        value={text}
        aria-invalid={read === null}
        onValueChange={(next) => {
          setText(next);
          const limit = parseLimit(next);
          if (limit !== null) onChange(limit);
        }}
        onBlur={() => {
          if (read !== null) setText(formatLimit(read));
        }}
      />
    </FormGroup>
  );
}

/** A service date, picked from a calendar or typed as 2026-03-03. */
function DayField({ label, day, onChange }: { label: string; day: string; onChange: (day: string) => void }) {
  const id = useId();
  return (
    <FormGroup label={label} labelFor={id}>
      <DateInput3
        value={day}
        onChange={(next) => {
          if (next !== null) onChange(next.slice(0, 10));
        }}
        formatDate={formatDay}
        parseDate={parseDay}
        locale={enUS}
        highlightCurrentDay
        showTimezoneSelect={false}
        inputProps={{ id }}
      />
    </FormGroup>
  );
}

/** Service dates and the rule, in words; each change goes into the address at once. */
export function RuleFields({
  search,
  onChange,
}: {
  search: HistorySearch;
  onChange: (next: HistorySearch) => void;
}) {
  const { rule } = search;
  const ids = { early: useId(), annulled: useId(), exactly: useId() };
  const setRule = (changed: Partial<HistorySearch['rule']>): void =>
    onChange({ ...search, rule: { ...rule, ...changed } });
  return (
    <form
      className="sp-fields"
      onSubmit={(event) => event.preventDefault()}
      aria-label="Service dates, both included, and rule"
    >
      <DayField
        label="First service date"
        day={search.from}
        onChange={(from) => onChange({ ...search, from })}
      />
      <DayField label="Last service date" day={search.to} onChange={(to) => onChange({ ...search, to })} />
      <LimitField
        seconds={rule.thresholdSeconds}
        onChange={(thresholdSeconds) => setRule({ thresholdSeconds })}
      />
      <FormGroup label="Exactly the limit" labelFor={ids.exactly}>
        <HTMLSelect
          id={ids.exactly}
          value={rule.inclusive ? 'on-time' : 'late'}
          onChange={(event) => setRule({ inclusive: event.currentTarget.value === 'on-time' })}
          options={[
            { value: 'on-time', label: 'on time' },
            { value: 'late', label: 'late' },
          ]}
        />
      </FormGroup>
      <FormGroup label="Left early" labelFor={ids.early}>
        <HTMLSelect
          id={ids.early}
          value={rule.early}
          onChange={(event) =>
            setRule({ early: event.currentTarget.value === 'not-on-time' ? 'not-on-time' : 'on-time' })
          }
          options={[
            { value: 'on-time', label: 'on time' },
            { value: 'not-on-time', label: 'not on time' },
          ]}
        />
      </FormGroup>
      <FormGroup label="Annulled" labelFor={ids.annulled}>
        <HTMLSelect
          id={ids.annulled}
          value={rule.annulled}
          onChange={(event) =>
            setRule({ annulled: event.currentTarget.value === 'not-on-time' ? 'not-on-time' : 'left-out' })
          }
          options={[
            { value: 'left-out', label: 'left out' },
            { value: 'not-on-time', label: 'not on time' },
          ]}
        />
      </FormGroup>
    </form>
  );
}
