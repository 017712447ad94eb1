import { Button } from '@blueprintjs/core';
import type { WireDutyShift } from '@stubpost/shared';
import { formatServiceDate, dateAt, formatTime } from '../../../lib/time-display';
import { useNow } from '../../../lib/use-now';
import type { RosterDraft } from '../model/roster-draft';
import { DUTY_WORDS } from './duty-words';
import styles from './duty.module.css';

interface ShiftTableProps {
  draft: RosterDraft;
  zone: string;
  /** Absent for those who only read. */
  onRemove: ((shift: WireDutyShift) => void) | undefined;
}

const nameOf = (draft: RosterDraft, id: string): string =>
  draft.people.find((person) => person.id === id)?.name ?? 'Somebody without the right to act here';

/** Who is on duty from when to when; what is over is left out. */
export function ShiftTable({ draft, zone, onRemove }: ShiftTableProps) {
  const now = useNow(10);
  const shifts = draft.shifts.filter(({ until }) => Date.parse(until) > now);
  if (shifts.length === 0) {
    return (
      <p>
        Nobody is on the roster from now on. Alerts go to the supervisors at once, until somebody is on the
        desk.
      </p>
    );
  }
  return (
    <div className={`sp-table-scroll ${styles.shifts}`} role="region" aria-label="Times on duty" tabIndex={0}>
      <table className="sp-table">
        <thead>
          <tr>
            <th scope="col">Day</th>
            <th scope="col">From</th>
            <th scope="col">Until</th>
            <th scope="col">Who</th>
            <th scope="col">As</th>
            <th scope="col">
              <span className="unseen">Now or later</span>
            </th>
            {onRemove !== undefined && (
              <th scope="col">
                <span className="unseen">Take off</span>
              </th>
            )}
          </tr>
        </thead>
        <tbody>
          {shifts.map((shift) => {
            const isNow = Date.parse(shift.from) <= now;
            const name = nameOf(draft, shift.personId);
            return (
              <tr
                key={`${shift.personId} ${shift.as} ${shift.from}`}
                className={isNow ? styles.now : undefined}
              >
                <td className="nowrap">{formatServiceDate(dateAt(shift.from, zone))}</td>
                <td>{formatTime(shift.from, zone)}</td>
                <td>{formatTime(shift.until, zone)}</td>
                <th scope="row">{name}</th>
                <td>{DUTY_WORDS[shift.as]}</td>
                <td>{isNow && <b>now</b>}</td>
                {onRemove !== undefined && (
                  <td className="number">
                    <Button
                      size="small"
                      aria-label={`Take ${name} off, ${formatServiceDate(dateAt(shift.from, zone))} ${formatTime(shift.from, zone)}`}
                      onClick={() => onRemove(shift)}
                    >
                      Take off
                    </Button>
                  </td>
                )}
              </tr>
            );
          })}
        </tbody>
      </table>
    </div>
  );
}
