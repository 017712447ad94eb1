import { resolve } from 'node:path';
import { defineConfig } from 'vitest/config';

process.env['TZ'] = 'UTC';

export default defineConfig({
  resolve: {
    alias: [
      { find: /^@stubpost\/shared$/, replacement: resolve(__dirname, '../shared/src/index.ts') },
      {
        find: /^@stubpost\/shared\/testing$/,
        replacement: resolve(__dirname, '../shared/src/testing/index.ts'),
      },
    ],
  },
  test: {
    environment: 'node',
    include: ['src/**/*.test.ts'],
    // The service is taken as it was built: its decorators need metadata that only its own compiler emits.
    server: { deps: { external: [/\/service\/dist\//] } },
  },
});
