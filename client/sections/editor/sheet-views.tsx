import { useId } from 'react';
import { type Shape } from '#geometry/shapes/shape.ts';
import { type Units } from '#client/app/units.ts';
import { CurvatureComb } from '#client/drawing/curvature-comb.tsx';
import { DimensionLines, type PlacedSectionDimension } from '#client/drawing/dimension-lines.tsx';
import { DistributionView } from '#client/drawing/distribution-view.tsx';
import { type DimensionId } from '#client/drawing/section-dimensions.ts';
import { drawSection, type SectionDrawing } from '#client/drawing/section-drawing.ts';
import { ChordLine, GhostLines, SectionLines } from '#client/drawing/section-lines.tsx';
import { MillimetreGrid, StationLabels, StationLines } from '#client/drawing/sheet-grid.tsx';
import { type SheetLayout } from '#client/drawing/sheet-layout.ts';
import { type SheetTransform } from '#client/drawing/sheet-view.ts';
import { type SheetSettings } from './sheet-settings.ts';
import { StationMarker } from './station-marker.tsx';

interface SheetViewsProps {
  readonly layout: SheetLayout;
  readonly transform: SheetTransform;
  readonly drawing: SectionDrawing;
  readonly chordMm: number;
  readonly units: Units;
  readonly settings: SheetSettings;
  readonly onSettings: (change: Partial<SheetSettings>) => void;
  readonly ghost: Shape | null;
  readonly gridMm: number | null;
  readonly dimensions: readonly PlacedSectionDimension[];
  readonly live: readonly DimensionId[];
}

/** Both views from back to front; each part is drawn again only when what it shows has changed. */
export function SheetViews(props: SheetViewsProps) {
  const {
    layout,
    transform,
    drawing,
    chordMm,
    units,
    settings,
    onSettings,
    ghost,
    gridMm,
    dimensions,
    live,
  } = props;
  const clip = useId();
  return (
    <>
      <StationLines layout={layout} transform={transform} />
      <clipPath id={clip}>
        <rect {...layout.section} />
      </clipPath>
      <g clipPath={`url(#${clip})`}>
        {gridMm !== null && (
          <MillimetreGrid layout={layout} transform={transform} stepMm={gridMm} chordMm={chordMm} />
        )}
        <SectionLines drawing={drawing} transform={transform} />
        {ghost && <GhostLines drawing={drawSection(ghost)} transform={transform} />}
        <ChordLine transform={transform} />
        {settings.comb && <CurvatureComb drawing={drawing} transform={transform} />}
        <DimensionLines dimensions={dimensions} live={live} />
      </g>
      {settings.secondView !== 'none' && (
        <DistributionView view={settings.secondView} {...{ layout, transform, drawing, chordMm, units }} />
      )}
      <StationLabels layout={layout} transform={transform} />
      {settings.secondView !== 'none' && (
        <StationMarker
          {...{ layout, transform, drawing, chordMm, units }}
          station={settings.station}
          onSettings={onSettings}
        />
      )}
    </>
  );
}
