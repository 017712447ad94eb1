import { OverlaysProvider } from '@blueprintjs/core';
import { QueryClientProvider, type QueryClient } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { StatusRegions } from '../components/status-regions';
import { useThemeClasses } from './theme';

/**
 * What every page stands in: the cache, Blueprint's overlays, the theme, and the two live regions. Blueprint's keys
 * provider is left out on purpose: its own sheet opens on "?" everywhere, which is a one-letter shortcut.
 */
export function Providers({ client, children }: { client: QueryClient; children: ReactNode }) {
  useThemeClasses();
  return (
    <QueryClientProvider client={client}>
      <OverlaysProvider>
        <>
          {children}
          <StatusRegions />
        </>
      </OverlaysProvider>
    </QueryClientProvider>
  );
}
