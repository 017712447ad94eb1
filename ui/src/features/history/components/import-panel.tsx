import { FormGroup, HTMLTable } from '@blueprintjs/core';
import type { WireHistoryImport } from '@stubpost/shared';
import { useQuery } from '@tanstack/react-query';
import { useId } from 'react';
import { ErrorState } from '../../../components/page-states';
import { historyImportsQuery, useLoadDepartures } from '../api/history-imports';
import { formatCount } from '../model/figures-text';

const problemsShown = 20;

function Outcome({ each }: { each: WireHistoryImport }) {
  if (each.state === 'reading') return <>is being read</>;
  if (each.state === 'loaded') return <>loaded, {formatCount(each.rows)} departures</>;
  return (
    <>
      <p>refused, nothing was loaded</p>
      <ul>
        {each.problems.slice(0, problemsShown).map((problem, index) => (
          <li key={index}>
            {problem.line === null ? '' : `line ${problem.line}: `}
            {problem.message}
          </li>
        ))}
        {each.problems.length > problemsShown && <li>and {each.problems.length - problemsShown} more</li>}
      </ul>
    </>
  );
}

/** Loads tables of past departures, for those who may. */
export function ImportPanel() {
  const { data } = useQuery(historyImportsQuery);
  const load = useLoadDepartures();
  const id = useId();
  return (
    <section className="sp-panel" aria-labelledby="load">
      <h2 id="load">Load past departures</h2>
      <p id="load-hint">
        A CSV with the columns serviceDate, terminal, train, scheduledDepartureAt, actualDepartureAt; times
        with a zone, such as 2026-03-03T22:40:00Z. It may also have set, track, scheduledArrivalAt,
        actualArrivalAt and annulled. One wrong row refuses the whole table, and says which.
      </p>
      <FormGroup label={load.isPending ? 'Sending' : 'Table of past departures'} labelFor={id}>
        <input
          id={id}
          type="file"
          accept=".csv,text/csv"
          aria-describedby="load-hint"
          disabled={load.isPending}
          onChange={(event) => {
            const file = event.currentTarget.files?.[0];
            if (file !== undefined) load.mutate(file);
            event.currentTarget.value = '';
          }}
        />
      </FormGroup>
      {load.error !== null && <ErrorState error={load.error} />}
      {data !== undefined && data.length > 0 && (
        <HTMLTable className="sp-table">
          <thead>
            <tr>
              <th scope="col">Table</th>
              <th scope="col">What became of it</th>
            </tr>
          </thead>
          <tbody aria-live="polite">
            {data.map((each) => (
              <tr key={each.id}>
                <th scope="row">{each.fileName}</th>
                <td>
                  <Outcome each={each} />
                </td>
              </tr>
            ))}
          </tbody>
        </HTMLTable>
      )}
    </section>
  );
}
