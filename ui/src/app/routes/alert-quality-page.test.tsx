import {
  alertQualitySchema,
  type CountedShare,
  type LoadFigures,
  type WireAlertQuality,
} from '@stubpost/shared';
import { screen, waitFor } from '@testing-library/react';
import { describe, expect, it, onTestFinished } from 'vitest';
import { replaceDeviceClock } from '../../lib/use-now';
import { FakeServer, type FakeRequest } from '../../testing/fake-server';
import { aPersonWith, renderApp, type RenderAppOptions } from '../../testing/render-app';
import { AlertPages } from './alert-pages';
import { AlertQualityPage } from './alert-quality-page';

const interval = { low: 0.388, high: 0.837, confidence: 0.95 };
const counted = (count: number, of: number): CountedShare => ({
  count,
  counted: of,
  share: of === 0 ? null : count / of,
  interval: of === 0 ? null : interval,
});
const load = (histogram: number[], parts: Partial<LoadFigures>): LoadFigures => ({
  periods: histogram.reduce((sum, periods) => sum + periods, 0),
  alerts: histogram.reduce((sum, periods, alerts) => sum + periods * alerts, 0),
  histogram,
  mean: 0.5,
  median: 0,
  ninetyFifth: 2,
  most: histogram.length - 1,
  shareInBurst: 0,
  ...parts,
});

const quality: WireAlertQuality = {
  terminal: 'HBR',
  from: '2026-02-04',
  to: '2026-03-03',
  afterwards: 'left-out',
  asOf: '2026-03-03T22:26:00.000Z',
  thresholdSeconds: 59,
  watchedTurns: 480,
  unwatchedTurns: 0,
  unseenAlerts: 0,
  alerts: 41,
  load: {
    all: load([300, 30, 4, 1], { shareInBurst: 0.02 }),
    peak: load([60, 20, 4, 1], { ninetyFifth: 2.5 }),
    peakFromTurns: 6,
  },
  bursts: [
    { fromAt: '2026-03-02T22:20:00.000Z', toAt: '2026-03-02T22:40:00.000Z', alerts: 17, isOpen: false },
  ],
  priorities: [
    { priority: 'act-now', target: 0.05, ...counted(2, 41) },
    { priority: 'act-soon', target: 0.15, ...counted(9, 41) },
    { priority: 'watch', target: 0.8, ...counted(30, 41) },
  ],
  sources: {
    sources: [
      {
        cause: 'late-departure',
        train: '1742',
        count: 6,
        share: 6 / 41,
        lastRaisedAt: '2026-03-02T22:24:10.000Z',
      },
    ],
    sourceCount: 28,
    share: 0.55,
  },
  repeaters: { chattering: 0, cameBack: 2, fleeting: 1 },
  stale: 1,
  standing: {
    count: 1,
    untaken: 1,
    longest: [
      {
        id: 'a',
        subject: 'Track 3, train 1742',
        text: 'Running test not recorded',
        raisedAt: '2026-03-02T10:00:00.000Z',
        isStale: true,
      },
    ],
  },
  untaken: {
    ...counted(7, 41),
    byPriority: [
      { priority: 'act-now', ...counted(0, 2) },
      { priority: 'act-soon', ...counted(1, 9) },
      { priority: 'watch', ...counted(6, 30) },
    ],
    secondsToTake: { counted: 34, median: 45, ninetyFifth: 170 },
  },
  precision: {
    verdicts: { 'left-late': 9, held: 1, taken: 3, needless: 1, annulled: 1, 'no-departure': 0 },
    atLeast: counted(9, 14),
    atMost: counted(13, 14),
  },
  warning: { counted: 15, median: 420, nineInTen: -30, afterDeparture: 2, histogram: [2, 3, 6, 4, 0, 0, 0] },
  warned: counted(9, 10),
};

const nothing: Partial<WireAlertQuality> = {
  alerts: 0,
  load: {
    all: load([], { mean: null, median: null, ninetyFifth: null, most: null, shareInBurst: null }),
    peak: load([], { mean: null, median: null, ninetyFifth: null, most: null, shareInBurst: null }),
    peakFromTurns: null,
  },
};

function open(answer: Partial<WireAlertQuality> = {}, options: RenderAppOptions = {}) {
  onTestFinished(replaceDeviceClock(() => Date.parse('2026-03-03T22:26:00Z')));
  const server = new FakeServer()
    .on('GET', '/api/terminals', [
      { id: 't1', version: 1, code: 'HBR', name: 'Harbor', zone: 'America/New_York', tracks: [] },
    ])
    .on('GET', '/api/alerts/quality', ({ query }: FakeRequest) =>
      alertQualitySchema.parse({
        ...quality,
        from: query.get('from'),
        to: query.get('to'),
        afterwards: query.get('afterwards'),
        ...answer,
      }),
    );
  return renderApp(<AlertQualityPage />, { server, path: '/alerts/quality?terminal=HBR', ...options });
}

const asked = (server: FakeServer) =>
  server.sent('GET', '/api/alerts/quality').map(({ query }) => [query.get('from'), query.get('to')]);

/** The rows of a table, each as its cells read in a line. */
async function rowsOf(caption: string): Promise<string[]> {
  const table = await screen.findByText(caption, { selector: 'caption' });
  const rows = table.closest('table')?.rows ?? [];
  return Array.from(rows, (row) => Array.from(row.cells, (cell) => cell.textContent).join(' | '));
}

async function panel(heading: string): Promise<string> {
  return (await screen.findByText(heading, { selector: 'h2' })).closest('section')?.textContent ?? '';
}

