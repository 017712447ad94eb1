import type { Role, SignedInPerson } from '@stubpost/shared';
import type { QueryClient } from '@tanstack/react-query';
import { render, type RenderResult } from '@testing-library/react';
import userEvent, { type UserEvent } from '@testing-library/user-event';
import type { ReactElement } from 'react';
import { createMemoryRouter, RouterProvider, type RouteObject } from 'react-router-dom';
import { onTestFinished } from 'vitest';
import { Providers } from '../app/providers';
import { stopOutboxes } from '../lib/outbox/use-outbox';
import { createQueryClient } from '../lib/query-client';
import { queryKeys } from '../lib/query-keys';
import { FakeServer } from './fake-server';

/** A person with one role, by default at every terminal. */
export function aPersonWith(role: Role, terminal = '*'): SignedInPerson {
  return {
    id: `person-${role}`,
    name: `R. ${role[0]?.toUpperCase()}${role.slice(1)}`,
    roles: [{ role, terminal }],
  };
}

export interface RenderAppOptions {
  /** Who is signed in; null for nobody. A dispatcher by default. */
  person?: SignedInPerson | null;
  /** Address the page is opened at. `/` by default. */
  path?: string;
  /** Pattern the element stands at, for its parameters. `*` by default. */
  route?: string;
  server?: FakeServer;
}

export interface RenderedApp extends RenderResult {
  user: UserEvent;
  server: FakeServer;
  client: QueryClient;
  router: ReturnType<typeof createMemoryRouter>;
}

/** Draws routes inside everything the app puts round them, against a fake server. Nothing is asked again by itself. */
export function renderRoutes(routes: RouteObject[], options: RenderAppOptions = {}): RenderedApp {
  const { person = aPersonWith('dispatcher'), path = '/', server = new FakeServer() } = options;
  onTestFinished(() => server.stop());
  if (person !== null) server.otherwise('GET', '/api/session', { person });
  const client = createQueryClient();
  onTestFinished(() => stopOutboxes(client));
  const queries = client.getDefaultOptions().queries;
  client.setDefaultOptions({ queries: { ...queries, retry: false } });
  client.setQueryData(queryKeys.session.all, person);
  const router = createMemoryRouter(routes, { initialEntries: [path] });
  const user = userEvent.setup({ delay: null });
  const result = render(
    <Providers client={client}>
      <RouterProvider router={router} />
    </Providers>,
  );
  return { ...result, user, server, client, router };
}

/** Draws one element at one address; other addresses show "Elsewhere". */
export function renderApp(element: ReactElement, options: RenderAppOptions = {}): RenderedApp {
  const { route = '*' } = options;
  const elsewhere = route === '*' ? [] : [{ path: '*', element: <p>Elsewhere</p> }];
  return renderRoutes([{ path: route, element }, ...elsewhere], options);
}
