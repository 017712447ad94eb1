import { readAhead, readWhen } from './when';

const zone = 'America/New_York';
const at = (text: string): number => Date.parse(text);
const now = at('2026-03-03T22:26:40Z');

describe('when something happened, as typed', () => {
  it.each([
    ['', '2026-03-03T22:26:40Z', 'now'],
    ['now', '2026-03-03T22:26:40Z', 'now'],
    ['2', '2026-03-03T22:24:40Z', 'ago'],
    ['12 min', '2026-03-03T22:14:40Z', 'ago'],
    ['17:24', '2026-03-03T22:24:00Z', 'typed'],
    ['1724', '2026-03-03T22:24:00Z', 'typed'],
    ['17:24:05', '2026-03-03T22:24:05Z', 'typed'],
    ['17:27', '2026-03-03T22:26:40Z', 'typed'],
  ])('"%s" is %s', (text, expected, said) => {
    expect(readWhen(text, zone, now)).toEqual({ ok: true, at: at(expected), said });
  });

  it.each(['17:40', 'soon', '7:61', '-2'])('refuses "%s"', (text) => {
    expect(readWhen(text, zone, now).ok).toBe(false);
  });

  it('means the evening before when it is typed after midnight', () => {
    const night = at('2026-03-04T05:10:00Z');
    expect(readWhen('23:55', zone, night)).toEqual({
      ok: true,
      at: at('2026-03-04T04:55:00Z'),
      said: 'typed',
    });
  });

  it('is read on the terminal’s clock on both sides of a clock change', () => {
    const spring = at('2026-03-08T07:30:00Z');
    expect(readWhen('01:50', zone, spring)).toMatchObject({ at: at('2026-03-08T06:50:00Z') });
    const autumn = at('2026-11-01T07:30:00Z');
    expect(readWhen('00:50', zone, autumn)).toMatchObject({ at: at('2026-11-01T04:50:00Z') });
  });
});

describe('a time to come, as typed', () => {
  it('is the next such moment', () => {
    expect(readAhead('17:44', zone, now)).toMatchObject({ ok: true, at: at('2026-03-03T22:44:00Z') });
    expect(readAhead('+5', zone, now)).toMatchObject({ ok: true, at: at('2026-03-03T22:31:40Z') });
    expect(readAhead('', zone, now).ok).toBe(false);
  });
});
