import type { WireTimetable, WireTimetableDifference, WireTimetableHead } from '@stubpost/shared';
import { screen, waitFor, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { FakeServer, type FakeRequest } from '../../testing/fake-server';
import { aPersonWith, renderApp, type RenderedApp } from '../../testing/render-app';
import { TimetablesPage } from './timetables-page';

const head: WireTimetableHead = {
  id: 'spring',
  state: 'ready',
  fileName: 'spring.zip',
  fileBytes: 1_840_000,
  routeTypes: '2,100-117',
  uploadedAt: '2026-03-02T15:00:00.000Z',
  uploadedBy: 'E. Vanterpool',
  readAt: '2026-03-02T15:00:03.400Z',
  progress: null,
  activeFrom: null,
  activeUntil: null,
  firstDate: '2020-01-06',
  lastDate: '2099-06-07',
};

const aStation = (stationId: string, name: string, turns: number) => ({
  stationId,
  name,
  turns,
  guessedTurns: 0,
  medianLayoverSeconds: 1260,
  shortByDesign: 4,
  platforms: ['1', '2'],
  turnsOnBusiestDay: 3,
  layovers: [{ minutes: 12, turns: 3 }],
});

const spring: WireTimetable = {
  ...head,
  problems: [
    {
      severity: 'left-out',
      file: 'trips.txt',
      line: 331,
      code: 'block.overlap',
      message: 'Block “B41”: train 1742 leaves before 1741 is in, on 2 dates. No turn on those dates.',
    },
  ],
  summary: {
    trips: 1212,
    blocks: 148,
    turns: 15_870,
    guessedTurns: 0,
    firstDate: '2020-01-06',
    lastDate: '2099-06-07',
    busiestDate: '2026-03-09',
    zone: 'America/New_York',
    agency: 'Cove Line',
    stations: [aStation('harbor-upper', 'Harbor', 100), aStation('harbor-lower', 'Harbor lower', 40)],
    gaps: [{ fromStationId: 'harbor-upper', toStationId: 'harbor-lower', pairs: 12 }],
  },
  terminals: [],
  acceptGuesses: false,
  rollBackTo: null,
};

const nothing: WireTimetableDifference = { against: null, dates: [], turns: [] };

function aServer(timetable: WireTimetable = spring, difference = nothing): FakeServer {
  const {
    problems: _p,
    summary: _s,
    terminals: _t,
    acceptGuesses: _a,
    rollBackTo: _r,
    ...listed
  } = timetable;
  return new FakeServer()
    .on('GET', '/api/terminals', () => [])
    .on('GET', '/api/timetables', () => [listed])
    .on('GET', '/api/timetables/:id', () => timetable)
    .on('GET', '/api/timetables/:id/difference', () => difference);
}

const open = (server: FakeServer, role: 'administrator' | 'planner' = 'administrator'): RenderedApp =>
  renderApp(<TimetablesPage />, {
    server,
    person: aPersonWith(role),
    path: '/timetables',
    route: '/timetables/*',
  });

describe('the page of timetables', () => {
  it('begins with the form when there is none yet, and sends the chosen zip', async () => {
    const server = new FakeServer()
      .on('GET', '/api/terminals', () => [])
      .on('GET', '/api/timetables', () => [])
      .on('POST', '/api/timetables', () => ({ id: 'spring', state: 'reading' }))
      .on('GET', '/api/timetables/:id', () => spring)
      .on('GET', '/api/timetables/:id/difference', () => nothing);
    const { user, router } = open(server);
    await user.click(await screen.findByRole('button', { name: 'Bring in' }));
    expect(await screen.findByRole('link', { name: 'No file is chosen.' })).toBeVisible();
    await user.upload(screen.getByLabelText(/Timetable, GTFS zip/), new File(['PK'], 'spring.zip'));
    await user.click(screen.getByRole('button', { name: 'Bring in' }));
    await waitFor(() => expect(router.state.location.pathname).toBe('/timetables/spring'));
    const [request] = server.sent('POST', '/api/timetables');
    const form = request?.body as FormData;
    expect((form.get('file') as File).name).toBe('spring.zip');
    expect(form.get('routeTypes')).toBeNull();
  });

  it('says in words why a file was not taken', async () => {
    const server = aServer().refuse('POST', '/api/timetables', 'timetable.not_a_zip');
    const { user } = open(server);
    await user.click(await screen.findByRole('button', { name: 'Bring in another file' }));
    await user.upload(screen.getByLabelText(/Timetable, GTFS zip/), new File(['x'], 'notes.zip'));
    await user.click(screen.getByRole('button', { name: 'Bring in' }));
    expect(await screen.findByText('The file is not a zip. Nothing was changed.')).toBeVisible();
  });

  it('shows how far the reading is', async () => {
    const reading = { ...spring, state: 'reading' as const, readAt: null, summary: null, problems: [] };
    open(aServer({ ...reading, progress: { stage: 'Reading stop_times.txt', share: 0.42 } }));
    expect(await screen.findByText(/Reading stop_times.txt, 42 %/)).toBeVisible();
    expect(screen.getByRole('progressbar', { name: 'Reading spring.zip' })).toBeVisible();
  });

  it('names problems with file, line and what was done, and sums the rest up', async () => {
    open(aServer());
    const row = await screen.findByRole('row', {
      name: /trips.txt 331 Block “B41”.* left out block.overlap/,
    });
    expect(row).toBeVisible();
    expect(screen.getByText('1 problem')).toBeVisible();
    expect(screen.getByRole('row', { name: 'Trains 1,212 trips, 148 blocks' })).toBeVisible();
    expect(screen.getByRole('row', { name: 'Turns, all days 15,870, none guessed' })).toBeVisible();
    expect(screen.getByText(/None of these stops the import/)).toBeVisible();
  });

  it('says that a refused file has changed nothing', async () => {
    const problem = {
      ...spring.problems[0],
      severity: 'refused' as const,
      code: 'time.unreadable',
      message: 'No time.',
    };
    const problems = [{ file: 'stop_times.txt', line: 7, ...problem }];
    open(aServer({ ...spring, state: 'refused', summary: null, problems }));
    expect(await screen.findByText('file refused')).toBeVisible();
    expect(screen.getByText(/Nothing was changed; the running timetable stays as it is/)).toBeVisible();
    expect(screen.queryByRole('button', { name: /Make active/ })).not.toBeInTheDocument();
  });

  it('asks for terminals before it makes active, then sends them with the date', async () => {
    const activated = { ...spring, state: 'active' as const, activeFrom: '2026-03-09' };
    const server = aServer().on('POST', '/api/timetables/:id/activation', () => activated);
    const { user } = open(server);
    await user.click(await screen.findByRole('button', { name: /Make active from/ }));
    expect(await screen.findByRole('link', { name: 'No terminal is chosen.' })).toBeVisible();
    await user.click(screen.getByRole('checkbox', { name: 'Harbor, harbor-upper' }));
    await user.click(screen.getByRole('checkbox', { name: 'Harbor lower, harbor-lower' }));
    const code = screen.getByLabelText('Code of Harbor lower');
    await user.clear(code);
    await user.type(code, 'HAR');
    expect(screen.getByText('2 stations are joined as Harbor.')).toBeVisible();
    const date = screen.getByLabelText('Active from, service date');
    await user.clear(date);
    await user.type(date, '2026-03-09{Enter}');
    expect(server.sent('POST', '/api/timetables/:id/activation')).toHaveLength(0);
    await user.click(screen.getByRole('button', { name: 'Make active from Mon 9 Mar' }));
    await waitFor(() => expect(server.sent('POST', '/api/timetables/:id/activation')).toHaveLength(1));
    expect(server.sent('POST', '/api/timetables/:id/activation')[0]?.body).toEqual({
      from: '2026-03-09',
      terminals: [{ code: 'HAR', name: 'Harbor', stationIds: ['harbor-upper', 'harbor-lower'] }],
      acceptGuesses: false,
    });
  });

  it('shows what changes against the running timetable', async () => {
    const part = (train: string, layoverSeconds: number) => ({
      inboundTrain: train,
      arrivalAt: '2026-03-09T21:02:00.000Z',
      outboundTrain: '1740',
      departureAt: '2026-03-09T21:14:00.000Z',
      layoverSeconds,
    });
    open(
      aServer(spring, {
        against: { id: 'winter', fileName: 'winter.zip' },
        dates: [
          ...[{ serviceDate: '2026-03-09', againstDate: '2026-03-02', terminal: 'HBR' }].map((date) => ({
            ...date,
            ...{ added: 0, removed: 0, moved: 1, same: 141 },
          })),
        ],
        turns: [
          {
            ...{ serviceDate: '2026-03-09', terminal: 'HBR', change: 'moved' },
            before: part('1737', 1080),
            after: part('1737', 720),
          },
        ],
      }),
    );
    const panel = await screen.findByRole('region', { name: 'Differences to the running timetable' });
    expect(await within(panel).findByText('141')).toBeVisible();
    expect(within(panel).getByText(/Compared with Mon 2 Mar/)).toBeVisible();
    const row = within(panel).getByRole('row', {
      hidden: true,
      name: /HBR moved 1737 in 17:02, 1740 out 17:14, 18 min/,
    });
    expect(row).toHaveTextContent('12 min');
  });

  it('takes a timetable back in one action', async () => {
    const active = { ...spring, state: 'active' as const, activeFrom: '2026-03-01' };
    const server = aServer({ ...active, rollBackTo: { id: 'winter', fileName: 'winter.zip' } }).on(
      'POST',
      '/api/timetables/:id/roll-back',
      ({ params }: FakeRequest) => ({ ...spring, id: `before ${params['id'] ?? ''}` }),
    );
    const { user } = open(server);
    await user.click(await screen.findByRole('button', { name: 'Take back to winter' }));
    await waitFor(() => expect(server.sent('POST', '/api/timetables/:id/roll-back')).toHaveLength(1));
  });

  it('lets a planner look and not touch', async () => {
    open(
      aServer({ ...spring, terminals: [{ code: 'HBR', name: 'Harbor', stationIds: ['harbor-upper'] }] }),
      'planner',
    );
    expect(await screen.findByRole('checkbox', { name: 'Harbor, harbor-upper' })).toBeDisabled();
    expect(screen.getByRole('cell', { name: 'HBR' })).toBeVisible();
    expect(screen.queryByRole('button', { name: /Make active|Bring in/ })).not.toBeInTheDocument();
  });

  it('says who can bring the first one in', async () => {
    const server = new FakeServer()
      .on('GET', '/api/terminals', () => [])
      .on('GET', '/api/timetables', () => []);
    open(server, 'planner');
    expect(await screen.findByText(/No timetable has been brought in yet/)).toBeVisible();
  });

  it('says what went wrong and offers another try', async () => {
    open(
      new FakeServer().on('GET', '/api/terminals', () => []).refuse('GET', '/api/timetables', 'server.busy'),
    );
    expect(await screen.findByRole('button', { name: 'Retry' }, { timeout: 10_000 })).toBeVisible();
  });
});
