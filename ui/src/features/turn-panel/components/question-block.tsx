import { Button } from '@blueprintjs/core';
import { formatInstant, type RecordEntryRequest } from '@stubpost/shared';
import { useRef } from 'react';
import { v4 as uuid } from 'uuid';
import { errorText } from '../../../lib/error-texts';
import { clockText } from '../../../lib/turn/time-text';
import type { TurnNow } from '../../../lib/turn/turn-now';
import { readNow } from '../../../lib/use-now';
import { useRecordEntry } from '../api/record-entry';
import { accountWords, questionWords, subjectOf, type Question } from '../model/question-words';
import styles from './question-block.module.css';
import type { Recorded } from './use-entry-form';

export interface QuestionBlockProps {
  turn: TurnNow;
  mayRule: boolean;
  onRecorded: (recorded: Recorded) => void;
}

/** What is in question about the turn: all accounts side by side, and for those who may the ruling. */
export function QuestionBlock({ turn, mayRule, onRecorded }: QuestionBlockProps) {
  const questions = turn.matters.inQuestion ?? [];
  if (questions.length === 0) return null;
  return (
    <section className={styles.block} aria-label="In question">
      {questions.map((question) => (
        <OneQuestion
          key={question.step}
          question={question}
          turn={turn}
          mayRule={mayRule}
          onRecorded={onRecorded}
        />
      ))}
    </section>
  );
}

function OneQuestion({ question, turn, mayRule, onRecorded }: QuestionBlockProps & { question: Question }) {
  const record = useRecordEntry();
  const prepared = useRef<RecordEntryRequest | null>(null);
  const rule = (target: string): void => {
    const known = prepared.current;
    const request: RecordEntryRequest =
      known?.kind === 'ruled' && known.target === target
        ? known
        : {
            id: uuid(),
            kind: 'ruled',
            observedAt: formatInstant(readNow()),
            source: 'by-hand',
            target,
            considered: question.accounts.map((account) => account.entryId),
          };
    prepared.current = request;
    record.mutate(
      { turnId: turn.id, request },
      {
        onSuccess: ({ sequence }) =>
          onRecorded({ turnId: turn.id, entryId: request.id, sequence, body: request }),
      },
    );
  };
  const isOnly = question.accounts.length === 1;
  return (
    <div className={styles.question}>
      <p className={styles.words}>
        <b>In question.</b> {questionWords(question, turn)}
      </p>
      <ul className={styles.accounts} aria-label={`Accounts of ${subjectOf(question, turn)}`}>
        {question.accounts.map((account, index) => {
          const words = accountWords(account, turn.zone);
          return (
            <li key={account.entryId}>
              <span>
                {words}
                {index === 0 && <small> counts until somebody rules</small>}
              </span>
              {mayRule && (
                <Button size="small" loading={record.isPending} onClick={() => rule(account.entryId)}>
                  {isOnly ? 'It counts' : 'This one counts'}
                  <span className="unseen">: {words}</span>
                </Button>
              )}
            </li>
          );
        })}
      </ul>
      {(question.objections ?? []).map((objection) => (
        <p key={objection.entryId} className={styles.fine}>
          {objection.by ?? 'Somebody'} does not agree ({clockText(Date.parse(objection.at), turn.zone)}):{' '}
          {objection.reason}
        </p>
      ))}
      <p className={styles.fine}>
        {mayRule
          ? 'All accounts stay in the log. One that should not be there is withdrawn instead.'
          : 'The dispatcher or the supervisor rules.'}
      </p>
      {record.error !== null && <p role="alert">{errorText(record.error)}</p>}
    </div>
  );
}
