import { describe, expect, test } from 'vitest';
import { judgePin, pinPattern } from './pin';

describe('a PIN', () => {
  test.each(['4444', '00000000', '1234', '3456', '9876', '43210'])('%s is what people try first', (pin) => {
    expect(judgePin(pin)).toBe('pin.too_simple');
  });

  test.each(['4471', '1235', '2580', '1357', '90210'])('%s is good', (pin) => {
    expect(judgePin(pin)).toBe('good');
  });

  test.each(['4471', '44718820'])('has 4 to 8 digits, as %s has', (pin) => {
    expect(pin).toMatch(pinPattern);
  });

  test.each(['447', '447188201', '44a1', '4471 ', '4471\n'])('is not %j', (pin) => {
    expect(pin).not.toMatch(pinPattern);
  });
});
