import { act, fireEvent, screen } from '@testing-library/react';
import { afterEach, expect, test, vi } from 'vitest';
import { FakeRefusal, FakeServer } from '../../../testing/fake-server';
import { aPersonWith, renderApp } from '../../../testing/render-app';
import { LeaveDemo } from './leave-demo';

afterEach(() => vi.useRealTimers());

test('the demo is left only after a second button, and the empty installation is waited for', async () => {
  let isBack = false;
  const server = new FakeServer()
    .on('POST', '/api/demo/leaving', undefined)
    .on('GET', '/api/setup', () => (isBack ? { needed: true } : new FakeRefusal('server.busy')));
  const onEmpty = vi.fn();
  renderApp(<LeaveDemo onEmpty={onEmpty} />, { person: aPersonWith('administrator'), server });

  fireEvent.click(screen.getByRole('button', { name: 'Leave the demo' }));
  expect(server.sent('POST', '/api/demo/leaving')).toHaveLength(0);

  vi.useFakeTimers();
  fireEvent.click(screen.getByRole('button', { name: 'Go on with an empty installation' }));
  await act(() => vi.advanceTimersByTimeAsync(2500));
  expect(server.sent('POST', '/api/demo/leaving')).toHaveLength(1);
  expect(screen.getByText(/^Leaving/)).toHaveRole('status');
  expect(onEmpty).not.toHaveBeenCalled();

  isBack = true;
  await act(() => vi.advanceTimersByTimeAsync(1000));
  expect(onEmpty).toHaveBeenCalledOnce();
});
