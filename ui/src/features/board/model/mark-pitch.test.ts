import { planText, spacedMarks } from './mark-pitch';

describe('marks in one half of the bar', () => {
  it('stay at their time when they do not touch', () => {
    expect(spacedMarks([0, 14, 40])).toEqual([0, 14, 40]);
  });

  it('queue to the right at their own width in a squeeze', () => {
    expect(spacedMarks([100, 103, 105, 140])).toEqual([100, 114, 128, 142]);
  });

  it('never move to the left', () => {
    const wanted = [5, 5, 5, 90];
    expect(spacedMarks(wanted).every((place, index) => place >= (wanted[index] ?? 0))).toBe(true);
  });
});

describe('text in the plan lane', () => {
  it.each([
    [122, { inbound: true, outbound: true, time: true }],
    [121.9, { inbound: false, outbound: true, time: true }],
    [88, { inbound: false, outbound: true, time: true }],
    [87, { inbound: false, outbound: true, time: false }],
    [46, { inbound: false, outbound: true, time: false }],
    [45, { inbound: false, outbound: false, time: false }],
  ])('of %d px keeps what fits', (width, text) => {
    expect(planText(width)).toEqual(text);
  });
});
