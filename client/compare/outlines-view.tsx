import { line } from 'd3-shape';
import { type Point } from '#geometry/point.ts';
import { LINE, textWidth } from '#client/drawing/line-types.ts';
import { type Compared } from './comparison.ts';
import { dashOf } from './line-look.ts';
import { legendLine, type SheetPlan, tagLift } from './sheet-plan.ts';
import { Tag } from './tag.tsx';
import { nameOf } from './words.ts';

interface ViewProps {
  readonly plan: SheetPlan;
  readonly compared: readonly Compared[];
}

/** The first view: the outlines on each other, the reference filled, each with a tag that touches its line. */
export function OutlinesView({ plan, compared }: ViewProps) {
  const { toX, toY } = plan.transform;
  const path = line<Point>(
    ({ x }) => toX(x),
    ({ y }) => toY(y),
  ).digits(2);
  return (
    <>
      {compared.map(({ tag, points, deviation }) => (
        <path
          key={tag}
          d={`${path(points) ?? ''}Z`}
          className={deviation ? 'fill-none stroke-ink' : 'fill-foam stroke-ink'}
          strokeWidth={deviation ? LINE.narrow * 1.25 : LINE.wide}
          strokeDasharray={deviation ? dashOf(tag) : undefined}
          strokeLinejoin="round"
        />
      ))}
      {compared.map((one, index) => (
        <Leader key={one.tag} plan={plan} one={one} place={(index + 1) / (compared.length + 1)} />
      ))}
    </>
  );
}

/** A leader from the upper surface to the tag above it; a dot says which line it belongs to. */
function Leader({ plan, one, place }: { plan: SheetPlan; one: Compared; place: number }) {
  const { compact } = plan.layout;
  const { toX, toY } = plan.transform;
  const lift = tagLift(compact);
  const upper = one.points.slice(0, Math.ceil(one.points.length / 2));
  const station = 0.25 + 0.6 * place;
  const at = upper.reduce(
    (best, point) => (Math.abs(point.x - station) < Math.abs(best.x - station) ? point : best),
    upper[0] ?? { x: 0, y: 0 },
  );
  const [x, y] = [toX(at.x), toY(at.y)];
  return (
    <g>
      <path d={`M${x} ${y}V${y - lift}`} className="fill-none stroke-graphite" strokeWidth={LINE.hair} />
      <circle cx={x} cy={y} r={2} className="fill-ink" />
      <Tag x={x} y={y - lift} tag={one.tag} small={compact} />
    </g>
  );
}

const SAMPLE = 34;
const SIZE = 10;

/** Which line is which: number, line and name, in two columns at the top of the sheet. */
export function Legend({ plan, compared }: ViewProps) {
  const { frame, compact } = plan.layout;
  const width = (frame.width - 20) / 2;
  const rows = Math.ceil(compared.length / 2);
  const lineHeight = legendLine(compact);
  return (
    <g>
      {compared.map((one, index) => {
        const x = frame.x + 10 + Math.floor(index / rows) * width;
        const y = frame.y + 15 + (index % rows) * lineHeight;
        const name = `${nameOf(one)}, ${one.version.status}${one.deviation ? '' : ': reference'}`;
        const room = width - SAMPLE - 26;
        const whole = textWidth(name, SIZE) <= room;
        const text = whole
          ? name
          : `${[...name].slice(0, Math.floor(room / textWidth('0', SIZE)) - 1).join('')}…`;
        return (
          <g key={one.tag}>
            <text x={x} y={y} fontSize={SIZE} className="fill-ink font-semibold">
              {one.tag}
            </text>
            <path
              d={`M${x + 12} ${y - 3.5}h${SAMPLE}`}
              className="stroke-ink"
              strokeWidth={one.deviation ? LINE.narrow * 1.25 : LINE.wide}
              strokeDasharray={one.deviation ? dashOf(one.tag) : undefined}
            />
            <text x={x + SAMPLE + 20} y={y} fontSize={SIZE} className="fill-ink">
              {text}
              {!whole && <title>{name}</title>}
            </text>
          </g>
        );
      })}
    </g>
  );
}
