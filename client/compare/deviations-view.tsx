import { scaleLinear } from 'd3-scale';
import { line } from 'd3-shape';
import { useId } from 'react';
import { type ContourDeviation } from '#geometry/contour/deviation.ts';
import { MM_PER_INCH, type Units } from '#client/app/units.ts';
import { LINE } from '#client/drawing/line-types.ts';
import { type Compared } from './comparison.ts';
import { dashOf, spread } from './line-look.ts';
import { type SheetPlan } from './sheet-plan.ts';
import { Tag, tagRadius } from './tag.tsx';

interface ViewProps {
  readonly plan: SheetPlan;
  readonly compared: readonly Compared[];
  readonly chordMm: number;
  readonly units: Units;
}

/** The second view: the deviations of each surface from the reference, on the same stations as the outlines. */
export function DeviationsView(props: ViewProps) {
  return props.plan.bands.map((band) => <BandView key={band.surface} {...props} band={band} />);
}

function BandView({
  plan,
  compared,
  chordMm,
  units,
  band,
}: ViewProps & { readonly band: SheetPlan['bands'][number] }) {
  const clip = useId();
  const { transform, layout, magnification } = plan;
  const middle = (band.top + band.bottom) / 2;
  const perUnit = (transform.chordPixels * magnification) / chordMm;
  const pixels = units === 'mm' ? perUnit : perUnit * MM_PER_INCH;
  const reach = (band.bottom - band.top) / 2 / pixels;
  const scale = scaleLinear().domain([-reach, reach]).range([band.bottom, band.top]);
  const toY = ({ deviation }: ContourDeviation) => middle - deviation * transform.chordPixels * magnification;
  const [left, right] = [transform.toX(0), transform.toX(1)];
  const path = line<ContourDeviation>(({ at }) => transform.toX(at.x), toY).digits(2);
  const curves = compared.flatMap(({ tag, deviation }) => {
    const places = deviation?.places.filter((place) => place.surface === band.surface || place.station === 0);
    return places ? [{ tag, places }] : [];
  });
  return (
    <g>
      <clipPath id={clip}>
        <rect x={layout.frame.x} y={band.top} width={layout.frame.width} height={band.bottom - band.top} />
      </clipPath>
      <Axis scale={scale} left={left} right={right} compact={layout.compact} edge={layout.frame.x} />
      <text
        x={layout.frame.x + (layout.compact ? 4 : 10)}
        y={band.top - 5}
        fontSize={10}
        className="fill-graphite stroke-sheet [paint-order:stroke]"
        strokeWidth={4}
      >
        {`Deviation, ${band.surface} surface, ${units === 'mm' ? 'mm' : 'in'}`}
      </text>
      <g clipPath={`url(#${clip})`}>
        {curves.map(({ tag, places }) => (
          <path
            key={tag}
            d={path(places) ?? ''}
            className="fill-none stroke-ink"
            strokeWidth={LINE.narrow * 1.25}
            strokeDasharray={dashOf(tag)}
          />
        ))}
      </g>
      <EndTags
        ends={curves.map(({ tag, places }) => {
          const end = places[band.surface === 'upper' ? 0 : places.length - 1];
          return { tag, x: end ? transform.toX(end.at.x) : right, y: end ? toY(end) : middle };
        })}
        small={layout.compact}
        x={right + (layout.compact ? 13 : 24)}
        band={band}
      />
    </g>
  );
}

interface AxisProps {
  readonly scale: ReturnType<typeof scaleLinear<number, number>>;
  readonly left: number;
  readonly right: number;
  readonly compact: boolean;
  /** Left edge of the frame. */
  readonly edge: number;
}

function Axis({ scale, left, right, compact, edge }: AxisProps) {
  return scale.ticks(3).map((tick) => (
    <g key={tick}>
      <path
        d={`M${left} ${scale(tick)}H${right}`}
        className={tick === 0 ? 'stroke-ink' : 'stroke-rule'}
        strokeWidth={tick === 0 ? LINE.narrow : LINE.hair}
      />
      <text
        x={compact ? edge + 2 : left - 8}
        y={scale(tick) + 3}
        fontSize={compact ? 8 : 10}
        textAnchor={compact ? 'start' : 'end'}
        className="fill-graphite"
      >
        {tick > 0 ? `+${tick}` : tick}
      </text>
    </g>
  ));
}

interface End {
  readonly tag: number;
  readonly x: number;
  readonly y: number;
}

/** The tags at the trailing-edge ends of the curves, moved apart where they would lie on each other. */
function EndTags({
  ends,
  small,
  x,
  band,
}: {
  readonly ends: readonly End[];
  readonly small: boolean;
  readonly x: number;
  readonly band: { readonly top: number; readonly bottom: number };
}) {
  const within = (y: number) => Math.min(band.bottom, Math.max(band.top, y));
  const places = spread(
    ends.map(({ y }) => within(y)),
    2 * tagRadius(small) + 1,
    band.top - 8,
    band.bottom + 8,
  );
  return ends.map((end, index) => {
    const y = places[index] ?? end.y;
    return (
      <g key={end.tag}>
        <path
          d={`M${end.x} ${within(end.y)}L${x} ${y}`}
          className="stroke-graphite"
          strokeWidth={LINE.hair}
        />
        <Tag x={x} y={y} tag={end.tag} small={small} />
      </g>
    );
  });
}
