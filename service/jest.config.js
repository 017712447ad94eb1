process.env.TZ = 'UTC';

/** @type {import('jest').Config} */
module.exports = {
  testEnvironment: 'node',
  // Whole services are booted beside other work on two cores.
  testTimeout: 30_000,
  roots: ['<rootDir>/src', '<rootDir>/test'],
  testRegex: '[.-]spec\\.ts$',
  moduleNameMapper: {
    '^@stubpost/shared$': '<rootDir>/../shared/src/index.ts',
    '^@stubpost/shared/testing$': '<rootDir>/../shared/src/testing/index.ts',
  },
  transform: {
    '^.+\\.ts$': [
      '@swc/jest',
      {
        sourceMaps: 'inline',
        module: { type: 'commonjs' },
        jsc: {
          target: 'es2022',
          keepClassNames: true,
          parser: { syntax: 'typescript', decorators: true },
          transform: { legacyDecorator: true, decoratorMetadata: true, useDefineForClassFields: false },
        },
      },
    ],
  },
};
