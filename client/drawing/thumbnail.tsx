import { extents } from '#geometry/contour/contour.ts';
import { sampleCosine } from '#geometry/contour/sampling.ts';
import { outlineOf, type Shape } from '#geometry/shapes/shape.ts';
import { contourPath } from './paths.ts';

const MARGIN = 1.5;
const POINTS_PER_SURFACE = 48;

/** Shapes are immutable, so their paths are kept as long as the shape itself is. */
const kept = new WeakMap<Shape, Map<string, string>>();

function thumbnailPath(shape: Shape, width: number, height: number): string {
  const sizes = kept.get(shape) ?? new Map<string, string>();
  kept.set(shape, sizes);
  const size = `${String(width)}x${String(height)}`;
  const known = sizes.get(size);
  if (known !== undefined) return known;

  const contour = sampleCosine(outlineOf(shape), POINTS_PER_SURFACE);
  const { minX, maxX, minY, maxY } = extents(contour);
  const scale = Math.min((width - 2 * MARGIN) / (maxX - minX), (height - 2 * MARGIN) / (maxY - minY));
  const path = contourPath(
    contour,
    (x) => width / 2 + (x - (minX + maxX) / 2) * scale,
    (y) => height / 2 - (y - (minY + maxY) / 2) * scale,
  );
  sizes.set(size, path);
  return path;
}

export interface ThumbnailProps {
  shape: Shape;
  /** Size in sixteenths of a rem, which usually are pixels; the section fills it as far as its true shape allows. */
  width: number;
  height: number;
  /** Thin short-dash grey without foam: the way a previous version is drawn. */
  dashed?: boolean | undefined;
  className?: string | undefined;
}

/** The true shape of a section in small: foam inside, ink outline. Decorative: the text beside it says what it is. */
export function Thumbnail({ shape, width, height, dashed = false, className }: ThumbnailProps) {
  return (
    <svg
      width={`${String(width / 16)}rem`}
      height={`${String(height / 16)}rem`}
      viewBox={`0 0 ${String(width)} ${String(height)}`}
      className={className}
      aria-hidden="true"
      focusable="false"
    >
      <path
        d={thumbnailPath(shape, width, height)}
        className={dashed ? 'fill-none stroke-graphite' : 'fill-foam stroke-ink'}
        strokeWidth={dashed ? 0.8 : 1.2}
        strokeDasharray={dashed ? '3 2' : undefined}
        strokeLinejoin="round"
      />
    </svg>
  );
}
