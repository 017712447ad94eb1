import js from '@eslint/js';
import query from '@tanstack/eslint-plugin-query';
import prettier from 'eslint-config-prettier';
import hooks from 'eslint-plugin-react-hooks';
import ts from 'typescript-eslint';
import { house } from './service/scripts/eslint-rules.mjs';

const TESTS = [
  '**/*.test.{ts,tsx}',
  '**/*.spec.ts',
  'service/test/**/*.ts',
  'ui/e2e/**/*.ts',
  'ui/src/testing/**/*.{ts,tsx}',
];
const CONFIGS = ['**/vite.config.ts', '**/vitest.config.ts', '**/*.mjs', '**/*.js'];

const syntax = (selector, message) => ({ selector, message });

const HOUSE_SYNTAX = [
  syntax('TSEnumDeclaration', 'Closed sets are constant arrays with a derived union.'),
  syntax('ExportDefaultDeclaration', 'Named exports only: one name everywhere.'),
  syntax('ExportAllDeclaration', 'Import the file itself; the one barrel lists its names.'),
];

const CLOCK_READS = [
  syntax(
    "CallExpression[callee.object.name='Date'][callee.property.name='now']",
    'Only the clock reads the time: take `now` as an argument.',
  ),
  syntax(
    "NewExpression[callee.name='Date'][arguments.length=0]",
    'Only the clock reads the time: take `now` as an argument.',
  ),
  syntax("CallExpression[callee.name='Date']", 'Only the clock reads the time: take `now` as an argument.'),
];

const CHANCE = [
  syntax(
    "MemberExpression[object.name='Math'][property.name='random']",
    'Same input, same result: take a seeded source of chance as an argument.',
  ),
];

const NOT_THE_WHOLE_TEST = [
  syntax(
    'CallExpression[callee.object.name=/^(it|test|describe)$/][callee.property.name=/^(only|skip|todo|fixme)$/]',
    'A test is run or removed; it is not switched off.',
  ),
  syntax(
    'CallExpression[callee.name=/^(xit|fit|xtest|xdescribe|fdescribe)$/]',
    'A test is run or removed; it is not switched off.',
  ),
];

const restrictedSyntax = (...lists) => ({ 'no-restricted-syntax': ['error', ...lists.flat()] });

const SHARED_IMPORTS = {
  patterns: [
    {
      group: ['node:*', 'fs', 'path', 'crypto', 'os', 'events', 'util'],
      message: 'shared runs in the browser as well and does no input or output.',
    },
    {
      group: [
        '@nestjs/*',
        'nestjs-*',
        'typeorm',
        'react',
        'react-*',
        'react/*',
        '@tanstack/*',
        '@blueprintjs/*',
      ],
      message: 'shared knows no framework.',
    },
  ],
};

const WRITE_DOORS = 'Writes go through UnitOfWork, reads through Reader; nothing else touches a connection.';
const SERVICE_IMPORTS = {
  paths: [
    {
      name: '@nestjs/typeorm',
      importNames: ['InjectRepository', 'InjectDataSource', 'InjectEntityManager'],
      message: WRITE_DOORS,
    },
    {
      name: 'typeorm',
      importNames: ['DataSource', 'Repository', 'BaseEntity', 'getRepository'],
      message: WRITE_DOORS,
    },
    { name: 'better-sqlite3', message: WRITE_DOORS },
  ],
  patterns: [{ regex: 'database/tokens$', importNames: ['WRITER', 'READER'], message: WRITE_DOORS }],
};

