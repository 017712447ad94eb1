import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { nextAlertStep, noAlertMemory, type AlertMemory, type AlertStep } from './alert-life';
import type { Finding } from './finding';

const finding: Finding = {
  cause: 'late-departure',
  priority: 'watch',
  text: 'Cab brake check not recorded, latest 17:24',
  action: 'Call the engineer.',
  actor: 'dispatcher, engineer',
  byWhen: null,
  lines: [],
};

const seconds = 1000;
const aSlack = (slackSeconds: number) => ({ slackSeconds, finding: slackSeconds < 0 ? finding : null });
const gone = { slackSeconds: null, finding: null };

/** Looks every 5 s at a slack that is a function of the seconds; gives the actions with their times. */
function watch(
  slackAt: (second: number) => number | null,
  until: number,
  every = 5,
): [second: number, action: string][] {
  let memory: AlertMemory = noAlertMemory;
  const actions: [number, string][] = [];
  for (let second = 0; second <= until; second += every) {
    const slackSeconds = slackAt(second);
    const step = nextAlertStep(memory, slackSeconds === null ? gone : aSlack(slackSeconds), second * seconds);
    memory = step.memory;
    if (step.action !== 'none') actions.push([second, step.action]);
  }
  return actions;
}

describe('a late departure', () => {
  it('is raised when slack has been below 0 for 30 s', () => {
    expect(watch(() => -1, 60)).toEqual([[30, 'raise']]);
  });

  it('is not raised at a slack of exactly 0', () => {
    expect(watch(() => 0, 600)).toEqual([]);
  });

  it('is not raised when slack comes back after 29 s', () => {
    expect(watch((second) => (second < 30 ? -1 : 5), 600, 1)).toEqual([]);
  });

  it('counts anew after slack was at 0 for one look', () => {
    expect(watch((second) => (second === 25 ? 0 : -1), 80)).toEqual([[60, 'raise']]);
  });

  it('is cleared when slack has been 60 s or more for 10 s', () => {
    expect(watch((second) => (second < 100 ? -5 : 60), 200)).toEqual([
      [30, 'raise'],
      [110, 'clear'],
    ]);
  });

  it('stands at a slack of 59 s, however long', () => {
    expect(watch((second) => (second < 100 ? -5 : 59), 3600)).toEqual([[30, 'raise']]);
  });

  it('counts the 10 s anew when slack was not enough for one look', () => {
    const slackAt = (second: number): number => (second < 100 ? -5 : second === 105 ? 59 : 80);
    expect(watch(slackAt, 200)).toEqual([
      [30, 'raise'],
      [120, 'clear'],
    ]);
  });

  it('is not cleared by a tick alone: the slack it brings must last', () => {
    expect(watch((second) => (second === 100 ? 200 : -5), 150)).toEqual([[30, 'raise']]);
  });

  it('is cleared at once when the train has left or the turn is annulled', () => {
    expect(watch((second) => (second < 100 ? -5 : null), 150)).toEqual([
      [30, 'raise'],
      [100, 'clear'],
    ]);
  });

  it('that comes back after it cleared is raised again, as a new one', () => {
    expect(watch((second) => (second < 100 || second >= 200 ? -5 : 90), 300)).toEqual([
      [30, 'raise'],
      [110, 'clear'],
      [230, 'raise'],
    ]);
  });

  it('swinging 10 s to both sides every 20 s for 10 min is raised at most once', () => {
    const swings = [
      (second: number): number => (Math.floor(second / 20) % 2 === 0 ? -10 : 10),
      (second: number): number => 10 * Math.sin((Math.PI * second) / 20),
      (second: number): number => (second < 31 ? -10 : Math.floor(second / 20) % 2 === 0 ? -10 : 10),
    ];
    for (const swing of swings) {
      for (const every of [1, 5, 7]) {
        const raised = watch(swing, 600, every).filter(([, action]) => action === 'raise');
        expect(raised.length).toBeLessThanOrEqual(1);
      }
    }
  });

  it('is updated when its words change, and only then', () => {
    const standing = nextAlertStep({ ...noAlertMemory, shortSince: 0 }, aSlack(-5), 30 * seconds);
    expect(standing.action).toBe('raise');
    const again = nextAlertStep(standing.memory, aSlack(-5), 35 * seconds);
    expect(again).toEqual({ memory: standing.memory, action: 'none' });
    const news = { slackSeconds: -200, finding: { ...finding, lines: ['Ends changed: latest 17:30'] } };
    expect(nextAlertStep(standing.memory, news, 40 * seconds).action).toBe('update');
  });

  it('is raised after a pause of the sweep by what was remembered', () => {
    const before = nextAlertStep(noAlertMemory, aSlack(-5), 0);
    expect(before.action).toBe('none');
    expect(nextAlertStep(before.memory, aSlack(-5), 600 * seconds).action).toBe('raise');
  });

  it('keeps its hold times from the settings of the terminal', () => {
    const holds = { raiseHoldSeconds: 0, clearSlackSeconds: 30, clearHoldSeconds: 0 };
    const raised = nextAlertStep(noAlertMemory, aSlack(-1), 0, holds);
    expect(raised.action).toBe('raise');
    expect(nextAlertStep(raised.memory, aSlack(30), seconds, holds).action).toBe('clear');
  });
});

