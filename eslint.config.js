import js from '@eslint/js'
import jsxA11y from 'eslint-plugin-jsx-a11y'
import reactHooks from 'eslint-plugin-react-hooks'
import tseslint from 'typescript-eslint'

/** Imports run one way: core ← db ← api, core ← web. Each folder lists what it may not reach. */
const forbid = (...groups) => ({
  'no-restricted-imports': ['error', { patterns: groups.map(([group, message]) => ({ group, message })) }],
})

const NODE = [
  ['node:*', 'fs', 'path', 'crypto', 'os', 'http', 'https', 'net', 'worker_threads', 'child_process'],
  'core/ is pure: no Node module',
]
const SERVER = [['express', 'pg', 'drizzle-orm', 'drizzle-orm/*', 'pino*', 'jose'], 'a server package']
const VIEW = [
  ['react', 'react-dom', 'react-dom/*', 'react-router-dom', '@visx/*', '@tanstack/*'],
  'a browser package',
]

export default tseslint.config(
  { ignores: ['dist', '.data', 'node_modules', 'coverage'] },
  js.configs.recommended,
  ...tseslint.configs.recommended,
  {
    rules: {
      '@typescript-eslint/consistent-type-imports': 'error',
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_' }],
      eqeqeq: ['error', 'always', { null: 'ignore' }],
    },
  },
  {
    files: ['core/**/*.ts'],
    rules: {
      ...forbid(NODE, SERVER, VIEW, [
        ['#api/*', '#db/*', '**/web/*', '**/api/*', '**/db/*'],
        'core/ imports none of ours',
      ]),
      'no-restricted-globals': [
        'error',
        ...[
          'window',
          'document',
          'fetch',
          'process',
          'Buffer',
          'setTimeout',
          'console',
          'localStorage',
          'performance',
        ].map((name) => ({
          name,
          message: 'core/ does no I/O and reads no clock',
        })),
      ],
      'no-restricted-properties': [
        'error',
        { object: 'Date', property: 'now', message: 'core/ reads no clock' },
        { object: 'Math', property: 'random', message: 'core/ takes a seed' },
      ],
    },
  },
  {
    files: ['db/**/*.ts'],
    rules: forbid(VIEW, [['#api/*', '**/api/*', '**/web/*'], 'db/ imports only core/']),
  },
  { files: ['api/**/*.ts'], rules: forbid(VIEW, [['**/web/*'], 'api/ imports core/ and db/']) },
  {
    files: ['web/**/*.{ts,tsx}'],
    plugins: { 'react-hooks': reactHooks, 'jsx-a11y': jsxA11y },
    rules: {
      ...reactHooks.configs.recommended.rules,
      ...jsxA11y.configs.recommended.rules,
      ...forbid(NODE, SERVER, [['#api/*', '#db/*'], 'web/ imports core/ only']),
      // The table library hands out functions the compiler cannot memoise; nothing here relies on that.
      'react-hooks/incompatible-library': 'off',
    },
  },
  {
    files: ['web/public/*.js'],
    languageOptions: { globals: { document: 'readonly', localStorage: 'readonly', matchMedia: 'readonly' } },
  },
  {
    files: ['scripts/**/*.mjs', 'tests/**/*.mjs'],
    languageOptions: {
      globals: {
        process: 'readonly',
        console: 'readonly',
        setTimeout: 'readonly',
        clearTimeout: 'readonly',
        URL: 'readonly',
        Buffer: 'readonly',
        fetch: 'readonly',
      },
    },
  },
)
