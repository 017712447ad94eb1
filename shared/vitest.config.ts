import { defineConfig } from 'vitest/config';

// One zone for every run: a test that leans on the machine's own zone would pass on one desk only.
process.env['TZ'] = 'UTC';

export default defineConfig({
  // Generous: simulations and properties are counted in rounds, and a busy machine is no failure.
  // Pure functions leave nothing behind, so files share one loading of the modules.
  test: { environment: 'node', isolate: false, include: ['src/**/*.test.ts'], testTimeout: 60_000 },
});
