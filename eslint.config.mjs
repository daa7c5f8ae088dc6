import angular from 'angular-eslint';
import tseslint from 'typescript-eslint';
import { wallConfig } from './scripts/walls.mjs';

const sizeBudget = {
  'max-lines': ['error', { max: 400, skipBlankLines: false, skipComments: false }],
  'max-lines-per-function': ['error', { max: 60, skipBlankLines: true, skipComments: true, IIFEs: false }],
  'max-params': ['error', 4],
  'max-depth': ['error', 3],
};

const named = {
  'no-restricted-syntax': [
    'error',
    { selector: 'TSEnumDeclaration', message: 'Use a union of string literals: it needs no runtime object.' },
    { selector: 'ExportDefaultDeclaration', message: 'Export by name, so that a search finds every use.' },
    {
      selector: "ImportDeclaration[source.value='zod'] > ImportSpecifier",
      message: "Write `import * as z from 'zod'`: the named import puts the whole package into the client.",
    },
    { selector: "ExportSpecifier[exported.name='z']", message: 'Do not re-export zod: it defeats tree shaking.' },
    { selector: ":matches(ExportNamedDeclaration, ExportAllDeclaration)[source.value='zod']", message: 'Do not re-export zod: it defeats tree shaking.' },
  ],
};

export default tseslint.config(
  { ignores: ['dist/', '.data*/', '.cache/', '.angular/', 'coverage/', 'node_modules/', 'cell-library/'] },
  {
    files: ['**/*.ts'],
    extends: [...tseslint.configs.recommended],
    rules: {
      ...sizeBudget,
      ...named,
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'separate-type-imports' }],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', varsIgnorePattern: '^_' }],
      'no-console': 'error',
      eqeqeq: 'error',
      'prefer-const': 'error',
    },
  },
  {
    files: ['**/*.{mjs,cjs}'],
    extends: [...tseslint.configs.recommended],
    rules: { ...sizeBudget, '@typescript-eslint/no-require-imports': 'off', eqeqeq: 'error', 'prefer-const': 'error' },
  },
  {
    files: ['server/**/*.ts'],
    // Decorated properties need their types at run time; only plain files can use type imports everywhere.
    rules: { '@typescript-eslint/consistent-type-imports': 'off' },
  },
  {
    // AssemblyScript, compiled by its own compiler: no type imports, and pointers travel as plain numbers, since an
    // object to hold them would itself have to live in memory. A stage is one textbook formula, written out.
    files: ['server/engine/kernel/assembly/*.ts'],
    rules: {
      '@typescript-eslint/consistent-type-imports': 'off',
      'prefer-const': 'off',
      'max-params': ['error', 10],
      'max-lines-per-function': ['error', { max: 90, skipBlankLines: true, skipComments: true }],
    },
  },
  {
    files: ['**/*.spec.ts', 'test/**/*.ts'],
    rules: { 'max-lines-per-function': 'off', 'max-lines': ['error', { max: 500 }] },
  },
  { files: ['server/**/main.ts', 'server/**/worker.ts', 'test/**/*.ts'], rules: { 'no-console': 'off' } },
  {
    files: ['src/**/*.ts'],
    extends: [...angular.configs.tsRecommended],
    processor: angular.processInlineTemplates,
    rules: {
      '@angular-eslint/component-selector': ['error', { type: 'element', prefix: 'slant', style: 'kebab-case' }],
      '@angular-eslint/directive-selector': ['error', { type: 'attribute', prefix: 'slant', style: 'camelCase' }],
      '@angular-eslint/component-class-suffix': 'off',
      '@angular-eslint/directive-class-suffix': 'off',
      '@angular-eslint/prefer-on-push-component-change-detection': 'error',
    },
  },
  // Hosts that a spec makes up live for one test.
  { files: ['src/**/*.spec.ts'], rules: { '@angular-eslint/prefer-on-push-component-change-detection': 'off' } },
  { files: ['src/**/*.html'], extends: [...angular.configs.templateRecommended, ...angular.configs.templateAccessibility] },
  wallConfig(import.meta.dirname),
);
