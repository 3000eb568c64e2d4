import { memo, useCallback } from 'react';
import {
  boatTailAngleDegOf,
  CST_LIMITS,
  type CstShape,
  noseRadiusOf,
  type Surface,
} from '#geometry/shapes/cst.ts';
import { type Units } from '#client/app/units.ts';
import { scaleOf } from '#client/drawing/section-points.ts';
import { Button } from '#client/ui/button.tsx';
import { CheckboxField } from '#client/ui/checkbox-field.tsx';
import { type EditorAction } from './editor-state.ts';
import { fieldRange } from './fields.ts';
import { NumberField } from './number-field.tsx';
import { ValueField } from './value-field.tsx';

interface FreeFormFieldsProps {
  readonly shape: CstShape;
  readonly equalNose: boolean;
  readonly chordMm: number;
  readonly units: Units;
  readonly dispatch: (action: EditorAction) => void;
}

const SURFACES = ['upper', 'lower'] as const;

/** The values of a free-form section: what its ends look like, its order, and its weights. */
export function FreeFormFields({ shape, equalNose, chordMm, units, dispatch }: FreeFormFieldsProps) {
  const common = { chordMm, units, dispatch };
  const scale = scaleOf(shape);
  return (
    <>
      {SURFACES.map((surface) => (
        <ValueField
          key={surface}
          {...common}
          kind="fraction"
          field={`noseRadius-${surface}`}
          label={`Nose R, ${surface}`}
          value={noseRadiusOf(shape, surface) * scale}
          decimals={3}
          {...fieldRange(shape, 'noseRadius')}
        />
      ))}
      <CheckboxField
        label="Equal nose radius on both sides"
        checked={equalNose}
        onChange={(event) => {
          dispatch({ type: 'equal-nose', on: event.target.checked });
        }}
      />
      {SURFACES.map((surface) => (
        <ValueField
          key={surface}
          {...common}
          kind="angle"
          field={`boatTail-${surface}`}
          label={`Boat tail, ${surface}`}
          value={boatTailAngleDegOf(shape, surface)}
          decimals={2}
          {...fieldRange(shape, `boatTail-${surface}`)}
        />
      ))}
      <ValueField
        {...common}
        kind="fraction"
        field="trailingEdgeGap"
        label="Edge gap"
        value={shape.trailingEdgeGap * scale}
        decimals={3}
        {...fieldRange(shape, 'trailingEdgeGap')}
      />
      <Orders shape={shape} dispatch={dispatch} />
      <Weights shape={shape} dispatch={dispatch} />
      <details>
        <summary className="py-1 text-graphite">Class exponents</summary>
        <div className="grid grid-cols-2 gap-x-3">
          <Exponent name="n1" label="Nose exponent" value={shape.n1} dispatch={dispatch} />
          <Exponent name="n2" label="Tail exponent" value={shape.n2} dispatch={dispatch} />
        </div>
      </details>
    </>
  );
}

interface PartProps {
  readonly shape: CstShape;
  readonly dispatch: (action: EditorAction) => void;
}

function Orders({ shape, dispatch }: PartProps) {
  const { min, max } = CST_LIMITS.order;
  const upper = shape.upper.length - 1;
  const lower = shape.lower.length - 1;
  const set = (surface: Surface | 'both', order: number) => () => {
    dispatch({ type: 'order', surface, order });
  };
  const row = (name: string, order: number, surface: Surface | 'both', shown: string) => (
    <div key={name} className="flex items-center gap-1" role="group" aria-label={`Order, ${name}`}>
      <span className="mr-auto text-graphite">{name}</span>
      <Button
        size="small"
        aria-label={`Lower the order, ${name}`}
        disabled={order <= min}
        onClick={set(surface, order - 1)}
        className="w-7 pointer-coarse:size-11"
      >
        −
      </Button>
      <output className="w-9 text-center font-semibold">{shown}</output>
      <Button
        size="small"
        aria-label={`Raise the order, ${name}`}
        disabled={order >= max}
        onClick={set(surface, order + 1)}
        className="w-7 pointer-coarse:size-11"
      >
        +
      </Button>
    </div>
  );
  return (
    <div className="mt-1 border-t border-hair pt-2">
      <h3 className="mb-1 text-xs text-graphite">Order</h3>
      <div className="grid grid-cols-2 gap-x-6 gap-y-1">
        {row('upper', upper, 'upper', String(upper))}
        {row('lower', lower, 'lower', String(lower))}
      </div>
      {upper === lower && <div className="mt-1">{row('both surfaces', upper, 'both', String(upper))}</div>}
    </div>
  );
}

function Weights({ shape, dispatch }: PartProps) {
  const rows = Array.from({ length: Math.max(shape.upper.length, shape.lower.length) }, (_, index) => index);
  return (
    <div className="mt-1">
      <div className="mb-1 grid grid-cols-2 gap-x-3 text-xs text-graphite">
        <h3>Weights, upper</h3>
        <h3>lower</h3>
      </div>
      <div className="grid grid-cols-2 gap-x-3 gap-y-1">
        {rows.map((index) =>
          SURFACES.map((surface) => {
            const value = shape[surface][index];
            return value === undefined ? (
              <span key={`${surface}-${index}`} />
            ) : (
              <Weight
                key={`${surface}-${index}`}
                surface={surface}
                index={index}
                value={value}
                dispatch={dispatch}
              />
            );
          }),
        )}
      </div>
    </div>
  );
}

interface WeightProps {
  readonly surface: Surface;
  readonly index: number;
  readonly value: number;
  readonly dispatch: (action: EditorAction) => void;
}

const Weight = memo(function Weight({ surface, index, value, dispatch }: WeightProps) {
  const commit = useCallback(
    (next: number) => {
      dispatch({ type: 'set', field: `${surface}-${index}`, value: next });
    },
    [dispatch, surface, index],
  );
  return (
    <NumberField
      label={`Weight ${index} of the ${surface} surface`}
      short={`A${index}`}
      value={value}
      decimals={4}
      {...CST_LIMITS[surface]}
      onCommit={commit}
    />
  );
});

function Exponent({
  name,
  label,
  value,
  dispatch,
}: {
  name: 'n1' | 'n2';
  label: string;
  value: number;
  dispatch: PartProps['dispatch'];
}) {
  return (
    <NumberField
      label={label}
      short={name.toUpperCase()}
      value={value}
      decimals={3}
      {...CST_LIMITS[name]}
      onCommit={(next) => {
        dispatch({ type: 'set', field: name, value: next });
      }}
    />
  );
}
