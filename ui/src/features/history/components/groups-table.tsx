import type { OnTimeFigures, OnTimeGroup } from '@stubpost/shared';
import { HTMLTable } from '@blueprintjs/core';
import { fewDepartures, formatCount, formatPercent } from '../model/figures-text';

const seconds = (value: number | null): string => (value === null ? '–' : String(Math.round(value)));

function Cells({ figures }: { figures: OnTimeFigures }) {
  const few = figures.counted > 0 && figures.counted < fewDepartures;
  return (
    <>
      <td className="number">{formatCount(figures.scheduled)}</td>
      <td className="number">{formatCount(figures.counted)}</td>
      <td className="number">{formatCount(figures.onTime)}</td>
      <td className={few ? 'number muted' : 'number'}>
        <b>{formatPercent(figures.share)}</b>
        {few && ' few'}
      </td>
      <td className="number">{figures.interval === null ? '–' : formatPercent(figures.interval.low)}</td>
      <td className="number">{figures.interval === null ? '–' : formatPercent(figures.interval.high)}</td>
      <td className="number">{seconds(figures.delaySeconds.p50)}</td>
      <td className="number">{seconds(figures.delaySeconds.p80)}</td>
      <td className="number">{seconds(figures.delaySeconds.p95)}</td>
      <td className="number">{formatCount(figures.annulled)}</td>
      <td className="number">{formatCount(figures.noRecord)}</td>
    </>
  );
}

/** Every figure of a chart as a table, the whole in its last row. */
export function GroupsTable({
  caption,
  head,
  all,
  groups,
}: {
  caption: string;
  /** Heading of the first column. */
  head: string;
  all: OnTimeFigures;
  groups: OnTimeGroup[];
}) {
  return (
    <div className="sp-table-scroll" tabIndex={0} role="region" aria-label={caption}>
      <HTMLTable className="sp-table">
        <caption className="unseen">{caption}</caption>
        <thead>
          <tr>
            <th scope="col">{head}</th>
            {[
              'Scheduled',
              'Counted',
              'On time',
              'Share, %',
              'Low, %',
              'High, %',
              'Delay p50, s',
              'p80, s',
              'p95, s',
              'Annulled',
              'No record',
            ].map((name) => (
              <th key={name} scope="col" className="number">
                {name}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {groups.map((group) => (
            <tr key={group.key}>
              <th scope="row">{group.label}</th>
              <Cells figures={group} />
            </tr>
          ))}
          <tr>
            <th scope="row">All</th>
            <Cells figures={all} />
          </tr>
        </tbody>
      </HTMLTable>
    </div>
  );
}
