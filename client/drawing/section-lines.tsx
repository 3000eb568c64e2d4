import { line } from 'd3-shape';
import { memo } from 'react';
import { type Point } from '#geometry/point.ts';
import { contourPath } from './paths.ts';
import { DASH, LINE } from './line-types.ts';
import { type SectionDrawing } from './section-drawing.ts';
import { noseCircle } from './section-points.ts';
import { type SheetTransform } from './sheet-view.ts';

interface SectionLinesProps {
  readonly drawing: SectionDrawing;
  readonly transform: SheetTransform;
}

/** The section itself: foam, outline, chord line, mean camber line and nose circle. */
export const SectionLines = memo(function SectionLines({ drawing, transform }: SectionLinesProps) {
  const outline = contourPath(drawing.contour, transform.toX, transform.toY);
  return (
    <g aria-hidden="true" strokeLinejoin="round">
      <path d={outline} className="fill-foam stroke-ink" strokeWidth={LINE.wide} data-part="outline" />
      <path
        d={pointsPath(drawing.camber, transform)}
        className="fill-none stroke-graphite"
        strokeWidth={LINE.narrow}
        strokeDasharray={DASH.longDashDot}
        data-part="camber"
      />
      <NoseCircle drawing={drawing} transform={transform} />
    </g>
  );
});

/** The chord line runs a little beyond the section at both ends, as centre lines do. */
export const ChordLine = memo(function ChordLine({ transform }: { transform: SheetTransform }) {
  const y = transform.toY(0);
  return (
    <path
      aria-hidden="true"
      d={`M${transform.toX(0) - 26} ${y}H${transform.toX(1) + 26}`}
      className="fill-none stroke-graphite"
      strokeWidth={LINE.narrow}
      strokeDasharray={DASH.longDashDot}
    />
  );
});

function NoseCircle({ drawing, transform }: SectionLinesProps) {
  const { nose, radius, axis } = noseCircle(drawing.shape);
  if (radius * transform.chordPixels < 1.5) return null;
  return (
    <ellipse
      cx={transform.toX(nose.x + radius * axis.x)}
      cy={transform.toY(nose.y + radius * axis.y)}
      rx={radius * transform.chordPixels}
      ry={radius * transform.crossPixels}
      className="fill-none stroke-graphite"
      strokeWidth={LINE.hair}
    />
  );
}

/** Another version behind the section, in short dashes. */
export const GhostLines = memo(function GhostLines({ drawing, transform }: SectionLinesProps) {
  return (
    <path
      aria-hidden="true"
      d={contourPath(drawing.contour, transform.toX, transform.toY)}
      className="fill-none stroke-graphite"
      strokeWidth={LINE.narrow}
      strokeDasharray={DASH.short}
      data-part="ghost"
    />
  );
});

/** An open path through points in fractions of chord. */
export function pointsPath(points: readonly Point[], transform: SheetTransform): string {
  return (
    line<Point>(
      (point) => transform.toX(point.x),
      (point) => transform.toY(point.y),
    ).digits(2)(points) ?? ''
  );
}
