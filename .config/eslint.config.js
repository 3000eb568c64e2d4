import reactHooks from 'eslint-plugin-react-hooks';
import globals from './globals.js';
import tseslint from 'typescript-eslint';

/**
 * The arrows between the folders: client → contracts → geometry, server → geometry, geometry → nothing of ours. Each is a regular
 * expression, because a pattern that begins with "#" is a comment to `group`; tests/structure/arrows.test.ts proves that each one
 * fires. A rule set by a later entry replaces that of an earlier one, so each entry states all it forbids.
 */
const forbid = (...arrows) => ({
  'no-restricted-imports': ['error', { patterns: [climbing, ...arrows] }],
  'no-restricted-syntax': [
    'error',
    ...[climbing, ...arrows].map(({ regex, message }) => ({
      selector: `ImportExpression[source.value=/${regex.replaceAll('/', '\\u002F')}/]`,
      message,
    })),
  ],
});

const climbing = { regex: '^#.*/\\.\\.?/', message: 'An alias names its file directly.' };

/** The top-level folders of these names, by alias or by a path that climbs out; paths below `except` may be imported. */
const folders = (names, message, except) => ({
  regex: `^(#|(\\.\\.?/)+)(${names.join('|')})/${except === undefined ? '' : `(?!${except}/)`}`,
  message,
});
const packages = (names, message) => ({ regex: `^(${names.join('|')})(/|$)`, message });
const node = '(node:.*)';

const contractsArrow = [
  folders(['client', 'tests', 'migrations'], 'Contracts are schemas: they import geometry/ only.'),
  folders(['server'], 'Contracts are schemas: they import geometry/ only.', 'contracts'),
  { regex: '^\\.\\./', message: 'Contracts are schemas: they import geometry/ only.' },
  packages([node, 'express', 'knex', 'mysql2'], 'Contracts are schemas: they import geometry/ only.'),
];
const serverArrow = folders(['client', 'tests'], 'server/ knows no client and no tests.');
const http = {
  regex: '/(routes|[^/]+-routes)\\.ts$|^#server/http/|^(\\.\\./)+http/',
  message: 'No HTTP here.',
};
const stores = { regex: '/([^/]+-)?store\\.ts$', message: 'Rules are pure decisions.' };

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
          regex: '^(?!\\.|#|(zod|maxrects-packer)(/|$))',
          message:
            'geometry/ is pure: of the packages it imports zod, and for the nesting of ribs maxrects-packer.',
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
        folders(['migrations', 'tests'], 'client/ may import geometry/ and server/contracts/ only.'),
        folders(['server'], 'client/ may import geometry/ and server/contracts/ only.', 'contracts'),
        packages([node, '@auth/express', 'express', 'knex', 'mysql2', 'pino'], 'This runs in the browser.'),
      ),
    },
  },
  {
    files: ['server/**/*.{ts,mjs}'],
    rules: forbid(serverArrow),
  },
  {
    files: ['server/contracts/**/*.ts'],
    rules: forbid(...contractsArrow),
  },
  {
    files: ['server/**/rules.ts'],
    rules: forbid(
      serverArrow,
      http,
      stores,
      packages([node, 'express', 'knex', 'mysql2'], 'Rules are pure decisions.'),
    ),
  },
  {
    files: ['server/**/{store,*-store}.ts'],
    rules: forbid(serverArrow, http, packages(['express'], 'Stores know no HTTP.')),
  },
  {
    files: ['migrations/**/*.ts'],
    rules: forbid(
      folders(
        ['client', 'server', 'geometry', 'tests'],
        'A migration stays as it was when the code moves on.',
      ),
    ),
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
