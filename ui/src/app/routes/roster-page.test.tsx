import { shippedEscalation, type UpdateDutyRosterRequest, type WireDutyRoster } from '@stubpost/shared';
import { screen, within } from '@testing-library/react';
import { describe, expect, test } from 'vitest';
import { type FakeRequest, FakeServer } from '../../testing/fake-server';
import { aPersonWith, renderApp } from '../../testing/render-app';
import { RosterPage } from './roster-page';

const terminal = { id: 't', version: 1, code: 'HBR', name: 'Harbor', zone: 'America/New_York', tracks: [] };
const hours = (from: number): string => new Date(Date.now() + from * 3_600_000).toISOString();

function aServer(): { server: FakeServer; kept: UpdateDutyRosterRequest[] } {
  let roster: WireDutyRoster = {
    terminal: 'HBR',
    zone: terminal.zone,
    version: 1,
    shifts: [{ personId: 'd', as: 'desk', from: hours(-1), until: hours(5) }],
    people: [
      { id: 'd', name: 'Dee', isSupervisor: false, hasPhone: true, quiet: null },
      { id: 's', name: 'Sue', isSupervisor: true, hasPhone: false, quiet: null },
    ],
    steps: shippedEscalation.map((step) => ({ ...step, channels: [...step.channels] })),
    changedAt: null,
    changedBy: null,
  };
  const kept: UpdateDutyRosterRequest[] = [];
  const server = new FakeServer();
  server.on('GET', '/api/terminals', () => [terminal]);
  server.on('GET', '/api/terminals/:code/duty-roster', () => roster);
  server.on('PUT', '/api/terminals/:code/duty-roster', ({ body }: FakeRequest) => {
    const request = body as UpdateDutyRosterRequest;
    kept.push(request);
    roster = { ...roster, shifts: request.shifts, steps: request.steps, version: 2 };
    return roster;
  });
  return { server, kept };
}

describe('the duty roster', () => {
  test('shows who is on now and who would be told, to whoever may read it', async () => {
    const { server } = aServer();
    renderApp(<RosterPage />, { server, person: aPersonWith('dispatcher') });
    const table = await screen.findByRole('region', { name: 'Times on duty' });
    expect(within(table).getByRole('row', { name: /Dee On the desk now/ })).toBeInTheDocument();
    const told = screen.getByRole('region', { name: 'Raised now and not taken' });
    expect(within(told).getAllByText('Dee').length).toBe(3);
    expect(screen.queryByRole('button', { name: 'Save the roster' })).toBeNull();
  });

  test('is changed as a whole by the supervisor, and counts once it is saved', async () => {
    const { server, kept } = aServer();
    const { user } = renderApp(<RosterPage />, { server, person: aPersonWith('supervisor') });
    await user.selectOptions(await screen.findByLabelText('Who'), 'Sue (no telephone)');
    await user.selectOptions(screen.getByLabelText('As'), 'Deputy');
    await user.click(screen.getByRole('button', { name: 'Put on' }));
    const save = screen.getByRole('button', { name: 'Save the roster' });
    expect([kept.length, screen.queryByText('Not saved yet.') !== null]).toEqual([0, true]);
    await user.click(screen.getByRole('button', { name: /^Take Dee off/ }));
    await user.click(save);
    expect(await screen.findByText('Saved.')).toBeInTheDocument();
    expect(kept).toMatchObject([{ version: 1, shifts: [{ personId: 's', as: 'deputy' }], quietHours: [] }]);
  });
});
