import { at, aWireTurn, ms } from '../testing/a-wire-turn';
import { turnFigure } from './turn-figure';

const standing = aWireTurn();
const round = (value: number | undefined): number => Math.round((value ?? NaN) * 10) / 10;

describe('the figure of a turn', () => {
  it('stands the post at the arrival and runs the work to now: 17:18:20 and 17:22:41 of 17:18 to 17:40', () => {
    const figure = turnFigure(standing, ms('17:22:41'));
    // 22 minutes on 350 units: 20 s are 5.3, 4 min 41 s are 74.5.
    expect(round(figure.post ?? NaN)).toBe(9.3);
    expect(round((figure.work?.x ?? 0) + (figure.work?.width ?? 0))).toBe(78.5);
    expect(figure.plan).toEqual({ x: 4, width: 350 });
  });

  it('runs the next lane from now to ready and the whisker to the nine-in-ten time', () => {
    const { next, whisker } = turnFigure(standing, ms('17:22:41'));
    expect(round((next?.x ?? 0) + (next?.width ?? 0))).toBe(306.3);
    expect(round((whisker?.x ?? 0) + (whisker?.width ?? 0))).toBe(322.2);
  });

  it('takes in the nine-in-ten time past the departure, so that nothing runs out of the drawing', () => {
    const short = aWireTurn({
      forecast: { ...standing.forecast, readyAt: at('17:41'), readyAtNineInTen: at('17:45') },
    });
    const figure = turnFigure(short, ms('17:34:50'));
    expect(round(figure.leaving?.x)).toBe(289.2);
    expect(round((figure.whisker?.x ?? 0) + (figure.whisker?.width ?? 0))).toBe(354);
  });

  it('draws no whisker while chances are not known', () => {
    const turn = aWireTurn({ forecast: { ...standing.forecast, readyAtNineInTen: null } });
    expect(turnFigure(turn, ms('17:22:41')).whisker).toBeNull();
  });

  it('begins at an early arrival instead of running out at the left', () => {
    const early = aWireTurn({
      inbound: {
        train: '1741',
        scheduledArrivalAt: at('17:18'),
        expectedArrivalAt: null,
        actualArrivalAt: at('17:16'),
      },
    });
    const figure = turnFigure(early, ms('17:20'));
    expect(figure.post).toBe(4);
    expect(figure.plan.x).toBeGreaterThan(30);
  });

  it('shows plan and now only before the train is in', () => {
    const coming = aWireTurn({
      inbound: {
        train: '1741',
        scheduledArrivalAt: at('17:18'),
        expectedArrivalAt: null,
        actualArrivalAt: null,
      },
    });
    const figure = turnFigure(coming, ms('17:10'));
    expect(figure).toMatchObject({ post: null, work: null, now: null });
    expect(turnFigure(coming, ms('17:19')).now).not.toBeNull();
  });

  it('closes the bar at the departure and drops forecast and now', () => {
    const left = aWireTurn({
      outbound: {
        train: '1742',
        scheduledDepartureAt: at('17:40'),
        heldUntil: null,
        holdReason: null,
        expectedDepartureAt: null,
        actualDepartureAt: at('17:40:30'),
      },
    });
    const figure = turnFigure(left, ms('17:45'));
    expect(figure).toMatchObject({ leaving: { x: 354, closed: true }, next: null, now: null, rest: null });
  });

  it('keeps a train that has not left inside the drawing when its time has passed', () => {
    const figure = turnFigure(standing, ms('17:50'));
    expect(figure.now).toBe(354);
    expect(figure.rest).toBeNull();
    expect(figure.leaving?.x).toBeLessThan(354);
  });

  it('draws a first-out from thirty minutes before it leaves, and a tie-up for thirty minutes at least', () => {
    const first = turnFigure(aWireTurn({ kind: 'first-out', inbound: null }), ms('17:25'));
    expect(first.now).toBe(4 + (15 / 30) * 350);
    const tieUp = turnFigure(
      aWireTurn({
        kind: 'tie-up',
        outbound: null,
        forecast: { ...standing.forecast, readyAt: null, readyAtNineInTen: null },
      }),
      ms('17:33'),
    );
    expect(tieUp.leaving).toBeNull();
    expect(round(tieUp.now ?? NaN)).toBe(4 + 175);
  });
});
