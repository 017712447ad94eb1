import { useState } from 'react';
import { useUnsaved } from '../../../lib/unsaved';
import { rolesOf, type Instant, type WireReading } from '@stubpost/shared';
import { lockOf, type ActLock } from '../model/act-lock';
import {
  emptyForm,
  fieldsOf,
  fieldWords,
  missingField,
  NUMBER_FIELDS,
  readingOf,
  type ActForm,
  type FormField,
  type NumberField,
} from '../model/act-form';
import { handbrakeView, type HandbrakeView } from '../model/handbrake-view';
import { hasLeft, type NextAct } from '../model/next-act';
import { useTurnScene } from './turn-context';
import { useAsksBriefing } from './use-turn-rules';

/** One act on the page: what was put in, what it waits for, what stands in its way. */
export interface ActOnPage {
  act: NextAct;
  brakes: HandbrakeView;
  fields: FormField[];
  form: ActForm;
  setForm: (form: ActForm) => void;
  active: NumberField | null;
  setActive: (field: NumberField) => void;
  reading: WireReading | undefined;
  /** Words of what the bar waits for; null when it may open. */
  waitsFor: string | null;
  lock: ActLock | null;
  isLockLifted: boolean;
  liftLock: () => void;
  /** When it happened, if it is entered later; `asksTime` while the person is asked. */
  earlier: Instant | null;
  setEarlier: (moment: Instant | null) => void;
  asksTime: boolean;
  setAsksTime: (asks: boolean) => void;
  /** The act can only be entered later: the train has left without it. */
  mustBeLater: boolean;
}

/** The state of one act. The component that calls it is drawn anew for another act, so nothing is carried over. */
export function useAct(act: NextAct): ActOnPage {
  const { turn, steps, handbrakes, now } = useTurnScene();
  const asksBriefing = useAsksBriefing();
  const [form, setForm] = useState<ActForm>(emptyForm);
  const [chosenField, setActive] = useState<NumberField | null>(null);
  const [isLockLifted, setLockLifted] = useState(false);
  const [earlier, setEarlier] = useState<Instant | null>(null);
  const [wantsTime, setWantsTime] = useState(false);

  useUnsaved(form !== emptyForm);

  const planned = act.kind === 'step' ? steps.find((step) => step.key === act.step.key) : undefined;
  const brakes = handbrakeView(turn, steps, handbrakes, planned?.key);
  const fields = planned === undefined ? [] : fieldsOf(planned, brakes.cars);
  const numbers = NUMBER_FIELDS.filter((field) => fields.includes(field));
  const mustBeLater =
    planned !== undefined && hasLeft(turn) && !rolesOf(steps).afterDeparture.has(planned.key);
  const asksTime = wantsTime || mustBeLater;
  const filled = withLeftCars(form, brakes);
  const missing = missingField(fields, filled);
  const waitsForField = missing === null ? null : fieldWords[missing].waitsFor;
  return {
    act,
    brakes,
    fields,
    form,
    setForm,
    active: chosenField ?? numbers[0] ?? null,
    setActive,
    reading: readingOf(fields, filled),
    waitsFor: waitsForField ?? (asksTime && earlier === null ? 'waits for the time' : null),
    lock: lockOf({ turn, steps, act, now, asksBriefing }),
    isLockLifted,
    liftLock: () => setLockLifted(true),
    earlier: asksTime ? earlier : null,
    setEarlier,
    asksTime,
    setAsksTime: setWantsTime,
    mustBeLater,
  };
}

/** While the counts differ and nothing is touched, the bar offers the cars that are left. */
function withLeftCars(form: ActForm, { shortCount }: HandbrakeView): ActForm {
  const isUntouched = form.cars.length === 0 && !form.none.includes('cars');
  return shortCount !== null && isUntouched ? { ...form, cars: shortCount.carsStillSet } : form;
}
