import { Caution } from '../../../components/caution';
import { formatClock } from '../../../lib/time-display';
import type { ActWays } from './act-ways';
import { Foot } from './foot';
import styles from './phone-parts.module.css';
import { RecordBar } from './record-bar';
import { SecondBar } from './second-bar';
import { TrainFacts } from './train-facts';
import { useTurnScene } from './turn-context';

/** An act that is asked for twice because it takes away what others rely on. */
export type DangerousAct = { kind: 'annulled'; reason: string } | { kind: 'blue-signal-down' };

/** Its second bar, in another place than the first, with the record in full; the way back is where the first bar was. */
export function OffCrewSecond({
  act,
  ways,
  onBack,
}: {
  act: DangerousAct;
  ways: ActWays;
  onBack: () => void;
}) {
  const { turn, now, marker } = useTurnScene();
  const train = turn.outbound?.train ?? turn.inbound?.train ?? '';
  const isAnnul = act.kind === 'annulled';
  const label = isAnnul ? `Annulled: train ${train}` : 'Blue signal taken down';
  return (
    <>
      <div className={styles.main}>
        <TrainFacts turn={turn} now={now} marker={marker} />
        <SecondBar onRecord={() => ways.onRecord(act, label, null)}>
          {isAnnul
            ? `Annulled: train ${train}. ${act.reason}`
            : `Blue signal taken down, track ${turn.track ?? 'not known'}`}
        </SecondBar>
        {!isAnnul && turn.blueSignal !== null && (
          <p>
            Up since {formatClock(turn.blueSignal.since, turn.zone)}, {turn.blueSignal.by}.
          </p>
        )}
        <Caution>
          {isAnnul
            ? 'The crew’s phones and the board show the turn as annulled. Its entries stay.'
            : 'Records what you did. It does not say that the train may move safely: your rules, the law in force and qualified people decide.'}
        </Caution>
      </div>
      <Foot>
        <RecordBar barKey="not-yet" isOwnChange hollow over="Nothing is recorded yet" onRecord={onBack}>
          Not yet, go back
        </RecordBar>
      </Foot>
    </>
  );
}
