import type { WireTurn } from '@stubpost/shared';
import { useEffect } from 'react';
import { ErrorState, LoadingRows } from '../../../components/page-states';
import { TurnSceneContext } from './turn-context';
import { TurnPlaces } from './turn-places';
import { useTurnSceneOf } from './use-turn-scene';
import styles from './phone-parts.module.css';

/** The page of one turn on the phone. */
export function TurnScreen({ turnId }: { turnId: string }) {
  const state = useTurnSceneOf(turnId);
  const train = state.kind === 'here' ? trainOf(state.scene.turn) : null;
  useEffect(() => {
    if (train !== null) document.title = `Train ${train} · Stubpost`;
  }, [train]);
  if (state.kind === 'here') {
    return (
      <TurnSceneContext.Provider value={state.scene}>
        <div className={styles.page}>
          <TurnPlaces />
        </div>
      </TurnSceneContext.Provider>
    );
  }
  return (
    <div className={styles.page}>
      <div className={styles.main}>
        <h1 className="unseen">Turn</h1>
        {state.kind === 'loading' ? (
          <LoadingRows what="the turn" rows={5} rowHeight={56} onRetry={state.retry} />
        ) : (
          <ErrorState error={state.error} onRetry={state.retry} />
        )}
      </div>
    </div>
  );
}

const trainOf = ({ outbound, inbound }: WireTurn): string | null => outbound?.train ?? inbound?.train ?? null;
