import { Fragment, memo } from 'react';
import { type Measures, thicknessAt } from '#geometry/contour/measures.ts';
import {
  formatAngle,
  formatLength,
  formatNumber,
  formatPercent,
  MM_PER_INCH,
  type Units,
} from '#client/app/units.ts';
import { type SectionDrawing } from '#client/drawing/section-drawing.ts';

interface MeasuredValuesProps {
  readonly drawing: SectionDrawing;
  readonly chordMm: number;
  readonly units: Units;
  readonly station: number;
}

type Row = readonly [name: string, value: string];

/** What the true contour measures at the chord in use; the values keep their places while they change. */
export const MeasuredValues = memo(function MeasuredValues({
  drawing,
  chordMm,
  units,
  station,
}: MeasuredValuesProps) {
  const { measures, outline } = drawing;
  const length = (fraction: number, decimals = 2) => formatLength(fraction * chordMm, units, decimals);
  const at = (fraction: number, position: number) => `${length(fraction)} at ${formatPercent(position, 1)}`;
  return (
    <>
      <Rows
        rows={[
          ['Largest thickness', at(measures.maxThickness, measures.maxThicknessPosition)],
          [
            'Largest camber',
            Math.abs(measures.maxCamber) < 5e-7 ? 'none' : at(measures.maxCamber, measures.maxCamberPosition),
          ],
          ['Nose radius', noseRadii(length(measures.noseRadiusUpper), length(measures.noseRadiusLower))],
          ['Edge angle', formatAngle(measures.trailingEdgeAngleDeg)],
          ['Edge gap', length(measures.trailingEdgeGap)],
          ['Area', area(measures.area * chordMm ** 2, units)],
          ['Perimeter', length(measures.perimeter, 1)],
          [`Thickness at ${formatPercent(station, 1)}`, length(thicknessAt(outline, station))],
        ]}
      />
      <details className="mt-1">
        <summary className="py-1 text-graphite">Second moments and smallest radii</summary>
        <Rows rows={furtherRows(measures, chordMm, units)} />
      </details>
    </>
  );
});

/** One radius, or both where the surfaces leave the nose with different ones. */
function noseRadii(upper: string, lower: string): string {
  return upper === lower ? upper : `${upper.split(' ')[0] ?? ''} above, ${lower} below`;
}

function furtherRows(measures: Measures, chordMm: number, units: Units): Row[] {
  const length = (fraction: number) => formatLength(fraction * chordMm, units);
  const moment = (value: number) => fourthPower(value * chordMm ** 4, units);
  const { centroid, smallestConvexRadius: convex, smallestConcaveRadius: hollow } = measures;
  return [
    ['Centroid from nose', `${length(centroid.x)}, ${length(centroid.y)}`],
    ['Ixx, about centroid', moment(measures.ixx)],
    ['Iyy, about centroid', moment(measures.iyy)],
    ['Ixy, about centroid', moment(measures.ixy)],
    ['Smallest radius', `${length(convex.radius)} at ${formatPercent(convex.at.x, 1)}`],
    [
      'Smallest hollow radius',
      hollow ? `${length(hollow.radius)} at ${formatPercent(hollow.at.x, 1)}` : 'no hollow',
    ],
  ];
}

function Rows({ rows }: { rows: readonly Row[] }) {
  return (
    <dl className="grid grid-cols-[minmax(0,1fr)_auto] gap-x-3 gap-y-1">
      {rows.map(([name, value]) => (
        <Fragment key={name.startsWith('Thickness at') ? 'station' : name}>
          <dt>{name}</dt>
          <dd className="text-right font-semibold whitespace-nowrap">{value}</dd>
        </Fragment>
      ))}
    </dl>
  );
}

function area(mm2: number, units: Units): string {
  return units === 'mm'
    ? `${formatNumber(mm2 / 100, 2)} cm²`
    : `${formatNumber(mm2 / MM_PER_INCH ** 2, 3)} in²`;
}

function fourthPower(mm4: number, units: Units): string {
  return units === 'mm'
    ? `${formatNumber(mm4 / 1e4, 3)} cm⁴`
    : `${formatNumber(mm4 / MM_PER_INCH ** 4, 4)} in⁴`;
}
