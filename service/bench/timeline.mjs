import { mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { chromium } from 'playwright-core';
import { build, preview } from 'vite';
import { goal, median, note } from './measure.mjs';

const ui = fileURLToPath(new URL('../../ui/', import.meta.url));

/** P9: a day of 2,000 items with four hours in view; our picture against the library alone, in the same browser. */
export async function benchTimeline({ rounds }) {
  const outDir = path.join(mkdtempSync(path.join(tmpdir(), 'stubpost-bench-')), 'timeline');
  const shared = {
    configFile: path.join(ui, 'vite.config.ts'),
    root: path.join(ui, 'bench'),
    logLevel: 'error',
  };
  await build({ ...shared, build: { outDir, emptyOutDir: true } });
  const server = await preview({ ...shared, build: { outDir }, preview: { host: '127.0.0.1', port: 0 } });
  const browser = await chromium.launch({
    executablePath: process.env.CHROMIUM_PATH ?? '/usr/bin/chromium',
    args: [
      '--no-sandbox',
      '--disable-gpu',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
    ],
  });
  try {
    const page = await browser.newPage({ viewport: { width: 1440, height: 900 } });
    await page.goto(server.resolvedUrls.local[0]);
    const measure = (which) => page.evaluate((name) => globalThis.bench[name](), which);
    await measure('ours');
    await measure('bare');
    const taken = { ours: [], bare: [] };
    for (let round = 0; round < rounds; round += 1)
      for (const which of ['ours', 'bare']) taken[which].push(await measure(which));
    const figures = new Map();
    for (const which of ['ours', 'bare'])
      for (const what of ['draw', 'update'])
        figures.set(`${which} ${what}`, median(taken[which].map((each) => each[what])));
    for (const [name, value] of figures) note(`${name.padEnd(12)} ${value.toFixed(1).padStart(8)} ms`);
    goal({
      id: 'P9',
      what: 'first draw of the picture, share of the library alone',
      value: figures.get('ours draw') / figures.get('bare draw'),
      atMost: 1.5,
    });
    goal({
      id: 'P9',
      what: 'update of 100 items, share of the library alone',
      value: figures.get('ours update') / figures.get('bare update'),
      atMost: 1.5,
    });
  } finally {
    await browser.close();
    await server.close();
  }
}
