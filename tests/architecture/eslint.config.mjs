/*
 * Lint of the whole house. Run by: npx eslint -c tests/architecture/eslint.config.mjs .
 * Types are used where a forgotten promise would lose a run; the arrows between folders are dependency-cruiser's work.
 */
import nextVitals from 'eslint-config-next/core-web-vitals';
import nextTypeScript from 'eslint-config-next/typescript';
import { defineConfig, globalIgnores } from 'eslint/config';
import tseslint from 'typescript-eslint';

const typeScript = ['**/*.ts', '**/*.tsx'];

/** What a pure function cannot touch, with what to do instead. */
const impureGlobals = [
  ['console', 'lib prints nothing: return what is to be said'],
  ['process', 'lib knows no process: take the value as an argument'],
  ['globalThis', 'lib knows no surroundings: take the value as an argument'],
  ['window', 'lib knows no browser: take the value as an argument'],
  ['document', 'lib knows no browser: take the value as an argument'],
  ['navigator', 'lib knows no browser: take the value as an argument'],
  ['localStorage', 'lib keeps nothing: return what is to be kept'],
  ['indexedDB', 'lib keeps nothing: return what is to be kept'],
  ['performance', 'lib has no clock: take the time as an argument'],
  ['setTimeout', 'lib has no clock: return the moment something is due'],
  ['setInterval', 'lib has no clock: return the moment something is due'],
  ['setImmediate', 'lib has no clock: return the moment something is due'],
  ['queueMicrotask', 'lib has no clock: return the moment something is due'],
  ['fetch', 'lib does no input or output: take what was fetched as an argument'],
  ['WebSocket', 'lib does no input or output: take what came in as an argument'],
  ['crypto', 'lib has no dice: take the random value as an argument'],
  ['Buffer', 'lib runs in the browser too: use Uint8Array'],
].map(([name, message]) => ({ name, message }));

/** A moment that is given is a value; the clock, and the place the machine stands in, are not. */
const impureSyntax = [
  ["NewExpression[callee.name='Date'][arguments.length=0]", 'lib has no clock: take nowMs as an argument'],
  ["CallExpression[callee.name='Date']", 'lib has no clock: take nowMs as an argument'],
  ["MemberExpression[object.name='Date'][property.name='now']", 'lib has no clock: take nowMs as an argument'],
  ["MemberExpression[object.name='Math'][property.name='random']", 'lib has no dice: take the random value as an argument'],
  [
    'MemberExpression[property.name=/^(getFullYear|getMonth|getDate|getDay|getHours|getMinutes|getTimezoneOffset|toLocaleString|toLocaleDateString|toLocaleTimeString)$/]',
    'lib stands in no time zone and speaks no local language: take the zone as an argument',
  ],
].map(([selector, message]) => ({ selector, message }));

export default defineConfig([
  globalIgnores(['**/node_modules/**', '.next/**', 'dist/**', '.fascicle/**', 'tests/.out/**', 'next-env.d.ts', 'public/**/*.min.js']),
  ...nextVitals,
  ...nextTypeScript,
  { linterOptions: { noInlineConfig: true, reportUnusedDisableDirectives: 'error' } },
  {
    files: typeScript,
    extends: [tseslint.configs.strict],
    languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: new URL('../..', import.meta.url).pathname } },
    rules: {
      '@typescript-eslint/no-explicit-any': 'error',
      '@typescript-eslint/no-non-null-assertion': 'error',
      '@typescript-eslint/ban-ts-comment': 'error',
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      '@typescript-eslint/no-floating-promises': 'error',
      '@typescript-eslint/no-misused-promises': ['error', { checksVoidReturn: { attributes: false } }],
      '@typescript-eslint/await-thenable': 'error',
      '@typescript-eslint/switch-exhaustiveness-check': ['error', { considerDefaultExhaustiveForUnions: true }],
      '@typescript-eslint/only-throw-error': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', ignoreRestSiblings: true }],
      '@typescript-eslint/no-invalid-void-type': 'off',
      '@typescript-eslint/no-dynamic-delete': 'off',
    },
  },
  {
    rules: {
      eqeqeq: ['error', 'always', { null: 'ignore' }],
      'no-var': 'error',
      'prefer-const': 'error',
      'no-param-reassign': 'error',
      'no-restricted-imports': ['error', { patterns: [{ regex: '^\\.\\.', message: 'Name the path from the root: @/lib/…' }] }],
    },
  },
  {
    files: ['lib/**/*.ts'],
    rules: { 'no-restricted-globals': ['error', ...impureGlobals], 'no-restricted-syntax': ['error', ...impureSyntax] },
  },
  {
    files: ['app/**/*.{ts,tsx}', 'server/**/*.ts', 'db/**/*.ts'],
    rules: { 'no-console': 'error' },
  },
  {
    // Set-up and commands speak to a person at a terminal before a logger exists.
    files: ['server/setup/**', 'server/auth/print-code.ts'],
    rules: { 'no-console': 'off' },
  },
  {
    // Set-up starts under plain Node, where @/ is not known yet.
    files: ['server/setup/**'],
    rules: { 'no-restricted-imports': 'off' },
  },
  {
    files: ['tests/**'],
    rules: { '@typescript-eslint/no-non-null-assertion': 'off' },
  },
]);
