import { boxOf } from '#geometry/cutting/arrays.ts';
import { type Finding, type Severity } from '#geometry/cutting/findings.ts';
import { type End } from '#geometry/cutting/plan.ts';
import { LINE } from '#client/drawing/line-types.ts';
import { type Place, type ViewId } from './plan-layout.ts';
import { pageAt } from './planform-view.tsx';
import { facesAt, type Scene } from './scene.ts';

/** A place on the sheet that is shown: a point of a view, or a distance along the span. */
export type Highlight =
  | { readonly kind: 'point'; readonly view: 'root' | 'tip'; readonly x: number; readonly y: number }
  | { readonly kind: 'station'; readonly spanMm: number };

/** The places that a finding speaks of, as far as the drawing has them; those of the program are shown by the wire. */
export function highlightsOf({ at, path }: Finding, scene: Scene): readonly Highlight[] {
  const feature = /^features\.(\d+)/.exec(path)?.[1];
  const ends: readonly End[] = at?.end ? [at.end] : endsOf(path);
  const points = ends.flatMap((end) =>
    feature === undefined || at?.station !== undefined
      ? stationPoint(scene, end, at?.station)
      : featurePoint(scene, end, Number(feature)),
  );
  const stations: Highlight[] = at?.spanMm === undefined ? [] : [{ kind: 'station', spanMm: at.spanMm }];
  return [...points, ...stations];
}

/** A path that names an end speaks of it; one that names the panel's inside speaks of both. */
function endsOf(path: string): readonly End[] {
  if (/\b(root|rootStation|rootDepthMm|rootHeightMm)\b/.test(path)) return ['root'];
  if (/\b(tip|tipStation|tipDepthMm|tipHeightMm)\b/.test(path)) return ['tip'];
  return /^(features|allowances|kerfMm|stock)/.test(path) ? ['root', 'tip'] : [];
}

function stationPoint(scene: Scene, end: End, station: number | undefined): Highlight[] {
  const face = facesAt(scene, end)[0];
  if (!face || station === undefined) return [];
  const { nose, trailingEdge } = face;
  return [
    {
      kind: 'point',
      view: end,
      x: nose.x + station * (trailingEdge.x - nose.x),
      y: nose.y + station * (trailingEdge.y - nose.y),
    },
  ];
}

function featurePoint(scene: Scene, end: End, index: number): Highlight[] {
  const feature = facesAt(scene, end)[0]?.features.find((of) => of.index === index);
  if (!feature) return [];
  const { minX, maxX, minY, maxY } = boxOf(feature.outline);
  return [{ kind: 'point', view: end, x: (minX + maxX) / 2, y: (minY + maxY) / 2 }];
}

const COLOURS: Readonly<Record<Severity, string>> = {
  error: 'stroke-brick',
  warning: 'stroke-amber',
  note: 'stroke-ink',
};

interface HighlightMarksProps {
  readonly highlights: readonly Highlight[];
  readonly severity: Severity;
  readonly scene: Scene;
  readonly places: Readonly<Record<ViewId, Place>>;
}

/** Rings and lines at the places of the finding that is selected. */
export function HighlightMarks({ highlights, severity, scene, places }: HighlightMarksProps) {
  const { planform } = places;
  return (
    <g
      className={`fill-none ${COLOURS[severity]}`}
      strokeWidth={LINE.wide}
      data-testid="highlight"
      aria-hidden="true"
    >
      {highlights.map((mark, i) => {
        if (mark.kind === 'point') {
          const place = places[mark.view];
          return <circle key={i} cx={place.toX(mark.x)} cy={place.toY(mark.y)} r={15} />;
        }
        const x = planform.toX(pageAt(scene, mark.spanMm));
        const reach = scene.block?.lengthMm ?? 0;
        return <path key={i} d={`M${x} ${planform.toY(0) - 10}V${planform.toY(-reach) + 10}`} />;
      })}
    </g>
  );
}

/** The middle of the first place, in pixels: where the sheet zooms to. */
export function middleOf(
  highlights: readonly Highlight[],
  scene: Scene,
  places: Readonly<Record<ViewId, Place>>,
): { readonly x: number; readonly y: number } | null {
  const [first] = highlights;
  if (!first) return null;
  if (first.kind === 'point')
    return { x: places[first.view].toX(first.x), y: places[first.view].toY(first.y) };
  const { planform } = places;
  return {
    x: planform.toX(pageAt(scene, first.spanMm)),
    y: planform.toY(-(scene.block?.lengthMm ?? 0) / 2),
  };
}
