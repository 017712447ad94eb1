import type { PlanStep, ReadingKey, WireReading } from '@stubpost/shared';

/** Fields whose value is typed on the number pad. */
export const NUMBER_FIELDS = ['count', 'brakePipePsi', 'p0', 'p1', 'seconds'] as const;
export type NumberField = (typeof NUMBER_FIELDS)[number];
/** Everything a step may ask to be counted or read off. `cars` are touched, not typed. */
export type FormField = NumberField | 'cars';

/** What the person has put in so far. Nothing stands in it before the first touch. */
export interface ActForm {
  cars: readonly string[];
  typed: Readonly<Partial<Record<NumberField, string>>>;
  /** Fields the person said there is no value for. */
  none: readonly FormField[];
}

export const emptyForm: ActForm = { cars: [], typed: {}, none: [] };

const readsToFields: Record<ReadingKey, FormField[]> = {
  count: ['count'],
  cars: ['cars'],
  brakePipePsi: ['brakePipePsi'],
  leakage: ['p0', 'p1', 'seconds'],
};

/** Fields of a step in the order of the page. Cars that are known by number are touched, and their number is the count. */
export function fieldsOf(step: Pick<PlanStep, 'reads'>, carsKnown: readonly string[]): FormField[] {
  const fields = step.reads.flatMap((read) => readsToFields[read]);
  const asksForHandbrakes = fields.includes('count') || fields.includes('cars');
  const counted: FormField[] = asksForHandbrakes ? [carsKnown.length > 0 ? 'cars' : 'count'] : [];
  return [...counted, ...fields.filter((field) => field !== 'count' && field !== 'cars')];
}

/** What each field is called where it is asked for, and its unit. */
export const fieldWords: Record<FormField, { name: string; unit: string; waitsFor: string }> = {
  cars: { name: 'Cars', unit: '', waitsFor: 'waits for the cars' },
  count: { name: 'Handbrakes', unit: '', waitsFor: 'waits for the count' },
  brakePipePsi: {
    name: 'Brake pipe, as the engineer reads it',
    unit: 'psi',
    waitsFor: 'waits for the reading',
  },
  p0: { name: 'Pressure at the start', unit: 'psi', waitsFor: 'waits for the reading' },
  p1: { name: 'Pressure at the end', unit: 'psi', waitsFor: 'waits for the reading' },
  seconds: { name: 'Length of the test', unit: 's', waitsFor: 'waits for the reading' },
};

/** Largest value each field takes; the log takes no more either. */
const largest: Record<NumberField, number> = {
  count: 200,
  brakePipePsi: 200,
  p0: 200,
  p1: 200,
  seconds: 3600,
};

const isFilled = (field: FormField, form: ActForm): boolean => {
  if (form.none.includes(field)) return true;
  return field === 'cars' ? form.cars.length > 0 : (form.typed[field] ?? '') !== '';
};

/** The first field that still waits for a value; null when the bar may open. */
export function missingField(fields: readonly FormField[], form: ActForm): FormField | null {
  return fields.find((field) => !isFilled(field, form)) ?? null;
}

/** The form with one more digit in a field. A digit that would pass the largest value is not taken; a leading 0 is dropped. */
export function withDigit(form: ActForm, field: NumberField, digit: string): ActForm {
  const text = `${form.typed[field] ?? ''}${digit}`.replace(/^0(?=\d)/, '');
  if (Number(text) > largest[field]) return form;
  return {
    ...form,
    typed: { ...form.typed, [field]: text },
    none: form.none.filter((each) => each !== field),
  };
}

/** The form with the last digit of a field taken away. */
export function withoutDigit(form: ActForm, field: NumberField): ActForm {
  return { ...form, typed: { ...form.typed, [field]: (form.typed[field] ?? '').slice(0, -1) } };
}

/** The form that says there is no value for a field. */
export function withNone(form: ActForm, field: FormField): ActForm {
  const cleared = field === 'cars' ? { cars: [] } : { typed: { ...form.typed, [field]: '' } };
  return { ...form, ...cleared, none: [...form.none.filter((each) => each !== field), field] };
}

/** The form with a car touched or let go. Cars stand in the order of the set. */
export function withCar(form: ActForm, car: string, order: readonly string[]): ActForm {
  const chosen = form.cars.includes(car) ? form.cars.filter((each) => each !== car) : [...form.cars, car];
  return {
    ...form,
    cars: order.filter((each) => chosen.includes(each)),
    none: form.none.filter((each) => each !== 'cars'),
  };
}

/** What goes into the entry; undefined when nothing was read off. */
export function readingOf(fields: readonly FormField[], form: ActForm): WireReading | undefined {
  const reading: WireReading = {};
  for (const field of fields) {
    if (form.none.includes(field)) continue;
    if (field === 'cars') {
      reading.cars = [...form.cars];
      reading.count = form.cars.length;
    } else {
      const text = form.typed[field] ?? '';
      if (text !== '') reading[field] = Number(text);
    }
  }
  return Object.keys(reading).length === 0 ? undefined : reading;
}

/** Car numbers as a person says them: "1408", "1408 and 1412", "1404, 1408 and 1412". */
export function carList(cars: readonly string[]): string {
  if (cars.length < 2) return cars[0] ?? '';
  return `${cars.slice(0, -1).join(', ')} and ${cars.at(-1) ?? ''}`;
}

/** Handbrakes of an entry in words: "2 handbrakes, cars 1408 and 1412", "1 handbrake, car 1412", "3 handbrakes". */
export function handbrakeWords(reading: WireReading | null | undefined): string {
  const cars = reading?.cars ?? [];
  const count = reading?.count ?? cars.length;
  if (count === 0 && cars.length === 0) return 'no count';
  const brakes = `${count} ${count === 1 ? 'handbrake' : 'handbrakes'}`;
  return cars.length === 0 ? brakes : `${brakes}, ${cars.length === 1 ? 'car' : 'cars'} ${carList(cars)}`;
}

/** Everything an entry carries, in words; empty when it carries nothing. */
export function readingWords(reading: WireReading | null | undefined): string {
  if (reading === null || reading === undefined) return '';
  const parts: string[] = [];
  if (reading.count !== undefined || reading.cars !== undefined) parts.push(handbrakeWords(reading));
  if (reading.brakePipePsi !== undefined) parts.push(`${reading.brakePipePsi} psi`);
  if (reading.p0 !== undefined && reading.p1 !== undefined) parts.push(`${reading.p0} to ${reading.p1} psi`);
  if (reading.seconds !== undefined) parts.push(`in ${reading.seconds} s`);
  return parts.join(', ');
}
