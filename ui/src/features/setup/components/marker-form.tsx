import { Button, HTMLSelect, InputGroup } from '@blueprintjs/core';
import { v4 as makeId } from 'uuid';
import {
  DIRECTIONS,
  directionWords,
  type MarkerDraft,
  type TrackDraft,
  type TrackProblem,
} from '../model/track-draft';
import styles from './setup.module.css';

export interface MarkerFormProps {
  track: TrackDraft;
  problems: readonly TrackProblem[];
  onChange: (markers: MarkerDraft[]) => void;
}

/** Stopping markers of one track: one for each train length, and for each direction where they differ. */
export function MarkerForm({ track, problems, onChange }: MarkerFormProps) {
  const change = (id: string, part: Partial<MarkerDraft>): void => {
    onChange(track.markers.map((marker) => (marker.id === id ? { ...marker, ...part } : marker)));
  };
  const add = (): void =>
    onChange([...track.markers, { id: makeId(), cars: '', label: '', direction: 'both' }]);
  return (
    <section className="sp-panel" aria-labelledby="markers">
      <header>
        <h2 id="markers">
          Stopping markers of {track.label.trim() === '' ? 'the new track' : `track ${track.label}`}
        </h2>
      </header>
      {track.markers.length > 0 && (
        <table className="sp-table">
          <thead>
            <tr>
              <th scope="col">Train of … cars</th>
              <th scope="col">stops at marker</th>
              <th scope="col">Direction</th>
              <th scope="col">
                <span className="unseen">Removal</span>
              </th>
            </tr>
          </thead>
          <tbody>
            {track.markers.map((marker, index) => (
              <MarkerRow
                key={marker.id}
                marker={marker}
                place={index + 1}
                problem={problems.find(({ markerId }) => markerId === marker.id)?.words}
                onChange={(part) => change(marker.id, part)}
                onRemove={() => onChange(track.markers.filter(({ id }) => id !== marker.id))}
              />
            ))}
          </tbody>
        </table>
      )}
      <div className="sp-actions">
        <Button onClick={add}>Add a marker</Button>
      </div>
    </section>
  );
}

interface MarkerRowProps {
  marker: MarkerDraft;
  place: number;
  problem: string | undefined;
  onChange: (part: Partial<MarkerDraft>) => void;
  onRemove: () => void;
}

function MarkerRow({ marker, place, problem, onChange, onRemove }: MarkerRowProps) {
  const isWrong = problem !== undefined;
  return (
    <tr>
      <td className={styles.cell}>
        <div className={styles.narrow}>
          <InputGroup
            aria-label={`Cars, marker ${place}`}
            aria-invalid={isWrong}
            inputMode="numeric"
            autoComplete="off"
            value={marker.cars}
            onValueChange={(cars) => onChange({ cars })}
          />
        </div>
        {isWrong && <span className={`small ${styles.wrong}`}>{problem}</span>}
      </td>
      <td className={styles.cell}>
        <div className={styles.narrow}>
          <InputGroup
            aria-label={`Label, marker ${place}`}
            aria-invalid={isWrong}
            autoComplete="off"
            value={marker.label}
            onValueChange={(label) => onChange({ label })}
          />
        </div>
      </td>
      <td>
        <HTMLSelect
          aria-label={`Direction, marker ${place}`}
          value={marker.direction}
          options={DIRECTIONS.map((value) => ({ value, label: directionWords[value] }))}
          onChange={(event) => {
            const direction = DIRECTIONS.find((each) => each === event.currentTarget.value);
            if (direction !== undefined) onChange({ direction });
          }}
        />
      </td>
      <td>
        <Button size="small" aria-label={`Remove marker ${place}`} onClick={onRemove}>
          Remove
        </Button>
      </td>
    </tr>
  );
}
