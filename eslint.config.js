// One block per folder; globs do not overlap, because two matching blocks replace (not merge)
// `no-restricted-imports`.
import js from '@eslint/js';
import tseslint from 'typescript-eslint';
import reactHooks from 'eslint-plugin-react-hooks';
import jsxA11y from 'eslint-plugin-jsx-a11y';
import * as importX from 'eslint-plugin-import-x';
import query from '@tanstack/eslint-plugin-query';
import globals from 'globals';

/** The one arrow: server and browser may import src/shared; nobody else's code crosses over. */
const noServer = {
  group: ['**/server/**', '**/migrations/**', '**/seeds/**'],
  message: 'The browser never imports the server.',
};
const noBrowser = {
  group: ['**/src/*', '!**/src/shared', '**/src/!(shared)/**'],
  message: 'Only #shared/* may be imported from src.',
};

export default tseslint.config(
  { ignores: ['node_modules', 'dist', 'coverage', '.data*', 'tests/reference/logs'] },
  js.configs.recommended,
  {
    files: ['**/*.{ts,tsx}'],
    extends: [...tseslint.configs.recommendedTypeChecked],
    languageOptions: {
      parserOptions: {
        project: [
          './tsconfig.json',
          './src/shared/tsconfig.json',
          './src/tsconfig.json',
          './server/tsconfig.json',
          './search/tsconfig.json',
          './tests/tsconfig.json',
        ],
        tsconfigRootDir: import.meta.dirname,
      },
    },
    plugins: { 'import-x': importX },
    settings: {
      'import-x/resolver-next': [
        importX.createNodeResolver({ extensions: ['.ts', '.tsx', '.js'] }),
      ],
    },
    rules: {
      '@typescript-eslint/switch-exhaustiveness-check': [
        'error',
        { considerDefaultExhaustiveForUnions: true },
      ],
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', varsIgnorePattern: '^_', ignoreRestSiblings: true },
      ],
      '@typescript-eslint/no-misused-promises': ['error', { checksVoidReturn: false }],
      '@typescript-eslint/restrict-template-expressions': ['error', { allowNumber: true }],
      'import-x/no-cycle': 'error',
      'no-eval': 'error',
      'no-new-func': 'error',
      'no-console': ['error', { allow: ['error', 'warn'] }],
      eqeqeq: ['error', 'always', { null: 'ignore' }],
    },
  },
  {
    files: ['src/shared/**/*.ts'],
    rules: {
      'no-restricted-imports': [
        'error',
        {
          patterns: [
            {
              regex: '^(?!\\.{1,2}/|zod$|#shared/)',
              message: 'src/shared is a leaf: it imports zod and itself, nothing else.',
            },
          ],
        },
      ],
    },
  },
  {
    files: ['src/**/*.{ts,tsx}'],
    ignores: ['src/shared/**'],
    plugins: { 'react-hooks': reactHooks, 'jsx-a11y': jsxA11y, '@tanstack/query': query },
    languageOptions: { globals: globals.browser },
    rules: {
      ...reactHooks.configs.recommended.rules,
      ...jsxA11y.configs.recommended.rules,
      '@tanstack/query/exhaustive-deps': 'error',
      '@tanstack/query/no-rest-destructuring': 'error',
      '@tanstack/query/stable-query-client': 'error',
      'no-restricted-imports': ['error', { patterns: [noServer] }],
    },
  },
  {
    files: ['server/**/*.ts', 'migrations/**/*.ts', 'seeds/**/*.ts'],
    languageOptions: { globals: globals.node },
    rules: { 'no-restricted-imports': ['error', { patterns: [noBrowser] }] },
  },
  {
    files: ['search/**/*.ts'],
    languageOptions: { globals: globals.node },
    rules: {
      'no-restricted-imports': [
        'error',
        { patterns: [noServer, { group: ['**/src/**'], message: 'search/ uses #shared/* only.' }] },
      ],
    },
  },
  {
    files: ['server/start/*.mjs', '*.js'],
    languageOptions: { globals: globals.node },
  },
  {
    files: ['src/**/*.{ts,tsx}', 'server/**/*.ts', 'search/**/*.ts'],
    rules: { 'max-lines': ['error', { max: 300, skipBlankLines: true, skipComments: true }] },
  },
);
