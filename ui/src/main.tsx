import '@blueprintjs/core/lib/css/blueprint.css';
import '@fontsource/public-sans/latin-400.css';
import '@fontsource/public-sans/latin-700.css';
import './styles/index.css';

import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { createBrowserRouter, RouterProvider } from 'react-router-dom';
import { Providers } from './app/providers';
import { routes } from './app/router';
import { watchWorker } from './lib/app-version';
import { awaitInstallOffer } from './lib/installed';
import { keepAnswers, restoreAnswers } from './lib/kept-answers';
import { watchLostParts } from './lib/lost-parts';
import { createQueryClient } from './lib/query-client';
import { watchFields } from './lib/unsaved';

async function start(root: HTMLElement): Promise<void> {
  awaitInstallOffer();
  watchFields();
  watchLostParts();
  void watchWorker();
  const client = createQueryClient();
  await restoreAnswers(client);
  keepAnswers(client);
  createRoot(root).render(
    <StrictMode>
      <Providers client={client}>
        <RouterProvider router={createBrowserRouter(routes)} />
      </Providers>
    </StrictMode>,
  );
}

const root = document.getElementById('root');
if (root === null) throw new Error('The page has no root element');
void start(root);
