import { withCar, withDigit, withNone, withoutDigit, NUMBER_FIELDS } from '../model/act-form';
import { CarBoxes, type CarBox } from './car-boxes';
import { NumberPad } from './number-pad';
import { useTurnScene } from './turn-context';
import type { ActOnPage } from './use-act';

/** What a step asks to be counted or read off: cars to touch, numbers to type. */
export function ActInputs({ page }: { page: ActOnPage }) {
  const { turn } = useTurnScene();
  const { fields, form, setForm, active } = page;
  const numbers = NUMBER_FIELDS.filter((field) => fields.includes(field));
  const order = turn.cars.length > 0 ? turn.cars : page.brakes.cars;
  return (
    <>
      {fields.includes('cars') && (
        <CarBoxes
          name={turn.set === null ? 'Cars of the train' : `Cars of set ${turn.set}`}
          boxes={order.map((car) => boxOf(car, page))}
          onTouch={(car) => setForm(withCar(form, car, order))}
        />
      )}
      {active !== null && (
        <NumberPad
          fields={numbers}
          form={form}
          active={active}
          onField={page.setActive}
          onDigit={(digit) => setForm(withDigit(form, active, digit))}
          onErase={() => setForm(withoutDigit(form, active))}
          onNone={() => setForm(withNone(form, active))}
        />
      )}
    </>
  );
}

function boxOf(car: string, { brakes, form }: ActOnPage): CarBox {
  const pressed = form.cars.includes(car);
  if (brakes.hand !== 'released')
    return { car, pressed, word: pressed ? 'set' : '', disabled: false, stillSet: false };
  const wasReleased = brakes.released.includes(car);
  const hasBrake = brakes.cars.includes(car);
  const word = pressed || wasReleased ? 'released' : hasBrake ? 'set' : '';
  return {
    car,
    pressed: pressed || wasReleased,
    word,
    disabled: wasReleased || !hasBrake,
    stillSet: hasBrake && brakes.shortCount !== null,
  };
}