describe('every other cause', () => {
  const unsecured = { slackSeconds: null, finding: { ...finding, cause: 'unsecured' as const } };

  it('is raised at the first look and cleared when it is gone', () => {
    const raised = nextAlertStep(noAlertMemory, unsecured, 0);
    expect(raised.action).toBe('raise');
    const cleared = nextAlertStep(raised.memory, gone, 5 * seconds);
    expect(cleared).toEqual({ memory: noAlertMemory, action: 'clear' });
  });

  it('does nothing while there is nothing', () => {
    expect(nextAlertStep(noAlertMemory, gone, 0)).toEqual({ memory: noAlertMemory, action: 'none' });
  });
});

describe('the memory of an alert', () => {
  const looks = fc.array(
    fc.tuple(fc.integer({ min: 1, max: 40 }), fc.option(fc.integer({ min: -90, max: 90 }), { nil: null })),
    { maxLength: 40 },
  );

  it('is plain data: written to a table and read back it decides the same', () => {
    fc.assert(
      fc.property(looks, (sequence) => {
        let [kept, stored]: [AlertMemory, AlertMemory] = [noAlertMemory, noAlertMemory];
        let now = 0;
        for (const [wait, slack] of sequence) {
          now += wait * seconds;
          const look = slack === null ? gone : aSlack(slack);
          const step = nextAlertStep(kept, look, now);
          expect(nextAlertStep(stored, look, now)).toEqual(step);
          kept = step.memory;
          stored = JSON.parse(JSON.stringify(step.memory)) as AlertMemory;
        }
      }),
      { seed: 30, numRuns: 300 },
    );
  });

  it('raises and clears by turns, and the same look twice does nothing the second time', () => {
    fc.assert(
      fc.property(looks, (sequence) => {
        let memory = noAlertMemory;
        let standing = false;
        let now = 0;
        for (const [wait, slack] of sequence) {
          now += wait * seconds;
          const look = slack === null ? gone : aSlack(slack);
          const step: AlertStep = nextAlertStep(memory, look, now);
          expect(step.action).not.toBe(standing ? 'raise' : 'clear');
          if (step.action === 'raise') standing = true;
          if (step.action === 'clear') standing = false;
          expect(step.memory.standing).toBe(standing);
          expect(nextAlertStep(step.memory, look, now).action).toBe('none');
          memory = step.memory;
        }
      }),
      { seed: 60, numRuns: 500 },
    );
  });
});
