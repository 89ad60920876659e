import angular from 'angular-eslint';
import prettier from 'eslint-config-prettier';
import tseslint from 'typescript-eslint';

/** Imports run one way: src and server know shared; shared knows neither; only tests may know all three. */
const forbid = (...rules) => ({
  'no-restricted-imports': ['error', { patterns: rules.map(([of, message]) => (of instanceof RegExp ? { regex: of.source, message } : { group: of, message })) }],
});
const noServer = [['**/server/**', '**/migrations/**'], 'The page talks to the server through shared/contracts only.'];
const noApp = [['**/src/**', '**/app/**'], 'Only the page may import the page.'];
const noPlatform = [['node:*', '@angular/*', 'express', 'kysely', 'three', '@tensorflow/*'], 'shared/ is pure: no browser, no Node, no framework.'];
const useAlias = [['**/../shared/**'], 'Import shared code as @oriel/shared/….'];
const noNode = [['node:*'], 'The page has no Node.'];
const noInside = [/^(\.\.\/)+(?!core\/)[\w-]+\/[\w-]+\//, 'What stands directly in a feature’s folder is for the others too; what stands deeper is its own.'];
/** Folders of src/app that features are built on; they know one another and no feature. */
const groundwork = ['calibration', 'core', 'drawing', 'figures', 'saving', 'scene-view', 'tracking'];
const noFeature = [new RegExp(`^(\\.\\./)+(?!(${groundwork.join('|')})/)[\\w-]+/`), 'Features are built on this folder; it knows none of them.'];
const noEditor = [/^(\.\.\/)+(account|bench|composer|household|photos|scenes|walls?)\//, 'The player stands without the editor.'];

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
      ...forbid(noServer, useAlias, noNode, noInside),
      '@angular-eslint/directive-selector': ['error', { type: 'attribute', prefix: 'oriel', style: 'camelCase' }],
      '@angular-eslint/component-selector': ['error', { type: 'element', prefix: 'oriel', style: 'kebab-case' }],
      '@angular-eslint/prefer-on-push-component-change-detection': 'error',
      '@typescript-eslint/no-extraneous-class': 'off',
    },
  },
  { files: ['src/**/*.html'], extends: [...angular.configs.templateRecommended, ...angular.configs.templateAccessibility] },
  { files: groundwork.map((folder) => `src/app/${folder}/**/*.ts`), rules: forbid(noServer, useAlias, noNode, noFeature) },
  { files: ['src/app/player/**/*.ts'], rules: forbid(noServer, useAlias, noNode, noInside, noEditor) },
  { files: ['tests/**/*.ts'], rules: { 'no-console': 'off' } },
);
