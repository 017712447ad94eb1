import {
  defaultStepPlanSteps,
  shippedThresholds,
  type CreatePlanRequest,
  type SignedInPerson,
  type WireStepPlan,
  type WireTrack,
} from '@stubpost/shared';
import { screen, within } from '@testing-library/react';
import { FakeRefusal, FakeServer, type FakeRequest } from '../../../testing/fake-server';
import { aPersonWith, renderApp } from '../../../testing/render-app';
import { SetupScreen } from './setup-screen';

const tracks: WireTrack[] = [
  { label: '1', lengthFeet: 850, cars: 9, gradePercent: 0.3, markers: [{ cars: 8, label: '8' }] },
];
const terminal = {
  id: 't',
  version: 1,
  code: 'HBR',
  name: 'Harbor Terminal',
  zone: 'America/New_York',
  tracks,
};
const shipped: WireStepPlan = {
  id: 'plan-1',
  key: 'push-pull-turn',
  name: 'Push-pull turn',
  version: 1,
  effectiveFrom: '2000-01-01',
  steps: defaultStepPlanSteps,
  terminal: 'HBR',
  createdAt: '2026-03-01T12:00:00.000Z',
  createdBy: null,
};
const slower: WireStepPlan = {
  ...shipped,
  id: 'plan-2',
  version: 2,
  effectiveFrom: '2020-01-01',
  createdBy: 'Reyes',
  steps: defaultStepPlanSteps.map((step) =>
    step.key === 'ends-changed' ? { ...step, typicalSeconds: 240 } : step,
  ),
};

function open(person: SignedInPerson, path: string, server = new FakeServer()) {
  server
    .on('GET', '/api/terminals', [terminal])
    .on('GET', '/api/terminals/:code/plans', [slower, shipped])
    .on('GET', '/api/terminals/:code/settings', {
      terminal: 'HBR',
      version: 0,
      thresholds: shippedThresholds,
      briefingRequired: false,
      changedAt: null,
      changedBy: null,
    });
  return renderApp(<SetupScreen />, { person, path, route: '/setup', server });
}

const partNames = async (): Promise<string[]> => {
  const nav = await screen.findByRole('navigation', { name: 'Parts of the set-up' });
  return within(nav)
    .getAllByRole('link')
    .map((link) => link.textContent);
};

/** The summary on top of a form: an alert, as is the page's own region for "Act now", which is empty here. */
const problems = (): HTMLElement => {
  const found = screen.getAllByRole('alert').find((alert) => alert.textContent !== '');
  if (found === undefined) throw new Error('nothing is to be mended');
  return found;
};

describe('the parts of the set-up', () => {
  it.each([
    ['supervisor', ['Step plans', 'Thresholds']],
    ['administrator', ['Step plans', 'Terminals and tracks', 'Sets']],
    ['inspector', ['Step plans', 'Sets']],
    ['conductor', ['Step plans']],
  ] as const)('stand for the %s as the policy says', async (role, names) => {
    open(aPersonWith(role), '/setup');
    await screen.findByText(/Push-pull turn, version 2/);
    expect(await partNames()).toEqual(names);
  });

  it('leave a reader without the way to a new version, and say who has it', async () => {
    open(aPersonWith('conductor'), '/setup');
    expect(
      await screen.findByText('Only the supervisor of Harbor Terminal can make a new version.'),
    ).toBeVisible();
    expect(screen.queryByRole('button', { name: /New version/ })).toBeNull();
  });
});

describe('step plans', () => {
  it('show the version in force with its shortest turn, and what it changed', async () => {
    const { user } = open(aPersonWith('supervisor'), '/setup');
    expect(await screen.findByText('9 min 10 s')).toBeVisible();
    expect(screen.getByText('in force today')).toBeVisible();
    await user.selectOptions(screen.getByLabelText('Compare with'), 'Version 1, from the start');
    const row = screen.getByRole('row', { name: /Short, typical, long/ });
    expect(row).toHaveTextContent('2:00 – 3:30 – 7:00');
    expect(row).toHaveTextContent('2:00 – 4:00 – 7:00');
  });

  it('are checked while they are typed and sent as a new version', async () => {
    const made = { ...slower, id: 'plan-3', version: 3, effectiveFrom: '2026-06-01' };
    const server = new FakeServer().on('POST', '/api/terminals/:code/plans', made);
    const { user } = open(aPersonWith('supervisor'), '/setup', server);
    await user.click(await screen.findByRole('button', { name: 'New version from this one' }));
    const typical = screen.getByLabelText('Typical');
    await user.clear(typical);
    await user.type(typical, '75');
    expect(screen.getByText('Typical: minutes and seconds, such as 1:15.')).toBeVisible();
    await user.click(screen.getByRole('button', { name: 'Put in force' }));
    const summary = problems();
    expect(within(summary).getByText('The day it comes into force is missing.')).toBeVisible();
    expect(
      within(summary).getByText('Handbrake set: Typical: minutes and seconds, such as 1:15.'),
    ).toBeVisible();
    expect(server.sent('POST', '/api/terminals/:code/plans')).toEqual([]);

    await user.clear(typical);
    await user.type(typical, '1:30');
    expect(screen.getByText('9 min 25 s')).toBeVisible();
    await user.type(screen.getByLabelText('In force from'), '2026-06-01');
    await user.click(screen.getByRole('button', { name: 'Put in force' }));
    expect(await screen.findByRole('heading', { name: 'Versions' })).toBeVisible();
    const request = server.sent('POST', '/api/terminals/:code/plans')[0]?.body as CreatePlanRequest;
    expect(request).toMatchObject({ key: 'push-pull-turn', effectiveFrom: '2026-06-01' });
    expect(request.steps[0]).toEqual({ ...defaultStepPlanSteps[0], typicalSeconds: 90 });
  });

  it('name a circle beside the step', async () => {
    const { user } = open(aPersonWith('supervisor'), '/setup');
    await user.click(await screen.findByRole('button', { name: 'New version from this one' }));
    await user.click(screen.getByRole('checkbox', { name: 'Ends changed' }));
    expect(screen.getByText(/these steps wait for one another/)).toBeVisible();
    expect(screen.getAllByText('–').length).toBeGreaterThan(1);
  });
});

