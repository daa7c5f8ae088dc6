const path = require('node:path');

/** Packages that exist only as ES modules and so must be transformed for jest's CommonJS runtime. */
const esmOnly = ['/node_modules/(?!(p-queue|p-timeout|eventemitter3)/)'];

const node = (name, testMatch, more = {}) => ({
  displayName: name,
  rootDir: __dirname,
  testEnvironment: 'node',
  testMatch,
  transform: { '^.+\\.[cm]?[tj]s$': ['ts-jest', { tsconfig: path.join(__dirname, 'tsconfig.jest.json'), diagnostics: false }] },
  transformIgnorePatterns: esmOnly,
  modulePathIgnorePatterns: ['<rootDir>/dist/', '<rootDir>/.data', '<rootDir>/.cache/'],
  cacheDirectory: path.join(__dirname, '.cache/jest'),
  ...more,
});

/** Predictions of the server run in the vector kernel, which is compiled first where its sources have changed. */
const withKernel = { globalSetup: path.join(__dirname, 'scripts/jest-kernel.mjs') };

module.exports = {
  projects: [
    node('shared', ['<rootDir>/shared/**/*.spec.ts']),
    node('server', ['<rootDir>/server/**/*.spec.ts'], withKernel),
    node('architecture', ['<rootDir>/test/architecture/**/*.spec.ts']),
    node('reference', ['<rootDir>/test/reference/**/*.spec.ts']),
    node('api', ['<rootDir>/test/api/**/*.spec.ts'], withKernel),
    // A busy machine may need minutes for what takes seconds: the checks wait for what they want to see, not for a time.
    node('e2e', ['<rootDir>/test/e2e/**/*.spec.ts'], { setupFilesAfterEnv: ['<rootDir>/test/e2e/support/patience.ts'] }),
    require('./jest.client.cjs'),
  ],
};
