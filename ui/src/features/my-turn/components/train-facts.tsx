import type { Instant, StoppingMarker, WireTerminal, WireTurn } from '@stubpost/shared';
import { formatRelative, formatServiceTime } from '../../../lib/time-display';
import { leavesAt } from '../model/turn-times';
import styles from './phone-parts.module.css';

/** Which train, which track, when it leaves. */
export function TrainFacts({ turn, now, marker }: { turn: WireTurn; now: Instant; marker: string | null }) {
  const train = turn.outbound?.train ?? turn.inbound?.train ?? '';
  return (
    <section aria-label="Train">
      <div className={styles.ends}>
        <h1>Train {train}</h1>
        <p className={styles.track}>{turn.track === null ? 'No track yet' : `Track ${turn.track}`}</p>
      </div>
      <div className={styles.ends}>
        <p>
          <LeavingWords turn={turn} now={now} />
        </p>
        <p>
          {turn.plannedTrack !== null && turn.plannedTrack !== turn.track
            ? `not ${turn.plannedTrack}`
            : marker}
        </p>
      </div>
    </section>
  );
}

function LeavingWords({ turn, now }: { turn: WireTurn; now: Instant }) {
  const { outbound, zone, serviceDate } = turn;
  if (outbound === null) return <>Stays, tie-up</>;
  if (outbound.actualDepartureAt !== null) {
    return (
      <>
        Left <b>{formatServiceTime(outbound.actualDepartureAt, zone, serviceDate)}</b>
      </>
    );
  }
  const at = leavesAt(turn) ?? outbound.scheduledDepartureAt;
  const isHeld = outbound.heldUntil !== null && at === outbound.heldUntil;
  return (
    <>
      {isHeld ? 'Held, leaves ' : 'Leaves '}
      <b>{formatServiceTime(at, zone, serviceDate)}</b>, {formatRelative(at, now)}
    </>
  );
}

/** The stopping marker for a train of this length on this track, as far as it is known: "marker 8", "marker 6 or 8". */
export function markerWords(turn: WireTurn, terminals: readonly WireTerminal[]): string | null {
  const track = terminals
    .find(({ code }) => code === turn.terminal)
    ?.tracks.find(({ label }) => label === turn.track);
  const fitting = (track?.markers ?? []).filter((marker: StoppingMarker) => marker.cars === turn.cars.length);
  const labels = [...new Set(fitting.map(({ label }) => label))];
  return labels.length === 0 ? null : `marker ${labels.join(' or ')}`;
}
