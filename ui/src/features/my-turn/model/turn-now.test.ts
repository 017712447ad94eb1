import { at, aWireTurn, ms, pushPullPlan, withDone } from '../testing/a-wire-turn';
import { shippedLatenessSettings } from '@stubpost/shared';
import { turnAt } from './turn-now';

const { steps } = pushPullPlan;
const settings = { ...shippedLatenessSettings, formatTime: String, formatExactTime: String };
const now = (turn: ReturnType<typeof aWireTurn>, clock: string) => turnAt(turn, steps, settings, ms(clock));
const secured = withDone(aWireTurn(), { 'handbrake-set': '17:19:52' });
const heardAt = (clock: string) => ({ ...secured, lastHeardAt: at(clock) });

describe('a turn at this second', () => {
  it('counts the slack down with the clock: the check must end at 17:33:35 by the default plan', () => {
    // 17:40 less 45, 60, 50, 20 and 210 s of work after it. It has outlived its long duration since 17:19:52, so it
    // counts as ending now.
    expect(now(secured, '17:22:41').forecast.slackSeconds).toBe(10 * 60 + 54);
    expect(now(heardAt('17:30'), '17:32:41').health).toBe('tight');
    expect(now(heardAt('17:33'), '17:34:00').health).toBe('short');
    expect(now(secured, '17:40:01').health).toBe('late');
  });

  it('gives each open step its due time and state, and leaves recorded ones alone', () => {
    const turn = now(secured, '17:22:41');
    const step = (key: string) => turn.steps.find((each) => each.key === key);
    expect(step('cab-brake-check')).toMatchObject({
      dueAt: at('17:24:20'),
      latestFinishAt: at('17:33:35'),
      state: 'due',
    });
    expect(step('engineer-in-cab')).toMatchObject({ dueAt: at('17:35'), state: 'not-due' });
    expect(step('handbrake-set')?.doneAt).toBe(at('17:19:52'));
  });

  it('leaves the running test undue before the departure and counts it after', () => {
    const running = (turn: ReturnType<typeof aWireTurn>) =>
      turn.steps.find((each) => each.key === 'running-test');
    expect(running(now(secured, '17:50'))?.state).toBe('not-due');
    const left = aWireTurn({
      outbound: {
        train: '1742',
        scheduledDepartureAt: at('17:40'),
        heldUntil: null,
        holdReason: null,
        expectedDepartureAt: null,
        actualDepartureAt: at('17:40'),
      },
    });
    expect(running(now(left, '17:46'))?.state).toBe('overdue');
    expect(now(left, '17:46').health).toBe('on-plan');
  });

  it('has no word three minutes past a due act without an entry since', () => {
    expect(now(secured, '17:27:19').health).toBe('on-plan');
    expect(now(secured, '17:27:20').health).toBe('no-word');
    expect(now({ ...secured, lastHeardAt: at('17:25') }, '17:27:20').health).toBe('on-plan');
  });
});
