import { FormGroup, HTMLSelect, InputGroup, SegmentedControl } from '@blueprintjs/core';
import { isCalendarDate, type CalendarDate } from '@stubpost/shared';
import { useId } from 'react';
import { lastDays, offeredDays, offeredLength, type QualityRange } from '../model/quality-range';

interface RangeFieldsProps {
  range: QualityRange;
  /** On the calendar of the terminal. */
  today: CalendarDate;
  onChange: (range: QualityRange) => void;
}

function DayField(props: { label: string; day: CalendarDate; onChange: (day: CalendarDate) => void }) {
  const id = useId();
  return (
    <FormGroup label={props.label} labelFor={id}>
      <InputGroup
        id={id}
        type="date"
        value={props.day}
        onValueChange={(day) => {
          if (isCalendarDate(day)) props.onChange(day);
        }}
      />
    </FormGroup>
  );
}

/** Which days the figures are about, both included; each change goes into the address at once. */
export function RangeFields({ range, today, onChange }: RangeFieldsProps) {
  const length = offeredLength(range, today);
  const afterwardsId = useId();
  return (
    <form
      className="sp-fields"
      aria-label="Days at the terminal, both included"
      onSubmit={(event) => event.preventDefault()}
    >
      <SegmentedControl
        aria-label="Days up to today"
        value={String(length)}
        onValueChange={(value) => onChange({ ...range, ...lastDays(Number(value), today) })}
        options={offeredDays.map((days) => ({
          value: String(days),
          label: days === 1 ? 'Today' : `${days} days`,
        }))}
      />
      <DayField label="First day" day={range.from} onChange={(from) => onChange({ ...range, from })} />
      <DayField label="Last day" day={range.to} onChange={(to) => onChange({ ...range, to })} />
      <FormGroup label="Turns entered afterwards" labelFor={afterwardsId}>
        <HTMLSelect
          id={afterwardsId}
          value={range.afterwards}
          onChange={(event) =>
            onChange({
              ...range,
              afterwards: event.currentTarget.value === 'counted' ? 'counted' : 'left-out',
            })
          }
          options={[
            { value: 'left-out', label: 'left out' },
            { value: 'counted', label: 'counted' },
          ]}
        />
      </FormGroup>
    </form>
  );
}
