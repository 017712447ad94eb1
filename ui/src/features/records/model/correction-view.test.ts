import { readingText } from './correction-view';

describe('what was read off, in a correction', () => {
  it('is said in words, for one handbrake and for several', () => {
    expect(readingText({ count: 2, cars: ['1408', '1412'] })).toBe('2 handbrakes, cars 1408, 1412');
    expect(readingText({ count: 1, cars: ['1410'] })).toBe('1 handbrake, car 1410');
    expect(readingText({ count: 3 })).toBe('3 handbrakes');
    expect(readingText({ brakePipePsi: 110 })).toBe('110 psi');
    expect(readingText({})).toBe('nothing');
  });
});
