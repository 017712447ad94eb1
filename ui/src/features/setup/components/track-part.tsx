import { Button } from '@blueprintjs/core';
import type { WireTerminal } from '@stubpost/shared';
import { useState, type FormEvent } from 'react';
import { v4 as makeId } from 'uuid';
import { FieldSummary, type FieldProblem } from '../../../components/field-summary';
import { errorText } from '../../../lib/error-texts';
import { useReplaceTracks } from '../api/terminals';
import { draftOfTrack, readTracks, type TrackDraft } from '../model/track-draft';
import { AddTerminal } from './add-terminal';
import { MarkerForm } from './marker-form';
import styles from './setup.module.css';
import { TrackTable, trackFieldId } from './track-table';

/** Tracks of a terminal with their stopping markers, and further terminals. */
export function TrackPart({ terminal }: { terminal: WireTerminal | null }) {
  return (
    <div className={styles.two}>
      {terminal === null ? (
        <p>No terminal yet. Add one, or import a timetable.</p>
      ) : (
        <TrackForm key={terminal.code} terminal={terminal} />
      )}
      <AddTerminal />
    </div>
  );
}

const emptyTrack = (): TrackDraft => ({
  id: makeId(),
  label: '',
  lengthFeet: '',
  cars: '',
  gradePercent: '',
  markers: [],
});

function TrackForm({ terminal }: { terminal: WireTerminal }) {
  const [tracks, setTracks] = useState<TrackDraft[]>(() =>
    terminal.tracks.map((track) => draftOfTrack(track, makeId)),
  );
  const [openId, setOpenId] = useState<string | null>(null);
  const [summary, setSummary] = useState<FieldProblem[]>([]);
  const replace = useReplaceTracks(terminal.code);
  const read = readTracks(tracks);
  const open = tracks.find(({ id }) => id === openId);

  const change = (id: string, part: Partial<TrackDraft>): void => {
    setTracks(tracks.map((track) => (track.id === id ? { ...track, ...part } : track)));
  };
  const submit = (event: FormEvent): void => {
    event.preventDefault();
    setSummary(
      read.problems.map(({ trackId, field, words }) => {
        const label = tracks.find(({ id }) => id === trackId)?.label.trim() ?? '';
        return {
          fieldId: trackFieldId(trackId, field),
          words: label === '' ? words : `Track ${label}: ${words}`,
        };
      }),
    );
    if (read.problems.length > 0) return;
    replace.mutate(read.tracks, {
      onSuccess: (saved) => setTracks(saved.tracks.map((track) => draftOfTrack(track, makeId))),
    });
  };
  return (
    <form className={styles.stack} onSubmit={submit} noValidate>
      <section className="sp-panel" aria-labelledby="tracks">
        <header>
          <h2 id="tracks">Tracks of {terminal.name}</h2>
          <span className="muted">in the order of the board</span>
        </header>
        <FieldSummary problems={summary} />
        {replace.isError && (
          <p className="sp-problems" role="alert">
            {errorText(replace.error)}
          </p>
        )}
        {tracks.length === 0 && <p>No tracks yet.</p>}
        {tracks.length > 0 && (
          <TrackTable
            tracks={tracks}
            problems={read.problems}
            openId={openId}
            onChange={change}
            onOpen={(id) => setOpenId(id === openId ? null : id)}
            onMove={(id, by) => setTracks(moved(tracks, id, by))}
            onRemove={(id) => setTracks(tracks.filter((track) => track.id !== id))}
          />
        )}
        <div className="sp-actions">
          <Button onClick={() => setTracks([...tracks, emptyTrack()])}>Add a track</Button>
          <Button type="submit" intent="primary" loading={replace.isPending}>
            Save tracks
          </Button>
          {replace.isSuccess && <span role="status">Saved.</span>}
        </div>
      </section>
      {open !== undefined && (
        <MarkerForm
          key={open.id}
          track={open}
          problems={read.problems.filter(({ trackId, field }) => trackId === open.id && field === 'markers')}
          onChange={(markers) => change(open.id, { markers })}
        />
      )}
    </form>
  );
}

function moved(tracks: readonly TrackDraft[], id: string, by: -1 | 1): TrackDraft[] {
  const at = tracks.findIndex((track) => track.id === id);
  const track = tracks[at];
  if (track === undefined || at + by < 0 || at + by >= tracks.length) return [...tracks];
  return tracks.toSpliced(at, 1).toSpliced(at + by, 0, track);
}
