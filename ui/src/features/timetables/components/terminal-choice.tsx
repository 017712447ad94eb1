import type { WireTimetableSummary } from '@stubpost/shared';
import { mostTurnsInAMinute } from '../model/layover-rug';
import { choiceId, terminalsOf, type StationDraft } from '../model/terminal-draft';
import { formatCount } from '../model/timetable-words';
import { LayoverAxis } from './layover-rug';
import { StationRow } from './station-row';
import styles from './timetables.module.css';

/** Gaps between stations named under the table. */
const gapsNamed = 4;

interface TerminalChoiceProps {
  summary: WireTimetableSummary;
  draft: readonly StationDraft[];
  /** Absent for people who may only look. */
  onChange?: ((draft: StationDraft[]) => void) | undefined;
}

/** Which stations are terminals, and which of them are one real place. */
export function TerminalChoice({ summary, draft, onChange }: TerminalChoiceProps) {
  const mostTurns = mostTurnsInAMinute(summary.stations);
  const turning = summary.stations.filter(({ turns, guessedTurns }) => turns + guessedTurns > 0).length;
  return (
    <section className="sp-panel" aria-labelledby={choiceId}>
      <header>
        <h2 id={choiceId} tabIndex={-1}>
          Which of these are your terminals?
        </h2>
        <span className="muted small">
          {turning === 1 ? '1 station' : `${turning} stations`} where trains turn
        </span>
      </header>
      <div className="sp-table-scroll" tabIndex={0} role="group" aria-label="Stations, table">
        <table className={`sp-table ${styles.stations}`}>
          <thead>
            <tr>
              <th scope="col">
                <span className="unseen">Choose</span>
              </th>
              <th scope="col">Station</th>
              <th scope="col" className="number">
                Turns, all days
              </th>
              <th scope="col">
                <span className="unseen">Layovers of the busiest day</span>
                <LayoverAxis />
              </th>
              <th scope="col" className="number">
                Half under
              </th>
              <th scope="col" className="number">
                Short by design
              </th>
              <th scope="col">Code</th>
              <th scope="col">Terminal</th>
              <th scope="col" className="number">
                Tracks
              </th>
            </tr>
          </thead>
          <tbody>
            {summary.stations.map((station) => {
              const row = draft.find(({ stationId }) => stationId === station.stationId);
              return row === undefined ? null : (
                <StationRow key={station.stationId} {...{ station, row, draft, mostTurns, onChange }} />
              );
            })}
          </tbody>
        </table>
      </div>
      <JoinedWords draft={draft} />
      <GapWords summary={summary} draft={draft} />
      <footer>
        Stations with the same code make one terminal. Tracks come from platform codes; lengths and markers of
        known tracks stay as they are.
      </footer>
    </section>
  );
}

/** Says which stations were put together. */
function JoinedWords({ draft }: { draft: readonly StationDraft[] }) {
  const joined = terminalsOf(draft).filter(({ stationIds }) => stationIds.length > 1);
  if (joined.length === 0) return null;
  return (
    <p>
      {joined
        .map(({ name, code, stationIds }) => `${stationIds.length} stations are joined as ${name || code}.`)
        .join(' ')}
    </p>
  );
}

/** Names pairs of stations between which trains change over: they may be one real place. */
function GapWords({ summary, draft }: { summary: WireTimetableSummary; draft: readonly StationDraft[] }) {
  const codeOf = new Map(
    draft.filter(({ chosen }) => chosen).map(({ stationId, code }) => [stationId, code]),
  );
  const nameOf = new Map(summary.stations.map(({ stationId, name }) => [stationId, name]));
  const isOpen = ({ fromStationId, toStationId }: { fromStationId: string; toStationId: string }): boolean =>
    codeOf.get(fromStationId) === undefined || codeOf.get(fromStationId) !== codeOf.get(toStationId);
  const open = summary.gaps.filter(isOpen);
  if (open.length === 0) return null;
  return (
    <details className={styles.gaps}>
      <summary>Trains that arrive at one station and leave from another ({formatCount(open.length)})</summary>
      <p>Where the two are one real place, give both the same code: then these are turns.</p>
      <ul className="sp-points">
        {open.slice(0, gapsNamed).map(({ fromStationId, toStationId, pairs }) => (
          <li key={`${fromStationId} ${toStationId}`}>
            {nameOf.get(fromStationId) ?? fromStationId} ({fromStationId}) to{' '}
            {nameOf.get(toStationId) ?? toStationId} ({toStationId}): {formatCount(pairs)} on all days
          </li>
        ))}
        {open.length > gapsNamed && <li>and {formatCount(open.length - gapsNamed)} more</li>}
      </ul>
    </details>
  );
}
