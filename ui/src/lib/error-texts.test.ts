import { ERROR_STATUSES, type ErrorCode } from '@stubpost/shared';
import { describe, expect, test } from 'vitest';
import { ApiError } from './api-client';
import { errorText } from './error-texts';

const refusal = (code: ErrorCode, facts: Record<string, unknown> = {}): ApiError =>
  new ApiError({ status: ERROR_STATUSES[code], code, message: code, facts });

describe('the words for a refusal', () => {
  test.each(Object.keys(ERROR_STATUSES) as ErrorCode[])('%s is a sentence, also without facts', (code) => {
    const words = errorText(refusal(code));
    expect(words).toMatch(/^[A-Z“].*\.$/);
    expect(words).not.toMatch(/undefined|null|NaN|please|sorry|!| {2}/i);
  });

  test('say how long to wait', () => {
    expect(errorText(refusal('session.too_many_tries', { retryAfterSeconds: 90 }))).toBe(
      'Too many tries. Try again in 2 min.',
    );
    expect(errorText(refusal('session.too_many_tries', { retryAfterSeconds: 12 }))).toBe(
      'Too many tries. Try again in 12 s.',
    );
  });

  test('name the field of a request that was not right', () => {
    const facts = { problems: [{ path: 'email', message: 'Invalid email address' }] };
    expect(errorText(refusal('request.invalid', facts))).toBe(
      'Something is not right: email: Invalid email address.',
    );
  });

  test('are those of the page itself for anything that is no refusal', () => {
    expect(errorText(new TypeError('x is undefined'))).toBe('This part of the page stopped working.');
  });
});
