import { describe, expect, test } from 'vitest';
import { judgePin } from './pin';

describe('a PIN', () => {
  test.each(['4444', '00000000', '1234', '3456', '9876', '43210'])('%s is what people try first', (pin) => {
    expect(judgePin(pin)).toBe('pin.too_simple');
  });

  test.each(['4471', '1235', '2580', '1357', '90210'])('%s is good', (pin) => {
    expect(judgePin(pin)).toBe('good');
  });
});
