import { formatAnchored, formatMinutes, parseMinutes } from './minutes-text';

describe('minutes and seconds of a plan', () => {
  it.each([0, 5, 60, 75, 600, 5999, -1, -45, -300])('reads back what it writes: %i s', (seconds) => {
    expect(parseMinutes(formatMinutes(seconds))).toBe(seconds);
  });

  it('takes the keyboard’s hyphen and blanks around', () => {
    expect(parseMinutes(' -5:00 ')).toBe(-300);
  });

  it.each(['', '75', '1:5', '1:60', '1.15', 'a:00', '--1:00'])('reads nothing from %j', (text) => {
    expect(parseMinutes(text)).toBeNull();
  });

  it('names the anchor', () => {
    expect(formatAnchored('arrival', 120)).toBe('arrival + 2:00');
    expect(formatAnchored('departure', -240)).toBe('departure − 4:00');
    expect(formatAnchored('departure', 300)).toBe('departure + 5:00');
  });
});
