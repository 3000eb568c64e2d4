import { memo, type ReactNode, useState } from 'react';
import { LENGTH_LIMITS } from '#geometry/formats/options.ts';
import { CST_LIMITS } from '#geometry/shapes/cst.ts';
import { describeShape, type ShapeKind } from '#geometry/shapes/shape.ts';
import { useUnits } from '#client/app/units.ts';
import { drawSection } from '#client/drawing/section-drawing.ts';
import { SegmentedControl } from '#client/ui/segmented-control.tsx';
import { SelectField } from '#client/ui/select-field.tsx';
import { DigitFields } from './digit-fields.tsx';
import { type EditorAction } from './editor-state.ts';
import { FreeFormFields } from './free-form-fields.tsx';
import { MeasuredValues } from './measured-values.tsx';
import { useLiveState } from './live-state.ts';
import { type SheetSettings } from './sheet-settings.ts';
import { ValueField } from './value-field.tsx';

interface SideColumnProps {
  readonly settings: SheetSettings;
  readonly onSettings: (change: Partial<SheetSettings>) => void;
  readonly enabled: boolean;
  readonly dispatch: (action: EditorAction) => void;
}

/** The values of the section beside the sheet: the same as on it, as ordinary labelled fields, and what it measures. */
export const SideColumn = memo(function SideColumn(props: SideColumnProps) {
  const { settings, onSettings, enabled, dispatch } = props;
  const { present } = useLiveState();
  const { shape, chordMm } = present;
  const units = useUnits();
  return (
    <>
      <Part title="Shape">
        {enabled ? (
          <KindSwitch kind={shape.kind} dispatch={dispatch} />
        ) : (
          <p className="font-semibold">{describeShape(shape)}</p>
        )}
        <ValueField
          field="chordMm"
          label="Chord"
          kind="length"
          value={chordMm}
          chordMm={chordMm}
          units={units}
          decimals={1}
          {...LENGTH_LIMITS.chordMm}
          dispatch={dispatch}
        />
        {enabled && shape.kind === 'naca4' && (
          <DigitFields
            {...{ shape, chordMm, units, dispatch }}
            snap={settings.snap}
            onSettings={onSettings}
          />
        )}
        {enabled && shape.kind === 'cst' && (
          <FreeFormFields
            shape={shape}
            equalNose={present.equalNose}
            chordMm={chordMm}
            units={units}
            dispatch={dispatch}
          />
        )}
      </Part>
      <Part title="Measured on the contour">
        <MeasuredValues
          drawing={drawSection(shape)}
          chordMm={chordMm}
          units={units}
          station={settings.station}
        />
      </Part>
    </>
  );
});

function Part({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section className="flex flex-col gap-1.5">
      <h2 className="mb-1 border-b border-rule pb-1 text-xs font-semibold tracking-wide text-graphite uppercase">
        {title}
      </h2>
      {children}
    </section>
  );
}

const ORDERS = Array.from({ length: CST_LIMITS.order.max - CST_LIMITS.order.min + 1 }, (_, i) =>
  String(CST_LIMITS.order.min + i),
);
/** Reproduces 4-digit sections to a few ten-thousandths of chord. */
const FIRST_ORDER = '8';

interface KindSwitchProps {
  readonly kind: ShapeKind;
  readonly dispatch: SideColumnProps['dispatch'];
}

const KindSwitch = memo(function KindSwitch({ kind, dispatch }: KindSwitchProps) {
  const [order, setOrder] = useState(FIRST_ORDER);
  return (
    <div className="mb-1 flex items-end gap-2">
      <SegmentedControl
        label="Kind of shape"
        hideLabel
        value={kind}
        segments={[
          { value: 'naca4', label: '4-digit' },
          { value: 'cst', label: 'Free form' },
        ]}
        onChange={(value) => {
          dispatch(value === 'cst' ? { type: 'to-free-form', order: Number(order) } : { type: 'to-digits' });
        }}
        className="flex-1"
      />
      {kind === 'naca4' && (
        <SelectField
          label="Order of the free form"
          hideLabel
          value={order}
          options={ORDERS.map((value) => ({ value, label: `order ${value}` }))}
          onChange={(event) => {
            setOrder(event.target.value);
          }}
          className="w-28"
        />
      )}
    </div>
  );
});
