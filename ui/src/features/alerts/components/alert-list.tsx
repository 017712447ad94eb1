import { Button } from '@blueprintjs/core';
import type { WireAlert } from '@stubpost/shared';
import { useRef, useState, type KeyboardEvent } from 'react';
import { usePreferences } from '../../../lib/preferences';
import { groupWords, type AlertGroup } from '../model/group-alerts';
import styles from './alert-list.module.css';
import { AlertRow } from './alert-row';

export interface AlertListProps {
  groups: readonly AlertGroup[];
  zone: string;
  me: string;
  mayAct: boolean;
  pickedId: string | null;
  onPick: (alert: WireAlert) => void;
  onTake: (alert: WireAlert) => void;
  onOpen: (alert: WireAlert) => void;
  /** Puts the focus into the form that the picked alert has: setting aside, or naming its cause. */
  onForm: (alert: WireAlert) => void;
}

/** Of what is over only so many are drawn at first: the latest. */
const mostDrawn = 40;

const asides: Partial<Record<AlertGroup['key'], string>> = {
  'set-aside': 'comes back by itself',
  closed: 'the latest first',
};

/** All alerts in their groups. One stop of the Tab key; arrows move, Enter opens the turn, T takes, S sets aside. */
export function AlertList(props: AlertListProps) {
  const { pickedId } = props;
  const [isWhole, setWhole] = useState(false);
  const groups = props.groups.map((group) => ({
    ...group,
    count: group.alerts.length,
    alerts: isWhole ? group.alerts : group.alerts.slice(0, mostDrawn),
  }));
  const table = useRef<HTMLTableElement>(null);
  const { letterKeys } = usePreferences();
  const alerts = groups.flatMap((group) => group.alerts);
  const tabStop = alerts.some((alert) => alert.id === pickedId) ? pickedId : (alerts[0]?.id ?? null);

  const move = (to: WireAlert | undefined): void => {
    if (to === undefined) return;
    props.onPick(to);
    table.current?.querySelector<HTMLElement>(`[data-alert="${CSS.escape(to.id)}"]`)?.focus();
  };

  const onKeyDown = (event: KeyboardEvent): void => {
    const row = (event.target as HTMLElement).closest<HTMLElement>('[data-alert]');
    const place = alerts.findIndex((alert) => alert.id === row?.dataset['alert']);
    const alert = alerts[place];
    if (alert === undefined || event.ctrlKey || event.altKey || event.metaKey) return;
    if ((event.target as HTMLElement).closest('button, a') !== null) return;
    const acts: Record<string, () => void> = {
      ArrowDown: () => move(alerts[Math.min(place + 1, alerts.length - 1)]),
      ArrowUp: () => move(alerts[Math.max(place - 1, 0)]),
      Home: () => move(alerts[0]),
      End: () => move(alerts.at(-1)),
      Enter: () => props.onOpen(alert),
      ...(letterKeys && props.mayAct ? { t: () => props.onTake(alert), s: () => props.onForm(alert) } : {}),
    };
    const act = acts[event.key] ?? acts[event.key.toLowerCase()];
    if (act === undefined) return;
    event.preventDefault();
    act();
  };

  return (
    <div className={styles.scroll}>
      <table className={styles.alerts} role="grid" ref={table} onKeyDown={onKeyDown}>
        <caption className="unseen">Standing alerts and alerts that wait for a cause</caption>
        <colgroup>
          {[98, 58, 162, 0, 224, 110, 132].map((width, index) => (
            <col key={index} {...(width === 0 ? {} : { style: { width } })} />
          ))}
        </colgroup>
        <thead>
          <tr>
            <th scope="col" className={styles.first}>
              Priority
            </th>
            <th scope="col">Raised</th>
            <th scope="col">Where</th>
            <th scope="col">What is wrong, by when</th>
            <th scope="col">What to do, who acts</th>
            <th scope="col">Who has it</th>
            <td />
          </tr>
        </thead>
        {groups.map((group) => (
          <tbody key={group.key}>
            <tr className={styles.group}>
              <th colSpan={7} scope="rowgroup">
                {groupWords[group.key]}
                <span>
                  {group.count}
                  {asides[group.key] === undefined ? '' : `, ${asides[group.key]}`}
                </span>
              </th>
            </tr>
            {group.alerts.map((alert) => (
              <AlertRow
                key={alert.id}
                alert={alert}
                zone={props.zone}
                me={props.me}
                mayAct={props.mayAct}
                isPicked={alert.id === pickedId}
                hasTabStop={alert.id === tabStop}
                onPick={() => props.onPick(alert)}
                onTake={() => props.onTake(alert)}
                onOpen={() => props.onOpen(alert)}
                onName={() => props.onForm(alert)}
              />
            ))}
            {group.count > group.alerts.length && (
              <tr>
                <td colSpan={7} className={styles.more}>
                  <Button size="small" onClick={() => setWhole(true)}>
                    Show {group.count - group.alerts.length} more
                  </Button>
                </td>
              </tr>
            )}
          </tbody>
        ))}
      </table>
    </div>
  );
}
