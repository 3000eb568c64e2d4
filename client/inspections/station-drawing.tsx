import { type InspectionRow } from '#geometry/cutting/inspection.ts';
import { extents } from '#geometry/contour/contour.ts';
import { sampleCosine } from '#geometry/contour/sampling.ts';
import { outlineOf } from '#geometry/shapes/shape.ts';
import { type SheetVersion } from '#server/contracts/cut-sheets.ts';
import { contourPath } from '#client/drawing/paths.ts';
import { type Judged } from './reading.ts';

interface StationDrawingProps {
  readonly version: SheetVersion;
  readonly rows: readonly InspectionRow[];
  readonly judged: readonly Judged[];
}

const WIDTH = 600;
const MARGIN = 12;
const SCALE = WIDTH - 2 * MARGIN;

/** Root and tip with the stations to measure; each takes the mark of its reading. */
export function StationDrawing({ version, rows, judged }: StationDrawingProps) {
  return (
    <div className="grid gap-4 md:grid-cols-2">
      {(['root', 'tip'] as const).map((end) => (
        <figure key={end} className="min-w-0 border border-rule bg-sheet p-2">
          <EndDrawing
            shape={version.pinned.panel[end].shape}
            marks={rows.flatMap((row, i) =>
              row.end === end ? [{ station: row.station, state: judged[i]?.state ?? 'empty' }] : [],
            )}
          />
          <figcaption className="text-sm text-graphite">
            {end}, chord {version.pinned.panel[end].chordMm} mm
          </figcaption>
        </figure>
      ))}
    </div>
  );
}

interface EndDrawingProps {
  readonly shape: SheetVersion['pinned']['panel']['root']['shape'];
  readonly marks: readonly { readonly station: number; readonly state: Judged['state'] }[];
}

function EndDrawing({ shape, marks }: EndDrawingProps) {
  const contour = sampleCosine(outlineOf(shape), 60);
  const { minY, maxY } = extents(contour);
  const above = maxY * SCALE + MARGIN + 14;
  const height = above - minY * SCALE + MARGIN;
  const toX = (x: number) => MARGIN + x * SCALE;
  return (
    <svg viewBox={`0 0 ${String(WIDTH)} ${String(height)}`} className="w-full" aria-hidden="true">
      <path
        d={contourPath(contour, toX, (y) => above - y * SCALE)}
        className="fill-foam stroke-ink"
        strokeWidth={1.5}
        strokeLinejoin="round"
      />
      {marks.map(({ station, state }) => (
        <g key={station} className={STROKES[state]}>
          <path
            d={`M${String(toX(station))} ${String(16)}V${String(height - 4)}`}
            strokeWidth={state === 'out' ? 2.5 : 1.2}
            strokeDasharray={state === 'empty' ? '4 3' : undefined}
          />
          <text x={toX(station)} y={12} textAnchor="middle" className="fill-current stroke-none text-[13px]">
            {GLYPHS[state]}
            {Math.round(station * 100)} %
          </text>
        </g>
      ))}
    </svg>
  );
}

const STROKES: Readonly<Record<Judged['state'], string>> = {
  empty: 'stroke-graphite text-graphite',
  unreadable: 'stroke-brick text-brick',
  within: 'stroke-spruce text-spruce',
  out: 'stroke-brick text-brick font-semibold',
};
const GLYPHS: Readonly<Record<Judged['state'], string>> = {
  empty: '',
  unreadable: '? ',
  within: '',
  out: '× ',
};
