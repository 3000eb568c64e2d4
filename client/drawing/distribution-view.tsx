import { scaleLinear, scaleSymlog } from 'd3-scale';
import { line } from 'd3-shape';
import { memo, type ReactNode } from 'react';
import { type Point } from '#geometry/point.ts';
import { MM_PER_INCH, type Units } from '#client/app/units.ts';
import { curvatureDistribution, thicknessDistribution } from './distribution.ts';
import { DASH, LINE } from './line-types.ts';
import { type SectionDrawing } from './section-drawing.ts';
import { stationAxisY } from './sheet-grid.tsx';
import { type SheetLayout } from './sheet-layout.ts';
import { type SheetTransform } from './sheet-view.ts';

interface ViewProps {
  readonly layout: SheetLayout;
  readonly transform: SheetTransform;
  readonly drawing: SectionDrawing;
  readonly chordMm: number;
  readonly units: Units;
}

/** The second view: what the section has along the chord, on the same stations as the first view. */
export const DistributionView = memo(function DistributionView({
  view,
  ...props
}: ViewProps & { readonly view: 'thickness' | 'curvature' }) {
  return view === 'thickness' ? <ThicknessView {...props} /> : <CurvatureView {...props} />;
});

/** Room of the plot: top and bottom pixel of the value axis. */
export function plotRange(layout: SheetLayout): { top: number; bottom: number } {
  return { top: layout.distribution.y + (layout.compact ? 18 : 26), bottom: stationAxisY(layout) };
}

function ThicknessView({ layout, transform, drawing, chordMm, units }: ViewProps) {
  const { thickness, camber } = thicknessDistribution(drawing);
  const perUnit = units === 'mm' ? chordMm : chordMm / MM_PER_INCH;
  const { top, bottom } = plotRange(layout);
  const lowest = Math.min(0, ...camber.map(({ y }) => y)) * perUnit;
  const highest = Math.max(0.02, drawing.measures.maxThickness) * perUnit;
  const scale = scaleLinear().domain([lowest, highest]).nice(4).range([bottom, top]);
  const ticks = scale.ticks(layout.compact ? 2 : 4);
  const labelAt = apart(thickness, camber);
  const toY = (y: number) => scale(y * perUnit);
  const curve = { toX: transform.toX, toY, labelAt };
  return (
    <Plot
      layout={layout}
      transform={transform}
      ticks={ticks.map((tick) => ({ y: scale(tick), text: String(tick) }))}
      unit={units === 'mm' ? 'mm' : 'in'}
      zero={scale(0)}
    >
      <Curve {...curve} points={thickness} name="thickness" above />
      <Curve {...curve} points={camber} name="camber" dash={DASH.longDashDot} above />
    </Plot>
  );
}

/** The station, of a few near the middle, where two curves lie furthest apart: their names have room there. */
function apart(one: readonly Point[], other: readonly Point[]): number {
  const distance = (station: number) => {
    const i = one.findIndex(({ x }) => x >= station);
    return Math.abs((one[i]?.y ?? 0) - (other[i]?.y ?? 0));
  };
  return [0.5, 0.62, 0.38, 0.25].reduce((best, next) =>
    distance(next) > distance(best) * 1.4 ? next : best,
  );
}

/** Curvature reads from nose to tail only on a scale that is straight near zero and logarithmic beyond. */
const CURVATURE_TICKS = [-10, -1, 0, 1, 10, 100] as const;

function CurvatureView({ layout, transform, drawing }: ViewProps) {
  const { upper, lower } = curvatureDistribution(drawing);
  const { top, bottom } = plotRange(layout);
  const values = [...upper, ...lower].map(({ y }) => y);
  const scale = scaleSymlog()
    .constant(0.5)
    .domain([Math.min(-1, ...values), Math.max(10, ...values)])
    .range([bottom, top]);
  const [low = 0, high = 0] = scale.domain();
  const ticks = spaced(
    CURVATURE_TICKS.filter((tick) => tick >= low && tick <= high).map((tick) => ({
      y: scale(tick),
      text: String(tick),
    })),
  );
  return (
    <Plot layout={layout} transform={transform} ticks={ticks} unit="1/chord" zero={scale(0)}>
      <Curve points={upper} toX={transform.toX} toY={scale} name="curvature, upper" labelAt={0.5} above />
      <Curve
        points={lower}
        toX={transform.toX}
        toY={scale}
        name="lower"
        labelAt={0.75}
        dash={DASH.short}
        above={false}
        floor={bottom - 3}
      />
    </Plot>
  );
}

const TICK_ROOM = 12;

/** The ticks that have room, from zero outwards. */
function spaced(ticks: readonly Tick[]): Tick[] {
  const shown: Tick[] = [];
  for (const tick of [...ticks].sort((a, b) => Math.abs(Number(a.text)) - Math.abs(Number(b.text)))) {
    if (shown.every(({ y }) => Math.abs(y - tick.y) >= TICK_ROOM)) shown.push(tick);
  }
  return shown;
}

interface Tick {
  readonly y: number;
  readonly text: string;
}

interface PlotProps {
  readonly layout: SheetLayout;
  readonly transform: SheetTransform;
  readonly ticks: readonly Tick[];
  readonly unit: string;
  readonly zero: number;
  readonly children: ReactNode;
}

function Plot({ layout, transform, ticks, unit, zero, children }: PlotProps) {
  const { drawing } = layout;
  const { top } = plotRange(layout);
  const x = Math.max(drawing.x + (layout.compact ? 24 : 40), transform.toX(0));
  const right = Math.min(drawing.x + drawing.width, transform.toX(1));
  return (
    <g aria-hidden="true">
      <path
        d={`M${x} ${top - 8}V${stationAxisY(layout)}`}
        className="stroke-graphite"
        strokeWidth={LINE.hair}
      />
      {right > x && <path d={`M${x} ${zero}H${right}`} className="stroke-graphite" strokeWidth={LINE.hair} />}
      <g className="fill-graphite text-[10px]" textAnchor="end">
        {ticks.map(({ y, text }) => (
          <g key={text}>
            <path d={`M${x - 4} ${y}H${x}`} className="stroke-graphite" strokeWidth={LINE.hair} />
            <text x={x - 7} y={y + 3.5}>
              {text}
            </text>
          </g>
        ))}
        <text x={x - 7} y={top - 12} textAnchor={layout.compact ? 'start' : 'end'}>
          {unit}
        </text>
      </g>
      {children}
    </g>
  );
}

interface CurveProps {
  readonly points: readonly Point[];
  readonly toX: (x: number) => number;
  readonly toY: (y: number) => number;
  readonly name: string;
  /** Station where its name stands. */
  readonly labelAt: number;
  readonly above: boolean;
  /** Names stand no lower than this. */
  readonly floor?: number;
  readonly dash?: string;
}

function Curve({ points, toX, toY, name, labelAt, above, floor = Infinity, dash }: CurveProps) {
  const path = line<Point>(
    (point) => toX(point.x),
    (point) => toY(point.y),
  ).digits(2)(points);
  const label = points.find((point) => point.x >= labelAt);
  return (
    <>
      <path
        d={path ?? ''}
        className="fill-none stroke-ink"
        strokeWidth={1.3}
        strokeDasharray={dash}
        strokeLinejoin="round"
      />
      {label && (
        <text
          x={toX(label.x) + 6}
          y={above ? toY(label.y) - 7 : Math.min(toY(label.y) + 15, floor)}
          paintOrder="stroke"
          strokeWidth={4}
          className="fill-graphite stroke-sheet text-[11px]"
        >
          {name}
        </text>
      )}
    </>
  );
}
