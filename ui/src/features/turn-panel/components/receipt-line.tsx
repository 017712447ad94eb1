import { Button } from '@blueprintjs/core';
import { formatInstant } from '@stubpost/shared';
import { useEffect, useRef, useState } from 'react';
import { v4 as uuid } from 'uuid';
import { errorText } from '../../../lib/error-texts';
import { readNow } from '../../../lib/use-now';
import { useRecordEntry, type EntryToRecord } from '../api/record-entry';
import { entryNouns } from '../model/entry-acts';
import styles from './receipt-line.module.css';
import type { Recorded } from './use-entry-form';

const undoMilliseconds = 10_000;
const numbers = new Intl.NumberFormat('en-US');

/** The answer to one's own act: its number in the log, and ten seconds in which it can be taken back at once. */
export function ReceiptLine({ recorded, onClose }: { recorded: Recorded; onClose: () => void }) {
  const [hasUndo, setHasUndo] = useState(recorded.body.kind !== 'withdrawn');
  const record = useRecordEntry();
  const entry = useRef<EntryToRecord | null>(null);
  useEffect(() => {
    const timer = setTimeout(() => setHasUndo(false), undoMilliseconds);
    return () => clearTimeout(timer);
  }, []);
  const undo = (): void => {
    entry.current ??= {
      turnId: recorded.turnId,
      request: {
        id: uuid(),
        kind: 'withdrawn',
        observedAt: formatInstant(readNow()),
        source: 'by-hand',
        target: recorded.entryId,
        reason: 'taken back by the same hand',
      },
    };
    record.mutate(entry.current, { onSuccess: () => setHasUndo(false) });
  };
  return (
    <div className={styles.line} role="status">
      <span>
        {record.isSuccess
          ? 'Taken back.'
          : `${entryNouns[recorded.body.kind]} recorded, no. ${numbers.format(recorded.sequence)}.`}
      </span>
      {record.error !== null && <b>{errorText(record.error)}</b>}
      {hasUndo && !record.isSuccess && (
        <Button loading={record.isPending} onClick={undo}>
          Undo
        </Button>
      )}
      <Button variant="minimal" onClick={onClose}>
        Close
      </Button>
    </div>
  );
}
