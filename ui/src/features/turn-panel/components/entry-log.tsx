import { Button } from '@blueprintjs/core';
import { withdrawalReach, type WireEntry } from '@stubpost/shared';
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { ErrorState, LoadingRows } from '../../../components/page-states';
import { usePerson } from '../../../lib/session';
import type { TurnNow } from '../../../lib/turn/turn-now';
import { entriesQuery } from '../../../lib/turn/turn-queries';
import { knownWords } from '../model/entry-words';
import { logLines, type LogLine } from '../model/log-lines';
import { isSettled, type ChangeAct } from '../model/may-change';
import type { EntryToChange } from './steps-table';
import styles from './turn-panel.module.css';

export interface EntryLogProps {
  turn: TurnNow;
  /** Opens the form to take an entry back, or to ask for its correction; absent for people who may not. */
  onTakeBack?: ((entry: EntryToChange, act: ChangeAct) => void) | undefined;
}

const fewest = 4;
const numbers = new Intl.NumberFormat('en-US');

/**
 * Every entry about the turn with its number in the sealed log, the latest first. What was taken back or corrected
 * stays in sight, struck, beside what counts.
 */
export function EntryLog({ turn, onTakeBack }: EntryLogProps) {
  const { data, error, isPending, refetch } = useQuery(entriesQuery(turn.id));
  const [isWhole, setWhole] = useState(false);
  const labels = new Map(turn.steps.map((step) => [step.key, step.shortLabel]));
  const { corrections = [] } = turn.matters;
  const lines = logLines(data ?? [], { labels, zone: turn.zone, corrections });
  const shown = isWhole ? lines : lines.slice(0, fewest);
  return (
    <section aria-label="Log">
      <h3 className={styles.heading}>
        Log <span className={styles.plain}>{countWords(shown.length, lines.length)}</span>
        {lines.length > fewest && (
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
      {lines.length > 0 && (
        <table className={styles.log}>
          <caption className="unseen">Entries of this turn, the latest first</caption>
          <colgroup>
            {[64, 0, 58, 62].map((width, index) => (
              <col key={index} {...(width === 0 ? {} : { style: { width } })} />
            ))}
          </colgroup>
          <thead>
            <tr>
              <th scope="col">Time</th>
              <th scope="col">Entry, how it is known</th>
              <th scope="col" className={styles.number}>
                Number
              </th>
              <td />
            </tr>
          </thead>
          <tbody>
            {shown.map((line) => (
              <LogRow key={line.entry.id} line={line} turn={turn} onTakeBack={onTakeBack} />
            ))}
          </tbody>
        </table>
      )}
    </section>
  );
}

function LogRow({ line, turn, onTakeBack }: EntryLogProps & { line: LogLine }) {
  const { entry, words, isWithdrawn } = line;
  return (
    <tr className={isWithdrawn ? styles.struck : undefined}>
      <td>
        <span className={styles.when}>{line.time}</span>
        {line.replaced.map((time) => (
          <del key={time} className={styles.replaced}>
            <span className="unseen">, before </span>
            {time}
          </del>
        ))}
      </td>
      <td>
        <span className={styles.said}>{words}</span>{' '}
        {line.replacedWords.map((before) => (
          <del key={before}>
            <span className="unseen">, before </span>
            {before}
          </del>
        ))}{' '}
        <span className={styles.plain}>
          {knownWords(entry)}
          {line.cameIn !== null && `, came in ${line.cameIn}`}
        </span>
        {isWithdrawn && <span className="unseen">, withdrawn</span>}
        {line.remarks.map((remark) => (
          <span key={remark} className={styles.since}>
            {remark}
          </span>
        ))}
      </td>
      <td className={styles.number}>{numbers.format(entry.sequence)}</td>
      <td className={styles.take}>
        <TakeBack line={line} turn={turn} onTakeBack={onTakeBack} />
      </td>
    </tr>
  );
}

function TakeBack({ line, turn, onTakeBack }: EntryLogProps & { line: LogLine }) {
  const person = usePerson();
  const { entry, words } = line;
  if (onTakeBack === undefined || line.isWithdrawn || isSettled(entry.kind)) return null;
  const asks = turn.departedAt !== null && entry.kind !== 'departure';
  const reach = withdrawalReach(person, turn.terminal);
  const isOwn = entry.by?.id === person.id;
  if (!asks && reach !== 'anyone' && !(reach === 'own' && isOwn)) return null;
  const { entryId, at, reading } = changeOf(entry);
  return (
    <button
      type="button"
      onClick={() => onTakeBack({ entryId, words, at, reading }, asks ? 'corrected' : 'withdrawn')}
    >
      {asks ? 'Correct' : 'Withdraw'}
      <span className="unseen"> {words}</span>
    </button>
  );
}

function changeOf(entry: WireEntry) {
  const at = Date.parse(entry.observedAt ?? entry.receivedAt);
  return { entryId: entry.id, at, reading: entry.reading ?? null };
}

function countWords(shown: number, all: number): string {
  if (all === 0) return 'nothing recorded yet';
  return shown === all ? `${all} ${all === 1 ? 'entry' : 'entries'}` : `last ${shown} of ${all} entries`;
}
