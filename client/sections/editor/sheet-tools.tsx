import { memo, type ReactNode, useRef, useState } from 'react';
import { useMedia } from '#client/app/media.ts';
import { EXAGGERATIONS, type Exaggeration } from '#client/drawing/sheet-view.ts';
import { Button, buttonClass } from '#client/ui/button.tsx';
import { useLeaving } from '#client/ui/menu.tsx';
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

/** How the sheet is shown: one thin row above it; on a narrow screen most of it waits behind a button. */
export const SheetTools = memo(function SheetTools(props: SheetToolsProps) {
  const { settings, onSettings, zoomPercent, onZoom, onFit } = props;
  const wide = useMedia('(min-width: 40rem)');
  const choices = <Choices settings={settings} onSettings={onSettings} />;
  return (
    <div
      role="toolbar"
      aria-label="Sheet"
      className="relative flex items-center gap-x-4 gap-y-1.5 sm:flex-wrap md:gap-x-3 xl:gap-x-4 print:hidden"
    >
      {wide ? choices : <Drawer>{choices}</Drawer>}
      <ZoomTools zoomPercent={zoomPercent} onZoom={onZoom} onFit={onFit} />
    </div>
  );
});

/** A button that lays what it holds over the sheet, so that the sheet keeps its place. */
function Drawer({ children }: { children: ReactNode }) {
  const [open, setOpen] = useState(false);
  const drawer = useRef<HTMLDivElement>(null);
  const button = useRef<HTMLButtonElement>(null);
  useLeaving(open, [drawer], () => setOpen(false));
  return (
    <div
      ref={drawer}
      onKeyDown={(event) => {
        if (event.key !== 'Escape' || !open) return;
        event.stopPropagation();
        setOpen(false);
        button.current?.focus();
      }}
    >
      <button
        ref={button}
        type="button"
        aria-expanded={open}
        onClick={() => setOpen(!open)}
        className={`${buttonClass('plain', 'small')} aria-expanded:border-ink aria-expanded:bg-ink aria-expanded:text-sheet pointer-coarse:h-11`}
      >
        Sheet shows…
      </button>
      {open && (
        <div className="absolute inset-x-0 top-full z-20 mt-1 flex flex-col gap-3 rounded border border-edge bg-sheet p-3 shadow-[0_2px_8px_rgb(0_0_0/0.18)]">
          {children}
        </div>
      )}
    </div>
  );
}

function Choices({ settings, onSettings }: Pick<SheetToolsProps, 'settings' | 'onSettings'>) {
  return (
    <>
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
    </>
  );
}

function Labelled({ label, children }: { label: string; children: ReactNode }) {
  return (
    <div className="flex items-center gap-2 max-sm:flex-col max-sm:items-start max-sm:gap-1">
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
      <output className="w-14 text-center text-xs text-graphite md:max-lg:hidden">{`${zoomPercent} %`}</output>
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
