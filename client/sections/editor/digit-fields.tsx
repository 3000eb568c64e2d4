import { memo, useId } from 'react';
import { designationOf, type Naca4Shape, parseDesignation } from '#geometry/shapes/naca4.ts';
import { type Units } from '#client/app/units.ts';
import { CheckboxField } from '#client/ui/checkbox-field.tsx';
import { SegmentedControl } from '#client/ui/segmented-control.tsx';
import { FieldError } from '#client/ui/field.tsx';
import { type EditorAction } from './editor-state.ts';
import { fieldRange } from './fields.ts';
import { handlePoint } from './handle-points.ts';
import { valueFieldClass } from './number-field.tsx';
import { type ReadText, useTypedText } from './use-typed-text.ts';
import { type SheetSettings } from './sheet-settings.ts';
import { ValueField } from './value-field.tsx';

interface DigitFieldsProps {
  readonly shape: Naca4Shape;
  readonly chordMm: number;
  readonly units: Units;
  readonly dispatch: (action: EditorAction) => void;
  /** Handles are held to whole digits. */
  readonly snap: boolean;
  readonly onSettings: (change: Partial<SheetSettings>) => void;
}

/** The values of a 4-digit section. */
export function DigitFields({ shape, chordMm, units, dispatch, snap, onSettings }: DigitFieldsProps) {
  const common = { chordMm, units, dispatch, kind: 'fraction' as const };
  const position = shape.maxCamber > 0 ? shape.maxCamberPosition : (handlePoint(shape, 'camber')?.x ?? 0.4);
  return (
    <>
      <DesignationField shape={shape} dispatch={dispatch} />
      <ValueField
        {...common}
        field="maxCamber"
        label="Camber"
        value={shape.maxCamber}
        decimals={2}
        {...fieldRange(shape, 'maxCamber')}
      />
      <ValueField
        {...common}
        field="maxCamberPosition"
        label="Camber position"
        value={position}
        decimals={1}
        {...fieldRange(shape, 'maxCamberPosition')}
      />
      <ValueField
        {...common}
        field="maxThickness"
        label="Thickness"
        value={shape.maxThickness}
        decimals={2}
        {...fieldRange(shape, 'maxThickness')}
      />
      <EdgeField trailingEdge={shape.trailingEdge} dispatch={dispatch} />
      <SnapField snap={snap} onSettings={onSettings} />
    </>
  );
}

interface EdgeFieldProps {
  readonly trailingEdge: Naca4Shape['trailingEdge'];
  readonly dispatch: DigitFieldsProps['dispatch'];
}

const EdgeField = memo(function EdgeField({ trailingEdge, dispatch }: EdgeFieldProps) {
  return (
    <div className="grid grid-cols-[minmax(0,1fr)_13rem] items-center gap-x-2">
      <span aria-hidden="true">Trailing edge</span>
      <SegmentedControl
        label="Trailing edge"
        hideLabel
        value={trailingEdge}
        segments={[
          { value: 'open', label: 'open' },
          { value: 'closed', label: 'closed' },
        ]}
        onChange={(trailingEdge) => {
          dispatch({ type: 'edge', trailingEdge });
        }}
      />
    </div>
  );
});

const SnapField = memo(function SnapField({
  snap,
  onSettings,
}: Pick<DigitFieldsProps, 'snap' | 'onSettings'>) {
  return (
    <CheckboxField
      label="Hold handles to whole digits"
      checked={snap}
      onChange={(event) => {
        onSettings({ snap: event.target.checked });
      }}
    />
  );
});

function DesignationField({
  shape,
  dispatch,
}: {
  shape: Naca4Shape;
  dispatch: DigitFieldsProps['dispatch'];
}) {
  const id = useId();
  const { text, error, handlers } = useTypedText(designationOf(shape) ?? '', readDesignation, (digits) => {
    if (digits) dispatch({ type: 'set-shape', shape: { ...shape, ...digits } });
  });
  return (
    <div>
      <div className="grid grid-cols-[minmax(0,1fr)_13rem] items-center gap-x-2">
        <label htmlFor={id}>Designation</label>
        <input
          {...handlers}
          id={id}
          type="text"
          autoComplete="off"
          spellCheck={false}
          placeholder="not whole digits"
          value={text}
          aria-invalid={error !== undefined}
          aria-describedby={error === undefined ? undefined : `${id}-error`}
          className={`${valueFieldClass} placeholder:font-normal`}
        />
      </div>
      <FieldError id={id} error={error} />
    </div>
  );
}

/** Nothing typed leaves the section as it is. */
function readDesignation(text: string): ReadText<ReturnType<typeof parseDesignation>> {
  if (text.trim() === '') return { value: null };
  const digits = parseDesignation(text);
  return digits ? { value: digits } : { error: 'Type four digits, such as 2412 or 0012.' };
}
