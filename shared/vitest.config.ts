import { defineConfig } from 'vitest/config';

// One zone for every run: a test that leans on the machine's own zone would pass on one desk only.
process.env['TZ'] = 'UTC';

export default defineConfig({
  test: { environment: 'node', include: ['src/**/*.test.ts'] },
});
