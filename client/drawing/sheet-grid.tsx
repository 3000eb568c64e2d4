import { memo } from 'react';
import { MM_PER_INCH, type Units } from '#client/app/units.ts';
import { LINE } from './line-types.ts';
import { type SheetLayout } from './sheet-layout.ts';
import { type SheetTransform } from './sheet-view.ts';

const LEAST_PIXELS = 14;
const MOST_LINES = 400;

/** Stations every 10 % of chord through both views. Their labels stand under the second view. */
export const StationLines = memo(function StationLines({
  layout,
  transform,
}: {
  layout: SheetLayout;
  transform: SheetTransform;
}) {
  const { drawing } = layout;
  const bottom = stationAxisY(layout);
  const path = stations(layout, transform)
    .map(({ x }) => `M${x} ${drawing.y + 1}V${bottom}`)
    .join('');
  return <path aria-hidden="true" d={path} className="fill-none stroke-hair" strokeWidth={1} />;
});

/** Labels of the stations, in per cent of chord; every second one where there is little room. */
export const StationLabels = memo(function StationLabels({
  layout,
  transform,
}: {
  layout: SheetLayout;
  transform: SheetTransform;
}) {
  const y = stationAxisY(layout) + 14;
  const every = transform.chordPixels / 10 < 34 ? 20 : 10;
  const shown = stations(layout, transform).filter(({ percent }) => percent % every === 0);
  const last = shown.find(({ percent }) => percent === 100);
  const named = last !== undefined && last.x + 84 < layout.frame.x + layout.frame.width;
  return (
    <g aria-hidden="true" className="fill-graphite text-[10px]" textAnchor="middle">
      {shown.map(({ x, percent }) => (
        <text key={percent} x={x} y={y}>
          {percent === 100 && !named ? '100 %' : percent}
        </text>
      ))}
      {named && (
        <text x={last.x + 16} y={y} textAnchor="start">
          % chord
        </text>
      )}
    </g>
  );
});

function stations(layout: SheetLayout, transform: SheetTransform): { percent: number; x: number }[] {
  const { drawing } = layout;
  return Array.from({ length: 11 }, (_, i) => ({
    percent: i * 10,
    x: Math.round(transform.toX(i / 10)) + 0.5,
  })).filter(({ x }) => x > drawing.x + 4 && x < drawing.x + drawing.width - 4);
}

/** Where the axis of the second view lies, above the labels of the stations. */
export function stationAxisY(layout: SheetLayout): number {
  const { distribution } = layout;
  return distribution.y + distribution.height - 26;
}

/** The spacing of the grid in mm: 1, 2 or 5 times a power of ten of the unit, at least 14 pixels apart. */
export function gridStepMm(transform: SheetTransform, chordMm: number, units: Units): number {
  const unit = units === 'mm' ? 1 : MM_PER_INCH;
  const pixelsPerUnit = (transform.chordPixels / chordMm) * unit;
  const least = LEAST_PIXELS / pixelsPerUnit;
  const power = 10 ** Math.floor(Math.log10(least));
  const step = [1, 2, 5, 10].find((factor) => factor * power >= least) ?? 10;
  return step * power * unit;
}

interface GridProps {
  readonly layout: SheetLayout;
  readonly transform: SheetTransform;
  readonly stepMm: number;
  readonly chordMm: number;
}

/** A square grid in mm of the workpiece from the nose; across the chord it is stretched as the section is. */
export const MillimetreGrid = memo(function MillimetreGrid({
  layout,
  transform,
  stepMm,
  chordMm,
}: GridProps) {
  const { section } = layout;
  const step = stepMm / chordMm;
  const topLeft = transform.toPoint(section.x, section.y);
  const bottomRight = transform.toPoint(section.x + section.width, section.y + section.height);
  const parts: string[] = [];
  const columns = multiples(topLeft.x, bottomRight.x, step);
  const rows = multiples(bottomRight.y, topLeft.y, step);
  if (columns.length + rows.length > MOST_LINES) return null;
  for (const x of columns)
    parts.push(`M${crisp(transform.toX(x))} ${section.y + 1}V${section.y + section.height}`);
  for (const y of rows)
    parts.push(`M${section.x + 1} ${crisp(transform.toY(y))}H${section.x + section.width - 1}`);
  return (
    <path aria-hidden="true" d={parts.join('')} className="fill-none stroke-hair" strokeWidth={LINE.hair} />
  );
});

function multiples(from: number, to: number, step: number): number[] {
  const first = Math.ceil(from / step);
  const count = Math.max(0, Math.floor(to / step) - first + 1);
  return Array.from({ length: Math.min(count, MOST_LINES + 1) }, (_, i) => (first + i) * step);
}

function crisp(pixel: number): number {
  return Math.round(pixel) + 0.5;
}
