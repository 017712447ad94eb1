import type { RecordEntryRequest, StepPlan } from '@stubpost/shared';
import { useRef, useState } from 'react';
import { v4 as uuid } from 'uuid';
import { usePerson } from '../../../lib/session';
import { nextStep } from '../../../lib/turn/step-words';
import type { TurnNow } from '../../../lib/turn/turn-now';
import { readNow } from '../../../lib/use-now';
import { useRecordEntry } from '../api/record-entry';
import { isWitnessed, usualSource, type ActTarget } from '../model/entry-acts';
import {
  emptyDraft,
  readDraft,
  type DraftFault,
  type EntryBody,
  type EntryDraft,
} from '../model/entry-draft';
import { secondBarWords } from '../model/second-bar';

/** What was recorded, for the line that answers the act. */
export interface Recorded {
  turnId: string;
  entryId: string;
  sequence: number;
  body: EntryBody;
}

export interface EntryFormOptions {
  target: ActTarget;
  turn: TurnNow;
  plan: Pick<StepPlan, 'steps'> | undefined;
  onRecorded: (recorded: Recorded) => void;
}

/** The state of one form: what is typed, what is wrong with it, what waits for a second word, and what is on its way. */
export function useEntryForm({ target, turn, plan, onRecorded }: EntryFormOptions) {
  const person = usePerson();
  const [draft, setDraft] = useState<EntryDraft>(() => firstDraft(target, turn, person));
  const [faults, setFaults] = useState<DraftFault[]>([]);
  const [waiting, setWaiting] = useState<{ body: EntryBody; words: string } | null>(null);
  const prepared = useRef<{ draft: EntryDraft; request: RecordEntryRequest } | null>(null);
  const record = useRecordEntry();
  const steps = plan?.steps ?? [];

  const send = (body: EntryBody): void => {
    // The same words sent again after a failure are the same entry: same id, same moment.
    const known = prepared.current?.draft === draft ? prepared.current.request : null;
    const request: RecordEntryRequest = known ?? { ...body, id: uuid() };
    prepared.current = { draft, request };
    record.mutate(
      { turnId: target.turnId, request },
      {
        onSuccess: ({ sequence }) =>
          onRecorded({ turnId: target.turnId, entryId: request.id, sequence, body: request }),
      },
    );
  };

  return {
    draft,
    faults,
    waiting,
    isSending: record.isPending,
    problem: record.error,
    change: (part: Partial<EntryDraft>): void => {
      setDraft((before) => ({ ...before, ...part }));
      setWaiting(null);
      record.reset();
    },
    submit: (): void => {
      const result = readDraft(draft, { zone: turn.zone, now: readNow(), steps, target });
      setFaults(result.ok ? [] : result.faults);
      if (!result.ok) return;
      const words = secondBarWords(result.body, turn, steps);
      if (words === null) send(result.body);
      else setWaiting({ body: result.body, words });
    },
    confirm: (): void => {
      if (waiting !== null) send(waiting.body);
    },
    notYet: (): void => setWaiting(null),
  };
}

function firstDraft(target: ActTarget, turn: TurnNow, person: ReturnType<typeof usePerson>): EntryDraft {
  const step = target.step ?? nextStep(turn)?.key ?? null;
  const as = target.as ?? 'conductor';
  const source = usualSource(person, turn.terminal, target.act);
  const holder = turn.crew.find((member) => member.as === as);
  const draft = emptyDraft({ ...target, step }, source, isWitnessed(target.act) ? speakerOf(turn) : '');
  return { ...draft, as, out: target.act === 'relief' ? (holder?.personId ?? '') : '' };
}

/** Who most likely speaks on the radio: the conductor, who tells of everybody's steps. It can be changed. */
export function speakerOf(turn: TurnNow): string {
  const conductor = turn.crew.find((member) => member.as === 'conductor');
  return conductor?.name ?? turn.crew[0]?.name ?? '';
}
