import type { WireAlert, WireTerminal } from '@stubpost/shared';
import { useState } from 'react';
import { useTakeAlert } from '../../features/alerts/api/alert-acts';
import { actsOf, type ActTarget, type EntryAct } from '../../features/turn-panel/model/entry-acts';
import type { Recorded } from '../../features/turn-panel/components/use-entry-form';
import { useMay, usePerson } from '../../lib/session';
import { useReturnFocus } from '../../lib/use-return-focus';
import type { TurnNow } from '../../lib/turn/turn-now';
import { foremostAlert } from '../../lib/turn/turn-times';

const formOf: Record<string, EntryAct> = {
  tick: 'step',
  relay: 'step',
  note: 'note',
  track: 'track',
  set: 'set',
};

/** What the desk is doing: the form that is open, the answer to the last entry, the alert being set aside. */
export function useDeskActs(terminal: WireTerminal) {
  const [target, setTarget] = useState<ActTarget | null>(null);
  const [recorded, setRecorded] = useState<Recorded | null>(null);
  const [aside, setAside] = useState<WireAlert | null>(null);
  const focus = useReturnFocus();
  const take = useTakeAlert();
  const acts = actsOf(usePerson(), terminal.code);
  const mayAct = useMay('alerts.act', terminal.code);

  const openForm = (form: ActTarget): void => {
    focus.remember();
    setTarget(form);
  };
  const openAside = (alert: WireAlert): void => {
    focus.remember();
    setAside(alert);
  };
  const close = (): void => {
    setTarget(null);
    setAside(null);
    focus.giveBack();
  };

  /** Carries out what a key or a click on the board asks for; what the person may not do is passed over. */
  const onBoard = (what: string, turn: TurnNow, step: string | null): void => {
    const form = formOf[what];
    const alert = foremostAlert(turn.alerts);
    if (what === 'take' && mayAct && alert !== null && alert.state !== 'taken') take.mutate(alert);
    else if (what === 'set-aside' && mayAct && alert !== null) openAside(alert);
    else if (form !== undefined && acts.has(form)) openForm({ act: form, turnId: turn.id, step });
  };
  return {
    target,
    recorded,
    aside,
    problem: take.error,
    onBoard,
    onEntry: openForm,
    onSetAside: openAside,
    onRecorded: (entry: Recorded): void => {
      close();
      setRecorded(entry);
    },
    close,
    closeReceipt: (): void => setRecorded(null),
  };
}
