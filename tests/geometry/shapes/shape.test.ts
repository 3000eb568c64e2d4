import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { ShapeError, type ShapeIssue } from '#geometry/shapes/error.ts';
import { canonicalShape, checkShape, describeShape, outlineOf, shapeSchema } from '#geometry/shapes/shape.ts';
import { FREE_FORM, UNIT, deepFrozen, naca4, shapes } from './samples.ts';

function issuesOf(shape: unknown): readonly ShapeIssue[] {
  try {
    checkShape(shape);
  } catch (error) {
    if (error instanceof ShapeError) return error.issues;
    throw error;
  }
  return [];
}

const pathsOf = (shape: unknown) => issuesOf(shape).map((issue) => issue.path);

describe('checkShape', () => {
  test('gives back what it accepts', () => {
    for (const shape of [naca4('2412'), FREE_FORM, UNIT])
      expect(checkShape(deepFrozen(shape))).toEqual(shape);
  });

  test.each([undefined, null, 3, 'naca4', [], {}, { kind: 'spline' }])('refuses %o as no shape', (value) => {
    expect(issuesOf(value).map((issue) => issue.message)).toEqual(['kind must be "naca4" or "cst"']);
  });

  test('names every field that is wrong, unknown ones included', () => {
    const shape = { ...naca4('2412'), maxCamber: 0.2, maxThickness: NaN, sweep: 3 };
    expect(pathsOf(shape)).toEqual(['maxCamber', 'maxThickness', 'sweep']);
  });

  test('surfaces that cross are refused under the weights next to the place', () => {
    const shape = { ...UNIT, upper: [0.2, -0.4, 0.2], lower: [-0.1, 0, -0.1] };
    const issues = issuesOf(shape);
    expect(issues.map((issue) => issue.path)).toEqual(['upper.1', 'lower.1']);
    expect(issues[0]!.message).toMatch(/^the surfaces cross or touch near \d+(\.\d)? % of chord$/);
    expect(shapeSchema.safeParse(shape).error!.issues[0]!.path).toEqual(['upper', 1]);
  });

  test('a 4-digit shape that folds back is refused under maxThickness', () => {
    const shape = { ...naca4('2412'), maxCamber: 0.12, maxCamberPosition: 0.1, maxThickness: 0.4 };
    expect(issuesOf(shape)[0]).toEqual({
      path: 'maxThickness',
      message:
        'the lower surface folds back on itself: take less maxThickness or maxCamber, or a maxCamberPosition nearer to the middle',
    });
  });

  test('one spoiled number in any accepted shape is refused under its own path', () => {
    const spoiled = fc.constantFrom(NaN, Infinity, -Infinity, 1e9, '0.1', null);
    fc.assert(
      fc.property(shapes, fc.nat(), spoiled, (shape, pick, bad) => {
        const fields =
          shape.kind === 'naca4'
            ? ['maxCamber', 'maxCamberPosition', 'maxThickness']
            : [
                'n1',
                'n2',
                'trailingEdgeGap',
                ...shape.upper.map((_, i) => `upper.${i}`),
                ...shape.lower.map((_, i) => `lower.${i}`),
              ];
        const field = fields[pick % fields.length]!;
        const [name, index] = field.split('.');
        const copy: Record<string, unknown> = structuredClone({ ...shape });
        if (index === undefined) copy[name!] = bad;
        else (copy[name!] as unknown[])[Number(index)] = bad;
        expect(pathsOf(copy)).toEqual([field]);
      }),
    );
  });
});

describe('outlineOf', () => {
  test('is finite and keeps its stations in order on both surfaces, behind the nose', () => {
    fc.assert(
      fc.property(shapes, (shape) => {
        const { upper, lower } = outlineOf(deepFrozen(shape));
        for (const surface of [upper, lower]) {
          const points = Array.from({ length: 81 }, (_, i) => surface.at(i / 80));
          expect(points.every(({ x, y }) => Number.isFinite(x) && Number.isFinite(y))).toBe(true);
          const fore = points.findIndex(({ x }) => x === Math.min(...points.map((point) => point.x)));
          for (let i = fore + 1; i < points.length; i++)
            expect(points[i]!.x).toBeGreaterThan(points[i - 1]!.x);
        }
      }),
    );
  });
});

describe('canonicalShape', () => {
  test('does not depend on the order of keys, keeps the order of weights, drops an absent placement', () => {
    const { kind, upper, lower, n1, n2, trailingEdgeGap } = UNIT;
    const text = '{"kind":"cst","lower":[-1,-1,-1],"n1":0.5,"n2":1,"trailingEdgeGap":0,"upper":[1,1,1,1]}';
    expect(canonicalShape({ trailingEdgeGap, upper, n2, lower, n1, kind })).toBe(text);
    expect(canonicalShape({ ...UNIT, placement: undefined })).toBe(text);
  });

  test('reads back as the same shape, digit for digit', () => {
    fc.assert(
      fc.property(shapes, (shape) => {
        const text = canonicalShape(deepFrozen(shape));
        const back = checkShape(JSON.parse(text));
        expect(canonicalShape(back)).toBe(text);
        expect(back).toEqual(JSON.parse(JSON.stringify(shape)));
      }),
    );
  });
});

describe('describeShape', () => {
  test.each([
    [naca4('2412'), 'NACA 2412'],
    [
      { ...naca4('2412'), maxCamber: 0.023, maxCamberPosition: 0.41, maxThickness: 0.121 },
      '4-digit form 2.3 % at 41 %, 12.1 %',
    ],
    [{ ...naca4('0012'), maxThickness: 0.121 }, '4-digit form without camber, 12.1 %'],
    [FREE_FORM, 'CST order 6/4'],
  ])('%o', (shape, text) => {
    expect(describeShape(shape)).toBe(text);
  });
});
