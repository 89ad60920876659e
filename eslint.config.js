import angular from 'angular-eslint';
import prettier from 'eslint-config-prettier';
import tseslint from 'typescript-eslint';

/** Imports run one way: src and server know shared; shared knows neither; only tests may know all three. */
const forbid = (...patterns) => ({
  'no-restricted-imports': ['error', { patterns: patterns.map(([group, message]) => ({ group, message })) }],
});
const noServer = [['**/server/**', '**/migrations/**'], 'The page talks to the server through shared/contracts only.'];
const noApp = [['**/src/**', '**/app/**'], 'Only the page may import the page.'];
const noPlatform = [['node:*', '@angular/*', 'express', 'kysely', 'three', '@tensorflow/*'], 'shared/ is pure: no browser, no Node, no framework.'];
const useAlias = [['**/../shared/**'], 'Import shared code as @oriel/shared/….'];

export default tseslint.config(
  { ignores: ['dist/', 'node_modules/', '.angular/', '.oriel/', 'coverage/', 'assets/', 'test-results/', 'playwright-report/'] },
  {
    files: ['**/*.ts'],
    extends: [...tseslint.configs.strict, ...tseslint.configs.stylistic, prettier],
    rules: {
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-non-null-assertion': 'off',
      '@typescript-eslint/consistent-type-definitions': 'off',
      eqeqeq: 'error',
      'no-console': 'error',
    },
  },
  { files: ['shared/**/*.ts'], ignores: ['**/*.spec.ts'], rules: forbid(noServer, noApp, noPlatform) },
  { files: ['server/**/*.ts', 'migrations/**/*.ts'], rules: forbid(noApp, useAlias) },
  {
    files: ['src/**/*.ts'],
    extends: [...angular.configs.tsRecommended],
    processor: angular.processInlineTemplates,
    rules: {
      ...forbid(noServer, useAlias, [['node:*'], 'The page has no Node.']),
      '@angular-eslint/directive-selector': ['error', { type: 'attribute', prefix: 'oriel', style: 'camelCase' }],
      '@angular-eslint/component-selector': ['error', { type: 'element', prefix: 'oriel', style: 'kebab-case' }],
      '@angular-eslint/prefer-on-push-component-change-detection': 'error',
      '@typescript-eslint/no-extraneous-class': 'off',
    },
  },
  { files: ['src/**/*.html'], extends: [...angular.configs.templateRecommended, ...angular.configs.templateAccessibility] },
  { files: ['src/app/player/**/*.ts', 'src/app/tracking/**/*.ts'], ignores: ['**/*.spec.ts'], rules: forbid(noServer, useAlias, [['**/composer/**', '**/photos/**', '**/scenes/**'], 'The player and the tracking stand without the editor.']) },
  { files: ['tests/**/*.ts'], rules: { 'no-console': 'off' } },
);
