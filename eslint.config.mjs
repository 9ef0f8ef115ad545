import eslint from '@eslint/js';
import angular from 'angular-eslint';
import prettier from 'eslint-config-prettier';
import boundaries from 'eslint-plugin-boundaries';
import importX from 'eslint-plugin-import-x';
import tseslint from 'typescript-eslint';

const own = (type) => [type, { feature: '${from.feature}' }];
const SHARED = ['shared', 'hazard'];

/** Which part may import which; first match wins, special files before their folder. */
const elements = [
  { type: 'hazard', pattern: 'shared/hazard' },
  { type: 'shared', pattern: 'shared/*', capture: ['area'] },
  {
    type: 'server-data',
    mode: 'full',
    pattern: 'server/features/*/**/*-{repository,queries,record,table}.ts',
    capture: ['feature'],
  },
  {
    type: 'server-service',
    mode: 'full',
    pattern: 'server/features/*/**/*-service.ts',
    capture: ['feature'],
  },
  { type: 'server-feature', pattern: 'server/features/*', capture: ['feature'] },
  { type: 'server-demo', pattern: 'server/demo' },
  { type: 'server-cli', pattern: 'server/cli' },
  { type: 'server-root', mode: 'full', pattern: 'server/*.ts' },
  { type: 'server-core', pattern: 'server/*', capture: ['part'] },
  {
    type: 'client-api',
    mode: 'full',
    pattern: 'src/app/features/*/*-api.ts',
    capture: ['feature'],
  },
  { type: 'client-feature', pattern: 'src/app/features/*', capture: ['feature'] },
  { type: 'client-ui', pattern: 'src/app/ui' },
  { type: 'client-core', pattern: 'src/app/core' },
  { type: 'client-root', mode: 'full', pattern: ['src/*.ts', 'src/app/*.ts'] },
  { type: 'migration', mode: 'full', pattern: 'migrations/*.ts' },
];

