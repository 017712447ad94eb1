import { describe, expect, it } from 'vitest';
import { phoneFiles, type BuildManifest } from './phone-files';

const manifest: BuildManifest = {
  'index.html': {
    file: 'assets/index.js',
    isEntry: true,
    imports: ['_shared.js'],
    dynamicImports: [
      'src/app/routes/my-page.tsx',
      'src/app/routes/my-tie-up-page.tsx',
      'src/app/routes/board-page.tsx',
    ],
    css: ['assets/index.css'],
    assets: ['assets/public-sans.woff2', 'assets/public-sans.woff', 'assets/blueprint-icons-16.woff2'],
  },
  '_shared.js': { file: 'assets/shared.js' },
  'src/app/routes/my-page.tsx': {
    file: 'assets/my-page.js',
    imports: ['_turn.js'],
    dynamicImports: ['src/features/my-turn/later.tsx', '../node_modules/icons/all-paths.js'],
  },
  '../node_modules/icons/all-paths.js': { file: 'assets/all-paths.js' },
  'src/app/routes/my-tie-up-page.tsx': { file: 'assets/my-tie-up-page.js' },
  '_turn.js': { file: 'assets/turn.js', css: ['assets/turn.css'], imports: ['index.html'] },
  'src/features/my-turn/later.tsx': { file: 'assets/later.js' },
  'src/app/routes/board-page.tsx': { file: 'assets/board-page.js', dynamicImports: ['timeline.tsx'] },
  'timeline.tsx': { file: 'assets/timeline.js' },
};

describe('the files of the phone', () => {
  it('are the entry, the phone’s pages, what they import now or later, styles and text fonts', () => {
    expect([...phoneFiles(manifest)].sort()).toEqual([
      'assets/index.css',
      'assets/index.js',
      'assets/later.js',
      'assets/my-page.js',
      'assets/my-tie-up-page.js',
      'assets/public-sans.woff2',
      'assets/shared.js',
      'assets/turn.css',
      'assets/turn.js',
    ]);
  });
});
