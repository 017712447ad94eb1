import type { Entry } from '@stubpost/shared';
import {
  aWireAlert,
  aWireTurn,
  clockAt,
  entryAt,
  fixedSettings,
  wirePlan,
  type WireTurnParts,
} from '../../../testing/wire-turn';
import { turnAt } from '../../../lib/turn/turn-at';
import { timeText } from '../../../lib/turn/time-text';
import { groupRows } from './group-rows';
import { detailedItems, mostItems, pictureItems } from './picture-items';
import type { Detail, PictureItem } from './picture-scene';
import { windowAt } from './time-window';

const zone = 'America/New_York';
const pixelsPerMinute = 9.2;
const steps = wirePlan.steps.map((step) => step.key);

/** Steps recorded at these clock times, in the order of the plan. */
const done = (...clocks: string[]): Entry[] =>
  clocks.map((clock, index) => entryAt('step-done', clock, { step: steps[index] ?? '' }));

function draw(clock: string, parts: WireTurnParts, detail: Detail = 'full', perMinute = pixelsPerMinute) {
  const now = clockAt(clock);
  const planned = {
    scheduledArrivalAt: clockAt('17:14'),
    scheduledDepartureAt: clockAt('17:34'),
    ...parts.planned,
  };
  const turn = turnAt(
    aWireTurn({ ...parts, planned }, now),
    { plan: wirePlan, settings: fixedSettings },
    now,
  );
  const window = windowAt({ span: 120, startAt: null }, now, { from: 0, to: 0 });
  const rows = groupRows([turn], 'track', [{ label: '3' }], now);
  const scene = {
    rows,
    window,
    now,
    pixelsPerMinute: perMinute,
    clock: (at: number) => timeText(at, zone),
    detail,
  };
  const items = pictureItems(scene);
  const x = (at: number): number => ((at - window.from) / 60_000) * perMinute;
  return { turn, items, x, find: (name: string) => items.find((item) => item.id === `turn-1 ${name}`) };
}

const span = (item: PictureItem | undefined) => [item?.start, item?.end];
const arrived = entryAt('arrival', '17:14:20', { source: 'by-feed' });

describe('the plan lane', () => {
  it('runs from scheduled arrival to scheduled departure with both numbers and the time', () => {
    const { find } = draw('17:10', {});
    expect(find('plan')).toMatchObject({
      group: 'track-3-plan',
      type: 'range',
      content: '1741',
      className: 'plan',
    });
    expect(find('leaves')?.content).toBe('1742 17:34');
    expect(span(find('plan'))).toEqual([clockAt('17:14'), clockAt('17:34')]);
  });

  it('has a tick where each step is due by the timetable, also when the train is late', () => {
    const { items } = draw('17:21', { entries: [entryAt('arrival', '17:19:10')] });
    const ticks = items.filter((item) => item.className === 'due').map((item) => timeText(item.start, zone));
    expect(ticks).toEqual(['17:16', '17:20', '17:24', '17:29', '17:30', '17:32', '17:33']);
  });

  it('leaves out text that does not fit', () => {
    const { find } = draw('17:10', {}, 'full', 4.6);
    expect([find('plan')?.content, find('leaves')?.content]).toEqual(['', '1742 17:34']);
    expect(draw('17:10', {}, 'full', 2).find('leaves')?.content).toBe('');
  });

  it('is all there is of a turn far off', () => {
    const { items } = draw('16:20', {});
    expect(new Set(items.map((item) => item.group))).toEqual(new Set(['track-3-plan']));
  });
});

describe('the work lane', () => {
  it('is solid from the post to now and dashed to the departure', () => {
    const { find } = draw('17:18', { entries: [arrived] });
    expect(span(find('work'))).toEqual([clockAt('17:14:20'), clockAt('17:18')]);
    expect(span(find('open'))).toEqual([clockAt('17:18'), clockAt('17:34')]);
    expect(find('work')?.className).toBe('work');
  });

  it('has a hollow post while the train is still coming', () => {
    const { find } = draw('17:00', {
      entries: [entryAt('expected-arrival', '16:50', { expectedAt: clockAt('17:17') })],
    });
    expect(find('work')).toBeUndefined();
    expect(find('open')).toMatchObject({ className: 'open coming', start: clockAt('17:17') });
  });

  it('is amber as a whole when short, and vermilion only past the scheduled departure when late', () => {
    const entries = [arrived, ...done('17:16')];
    expect(
      draw('17:28:30', { entries: [...entries, entryAt('note', '17:27', { note: 'x' })] }).find('work')
        ?.className,
    ).toBe('work short');
    const late = draw('17:37', { entries });
    expect(span(late.find('work'))).toEqual([clockAt('17:14:20'), clockAt('17:34')]);
    expect(span(late.find('over'))).toEqual([clockAt('17:34'), clockAt('17:37')]);
    expect(late.find('flag')?.content).toBe('Late 3 min');
  });

  it('breaks where the train was last heard of, with no marks beyond', () => {
    const { find, items } = draw('17:29', { entries: [arrived, ...done('17:16')] });
    expect(find('unheard')?.start).toBe(clockAt('17:16:02'));
    expect(find('flag')).toMatchObject({ start: clockAt('17:29'), content: 'No word 12 min' });
    expect(items.filter((item) => item.className.startsWith('mark'))).toHaveLength(1);
    expect(items.filter((item) => item.group === 'track-3-next')).toEqual([]);
  });

  it('closes square when the train has left, and says when the running test is due', () => {
    const all = done('17:16', '17:18', '17:21', '17:29', '17:30', '17:31', '17:32');
    const { find } = draw('17:36', { entries: [arrived, ...all, entryAt('departure', '17:34:40')] });
    expect(find('work')).toMatchObject({ className: 'work gone', end: clockAt('17:34:40') });
    expect(find('said running-test')?.content).toBe('running test due 17:39');
    expect(find('open')).toBeUndefined();
  });

  it('carries a blue signal the whole bar long', () => {
    const { find } = draw('17:18', { entries: [arrived, entryAt('blue-signal-up', '17:16')] });
    expect(find('work')?.className).toContain('blue-signal');
    expect(find('open')?.className).toContain('blue-signal');
    expect(find('blue')?.content).toBe('Blue signal');
  });

  it('strikes an annulled turn and says why', () => {
    const { find } = draw('17:00', { entries: [entryAt('annulled', '16:55', { reason: 'no crew' })] });
    expect(find('plan')?.className).toBe('plan annulled');
    expect(find('flag')?.content).toBe('Annulled 16:55, no crew');
  });

  it('frames the flag of a turn whose alert nobody has', () => {
    const { find } = draw('17:37', { entries: [arrived], alerts: [aWireAlert()] });
    expect(find('flag')?.className).toBe('flag late untaken');
  });
});

