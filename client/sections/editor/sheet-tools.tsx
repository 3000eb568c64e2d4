import { memo, type ReactNode } from 'react';
import { EXAGGERATIONS, type Exaggeration } from '#client/drawing/sheet-view.ts';
import { Button } from '#client/ui/button.tsx';
import { SegmentedControl } from '#client/ui/segmented-control.tsx';
import { ToggleButton } from '#client/ui/toggle-button.tsx';
import { type SheetSettings } from './sheet-settings.ts';
import { ZOOM_STEP } from './use-sheet-view.ts';

interface SheetToolsProps {
  readonly settings: SheetSettings;
  readonly onSettings: (change: Partial<SheetSettings>) => void;
  /** Zoom in per cent of the fitted sheet. */
  readonly zoomPercent: number;
  readonly onZoom: (factor: number) => void;
  readonly onFit: () => void;
}

/** How the sheet is shown: a thin row above it. */
export const SheetTools = memo(function SheetTools(props: SheetToolsProps) {
  const { settings, onSettings, zoomPercent, onZoom, onFit } = props;
  return (
    <div
      role="toolbar"
      aria-label="Sheet"
      className="flex flex-wrap items-center gap-x-4 gap-y-1.5 print:hidden"
    >
      <Labelled label="Thickness">
        <SegmentedControl
          label="Thickness shown"
          hideLabel
          value={String(settings.exaggeration)}
          segments={EXAGGERATIONS.map((factor) => ({ value: String(factor), label: `${factor}×` }))}
          onChange={(value) => {
            onSettings({ exaggeration: Number(value) as Exaggeration });
          }}
          className="w-33"
        />
      </Labelled>
      <Labelled label="Below">
        <SegmentedControl
          label="View below the section"
          hideLabel
          value={settings.secondView}
          segments={[
            { value: 'thickness', label: 'Thickness' },
            { value: 'curvature', label: 'Curvature' },
            { value: 'none', label: 'None' },
          ]}
          onChange={(secondView) => {
            onSettings({ secondView });
          }}
          className="w-66"
        />
      </Labelled>
      <Toggles settings={settings} onSettings={onSettings} />
      <ZoomTools zoomPercent={zoomPercent} onZoom={onZoom} onFit={onFit} />
    </div>
  );
});

function Labelled({ label, children }: { label: string; children: ReactNode }) {
  return (
    <div className="flex items-center gap-2">
      <span aria-hidden="true" className="text-xs text-graphite">
        {label}
      </span>
      {children}
    </div>
  );
}

function Toggles({ settings, onSettings }: Pick<SheetToolsProps, 'settings' | 'onSettings'>) {
  return (
    <div className="flex gap-1.5">
      <ToggleButton
        size="small"
        pressed={settings.grid}
        onPressedChange={(grid) => onSettings({ grid })}
        className="pointer-coarse:h-11"
      >
        Grid
      </ToggleButton>
      <ToggleButton
        size="small"
        pressed={settings.comb}
        onPressedChange={(comb) => onSettings({ comb })}
        className="pointer-coarse:h-11"
      >
        Comb
      </ToggleButton>
    </div>
  );
}

function ZoomTools({
  zoomPercent,
  onZoom,
  onFit,
}: Pick<SheetToolsProps, 'zoomPercent' | 'onZoom' | 'onFit'>) {
  return (
    <div className="ml-auto flex items-center gap-1">
      <Button
        size="small"
        aria-label="Zoom out"
        onClick={() => onZoom(1 / ZOOM_STEP)}
        className="w-7 pointer-coarse:size-11"
      >
        −
      </Button>
      <output className="w-14 text-center text-xs text-graphite">{`${zoomPercent} %`}</output>
      <Button
        size="small"
        aria-label="Zoom in"
        onClick={() => onZoom(ZOOM_STEP)}
        className="w-7 pointer-coarse:size-11"
      >
        +
      </Button>
      <Button size="small" onClick={onFit} className="pointer-coarse:h-11">
        Fit
      </Button>
    </div>
  );
}
