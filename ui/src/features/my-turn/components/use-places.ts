import { useCallback, useLayoutEffect, useState } from 'react';
import { actKey, isSettled, nextAct, type NextAct } from '../model/next-act';
import type { ActWays } from './act-ways';
import type { EntryToWithdraw } from './last-entry';
import { useTurnScene, type Recorded } from './turn-context';
import type { ActOnPage } from './use-act';

/** What is on the page of a turn now. */
export type Place =
  | { kind: 'act' }
  | { kind: 'second'; page: ActOnPage }
  | { kind: 'steps' }
  | { kind: 'cannot-do'; step: string; label: string }
  | { kind: 'note' }
  | { kind: 'withdraw'; entry: EntryToWithdraw }
  | { kind: 'phone' };

const undoReason = 'withdrawn by same hand';

/** Where the person is on the page of a turn, and what each button does there. */
export interface Places {
  place: Place;
  act: NextAct;
  /** The act was chosen by the person, out of the plan's order. */
  isPicked: boolean;
  /** What was recorded last, while it can still be undone. */
  done: Recorded | null;
  ways: ActWays;
  toAct: () => void;
  pick: (key: string) => void;
  cannotDo: (step: string, label: string, reason: string) => void;
  withdraw: (entry: EntryToWithdraw, reason: string) => void;
  briefing: () => void;
  undo: () => void;
  endUndo: () => void;
}

/** Keeps the place, the chosen step and the ten seconds of Undo. */
export function usePlaces(): Places {
  const { turn, steps, record } = useTurnScene();
  const [chosen, setPlace] = useState<Place>({ kind: 'act' });
  const [picked, setPicked] = useState<string | null>(null);
  const [done, setDone] = useState<Recorded | null>(null);
  const endUndo = useCallback(() => setDone(null), []);
  const toAct = (): void => setPlace({ kind: 'act' });

  const pickedStep = turn.steps.find((step) => step.key === picked && !isSettled(step));
  const act: NextAct = pickedStep === undefined ? nextAct(turn, steps) : { kind: 'step', step: pickedStep };
  // Somebody else recorded the release meanwhile: there is nothing left for a second touch.
  const isOutdated = chosen.kind === 'second' && actKey(chosen.page.act) !== actKey(act);
  const place: Place = isOutdated ? { kind: 'act' } : chosen;

  const shownKey = `${place.kind} ${actKey(act)}`;
  // Before the parts of the page look where they stand: a number pad may then bring itself into sight.
  useLayoutEffect(() => {
    window.scrollTo({ top: 0 });
  }, [shownKey]);

  const keep = (recorded: Recorded): void => {
    setDone(recorded);
    setPicked(null);
    toAct();
  };
  const tellDesk = (note: string): void =>
    keep(record({ kind: 'note', note }, { label: 'Note to the desk' }));
  const ways: ActWays = {
    onRecord: (draft, label, earlier) => keep(record(draft, { label, earlier })),
    onSecond: (page) => setPlace({ kind: 'second', page }),
    onSteps: () => setPlace({ kind: 'steps' }),
    onCannotDo: () => {
      if (act.kind === 'step')
        setPlace({ kind: 'cannot-do', step: act.step.key, label: act.step.shortLabel });
    },
    onNote: () => setPlace({ kind: 'note' }),
    onTellDesk: tellDesk,
    onWithdraw: (entry) => setPlace({ kind: 'withdraw', entry }),
    onPhone: () => setPlace({ kind: 'phone' }),
  };

  return {
    place,
    act,
    isPicked: pickedStep !== undefined,
    done,
    ways,
    toAct,
    endUndo,
    pick: (key) => {
      setPicked(key);
      setDone(null);
      toAct();
    },
    cannotDo: (step, label, reason) =>
      keep(record({ kind: 'cannot-do', step, reason }, { label: `Can’t do: ${label}` })),
    withdraw: ({ entryId, words }, reason) => {
      record({ kind: 'withdrawn', target: entryId, reason }, { label: `Withdrawn: ${words}` });
      toAct();
    },
    briefing: () => keep(record({ kind: 'briefing' }, { label: 'Safety briefing' })),
    undo: () => {
      if (done !== null)
        record(
          { kind: 'withdrawn', target: done.entryId, reason: undoReason },
          { label: `Undo: ${done.label}` },
        );
      setDone(null);
    },
  };
}
