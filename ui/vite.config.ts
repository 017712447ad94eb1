import { createRequire } from 'node:module';
import { fileURLToPath } from 'node:url';
import react from '@vitejs/plugin-react';
import type { Plugin } from 'vite';
import { defineConfig } from 'vitest/config';
import { buildIdOf } from './bundle/build-id.ts';
import { keepOldAssets } from './bundle/keep-old-assets.ts';
import { webApp } from './bundle/web-app.ts';
import { recolorBlueprint } from './src/styles/recolor-blueprint.ts';

process.env['TZ'] = 'UTC';

/**
 * Zones whose clock rules travel with the timeline. The library's ready-made ten-year file turns wrong after its last
 * year and its full file is ten times as large, so the wanted zones are cut out of the full one when we build.
 */
const ZONES = [
  'America/Halifax',
  'America/New_York',
  'America/Toronto',
  'America/Detroit',
  'America/Chicago',
  'America/Winnipeg',
  'America/Denver',
  'America/Edmonton',
  'America/Phoenix',
  'America/Los_Angeles',
  'America/Vancouver',
  'America/Anchorage',
  'Pacific/Honolulu',
];

const packed = createRequire(import.meta.url)('moment-timezone/data/packed/latest.json') as {
  zones: string[];
};

function packedZone(name: string): string {
  const zone = packed.zones.find((line) => line.startsWith(`${name}|`));
  if (zone === undefined) throw new Error(`moment-timezone knows no zone named ${name}`);
  return zone;
}

const inShared = (file: string): string => fileURLToPath(new URL(`../shared/src/${file}`, import.meta.url));

/** Blueprint's stylesheet with its own colours turned into ours, see recolor-blueprint.ts. */
const recoloredBlueprint: Plugin = {
  name: 'recolored-blueprint',
  enforce: 'pre',
  transform: (code, id) =>
    /@blueprintjs[\\/].*\.css$/.test(id.split('?')[0] ?? '') ? recolorBlueprint(code) : null,
};

const root = fileURLToPath(new URL('.', import.meta.url));
const buildId = buildIdOf([`${root}src`, `${root}public`, inShared('')]);

const service = `http://127.0.0.1:${process.env['PORT'] ?? '4600'}`;

export default defineConfig({
  plugins: [
    recoloredBlueprint,
    react(),
    ...(process.env['VITEST'] === undefined ? [webApp(), keepOldAssets()] : []),
  ],
  define: { __ZONES__: JSON.stringify(ZONES.map(packedZone)), __BUILD_ID__: JSON.stringify(buildId) },
  resolve: {
    // Regular expressions on purpose: a plain string would also catch the testing entry point.
    alias: [
      { find: /^@stubpost\/shared$/, replacement: inShared('index.ts') },
      { find: /^@stubpost\/shared\/testing$/, replacement: inShared('testing/index.ts') },
    ],
  },
  server: {
    host: '127.0.0.1',
    port: 5173,
    strictPort: true,
    // The service takes requests of its own pages only: in development those come through here, under its name.
    proxy: { '/api': { target: service, changeOrigin: true, headers: { origin: service } } },
  },
  // The folder is not emptied: files of earlier builds stay for a while, see keep-old-assets.ts.
  build: { manifest: true, emptyOutDir: false },
  test: {
    environment: 'jsdom',
    globals: true,
    css: false,
    setupFiles: ['./src/testing/setup.ts'],
    // Files share one page and its modules: loading them anew for each took seven times as long as all the tests.
    isolate: false,
    // Deadlines, not waits: whole pages are drawn, also on a busy machine.
    testTimeout: 30_000,
    hookTimeout: 30_000,
    include: ['{src,bundle}/**/*.test.{ts,tsx}'],
  },
});
