import { ErrorState, LoadingRows } from '../../../components/page-states';
import styles from './phone-parts.module.css';
import { TieUpChoice } from './tie-up-choice';
import { TieUpPlaces } from './tie-up-places';
import { TurnSceneContext } from './turn-context';
import { useTurnSceneOf } from './use-turn-scene';

/** `/my/tie-up`: leaves a set. Without a turn in the address it asks which set. */
export function TieUpScreen({ turnId }: { turnId: string | null }) {
  return <div className={styles.page}>{turnId === null ? <TieUpChoice /> : <TieUpOf turnId={turnId} />}</div>;
}

function TieUpOf({ turnId }: { turnId: string }) {
  const state = useTurnSceneOf(turnId);
  if (state.kind === 'here') {
    return (
      <TurnSceneContext.Provider value={state.scene}>
        <TieUpPlaces />
      </TurnSceneContext.Provider>
    );
  }
  return (
    <div className={styles.main}>
      <h1 className="unseen">Tie-up</h1>
      {state.kind === 'loading' ? (
        <LoadingRows what="the set" rows={5} rowHeight={56} onRetry={state.retry} />
      ) : (
        <ErrorState error={state.error} onRetry={state.retry} />
      )}
    </div>
  );
}
