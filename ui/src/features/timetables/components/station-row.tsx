import { InputGroup } from '@blueprintjs/core';
import type { WireStationSummary } from '@stubpost/shared';
import { rugWords } from '../model/layover-rug';
import {
  codeFieldId,
  nameFieldId,
  setChosen,
  setCode,
  setName,
  type StationDraft,
} from '../model/terminal-draft';
import { formatCount, formatMedian } from '../model/timetable-words';
import { LayoverRug } from './layover-rug';
import styles from './timetables.module.css';

interface StationRowProps {
  station: WireStationSummary;
  row: StationDraft;
  draft: readonly StationDraft[];
  /** Most turns in one minute at any station: the full height of a stroke. */
  mostTurns: number;
  onChange: ((draft: StationDraft[]) => void) | undefined;
}

/** One station: how trains turn there, and which terminal it is part of. */
export function StationRow({ station, row, draft, mostTurns, onChange }: StationRowProps) {
  const { stationId, name, turns, guessedTurns, layovers } = station;
  return (
    <tr className={row.chosen ? undefined : styles.few}>
      <td>
        <input
          type="checkbox"
          checked={row.chosen}
          disabled={onChange === undefined}
          aria-label={`${name}, ${stationId}`}
          onChange={(event) => onChange?.(setChosen(draft, stationId, event.currentTarget.checked))}
        />
      </td>
      <th scope="row">
        {name}
        <br />
        <span className="small muted">{stationId}</span>
      </th>
      <td className="number">
        {formatCount(turns)}
        {guessedTurns > 0 && <span className="small muted"> +{formatCount(guessedTurns)} guessed</span>}
      </td>
      <td>
        <span className="unseen">{rugWords(layovers)}</span>
        <LayoverRug layovers={layovers} mostTurns={mostTurns} isQuiet={!row.chosen} />
      </td>
      <td className="number nowrap">{formatMedian(station.medianLayoverSeconds)}</td>
      <td className="number">{station.shortByDesign === 0 ? '–' : formatCount(station.shortByDesign)}</td>
      <TerminalCells {...{ row, draft, onChange }} stationName={name} />
      <td className="number">{row.chosen ? station.platforms.length || 'none' : ''}</td>
    </tr>
  );
}

/** Code and name of the terminal, to be written by those who may. */
function TerminalCells({
  row,
  draft,
  stationName,
  onChange,
}: Pick<StationRowProps, 'row' | 'draft' | 'onChange'> & { stationName: string }) {
  if (!row.chosen) {
    return (
      <>
        <td />
        <td />
      </>
    );
  }
  if (onChange === undefined) {
    return (
      <>
        <td>{row.code}</td>
        <td>{row.name}</td>
      </>
    );
  }
  return (
    <>
      <td>
        <InputGroup
          id={codeFieldId(row.stationId)}
          className={styles.code}
          aria-label={`Code of ${stationName}`}
          value={row.code}
          onValueChange={(code) => onChange(setCode(draft, row.stationId, code))}
        />
      </td>
      <td>
        <InputGroup
          id={nameFieldId(row.stationId)}
          className={styles.terminalName}
          aria-label={`Name of the terminal of ${stationName}`}
          value={row.name}
          onValueChange={(name) => onChange(setName(draft, row.stationId, name))}
        />
      </td>
    </>
  );
}