export default tseslint.config(
  { ignores: ['dist/**', 'node_modules/**', '.angular/**', 'data/**', 'tmp/**'] },
  eslint.configs.recommended,
  tseslint.configs.strict,
  {
    files: ['**/*.ts'],
    languageOptions: { parser: tseslint.parser, parserOptions: { projectService: true } },
    plugins: { boundaries, 'import-x': importX },
    settings: {
      'import/resolver': { typescript: { alwaysTryTypes: true } },
      'import-x/resolver': { typescript: { alwaysTryTypes: true } },
      'import-x/parsers': { '@typescript-eslint/parser': ['.ts'] },
      'boundaries/include': ['shared/**', 'server/**', 'src/**', 'migrations/**'],
      'boundaries/elements': elements,
    },
    rules: {
      'boundaries/no-unknown-files': 'error',
      'import-x/no-cycle': 'error',
      'import-x/no-default-export': 'error',
      'max-lines': ['error', { max: 400, skipBlankLines: true, skipComments: true }],
      'max-params': ['error', 4],
      'no-restricted-syntax': [
        'error',
        { selector: 'TSEnumDeclaration', message: 'Use a union of strings.' },
        {
          selector: "MemberExpression[object.name='sql'][property.name='raw']",
          message: 'No raw SQL text.',
        },
        {
          selector: "AssignmentExpression > MemberExpression[property.name='innerHTML']",
          message: 'No HTML from text.',
        },
      ],
      '@typescript-eslint/no-floating-promises': 'error',
      '@typescript-eslint/await-thenable': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_' }],
      '@typescript-eslint/no-invalid-void-type': 'off',
      'boundaries/element-types': [
        'error',
        {
          default: 'disallow',
          rules: [
            { from: 'hazard', allow: ['hazard'] },
            { from: 'shared', allow: SHARED },
            { from: 'server-core', allow: ['server-core', ...SHARED, 'migration'] },
            { from: 'server-data', allow: ['server-core', ...SHARED, own('server-data')] },
            {
              from: 'server-service',
              allow: [
                'server-core',
                ...SHARED,
                'server-service',
                own('server-data'),
                own('server-feature'),
              ],
            },
            {
              from: 'server-feature',
              allow: [
                'server-core',
                ...SHARED,
                'server-service',
                own('server-data'),
                own('server-feature'),
              ],
            },
            {
              from: 'server-cli',
              allow: ['server-cli', 'server-root', 'server-core', ...SHARED],
            },
            {
              from: 'server-demo',
              allow: ['server-demo', 'server-core', 'server-service', ...SHARED],
            },
            {
              from: 'server-root',
              allow: [
                'server-root',
                'server-core',
                'server-service',
                'server-feature',
                'server-data',
                'server-demo',
                ...SHARED,
                'migration',
              ],
            },
            { from: 'client-ui', allow: ['client-ui', ...SHARED] },
            { from: 'client-core', allow: ['client-core', 'client-ui', ...SHARED] },
            { from: 'client-api', allow: ['client-core', ...SHARED] },
            {
              from: 'client-feature',
              allow: ['client-core', 'client-ui', ...SHARED, 'client-api', own('client-feature')],
            },
            {
              from: 'client-root',
              allow: ['client-root', 'client-core', 'client-ui', 'client-feature', ...SHARED],
            },
            { from: 'migration', allow: ['migration'] },
          ],
        },
      ],
      'boundaries/external': [
        'error',
        {
          default: 'allow',
          rules: [
            { from: 'hazard', disallow: ['*', 'node:*'] },
            { from: 'shared', disallow: ['*', 'node:*'] },
            { from: 'shared', allow: ['zod'] },
            { from: ['client-*'], disallow: ['express', 'kysely', 'better-sqlite3', 'node:*'] },
            { from: ['server-*'], disallow: ['@angular/*'] },
            { from: ['server-service', 'server-feature'], disallow: ['better-sqlite3', 'kysely'] },
          ],
        },
      ],
    },
  },
  {
    files: ['shared/**/*.ts'],
    rules: {
      'no-restricted-globals': ['error', 'process', 'fetch', 'window', 'document'],
      'no-restricted-properties': [
        'error',
        { object: 'Date', property: 'now', message: 'Time is an argument below shared.' },
        { object: 'Math', property: 'random', message: 'Seeds are arguments below shared.' },
      ],
    },
  },
  {
    files: ['src/**/*.ts'],
    extends: [angular.configs.tsRecommended],
    processor: angular.processInlineTemplates,
    rules: {
      '@angular-eslint/component-class-suffix': 'off',
      '@angular-eslint/directive-class-suffix': 'off',
      '@angular-eslint/prefer-on-push-component-change-detection': 'error',
      '@angular-eslint/component-selector': [
        'error',
        { type: 'element', prefix: 'lm', style: 'kebab-case' },
      ],
      '@angular-eslint/directive-selector': [
        'error',
        { type: 'attribute', prefix: 'lm', style: 'camelCase' },
      ],
      '@typescript-eslint/no-extraneous-class': ['error', { allowWithDecorator: true }],
    },
  },
  {
    files: ['src/**/*.ts'],
    ignores: ['src/app/ui/icon/**', '**/*.spec.ts'],
    rules: {
      'no-restricted-syntax': [
        'error',
        {
          selector: 'Identifier[name=/^bypassSecurityTrust/]',
          message: 'Only the icon registry may trust its own text.',
        },
        { selector: 'TSEnumDeclaration', message: 'Use a union of strings.' },
        { selector: "MemberExpression[property.name='innerHTML']", message: 'No HTML from text.' },
      ],
    },
  },
  {
    // Components on native table elements are selected by attribute.
    files: ['src/app/ui/list-table/**/*.ts'],
    plugins: { '@angular-eslint': angular.tsPlugin },
    rules: { '@angular-eslint/component-selector': 'off' },
  },
  {
    files: ['src/**/*.html'],
    extends: [angular.configs.templateRecommended, angular.configs.templateAccessibility],
  },
  {
    files: ['**/*.spec.ts', 'tests/**/*.ts'],
    rules: {
      'boundaries/external': 'off',
      'boundaries/element-types': 'off',
      '@typescript-eslint/no-non-null-assertion': 'off',
      'max-lines': 'off',
    },
  },
  { files: ['shared/hazard/rule-sets/**'], rules: { 'max-lines': 'off' } },
  { files: ['**/*.config.ts', '**/*.config.mjs'], rules: { 'import-x/no-default-export': 'off' } },
  {
    files: ['**/*.mjs'],
    languageOptions: { globals: { process: 'readonly', console: 'readonly', URL: 'readonly' } },
  },
  prettier,
);