export default ts.config(
  { ignores: ['**/dist/**', '**/coverage/**', '**/node_modules/**', 'data/**', '.stamp/**'] },
  { linterOptions: { reportUnusedDisableDirectives: 'error' } },
  js.configs.recommended,
  ...ts.configs.recommendedTypeChecked,
  {
    plugins: { house },
    languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname } },
    rules: {
      'house/file-name': 'error',
      'house/suppression-reason': 'error',
      eqeqeq: 'error',
      'max-depth': ['error', 3],
      '@typescript-eslint/ban-ts-comment': [
        'error',
        { 'ts-expect-error': 'allow-with-description', minimumDescriptionLength: 10 },
      ],
      '@typescript-eslint/no-misused-promises': ['error', { checksVoidReturn: { attributes: false } }],
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', varsIgnorePattern: '^_', ignoreRestSiblings: true },
      ],
      '@typescript-eslint/require-await': 'off',
      '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true }],
      '@typescript-eslint/switch-exhaustiveness-check': [
        'error',
        { considerDefaultExhaustiveForUnions: true },
      ],
      ...restrictedSyntax(HOUSE_SYNTAX, CLOCK_READS),
    },
  },
  {
    files: ['shared/src/**/*.ts'],
    rules: {
      ...restrictedSyntax(HOUSE_SYNTAX, CLOCK_READS, CHANCE),
      'no-restricted-globals': [
        'error',
        'performance',
        'process',
        'window',
        'document',
        'fetch',
        'localStorage',
        'setTimeout',
        'setInterval',
      ],
      'no-restricted-imports': ['error', SHARED_IMPORTS],
    },
  },
  { files: ['seed/src/**/*.ts'], rules: restrictedSyntax(HOUSE_SYNTAX, CLOCK_READS, CHANCE) },
  { files: ['service/src/**/*.ts'], rules: { 'no-restricted-imports': ['error', SERVICE_IMPORTS] } },
  { files: ['service/src/database/**/*.ts'], rules: { 'no-restricted-imports': 'off' } },
  {
    // The two places that read the clock.
    files: ['service/src/common/clock*.ts', 'ui/src/lib/use-now.{ts,tsx}'],
    rules: restrictedSyntax(HOUSE_SYNTAX),
  },
  { files: ['ui/src/**/*.{ts,tsx}'], ...hooks.configs.flat.recommended },
  {
    // These serve the React compiler, which does not build this code; here they would forbid a hook that hands out a
    // ref, an effect that opens a stream and keeps it, and a picture that is moved by hand.
    files: ['ui/src/**/*.{ts,tsx}'],
    rules: {
      'react-hooks/immutability': 'off',
      'react-hooks/incompatible-library': 'off',
      'react-hooks/preserve-manual-memoization': 'off',
      'react-hooks/refs': 'off',
      'react-hooks/set-state-in-effect': 'off',
    },
  },
  ...query.configs['flat/recommended'].map((config) => ({ ...config, files: ['ui/src/**/*.{ts,tsx}'] })),
  { files: ['ui/src/**/*.{ts,tsx}'], rules: { '@tanstack/query/prefer-query-options': 'error' } },
  {
    // Answers of supertest and of asymmetric matchers are untyped by nature; the asserts are what checks them.
    files: TESTS,
    rules: {
      ...restrictedSyntax(HOUSE_SYNTAX, NOT_THE_WHOLE_TEST),
      'no-restricted-imports': 'off',
      '@typescript-eslint/no-unsafe-argument': 'off',
      '@typescript-eslint/no-unsafe-assignment': 'off',
      '@typescript-eslint/no-unsafe-call': 'off',
      '@typescript-eslint/no-unsafe-member-access': 'off',
      '@typescript-eslint/no-unsafe-return': 'off',
      '@typescript-eslint/unbound-method': 'off',
    },
  },
  {
    files: ['shared/src/**/*.test.ts'],
    rules: {
      ...restrictedSyntax(HOUSE_SYNTAX, CLOCK_READS, CHANCE, NOT_THE_WHOLE_TEST),
      'no-restricted-globals': 'off',
    },
  },
  {
    files: ['**/*.{js,mjs}'],
    ...ts.configs.disableTypeChecked,
    languageOptions: {
      ...ts.configs.disableTypeChecked.languageOptions,
      globals: Object.fromEntries(
        [
          'AbortController',
          'AbortSignal',
          'Buffer',
          'URL',
          'clearInterval',
          'clearTimeout',
          'console',
          'fetch',
          'module',
          'performance',
          'process',
          'require',
          'setImmediate',
          'setInterval',
          'setTimeout',
        ].map((name) => [name, 'readonly']),
      ),
    },
  },
  { files: ['**/*.js'], rules: { '@typescript-eslint/no-require-imports': 'off' } },
  { files: CONFIGS, rules: { 'no-restricted-syntax': 'off', 'no-restricted-imports': 'off' } },
  prettier,
);
