import { cleanup, render } from '@testing-library/react';
import { afterEach, describe, expect, it } from 'vitest';
import { contourPath } from '#client/drawing/paths.ts';
import { Thumbnail } from '#client/drawing/thumbnail.tsx';
import { sampleCosine } from '#geometry/contour/sampling.ts';
import { naca4Outline } from '#geometry/shapes/naca4.ts';

afterEach(cleanup);

const shape = {
  kind: 'naca4',
  maxCamber: 0.02,
  maxCamberPosition: 0.4,
  maxThickness: 0.12,
  trailingEdge: 'open',
} as const;
const points = (path: string) =>
  [...path.matchAll(/(-?[\d.]+),(-?[\d.]+)/g)].map(([, x, y]) => ({ x: Number(x), y: Number(y) }));

describe('contourPath', () => {
  it('goes through every point of the contour in order and closes', () => {
    const contour = sampleCosine(naca4Outline(shape), 20);
    const path = contourPath(
      contour,
      (x) => x * 100,
      (y) => -y * 100,
      3,
    );
    const drawn = points(path);
    expect(path.endsWith('Z')).toBe(true);
    expect(drawn).toHaveLength(contour.x.length);
    drawn.forEach(({ x, y }, index) => {
      expect(Math.abs(x - contour.x[index]! * 100)).toBeLessThanOrEqual(0.0005001);
      expect(Math.abs(y + contour.y[index]! * 100)).toBeLessThanOrEqual(0.0005001);
    });
  });
});

describe('Thumbnail', () => {
  it('keeps the true proportion and stays inside', () => {
    const { container } = render(<Thumbnail shape={shape} width={112} height={28} />);
    const drawn = points(container.querySelector('path')?.getAttribute('d') ?? '');
    const span = (values: number[]) => Math.max(...values) - Math.min(...values);
    const width = span(drawn.map((point) => point.x));
    const height = span(drawn.map((point) => point.y));
    expect(width).toBeCloseTo(109, 1);
    expect(height / width).toBeCloseTo(0.12, 2);
    expect(drawn.every(({ x, y }) => x >= 0 && x <= 112 && y >= 0 && y <= 28)).toBe(true);
  });

  it('is drawn dashed and without foam as a previous version', () => {
    const { container } = render(<Thumbnail shape={shape} width={112} height={28} dashed />);
    const path = container.querySelector('path');
    expect(path?.getAttribute('stroke-dasharray')).toBe('3 2');
    expect(path?.getAttribute('class')).toContain('fill-none');
  });
});
