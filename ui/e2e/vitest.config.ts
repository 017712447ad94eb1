import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

process.env['TZ'] = 'UTC';

const here = (path: string): string => fileURLToPath(new URL(path, import.meta.url));

export default defineConfig({
  root: here('.'),
  resolve: { alias: [{ find: /^@stubpost\/shared$/, replacement: here('../../shared/src/index.ts') }] },
  test: {
    environment: 'node',
    include: ['**/*.e2e.test.ts'],
    // One browser at a time: each file boots its own server, and two cores are soon used up.
    fileParallelism: false,
    testTimeout: 60_000,
    hookTimeout: 120_000,
  },
});
