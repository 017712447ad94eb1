import { SegmentedControl } from '@blueprintjs/core';
import type { WireTerminal } from '@stubpost/shared';
import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { EmptyState, ErrorState, LoadingRows } from '../../../components/page-states';
import { correctionsQuery, useLiveCorrections } from '../api/corrections';
import { CorrectionCard } from './correction-card';
import styles from './corrections.module.css';

export interface CorrectionsViewProps {
  terminal: WireTerminal;
  /** Opens the turn that a correction is about. */
  onOpen: (turnId: string) => void;
}

/** Changes of the record asked for after a departure, the latest first; the choice of list stands in the address. */
export function CorrectionsView({ terminal, onOpen }: CorrectionsViewProps) {
  const [query, setQuery] = useSearchParams();
  const state = query.get('state') === 'all' ? 'all' : 'waiting';
  const { data, error, refetch } = useQuery(correctionsQuery({ terminal: terminal.code, state }));
  useLiveCorrections();
  const choose = (value: string): void => {
    const next = new URLSearchParams(query);
    if (value === 'all') next.set('state', 'all');
    else next.delete('state');
    setQuery(next, { replace: true });
  };
  return (
    <>
      <div className={styles.tools}>
        <SegmentedControl
          aria-label="Which corrections"
          value={state}
          onValueChange={choose}
          options={[
            { label: 'Waiting', value: 'waiting' },
            { label: 'All', value: 'all' },
          ]}
        />
        <p className="muted">
          Asked for after a train left. Nobody decides on their own request; the first entry stays in the log.
        </p>
      </div>
      {error !== null && data === undefined && <ErrorState error={error} onRetry={() => void refetch()} />}
      {error === null && data === undefined && (
        <LoadingRows what="corrections" onRetry={() => void refetch()} />
      )}
      {data?.length === 0 && (
        <EmptyState
          words={
            state === 'waiting'
              ? `No correction waits at ${terminal.name}.`
              : `No correction was ever asked for at ${terminal.name}.`
          }
        />
      )}
      {data !== undefined && data.length > 0 && (
        <ul className={styles.list} aria-label="Corrections">
          {data.map((correction) => (
            <li key={correction.entryId}>
              <CorrectionCard correction={correction} terminal={terminal} onOpen={onOpen} />
            </li>
          ))}
        </ul>
      )}
    </>
  );
}
