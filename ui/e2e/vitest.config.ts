import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vitest/config';

process.env['TZ'] = 'UTC';

export default defineConfig({
  root: fileURLToPath(new URL('.', import.meta.url)),
  test: {
    environment: 'node',
    include: ['**/*.e2e.test.ts'],
    // One browser at a time: each file boots its own server, and two cores are soon used up.
    fileParallelism: false,
    testTimeout: 60_000,
    hookTimeout: 120_000,
  },
});
