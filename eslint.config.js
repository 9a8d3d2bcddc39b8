import { existsSync, readdirSync } from 'node:fs'
import { createTypeScriptImportResolver } from 'eslint-import-resolver-typescript'
import importX from 'eslint-plugin-import-x'
import reactHooks from 'eslint-plugin-react-hooks'
import tseslint from 'typescript-eslint'

const folders = (path) =>
  (existsSync(path) ? readdirSync(path, { withFileTypes: true }) : []).filter((entry) => entry.isDirectory())

/** Who must not import whom: the laws of DEVELOPERS.md. */
const zone = (target, from, message, except) => ({ target, from, message, ...(except && { except }) })
const importLaws = [
  zone('./src', ['./server', './tests', './seeds'], 'The client imports shared, never the server.'),
  zone('./server', ['./src', './tests'], 'The server imports shared, never the client.'),
  zone('./shared', ['./src', './server', './tests', './seeds'], 'shared imports nothing but shared.'),
  zone('./seeds', ['./src', './server', './tests'], 'Seeds are data for shared and server to read.'),
  zone(
    './shared/mechanics',
    ['./shared/rules', './shared/planning', './shared/contract'],
    'Mechanics knows nothing of rules.',
  ),
  zone('./shared/rules', './shared/planning', 'Rules know nothing of planning.'),
  zone('./src/features', './src/pages', 'Pages import features, not the other way round.'),
  zone('./src/features', './src/app', 'A feature knows no more of the app than its URLs.', ['./paths.ts']),
  zone(
    './src/components',
    ['./src/features', './src/pages', './src/app'],
    'Components hold no product logic.',
    undefined,
  ),
  zone('./src/lib', ['./src/features', './src/pages', './src/app', './src/components'], 'lib is the ground floor.'),
  ...folders('src/features').map(({ name }) =>
    zone(
      `./src/features/${name}`,
      './src/features',
      'No feature imports another: put it in components or lib, or join them in a page.',
      [`./${name}`],
    ),
  ),
]

const call = (object, property) => `CallExpression[callee.object.name="${object}"][callee.property.name="${property}"]`
const IMPURE = 'shared is pure: take the time, the id or the random number as an argument.'
const impureCalls = [
  call('Date', 'now'),
  call('Math', 'random'),
  'CallExpression[callee.name="Date"]',
  'NewExpression[callee.name="Date"][arguments.length=0]',
].map((selector) => ({ selector, message: IMPURE }))
const impureGlobals = ['window', 'document', 'navigator', 'fetch', 'process', 'performance', 'crypto', 'localStorage']

export default tseslint.config(
  { ignores: ['dist/', 'node_modules/', '.data/', 'coverage/', 'public/'] },
  { linterOptions: { reportUnusedDisableDirectives: 'error' } },
  tseslint.configs.recommended,
  {
    files: ['**/*.{ts,tsx}'],
    languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname } },
    rules: {
      '@typescript-eslint/no-floating-promises': ['error', { ignoreVoid: true }],
      '@typescript-eslint/no-misused-promises': [
        'error',
        { checksVoidReturn: { arguments: false, attributes: false } },
      ],
      '@typescript-eslint/await-thenable': 'error',
      '@typescript-eslint/only-throw-error': ['error', { allow: [{ from: 'lib', name: 'Response' }] }],
      '@typescript-eslint/switch-exhaustiveness-check': ['error', { considerDefaultExhaustiveForUnions: true }],
    },
  },
  {
    plugins: { 'import-x': importX },
    settings: { 'import-x/resolver-next': [createTypeScriptImportResolver()] },
    rules: {
      'import-x/no-restricted-paths': ['error', { basePath: import.meta.dirname, zones: importLaws }],
      '@typescript-eslint/no-unused-vars': [
        'error',
        { argsIgnorePattern: '^_', varsIgnorePattern: '^_', caughtErrors: 'none', ignoreRestSiblings: true },
      ],
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      eqeqeq: 'error',
      'no-console': 'error',
      'no-var': 'error',
      'prefer-const': 'error',
    },
  },
  {
    files: ['shared/**/*.ts'],
    rules: {
      'no-restricted-syntax': ['error', ...impureCalls],
      'no-restricted-globals': ['error', ...impureGlobals.map((name) => ({ name, message: IMPURE }))],
      'no-restricted-imports': [
        'error',
        { patterns: [{ regex: '^(?!\\.{1,2}/|zod$|#shared/)', message: 'shared needs nothing but zod.' }] },
      ],
    },
  },
  {
    files: ['server/**/*.ts'],
    ignores: ['server/scripts/**', 'server/main.ts', 'server/database/seed.ts'],
    rules: {
      'no-restricted-properties': [
        'error',
        {
          object: 'process',
          property: 'env',
          message: 'The environment is parsed once, in server/env.ts: take what you need from it.',
        },
      ],
    },
  },
  {
    files: ['src/**/*.{ts,tsx}'],
    plugins: { 'react-hooks': reactHooks },
    rules: {
      ...reactHooks.configs.flat['recommended-latest'].rules,
      // Both take react-hook-form's form object for something it is not; the compiler they serve is not used here.
      'react-hooks/refs': 'off',
      'react-hooks/incompatible-library': 'off',
    },
  },
  {
    files: ['server/scripts/**', 'tests/bench/**', 'tests/e2e/**', 'tests/support/**'],
    rules: { 'no-console': 'off' },
  },
)
