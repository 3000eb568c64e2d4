import { describe, expect, test } from 'vitest';
import { CST_LIMITS, cstSchema, placementSchema } from '#geometry/shapes/cst-schema.ts';
import { FREE_FORM, deepFrozen } from './samples.ts';

const issuesOf = (change: object) =>
  cstSchema
    .safeParse(deepFrozen({ ...FREE_FORM, ...change }))
    .error?.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`) ?? [];

describe('cstSchema', () => {
  test('accepts a shape as it is', () => {
    expect(cstSchema.parse(FREE_FORM)).toEqual(FREE_FORM);
    expect(
      issuesOf({
        upper: new Array(13).fill(CST_LIMITS.upper.max),
        lower: new Array(3).fill(CST_LIMITS.lower.min),
      }),
    ).toEqual([]);
  });

  test.each([
    [{ upper: new Array(14).fill(0.1) }, 'upper: upper must have 3 to 13 weights'],
    [{ lower: [-0.1, -0.1] }, 'lower: lower must have 3 to 13 weights'],
    [{ lower: 'many' }, 'lower: lower must have 3 to 13 weights'],
    [{ upper: [0.1, 2.1, 0.1] }, 'upper.1: each weight of the upper surface must be between -1 and 2'],
    [{ upper: [0.1, 0.1, NaN] }, 'upper.2: each weight of the upper surface must be between -1 and 2'],
    [{ lower: [-0.1, -0.1, -2.1] }, 'lower.2: each weight of the lower surface must be between -2 and 1'],
    [{ lower: [-0.1, Infinity, -0.1] }, 'lower.1: each weight of the lower surface must be between -2 and 1'],
    [{ n1: 0.4 }, 'n1: n1 must be between 0.5 and 1'],
    [{ n2: 1.6 }, 'n2: n2 must be between 0.5 and 1.5'],
    [{ trailingEdgeGap: -0.001 }, 'trailingEdgeGap: trailingEdgeGap must be between 0 % and 5 % of chord'],
    [
      { placement: { x: 0, y: 0, rotationDeg: 0, scale: 0 } },
      'placement.scale: scale must be between 0.5 and 2',
    ],
  ])('%o is refused under its name', (change, message) => {
    expect(issuesOf(change)).toEqual([message]);
  });

  test('a placement needs all its values', () => {
    expect(
      placementSchema.safeParse({ x: 0, y: 0, scale: 1 }).error?.issues.map((issue) => issue.path),
    ).toEqual([['rotationDeg']]);
  });
});
