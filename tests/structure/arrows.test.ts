import { ESLint } from 'eslint';
import { describe, expect, test } from 'vitest';

const eslint = new ESLint({ overrideConfigFile: '.config/eslint.config.js' });
const arrowRules = ['no-restricted-imports', 'no-restricted-syntax'];

/** The arrow rules that object when a file at `path` holds `code`. */
async function objections(path: string, code: string): Promise<string[]> {
  const [result] = await eslint.lintText(code, { filePath: path });
  return (result?.messages ?? []).flatMap(({ ruleId }) =>
    ruleId !== null && arrowRules.includes(ruleId) ? [ruleId] : [],
  );
}

const forbidden: readonly (readonly [from: string, to: readonly string[]])[] = [
  [
    'geometry/contour/planted.ts',
    [
      '#server/refusal.ts',
      '#client/app/units.ts',
      '#migrations/index.ts',
      '#tests/setup.ts',
      '../../server/refusal.ts',
      'node:fs',
      'fs',
      'react',
      'd3-shape',
    ],
  ],
  [
    'client/app/planted.ts',
    [
      '#server/refusal.ts',
      '#server/database/scoped.ts',
      '#server/contracts/../app.ts',
      '#migrations/index.ts',
      '#tests/setup.ts',
      '../../server/app.ts',
      '../../migrations/index.ts',
      'node:fs',
      'express',
      'knex',
    ],
  ],
  ['server/sections/planted.ts', ['#client/app/units.ts', '#tests/setup.ts', '../../client/app/units.ts']],
  ['server/start/planted.mjs', ['../../client/app/units.ts']],
  [
    'server/contracts/planted.ts',
    [
      '#server/refusal.ts',
      '../refusal.ts',
      '#client/app/units.ts',
      '#migrations/index.ts',
      'express',
      'knex',
    ],
  ],
  [
    'server/sections/rules.ts',
    [
      './store.ts',
      './routes.ts',
      '#server/sections/versions/status-store.ts',
      '#server/http/problem.ts',
      'knex',
      'express',
      'node:fs',
    ],
  ],
  [
    'server/sections/store.ts',
    ['./routes.ts', '#server/sections/routes.ts', '../http/problem.ts', 'express', '#client/app/units.ts'],
  ],
  ['server/sections/versions/status-store.ts', ['express', '#server/account/auth-routes.ts']],
  [
    'migrations/planted.ts',
    ['#server/sections/store.ts', '#geometry/shapes/shape.ts', '../server/refusal.ts'],
  ],
];

const planted = forbidden.flatMap(([from, to]) => to.map((path) => [from, path] as const));

describe('an import against the arrows is refused', () => {
  test.each(planted)('%s may not import %s', async (from, to) => {
    expect(await objections(from, `import { x } from '${to}';\nexport const y = x;\n`)).toEqual([
      'no-restricted-imports',
    ]);
    expect(await objections(from, `import { type X } from '${to}';\nexport type Y = X;\n`)).toEqual([
      'no-restricted-imports',
    ]);
    expect(await objections(from, `export { x } from '${to}';\n`)).toEqual(['no-restricted-imports']);
    expect(await objections(from, `export const y = () => import('${to}');\n`)).toEqual([
      'no-restricted-syntax',
    ]);
  });
});

test.each([
  ['geometry/contour/planted.ts', '../shapes/outline.ts'],
  ['geometry/contour/planted.ts', 'zod'],
  ['client/app/planted.ts', '#server/contracts/common.ts'],
  ['client/app/planted.ts', '#geometry/shapes/shape.ts'],
  ['client/app/planted.ts', 'react'],
  ['server/contracts/planted.ts', './common.ts'],
  ['server/contracts/planted.ts', '#geometry/shapes/shape.ts'],
  ['server/sections/rules.ts', '#server/contracts/sections.ts'],
  ['server/sections/store.ts', './described.ts'],
  ['server/sections/store.ts', 'knex'],
  ['migrations/planted.ts', 'knex'],
])('%s may import %s', async (from, to) => {
  expect(await objections(from, `import { x } from '${to}';\nexport const y = x;\n`)).toEqual([]);
  expect(await objections(from, `export const y = () => import('${to}');\n`)).toEqual([]);
});
