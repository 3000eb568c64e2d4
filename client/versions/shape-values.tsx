import { type CstShape } from '#geometry/shapes/cst.ts';
import { type Naca4Shape } from '#geometry/shapes/naca4.ts';
import { type Shape } from '#geometry/shapes/shape.ts';
import { formatLength, formatPercent, type Units } from '#client/app/units.ts';
import { FactList } from './fact-list.tsx';

interface ShapeValuesProps {
  readonly shape: Shape;
  readonly chordMm: number;
  readonly units: Units;
}

/** The values that make the shape, as they were saved. */
export function ShapeValues({ shape, chordMm, units }: ShapeValuesProps) {
  if (shape.kind === 'naca4') return <FourDigitValues shape={shape} />;
  const gap = shape.trailingEdgeGap;
  return (
    <>
      <WeightTable shape={shape} />
      <FactList
        facts={[
          ['Class exponents', `${shape.n1.toFixed(2)}, ${shape.n2.toFixed(2)}`],
          ['Trailing-edge gap', `${formatPercent(gap)}, ${formatLength(gap * chordMm, units)}`],
        ]}
      />
    </>
  );
}

function FourDigitValues({ shape }: { readonly shape: Naca4Shape }) {
  return (
    <FactList
      facts={[
        ['Camber', formatPercent(shape.maxCamber)],
        ['Camber position', shape.maxCamber > 0 ? formatPercent(shape.maxCamberPosition, 1) : '–'],
        ['Thickness', formatPercent(shape.maxThickness)],
        ['Trailing edge', shape.trailingEdge],
      ]}
    />
  );
}

function WeightTable({ shape }: { readonly shape: CstShape }) {
  const rows = Math.max(shape.upper.length, shape.lower.length);
  return (
    <table className="mb-2 w-full text-xs">
      <caption className="sr-only">Weights of the shape function by surface</caption>
      <thead className="text-graphite">
        <tr>
          <th scope="col" className="text-left font-normal">
            Weight
          </th>
          <th scope="col" className="text-right font-normal">
            upper
          </th>
          <th scope="col" className="text-right font-normal">
            lower
          </th>
        </tr>
      </thead>
      <tbody>
        {Array.from({ length: rows }, (_, index) => (
          <tr key={index}>
            <th scope="row" className="text-left font-normal text-graphite">
              {index}
            </th>
            <td className="text-right font-semibold">{weight(shape.upper[index])}</td>
            <td className="text-right font-semibold">{weight(shape.lower[index])}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function weight(value: number | undefined): string {
  return value === undefined ? '' : value.toFixed(4);
}
