import { draggedChoice, movedChoice, neighbourSpan, resizedChoice, windowAt } from './time-window';

const at = (text: string): number => Date.parse(`2026-03-03T${text}Z`);
const day = { from: at('05:00:00'), to: at('23:59:00') };
const now = at('22:26:40');

describe('the window of the board', () => {
  it('of two hours starts 20 minutes before now and ends 100 minutes after', () => {
    const shown = windowAt({ span: 120, startAt: null }, now, day);
    expect(shown).toEqual({ from: at('22:06:40'), to: now + 100 * 60_000 });
  });

  it('of a day is the service day, wherever now is', () => {
    expect(windowAt({ span: 'day', startAt: null }, now, day)).toEqual(day);
  });

  it('moves by half its length, at whole minutes, and stops following now', () => {
    const choice = { span: 120, startAt: null };
    const later = movedChoice(choice, windowAt(choice, now, day), 1);
    expect(later).toEqual({ span: 120, startAt: at('23:07:00') });
    const back = movedChoice(later, windowAt(later, now, day), -1);
    expect(back).toEqual({ span: 120, startAt: at('22:07:00') });
  });

  it('moves from one day to the next when it shows a day', () => {
    const later = movedChoice(
      { span: 'day', startAt: null },
      { from: at('10:00:00'), to: at('20:00:00') },
      1,
    );
    expect(later).toEqual({ span: 'day', startAt: at('15:00:00') + 24 * 3_600_000 });
  });

  it('keeps its middle when another length is picked away from now', () => {
    const choice = { span: 120, startAt: at('10:00:00') };
    const wider = resizedChoice(choice, windowAt(choice, now, day), 240);
    expect(wider).toEqual({ span: 240, startAt: at('09:00:00') });
  });

  it('goes on following now when another length is picked at now', () => {
    const choice = { span: 120, startAt: null };
    expect(resizedChoice(choice, windowAt(choice, now, day), 60)).toEqual({ span: 60, startAt: null });
  });

  it.each([
    [120, 1, 240],
    [480, 1, 'day'],
    ['day', 1, 'day'],
    ['day', -1, 480],
    [60, -1, 60],
    [95, 1, 120],
    [95, -1, 60],
  ] as const)('%s minutes, one step %i, is %s', (span, direction, expected) => {
    expect(neighbourSpan(span, direction)).toBe(expected);
  });

  it('keeps a dragged length within bounds', () => {
    expect(draggedChoice({ from: at('10:00:20'), to: at('10:05:00') })).toEqual({
      span: 30,
      startAt: at('10:00:00'),
    });
  });
});
