import { useDrag } from '@use-gesture/react';
import { type KeyboardEvent, memo } from 'react';
import { thicknessAt } from '#geometry/contour/measures.ts';
import { formatLength, formatPercent, type Units } from '#client/app/units.ts';
import { plotRange } from '#client/drawing/distribution-view.tsx';
import { textWidth } from '#client/drawing/line-types.ts';
import { type SectionDrawing } from '#client/drawing/section-drawing.ts';
import { type SheetLayout } from '#client/drawing/sheet-layout.ts';
import { type SheetTransform } from '#client/drawing/sheet-view.ts';
import { isSecondFinger } from './second-finger.ts';
import { type SheetSettings, STATION_LIMITS } from './sheet-settings.ts';

interface StationMarkerProps {
  readonly layout: SheetLayout;
  readonly transform: SheetTransform;
  readonly drawing: SectionDrawing;
  readonly chordMm: number;
  readonly units: Units;
  readonly station: number;
  readonly onSettings: (change: Partial<SheetSettings>) => void;
}

/** The station looked at, such as that of a spar: a line through both views with the thickness there, moved by its mark. */
export const StationMarker = memo(function StationMarker(props: StationMarkerProps) {
  const { layout, transform, drawing, chordMm, units, station, onSettings } = props;
  const bind = useDrag(
    ({
      xy,
      initial,
      memo: from = station,
      event,
    }: {
      xy: [number, number];
      initial: [number, number];
      memo?: number;
      event: Event;
    }) => {
      event.stopPropagation();
      if (isSecondFinger(event)) return from;
      onSettings({ station: held(from + (xy[0] - initial[0]) / (transform.chordPixels * transform.scale)) });
      return from;
    },
    { pointer: { keys: false } },
  );
  const x = transform.toX(station);
  const { top, bottom } = plotRange(layout);
  if (x < layout.drawing.x || x > layout.drawing.x + layout.drawing.width) return null;
  const thickness = formatLength(thicknessAt(drawing.outline, station) * chordMm, units);
  const text = `${formatPercent(station, 1)}: ${thickness}`;
  const width = textWidth(text, 11);
  const beside = x + width + 20 < layout.frame.x + layout.frame.width ? x + 9 : x - 9 - width;
  return (
    <g
      {...bind()}
      role="slider"
      tabIndex={0}
      data-handle="station"
      aria-label="Station looked at"
      aria-valuenow={Number((station * 100).toFixed(1))}
      aria-valuemin={STATION_LIMITS.smallest * 100}
      aria-valuemax={STATION_LIMITS.largest * 100}
      aria-valuetext={`${formatPercent(station, 1)} of chord, thickness there ${thickness}`}
      onKeyDown={(event) => {
        const next = stationByKey(event, station);
        if (next === null) return;
        event.preventDefault();
        onSettings({ station: next });
      }}
      className="group block cursor-ew-resize touch-none outline-none"
    >
      <Mark x={x} top={top} bottom={bottom} below={transform.toY(drawing.measures.extents.minY)} />
      <text x={beside} y={top - 9} fontSize={11} className="fill-spruce font-semibold">
        {text}
      </text>
    </g>
  );
});

/** Its line and the mark to take it by, and a tick below the section at the same station. */
function Mark({ x, top, bottom, below }: { x: number; top: number; bottom: number; below: number }) {
  return (
    <>
      <path d={`M${x} ${top - 10}V${bottom}`} className="stroke-transparent" strokeWidth={24} />
      <path
        d={`M${x} ${top - 10}V${bottom}M${x} ${below + 5}v8`}
        className="stroke-spruce"
        strokeWidth={1.2}
      />
      <path d={`M${x - 5} ${top - 17}H${x + 5}L${x} ${top - 9}Z`} className="fill-spruce" />
      <circle
        cx={x}
        cy={top - 14}
        r={10}
        className="hidden fill-none stroke-ink group-focus-visible:block"
        strokeWidth={2}
      />
    </>
  );
}

function held(station: number): number {
  return Math.min(STATION_LIMITS.largest, Math.max(STATION_LIMITS.smallest, station));
}

/** Arrow keys move by 0.1 % of chord, with Shift by 1 %. */
function stationByKey(event: KeyboardEvent, station: number): number | null {
  if (event.key === 'Home') return STATION_LIMITS.smallest;
  if (event.key === 'End') return STATION_LIMITS.largest;
  const by = { ArrowLeft: -1, ArrowDown: -1, ArrowRight: 1, ArrowUp: 1 }[event.key];
  if (by === undefined) return null;
  return held(Number((station + by * (event.shiftKey ? 0.01 : 0.001)).toFixed(4)));
}
