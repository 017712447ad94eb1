import { readFileSync } from 'node:fs';
import path from 'node:path';
import type { Plugin } from 'vite';
import { VitePWA } from 'vite-plugin-pwa';
import { phoneFiles, type BuildManifest } from './phone-files.ts';

/** Files without a hash that belong to the app itself. */
const OWN_FILES = ['index.html', 'mark.svg'];

/**
 * The installable app: its manifest and the worker that opens it without a signal. The worker keeps the phone's files and
 * nothing else; a newer one waits until the page says so, and pages are answered with the shell, never the interface
 * under `/api` nor a missing file.
 */
export function webApp(): Plugin[] {
  let outDir = '';
  const readManifest = (): BuildManifest =>
    JSON.parse(readFileSync(path.join(outDir, '.vite', 'manifest.json'), 'utf8')) as BuildManifest;
  const noteOutDir: Plugin = {
    name: 'note-out-dir',
    configResolved: (config) => {
      outDir = path.resolve(config.root, config.build.outDir);
    },
  };
  const worker = VitePWA({
    registerType: 'prompt',
    injectRegister: null,
    filename: 'worker.js',
    manifestFilename: 'app.webmanifest',
    includeManifestIcons: false,
    manifest: {
      id: '/',
      name: 'Stubpost',
      short_name: 'Stubpost',
      description: 'Turns at terminal stations: record each step, see what is next',
      lang: 'en',
      start_url: '/',
      scope: '/',
      display: 'standalone',
      orientation: 'any',
      background_color: '#f6f5f1',
      theme_color: '#f6f5f1',
      icons: [
        { src: '/icons/mark-192.png', sizes: '192x192', type: 'image/png' },
        { src: '/icons/mark-512.png', sizes: '512x512', type: 'image/png' },
        { src: '/icons/mark-maskable-512.png', sizes: '512x512', type: 'image/png', purpose: 'maskable' },
      ],
    },
    workbox: {
      globPatterns: ['index.html', 'mark.svg', 'assets/*.{js,css,woff2,svg,png}'],
      maximumFileSizeToCacheInBytes: 4 * 1024 * 1024,
      // Names of files under `assets` change with what is in them.
      dontCacheBustURLsMatching: /^assets\//,
      manifestTransforms: [
        (entries) => {
          const wanted = phoneFiles(readManifest());
          const manifest = entries.filter(({ url }) => wanted.has(url) || OWN_FILES.includes(url));
          return { manifest, warnings: [] };
        },
      ],
      navigateFallback: '/index.html',
      navigateFallbackDenylist: [/^\/api(\/|$)/, /^\/assets(\/|$)/, /\/[^/]+\.[^/]+$/],
      cleanupOutdatedCaches: true,
      // A phone that loses its signal right after the first visit is served as well.
      clientsClaim: true,
      skipWaiting: false,
      inlineWorkboxRuntime: true,
      sourcemap: false,
    },
  });
  return [noteOutDir, ...worker];
}
