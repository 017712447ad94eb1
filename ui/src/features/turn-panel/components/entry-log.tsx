import { Button } from '@blueprintjs/core';
import { withdrawalReach, type WireEntry } from '@stubpost/shared';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { ErrorState, LoadingRows } from '../../../components/page-states';
import { usePerson } from '../../../lib/session';
import { clockText } from '../../../lib/turn/time-text';
import type { TurnNow } from '../../../lib/turn/turn-now';
import { entriesQuery } from '../../../lib/turn/turn-queries';
import { entryWords, knownWords, withdrawnIds } from '../model/entry-words';
import styles from './turn-panel.module.css';

export interface EntryLogProps {
  turn: TurnNow;
  /** Opens the form to take an entry back; absent for people who may not. */
  onWithdraw?: ((entryId: string, words: string) => void) | undefined;
}

const fewest = 4;
const numbers = new Intl.NumberFormat('en-US');

/** Every entry about the turn with its number in the sealed log, the latest first. What was taken back stays, struck. */
export function EntryLog({ turn, onWithdraw }: EntryLogProps) {
  const { data, error, isPending, refetch } = useQuery(entriesQuery(turn.id));
  const [isWhole, setWhole] = useState(false);
  const person = usePerson();
  const labels = new Map(turn.steps.map((step) => [step.key, step.shortLabel]));
  const entries = [...(data ?? [])].sort((a, b) => b.sequence - a.sequence);
  const withdrawn = withdrawnIds(entries);
  const shown = isWhole ? entries : entries.slice(0, fewest);
  const reach = withdrawalReach(person, turn.terminal);
  const mayTake = (entry: WireEntry): boolean =>
    onWithdraw !== undefined &&
    entry.kind !== 'withdrawn' &&
    !withdrawn.has(entry.id) &&
    (reach === 'anyone' || (reach === 'own' && entry.by?.id === person.id));
  return (
    <section aria-label="Log">
      <h3 className={styles.heading}>
        Log <span className={styles.plain}>{countWords(shown.length, entries.length)}</span>
        {entries.length > fewest && (
          <Button
            size="small"
            className={styles.push ?? ''}
            aria-expanded={isWhole}
            onClick={() => setWhole(!isWhole)}
          >
            {isWhole ? 'Fewer' : 'All entries'}
          </Button>
        )}
      </h3>
      {isPending && <LoadingRows what="entries" rows={3} rowHeight={20} />}
      {error !== null && data === undefined && <ErrorState error={error} onRetry={() => void refetch()} />}
      {entries.length > 0 && (
        <table className={styles.log}>
          <caption className="unseen">Entries of this turn, the latest first</caption>
          <colgroup>
            {[64, 0, 112, 66, 62].map((width, index) => (
              <col key={index} {...(width === 0 ? {} : { style: { width } })} />
            ))}
          </colgroup>
          <thead>
            <tr>
              <th scope="col">Time</th>
              <th scope="col">Entry</th>
              <th scope="col">How known</th>
              <th scope="col" className={styles.number}>
                Number
              </th>
              <td />
            </tr>
          </thead>
          <tbody>
            {shown.map((entry) => {
              const words = entryWords(entry, labels, turn.zone);
              return (
                <tr key={entry.id} className={withdrawn.has(entry.id) ? styles.struck : undefined}>
                  <td>{clockText(Date.parse(entry.observedAt), turn.zone)}</td>
                  <td title={words}>
                    {words}
                    {withdrawn.has(entry.id) && <span className="unseen">, withdrawn</span>}
                  </td>
                  <td title={knownWords(entry)}>{knownWords(entry)}</td>
                  <td className={styles.number}>{numbers.format(entry.sequence)}</td>
                  <td className={styles.take}>
                    {mayTake(entry) && (
                      <button type="button" onClick={() => onWithdraw?.(entry.id, words)}>
                        Withdraw<span className="unseen"> {words}</span>
                      </button>
                    )}
                  </td>
                </tr>
              );
            })}
          </tbody>
        </table>
      )}
    </section>
  );
}

function countWords(shown: number, all: number): string {
  if (all === 0) return 'nothing recorded yet';
  return shown === all ? `${all} ${all === 1 ? 'entry' : 'entries'}` : `last ${shown} of ${all} entries`;
}
