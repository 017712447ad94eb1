import { useQuery } from '@tanstack/react-query';
import { ErrorState, LoadingRows } from '../../../components/page-states';
import { dailyHeadsQuery, logStateQuery } from '../api/log';
import { DailyHeads } from './daily-heads';
import { LogState } from './log-state';
import { SealMeaning } from './seal-meaning';
import { TakeAlong, type TakeAlongProps } from './take-along';
import styles from './check-log.module.css';

/** State of the chain, heads to keep, and everything to check it elsewhere. */
export function CheckLogView({ zone, ...takeAlong }: TakeAlongProps & { zone: string }) {
  const state = useQuery(logStateQuery);
  const heads = useQuery(dailyHeadsQuery);
  return (
    <div className={styles.grid}>
      <div className={styles.column}>
        {state.error !== null && state.data === undefined && (
          <ErrorState error={state.error} onRetry={() => void state.refetch()} />
        )}
        {state.isPending && <LoadingRows what="the state of the log" onRetry={() => void state.refetch()} />}
        {state.data !== undefined && <LogState state={state.data} zone={zone} />}
        <TakeAlong {...takeAlong} />
        <SealMeaning />
      </div>
      <div className={styles.column}>
        {heads.error !== null && heads.data === undefined && (
          <ErrorState error={heads.error} onRetry={() => void heads.refetch()} />
        )}
        {heads.isPending && <LoadingRows what="daily heads" onRetry={() => void heads.refetch()} />}
        {heads.data !== undefined && <DailyHeads heads={heads.data} zone={zone} />}
      </div>
    </div>
  );
}
