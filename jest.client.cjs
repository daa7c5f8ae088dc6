const path = require('node:path');
const { createCjsPreset } = require('jest-preset-angular/presets/index.js');

module.exports = {
  ...createCjsPreset({ tsconfig: path.join(__dirname, 'tsconfig.spec-client.json') }),
  displayName: 'client',
  rootDir: __dirname,
  testMatch: ['<rootDir>/src/**/*.spec.ts'],
  setupFilesAfterEnv: ['<rootDir>/test/support/client-setup.ts'],
  modulePathIgnorePatterns: ['<rootDir>/dist/', '<rootDir>/.data', '<rootDir>/.cache/'],
  cacheDirectory: path.join(__dirname, '.cache/jest'),
};
