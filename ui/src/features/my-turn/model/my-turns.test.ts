import { at, aWireTurn, ms, withDone } from '../testing/a-wire-turn';
import {
  crewRolesAt,
  myWindow,
  openAfterDeparture,
  progressOf,
  roleOnTurn,
  sortMyTurns,
  turnAtHand,
} from './my-turns';

const me = 'p-ortiz';
const departed = (clock: string) => ({
  train: '1726',
  scheduledDepartureAt: at('15:20'),
  heldUntil: null,
  holdReason: null,
  expectedDepartureAt: null,
  actualDepartureAt: at(clock),
});
const inAt = (clock: string, actual: string | null) => ({
  train: '1741',
  scheduledArrivalAt: at(clock),
  expectedArrivalAt: null,
  actualArrivalAt: actual === null ? null : at(actual),
});
const all = Object.fromEntries(aWireTurn().steps.map((step) => [step.key, '15:10']));
const { 'running-test': _runningTest, ...allButRunning } = all;

const here = aWireTurn({ id: 'here' });
const later = aWireTurn({ id: 'later', inbound: inAt('18:25', null) });
const openOne = withDone(
  aWireTurn({ id: 'open', inbound: inAt('15:00', '15:00'), outbound: departed('15:20:10') }),
  allButRunning,
);
const over = withDone(
  aWireTurn({ id: 'over', inbound: inAt('14:00', '14:00'), outbound: departed('14:20') }),
  all,
);
const foreign = aWireTurn({ id: 'foreign', crew: [], inbound: inAt('17:30', null) });
const tooFar = aWireTurn({ id: 'far', crew: [], inbound: inAt('19:40', null) });
const gone = aWireTurn({ id: 'gone', crew: [], outbound: departed('15:20') });
const ids = (turns: { id: string }[]): string[] => turns.map((turn) => turn.id);

describe('the turns of a crew', () => {
  const sorted = sortMyTurns([later, foreign, over, here, tooFar, openOne, gone], me, ms('17:22:41'));

  it('come by time, one’s own apart from the others, those that are over counted only', () => {
    expect(ids(sorted.mine)).toEqual(['open', 'here', 'later']);
    expect(ids(sorted.mineOver)).toEqual(['over']);
    expect(ids(sorted.others)).toEqual(['foreign']);
  });

  it('open at the train that stands here, else at the next', () => {
    expect(turnAtHand(sorted.mine)?.id).toBe('here');
    expect(turnAtHand([openOne, later])?.id).toBe('later');
    expect(turnAtHand([openOne])?.id).toBe('open');
    expect(turnAtHand([])).toBeNull();
  });

  it('count what is recorded and what was left open at the departure', () => {
    expect(progressOf(withDone(here, { 'handbrake-set': '17:20' }))).toEqual({ recorded: 1, asked: 8 });
    expect(openAfterDeparture(openOne)).toBe(1);
    expect(openAfterDeparture(here)).toBe(0);
  });

  it('are asked for on round ten minutes, two hours either way', () => {
    const { from, to } = myWindow(ms('17:22:41'));
    expect([from, to]).toEqual([ms('15:20'), ms('19:30')]);
    expect(myWindow(ms('17:29:59'))).toEqual({ from, to });
  });

  it('know the person’s jobs by terminal and on the turn', () => {
    const person = {
      id: me,
      roles: [
        { role: 'conductor', terminal: 'HBR' },
        { role: 'engineer', terminal: '*' },
        { role: 'dispatcher', terminal: 'HBR' },
      ] as const,
    };
    expect(crewRolesAt(person, 'HBR')).toEqual(['conductor', 'engineer']);
    expect(crewRolesAt(person, 'CAM')).toEqual(['engineer']);
    expect(roleOnTurn(here, me)).toBe('conductor');
    expect(roleOnTurn(here, 'p-else')).toBeNull();
  });
});