describe('tracks', () => {
  it('are replaced all at once, with their markers', async () => {
    const server = new FakeServer().on('PUT', '/api/terminals/:code/tracks', ({ body }: FakeRequest) => ({
      ...terminal,
      version: 2,
      tracks: body,
    }));
    const { user } = open(aPersonWith('administrator'), '/setup?part=tracks', server);
    await user.click(await screen.findByRole('button', { name: 'Add a track' }));
    await user.click(screen.getByRole('button', { name: 'Save tracks' }));
    expect(within(problems()).getByText('Label is missing.')).toBeVisible();
    await user.type(screen.getByRole('textbox', { name: 'Label of new track' }), '2');
    await user.click(screen.getByRole('button', { name: 'Markers of track 1' }));
    await user.click(screen.getByRole('button', { name: 'Add a marker' }));
    await user.type(screen.getByRole('textbox', { name: 'Cars, marker 2' }), '4');
    await user.type(screen.getByRole('textbox', { name: 'Label, marker 2' }), 'A');
    await user.click(screen.getByRole('button', { name: 'Save tracks' }));
    expect(await screen.findByText('Saved.')).toBeVisible();
    expect(server.sent('PUT', '/api/terminals/:code/tracks')[0]?.body).toEqual([
      {
        ...tracks[0],
        markers: [
          { cars: 8, label: '8' },
          { cars: 4, label: 'A' },
        ],
      },
      { label: '2' },
    ]);
  });
});

describe('thresholds', () => {
  it('are sent with the version that was seen; a faster change is shown', async () => {
    const server = new FakeServer().on(
      'PUT',
      '/api/terminals/:code/settings',
      new FakeRefusal('settings.changed'),
    );
    const { user } = open(aPersonWith('supervisor'), '/setup?part=thresholds', server);
    const field = await screen.findByLabelText('No word after');
    await user.clear(field);
    await user.type(field, '5');
    await user.click(screen.getByRole('checkbox', { name: /asks for the safety briefing/ }));
    await user.click(screen.getByRole('button', { name: 'Save' }));
    expect(await screen.findByText(/Somebody changed these settings meanwhile/)).toBeVisible();
    expect(server.sent('PUT', '/api/terminals/:code/settings')[0]?.body).toEqual({
      version: 0,
      thresholds: { ...shippedThresholds, noWordMinutes: 5 },
      briefingRequired: true,
    });
  });
});

describe('sets', () => {
  const set = {
    id: 's41',
    version: 3,
    label: '41',
    units: [{ number: '1501', kind: 'cab-car' as const }],
    leadingUnit: null,
    offAirSince: null,
  };

  it('are saved with the version that was seen', async () => {
    const server = new FakeServer()
      .on('GET', '/api/sets', [set])
      .on('PUT', '/api/sets/:label', { ...set, version: 4 });
    const { user } = open(aPersonWith('inspector'), '/setup?part=sets', server);
    await user.click(await screen.findByRole('button', { name: '41' }));
    await user.click(screen.getByRole('button', { name: 'Add a unit' }));
    await user.type(screen.getByRole('textbox', { name: 'Number of new unit' }), '1402');
    await user.selectOptions(screen.getByLabelText('Leads on leaving'), '1402');
    await user.click(screen.getByRole('button', { name: 'Save set' }));
    expect(await screen.findByText('Set 41 is saved.')).toBeVisible();
    const { path, body } = server.sent('PUT', '/api/sets/:label')[0] ?? {};
    expect(path).toBe('/api/sets/41');
    expect(body).toMatchObject({
      version: 3,
      leadingUnit: '1402',
      units: [
        { number: '1501', kind: 'cab-car' },
        { number: '1402', kind: 'coach' },
      ],
    });
  });
});
