import { fileURLToPath } from 'node:url';
import { defineConfig } from 'vite';

const here = (path) => fileURLToPath(new URL(path, import.meta.url));
const checker = here('src/records/check-log.ts');

/** The service is CommonJS, its checker is not: without this the bundler would wrap it as if it were. */
const asModule = {
  name: 'checker-as-module',
  enforce: 'pre',
  resolveId: (id) => (id === checker ? { id, packageJsonPath: here('../package.json') } : null),
};

// Makes one file without dependencies of the checker and the parts of shared that it needs. It is not made small:
// whoever has to trust it must be able to read it.
export default defineConfig({
  logLevel: 'warn',
  plugins: [asModule],
  resolve: { alias: [{ find: /^@stubpost\/shared$/, replacement: here('../shared/src/index.ts') }] },
  ssr: { noExternal: true },
  build: {
    ssr: checker,
    target: 'node20',
    outDir: here('dist'),
    emptyOutDir: false,
    minify: false,
    copyPublicDir: false,
    rolldownOptions: {
      treeshake: { moduleSideEffects: false },
      output: {
        entryFileNames: 'check-log.mjs',
        banner:
          '#!/usr/bin/env node\n// Checker of the sealed log of Stubpost. Needs Node 20 or later, nothing else: node check-log.mjs FILE',
      },
    },
  },
});
