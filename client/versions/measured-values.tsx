import { type Measures } from '#geometry/contour/measures.ts';
import { formatAngle, formatLength, formatPercent, MM_PER_INCH, type Units } from '#client/app/units.ts';
import { FactList } from './fact-list.tsx';

interface MeasuredValuesProps {
  readonly measures: Measures;
  readonly chordMm: number;
  readonly units: Units;
}

/** What rounding leaves of the camber of a symmetrical section, and far below what any machine can cut. */
const NO_CAMBER = 1e-9;

/** Measured on the true contour at the chord shown, not echoed from the values that made it. */
export function MeasuredValues({ measures, chordMm, units }: MeasuredValuesProps) {
  const length = (fraction: number) => formatLength(fraction * chordMm, units);
  const at = (fraction: number, station: number) => `${length(fraction)} at ${formatPercent(station, 1)}`;
  const camber =
    Math.abs(measures.maxCamber) < NO_CAMBER ? 'none' : at(measures.maxCamber, measures.maxCamberPosition);
  return (
    <FactList
      facts={[
        ['Largest thickness', at(measures.maxThickness, measures.maxThicknessPosition)],
        ['Largest camber', camber],
        ['Nose radius', length(measures.noseRadius)],
        ['Edge angle', formatAngle(measures.trailingEdgeAngleDeg)],
        ['Edge gap', length(measures.trailingEdgeGap)],
        ['Area', area(measures.area * chordMm ** 2, units)],
        ['Perimeter', length(measures.perimeter)],
      ]}
    />
  );
}

function area(mm2: number, units: Units): string {
  return units === 'mm' ? `${(mm2 / 100).toFixed(1)} cm²` : `${(mm2 / MM_PER_INCH ** 2).toFixed(2)} in²`;
}