describe('marks', () => {
  it('stand at the recorded time, others at the forecast finish', () => {
    const { find, turn } = draw('17:18', { entries: [arrived, ...done('17:16')] });
    expect(find('mark handbrake-set')).toMatchObject({
      start: clockAt('17:16'),
      className: 'mark securement done ground on-work',
    });
    const check = turn.steps[1];
    expect(find('mark cab-brake-check')).toMatchObject({
      start: check?.finishAt,
      className: 'mark brake-test cab',
    });
  });

  it('are half filled by radio', () => {
    const relayed = entryAt('step-done', '17:16', { step: 'handbrake-set', source: 'by-radio' });
    expect(draw('17:18', { entries: [arrived, relayed] }).find('mark handbrake-set')?.className).toContain(
      'relayed',
    );
  });

  it.each([9.2, 4.6, 2.3])(
    'never cover one another in one half of the bar, at %d px a minute',
    (perMinute) => {
      const { items, x } = draw(
        '17:30',
        { entries: [arrived, ...done('17:16', '17:18'), entryAt('note', '17:29', { note: 'x' })] },
        'full',
        perMinute,
      );
      for (const place of [' cab', ' ground']) {
        const places = items
          .filter((item) => item.className.includes(`${place}`))
          .map((item) => x(item.start))
          .sort((a, b) => a - b);
        places.slice(1).forEach((at, index) => expect(at - (places[index] ?? 0)).toBeGreaterThan(13.99));
      }
    },
  );
});

describe('the next lane', () => {
  it('has hatch for work and lines for time to spare, and the figure is the length of the lines', () => {
    const { items, find, turn } = draw('17:18', { entries: [arrived, ...done('17:16')] });
    const rooms = items.filter((item) => item.className === 'room');
    const length = rooms.reduce((sum, room) => sum + ((room.end ?? room.start) - room.start), 0) / 1000;
    expect(length).toBeCloseTo(turn.slackSeconds ?? 0, -1);
    expect(find('figure')?.content).toBe(`+${Math.floor((turn.slackSeconds ?? 0) / 60)}`);
    expect(find('half')?.start).toBe(turn.readyAt);
  });

  it('has a bracket as long as the minutes short', () => {
    const short = [arrived, ...done('17:16'), entryAt('note', '17:27', { note: 'x' })];
    const { find, turn } = draw('17:28:30', { entries: short });
    expect(span(find('bracket'))).toEqual([clockAt('17:34'), turn.readyAt]);
    expect(find('figure')?.content).toMatch(/^−/);
  });
});

describe('detail', () => {
  const many = (count: number) => {
    const now = clockAt('17:18');
    const turns = Array.from({ length: count }, (_, index) =>
      turnAt(
        aWireTurn(
          {
            planned: { id: `t-${index}`, track: String(index) },
            entries: [entryAt('arrival', '17:01'), entryAt('note', '17:17', { note: 'x' })],
          },
          now,
        ),
        { plan: wirePlan, settings: fixedSettings },
        now,
      ),
    );
    const window = windowAt({ span: 240, startAt: null }, now, { from: 0, to: 0 });
    return {
      rows: groupRows(turns, 'track', [], now),
      window,
      now,
      pixelsPerMinute: 4.6,
      clock: (at: number) => timeText(at, zone),
    };
  };

  it('gives way before there are more things in view than move fluidly', () => {
    expect(detailedItems(many(10), false).some((item) => item.className === 'due')).toBe(true);
    const lean = detailedItems(many(25), false);
    expect(lean.some((item) => item.className === 'due')).toBe(false);
    expect(lean.some((item) => item.className.startsWith('mark'))).toBe(true);
    const crowded = detailedItems(many(60), false);
    expect(crowded.some((item) => item.className.startsWith('mark'))).toBe(false);
    for (const items of [lean, crowded]) expect(items.length).toBeLessThanOrEqual(mostItems);
  });

  it('is four cells in the summary: set, tested, ends, ready', () => {
    const { find, items } = draw('17:20', { entries: [arrived, ...done('17:16', '17:18')] }, 'summary');
    expect(find('cells')?.className).toBe('cells set tested');
    expect(items.some((item) => item.className.startsWith('mark'))).toBe(false);
  });
});

describe('what the picture is told', () => {
  it('is plain text and class names: nothing in it is markup', () => {
    const { items } = draw('17:00', {
      entries: [entryAt('annulled', '16:55', { reason: '<b>no</b> crew' })],
    });
    expect(items.every((item) => /^[a-z0-9 -]*$/.test(item.className))).toBe(true);
    expect(items.find((item) => item.id.endsWith('flag'))?.content).toBe('Annulled 16:55, <b>no</b> crew');
  });
});
