import reactHooks from 'eslint-plugin-react-hooks';
import globals from './globals.js';
import tseslint from 'typescript-eslint';

/** The arrows between the folders: client → contracts → geometry, server → geometry, geometry → nothing of ours. */
const forbid = (...patterns) => ({
  'no-restricted-imports': ['error', { patterns }],
});
const folders = (names, message) => ({
  group: names.flatMap((name) => [`#${name}/*`, `**/${name}/**`]),
  message,
});

export default tseslint.config(
  { ignores: ['node_modules', '.build', '.data'] },
  { linterOptions: { reportUnusedDisableDirectives: 'error' } },
  ...tseslint.configs.strict,
  {
    languageOptions: { globals },
    rules: {
      '@typescript-eslint/consistent-type-imports': ['error', { fixStyle: 'inline-type-imports' }],
      '@typescript-eslint/no-unused-vars': ['error', { argsIgnorePattern: '^_', ignoreRestSiblings: true }],
      '@typescript-eslint/no-invalid-void-type': 'off',
      eqeqeq: ['error', 'always'],
      'max-lines': ['error', { max: 300, skipBlankLines: true, skipComments: true }],
      'max-lines-per-function': ['error', { max: 60, skipBlankLines: true, skipComments: true }],
      'no-console': 'error',
    },
  },
  {
    files: ['geometry/**/*.ts'],
    rules: {
      ...forbid(
        folders(['server', 'client', 'migrations', 'tests'], 'geometry/ imports nothing of ours but itself.'),
        {
          group: ['node:*', 'react', 'react-*', 'express', 'knex'],
          message: 'geometry/ is pure: no I/O, no DOM, no Node.',
        },
      ),
      'no-restricted-globals': [
        'error',
        'Date',
        'fetch',
        'window',
        'document',
        'process',
        'console',
        'performance',
        'crypto',
      ],
      'no-restricted-properties': [
        'error',
        { object: 'Math', property: 'random', message: 'geometry/ is deterministic.' },
      ],
    },
  },
  {
    files: ['client/**/*.{ts,tsx}'],
    ...reactHooks.configs.flat.recommended,
    rules: {
      ...reactHooks.configs.flat.recommended.rules,
      ...forbid(
        {
          group: [
            '#server/*',
            '!#server/contracts',
            '!#server/contracts/*',
            '**/server/**',
            '#migrations/*',
            '#tests/*',
          ],
          message: 'client/ may import geometry/ and server/contracts/ only.',
        },
        { group: ['node:*', 'express', 'knex', 'mysql2'], message: 'This runs in the browser.' },
      ),
    },
  },
  {
    files: ['server/**/*.ts'],
    rules: forbid(folders(['client', 'tests'], 'server/ knows no client and no tests.')),
  },
  {
    files: ['server/contracts/**/*.ts'],
    rules: forbid(
      folders(['client', 'tests', 'migrations'], 'Contracts are schemas: they import geometry/ only.'),
      {
        group: [
          'node:*',
          'express',
          'knex',
          'mysql2',
          '#server/*',
          '!#server/contracts',
          '!#server/contracts/*',
          '../*',
        ],
        message: 'Contracts are schemas: they import geometry/ only.',
      },
    ),
  },
  {
    files: ['server/**/rules.ts'],
    rules: forbid(folders(['client', 'tests'], 'server/ knows no client.'), {
      group: ['express', 'knex', 'mysql2', 'node:*', '**/store.ts', '**/routes.ts'],
      message: 'Rules are pure decisions.',
    }),
  },
  {
    files: ['server/**/store.ts'],
    rules: forbid(folders(['client', 'tests'], 'server/ knows no client.'), {
      group: ['express', '**/routes.ts'],
      message: 'Stores know no HTTP.',
    }),
  },
  {
    files: ['tests/**', 'server/start/**', 'migrations/**'],
    rules: {
      'max-lines-per-function': 'off',
      '@typescript-eslint/no-non-null-assertion': 'off',
      'no-console': 'off',
    },
  },
);
