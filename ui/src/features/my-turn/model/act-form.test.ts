import {
  carList,
  emptyForm,
  fieldsOf,
  handbrakeWords,
  missingField,
  readingOf,
  readingWords,
  withCar,
  withDigit,
  withNone,
  withoutDigit,
} from './act-form';

const cars = ['1501', '1402', '1408', '1412'];
const handbrake = { reads: ['count', 'cars'] as const };
const typed = (digits: string, field: 'count' | 'brakePipePsi' = 'brakePipePsi') =>
  [...digits].reduce((form, digit) => withDigit(form, field, digit), emptyForm);

describe('what a step asks to be read off', () => {
  it('is touched cars when the cars of the set are known, else a count', () => {
    expect(fieldsOf({ reads: [...handbrake.reads] }, cars)).toEqual(['cars']);
    expect(fieldsOf({ reads: [...handbrake.reads] }, [])).toEqual(['count']);
    expect(fieldsOf({ reads: ['count'] }, cars)).toEqual(['cars']);
  });

  it('is the brake pipe, or three values for leakage, or nothing', () => {
    expect(fieldsOf({ reads: ['brakePipePsi'] }, cars)).toEqual(['brakePipePsi']);
    expect(fieldsOf({ reads: ['leakage'] }, cars)).toEqual(['p0', 'p1', 'seconds']);
    expect(fieldsOf({ reads: [] }, cars)).toEqual([]);
  });

  it('has no value before the first touch', () => {
    expect(missingField(['brakePipePsi'], emptyForm)).toBe('brakePipePsi');
    expect(readingOf(['brakePipePsi'], emptyForm)).toBeUndefined();
  });
});

describe('typing', () => {
  it('puts digits one behind the other and takes the last away', () => {
    expect(readingOf(['brakePipePsi'], typed('110'))).toEqual({ brakePipePsi: 110 });
    expect(withoutDigit(typed('110'), 'brakePipePsi').typed.brakePipePsi).toBe('11');
    expect(missingField(['brakePipePsi'], withoutDigit(typed('1'), 'brakePipePsi'))).toBe('brakePipePsi');
  });

  it('does not pass what the log takes, and drops a leading zero', () => {
    expect(typed('1105').typed.brakePipePsi).toBe('110');
    expect(typed('201').typed.brakePipePsi).toBe('20');
    expect(typed('07', 'count').typed.count).toBe('7');
  });

  it('can say that there is no reading, which is not zero', () => {
    const none = withNone(typed('11'), 'brakePipePsi');
    expect(missingField(['brakePipePsi'], none)).toBeNull();
    expect(readingOf(['brakePipePsi'], none)).toBeUndefined();
    expect(readingOf(['count'], typed('0', 'count'))).toEqual({ count: 0 });
    expect(readingOf(['brakePipePsi'], withDigit(none, 'brakePipePsi', '9'))).toEqual({ brakePipePsi: 9 });
  });
});

describe('touching cars', () => {
  it('keeps the order of the set, counts them, and lets one go again', () => {
    const two = withCar(withCar(emptyForm, '1412', cars), '1408', cars);
    expect(readingOf(['cars'], two)).toEqual({ cars: ['1408', '1412'], count: 2 });
    expect(withCar(two, '1408', cars).cars).toEqual(['1412']);
    expect(missingField(['cars'], emptyForm)).toBe('cars');
  });

  it('is said as a record', () => {
    expect(handbrakeWords({ count: 2, cars: ['1408', '1412'] })).toBe('2 handbrakes, cars 1408 and 1412');
    expect(handbrakeWords({ count: 1, cars: ['1412'] })).toBe('1 handbrake, car 1412');
    expect(handbrakeWords({ count: 3 })).toBe('3 handbrakes');
    expect(handbrakeWords(undefined)).toBe('no count');
    expect(carList(['1404', '1408', '1412'])).toBe('1404, 1408 and 1412');
    expect(readingWords({ p0: 110, p1: 108, seconds: 60 })).toBe('110 to 108 psi, in 60 s');
  });
});
