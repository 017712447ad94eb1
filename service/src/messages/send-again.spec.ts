import { pauseAfter } from './send-again';

test('pauses grow, then stay: ten minutes of silence are tried seven times', () => {
  const pauses = Array.from({ length: 8 }, (_, index) => pauseAfter(index + 1));
  expect(pauses).toEqual([5, 15, 30, 60, 120, 300, 300, 300]);
  let tries = 1;
  for (let at = 0; at + pauseAfter(tries) <= 600; tries += 1) at += pauseAfter(tries);
  expect(tries).toBe(7);
});