describe('the page of the quality of alerts', () => {
  it('shows the load at peak with its n, its distribution, and each figure beside its target with the source', async () => {
    open();
    const headline = await panel('Alerts in 10 minutes, at peak');
    expect(headline).toContain('0 in half of them, 2.5 in 95 of 100');
    expect(headline).toContain('41 alerts on 480 turns');
    expect(headline).toContain('Peak: the 85 with 6 or more turns on hand');
    const distribution = await rowsOf('Periods of 10 minutes by number of alerts');
    expect(distribution).toHaveLength(13);
    expect(distribution[3]).toBe('2 | 4 | 1.2 % | 4 | 4.7 %');
    expect(distribution[12]).toBe('> 10 | 0 | 0.0 % | 0 | 0.0 %');
    const published = 'EEMUA 191, ISA-18.2 (second-hand)';
    expect(await rowsOf('Figures beside their targets')).toEqual(
      expect.arrayContaining([
        '95 in 100 of them had at most | 2.5 | 2 | outside | our choice',
        `10-minute periods in burst | 2.0 % | under 1 % | outside | ${published}`,
        `Share of the ten busiest sources | 55.0 % of 28 sources | 1 to 5 % | outside | ${published}`,
        `Most in any 10 minutes | 3 | at most 10 | within | ${published}`,
        `Stood for more than 24 h | 1 | few, and explained | no verdict | ${published}`,
        'Came back within 10 min of clearing | 2 | 0 | outside | our choice',
      ]),
    );
    expect(await rowsOf('Bursts')).toEqual(['From | To | Alerts', 'Mon 2 Mar 17:20:00 EST | 17:40 | 17']);
  });

  it('says how precision is defined, and of what and how surely each share is', async () => {
    open();
    const precision = await panel('Precision of late departures');
    expect(precision).toContain('64.3 % sure, 92.9 % possible');
    expect(precision).toContain('9 of 14, interval 38.8 to 83.7 %');
    expect(precision).toContain('Left on time, nobody had done anything about it1');
    expect(precision).toContain('9 of 10, interval 38.8 to 83.7 %, had such an alert before they left');
    expect(precision).toContain('Whether these would have been late otherwise nobody can know');
    expect(await panel('Warning before the departure')).toContain(
      '9 in 10 gave at least30 s after the departure',
    );
    expect((await rowsOf('The busiest sources of alerts'))[1]).toBe(
      'Late departure | 1742 | 6 | 14.6 % | Mon 2 Mar 17:24:10 EST',
    );
    expect((await rowsOf('Alerts by priority'))[1]).toBe(
      'Act now | 2 | 2 of 41, interval 38.8 to 83.7 % | 5.0 %',
    );
    expect((await rowsOf('Untaken alerts by priority'))[2]).toBe(
      'Act soon | 1 | 1 of 9, interval 38.8 to 83.7 %',
    );
    expect((await rowsOf('Alerts that stand now'))[1]).toContain(
      'Track 3, train 1742 | Running test not recorded | Mon 2 Mar 05:00:00 EST, more than 24 h',
    );
  });

  it('asks for four weeks up to today, or for other days, which stand in the address', async () => {
    const { user, server, router } = open();
    await screen.findByText('Precision of late departures');
    await user.click(screen.getByRole('radio', { name: '7 days' }));
    await waitFor(() =>
      expect(asked(server)).toEqual([
        ['2026-02-04', '2026-03-03'],
        ['2026-02-25', '2026-03-03'],
      ]),
    );
    expect(router.state.location.search).toBe('?terminal=HBR&from=2026-02-25&to=2026-03-03');
  });
});

describe('a past without alerts', () => {
  it('says that nobody was watching, and draws nothing', async () => {
    open({ ...nothing, watchedTurns: 0, unwatchedTurns: 3120, unseenAlerts: 150 });
    expect(
      await screen.findByText(
        'There are no alerts from Wed 4 Feb 2026 to Tue 3 Mar 2026. Left out: 3,120 turns of these days were entered only when over, and 150 alerts worked out from their entries. Nobody could have acted on them.',
      ),
    ).toBeVisible();
    expect(screen.queryByRole('table')).not.toBeInTheDocument();
  });

  it('tells a quiet desk from an empty terminal', async () => {
    const { unmount } = open({ alerts: 0, watchedTurns: 12 });
    expect(await screen.findByText(/No alert was raised from .*, on 12 turns\./)).toBeVisible();
    unmount();
    open({ ...nothing, watchedTurns: 0 });
    expect(await screen.findByText(/There are neither turns nor alerts at this terminal/)).toBeVisible();
  });

  it('leaves out what was entered afterwards, or counts it, and says so', async () => {
    const { user, server } = open({ unwatchedTurns: 1 });
    expect(
      await screen.findByText(/^Left out: 1 turn of these days was entered only when over/),
    ).toBeVisible();
    await user.selectOptions(screen.getByLabelText('Turns entered afterwards'), 'counted');
    expect(
      await screen.findByText(/^Counted here: 1 turn .* the warning is shorter than at a desk that watches/),
    ).toBeVisible();
    const asking = server.sent('GET', '/api/alerts/quality').map(({ query }) => query.get('afterwards'));
    expect(asking).toEqual(['left-out', 'counted']);
  });
});

describe('the pages about alerts', () => {
  it('are named to those who may look back', () => {
    renderApp(<AlertPages />, { person: aPersonWith('supervisor'), path: '/alerts/quality' });
    expect(screen.getByRole('link', { name: 'Quality' })).toHaveAttribute('aria-current', 'page');
    expect(screen.getByRole('link', { name: 'List' })).not.toHaveAttribute('aria-current');
  });

  it('are only the list for a crew, so nothing is named', () => {
    renderApp(<AlertPages />, { person: aPersonWith('conductor') });
    expect(screen.queryByRole('navigation')).not.toBeInTheDocument();
  });
});
