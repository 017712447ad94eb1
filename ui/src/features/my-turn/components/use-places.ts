import { useLayoutEffect, useRef, useState } from 'react';
import type { EntryDraft } from '../model/entry-draft';
import { actKey, isSettled, nextAct, type NextAct } from '../model/next-act';
import type { ActWays } from './act-ways';
import type { Place } from './place';
import { useTurnScene, type RecordOptions, type Recorded } from './turn-context';
import { useDone } from './use-done';

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
  /** Brings a step under the bar, also out of order. */
  pick: (key: string) => void;
  /** Records without a place for Undo: what takes back or corrects is itself taken back by another entry. */
  recordQuietly: (...acts: (RecordOptions & { draft: EntryDraft })[]) => void;
  undo: () => void;
  endUndo: () => void;
}

/** Keeps the place, the chosen step and the ten seconds of Undo. */
export function usePlaces(): Places {
  const { turn, steps } = useTurnScene();
  const [chosen, setPlace] = useState<Place>({ kind: 'act' });
  const [picked, setPicked] = useState<string | null>(null);
  const { done, endUndo, keep, keepQuietly, undo } = useDone();
  const toAct = (): void => setPlace({ kind: 'act' });

  const pickedStep = turn.steps.find((step) => step.key === picked && !isSettled(step));
  const act: NextAct = pickedStep === undefined ? nextAct(turn, steps) : { kind: 'step', step: pickedStep };
  // Somebody else recorded the release meanwhile: there is nothing left for a second touch.
  const isOutdated = chosen.kind === 'second' && actKey(chosen.page.act) !== actKey(act);
  const place: Place = isOutdated ? { kind: 'act' } : chosen;
  useTopOfPlace(`${place.kind} ${actKey(act)}`);
  useFocusOnReturn(place);

  const ways: ActWays = {
    onRecord: (draft, label, earlier) => {
      keep(draft, { label, earlier }, () => {
        setPicked(null);
        toAct();
      });
    },
    onGo: setPlace,
  };

  return {
    place,
    act,
    isPicked: pickedStep !== undefined,
    done,
    ways,
    toAct,
    undo,
    endUndo,
    pick: (key) => {
      setPicked(key);
      endUndo();
      toAct();
    },
    recordQuietly: (...acts) => keepQuietly(acts, toAct),
  };
}

/** Each place begins at its top. Before the parts of the page look where they stand: a number pad may then bring itself into sight. */
export function useTopOfPlace(shownKey: string): void {
  useLayoutEffect(() => {
    window.scrollTo({ top: 0 });
  }, [shownKey]);
}

/** Back on the act, the focus goes to what is next; without it the keys would begin at the top of the page again. */
function useFocusOnReturn(place: Place): void {
  const before = useRef<Place['kind']>('act');
  useLayoutEffect(() => {
    const isReturn = place.kind === 'act' && before.current !== 'act';
    before.current = place.kind;
    if (isReturn) document.getElementById(nextHeadingId)?.focus({ preventScroll: true });
  }, [place.kind]);
}

/** The heading of the next act, where the focus goes when its place comes up again. */
export const nextHeadingId = 'next-act';
