import { Button, InputGroup } from '@blueprintjs/core';
import { markerSummary, type TrackDraft, type TrackProblem } from '../model/track-draft';
import styles from './setup.module.css';

type TextField = 'label' | 'lengthFeet' | 'cars' | 'gradePercent';

/** Id of a field of a track, for the links of the summary. Markers are reached by the button that opens them. */
export function trackFieldId(trackId: string, field: TrackProblem['field']): string {
  return `track-${trackId}-${field}`;
}

const columns: { field: TextField; name: string; isNumber: boolean }[] = [
  { field: 'label', name: 'Label', isNumber: false },
  { field: 'lengthFeet', name: 'Length, ft', isNumber: true },
  { field: 'cars', name: 'Cars', isNumber: true },
  { field: 'gradePercent', name: 'Grade, %', isNumber: true },
];

export interface TrackTableProps {
  tracks: readonly TrackDraft[];
  problems: readonly TrackProblem[];
  /** The track whose markers stand below. */
  openId: string | null;
  onChange: (id: string, part: Partial<TrackDraft>) => void;
  onOpen: (id: string) => void;
  onMove: (id: string, by: -1 | 1) => void;
  onRemove: (id: string) => void;
}

/** One row a track: what is known of the platform, its markers in a line, its place on the board. */
export function TrackTable(props: TrackTableProps) {
  return (
    <div className="sp-table-scroll">
      <table className="sp-table">
        <thead>
          <tr>
            {columns.map(({ field, name }) => (
              <th key={field} scope="col">
                {name}
              </th>
            ))}
            <th scope="col">Stopping markers</th>
            <th scope="col">
              <span className="unseen">Place and removal</span>
            </th>
          </tr>
        </thead>
        <tbody>
          {props.tracks.map((track) => (
            <Row key={track.id} track={track} {...props} />
          ))}
        </tbody>
      </table>
      <p className="muted small">
        Grade: falling towards the post is positive. What is not known stays empty.
      </p>
    </div>
  );
}

function Row({
  track,
  problems,
  openId,
  onChange,
  onOpen,
  onMove,
  onRemove,
}: TrackTableProps & { track: TrackDraft }) {
  const name = track.label.trim() === '' ? 'new track' : `track ${track.label}`;
  const own = problems.filter(({ trackId }) => trackId === track.id);
  return (
    <tr className={track.id === openId ? styles.chosen : undefined}>
      {columns.map((column) => (
        <Cell
          key={column.field}
          track={track}
          trackName={name}
          {...column}
          problem={own.find(({ field }) => field === column.field)?.words}
          onChange={onChange}
        />
      ))}
      <td>
        <button
          type="button"
          id={trackFieldId(track.id, 'markers')}
          className={styles.pick}
          aria-expanded={track.id === openId}
          aria-label={`Markers of ${name}`}
          onClick={() => onOpen(track.id)}
        >
          {markerSummary(track.markers)}
        </button>
        {own.some(({ field }) => field === 'markers') && (
          <span className={`${styles.wrong} ${styles.mend}`}>to mend</span>
        )}
      </td>
      <td className={styles.nowrap}>
        <Button size="small" aria-label={`Move ${name} up`} onClick={() => onMove(track.id, -1)}>
          Up
        </Button>{' '}
        <Button size="small" aria-label={`Move ${name} down`} onClick={() => onMove(track.id, 1)}>
          Down
        </Button>{' '}
        <Button size="small" aria-label={`Remove ${name}`} onClick={() => onRemove(track.id)}>
          Remove
        </Button>
      </td>
    </tr>
  );
}

interface CellProps {
  track: TrackDraft;
  trackName: string;
  field: TextField;
  name: string;
  isNumber: boolean;
  problem: string | undefined;
  onChange: TrackTableProps['onChange'];
}

function Cell({ track, trackName, field, name, isNumber, problem, onChange }: CellProps) {
  const id = trackFieldId(track.id, field);
  return (
    <td className={styles.cell}>
      <div className={`${styles.narrow} ${problem === undefined ? '' : styles.wrongField}`}>
        <InputGroup
          id={id}
          aria-label={`${name} of ${trackName}`}
          aria-invalid={problem !== undefined}
          {...(problem === undefined ? {} : { 'aria-describedby': `${id}-help` })}
          inputMode={isNumber ? 'decimal' : 'text'}
          autoComplete="off"
          value={track[field]}
          onValueChange={(text) => onChange(track.id, { [field]: text })}
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
