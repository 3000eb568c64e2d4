import { memo, useCallback } from 'react';
import { formatLength, type QuantityKind, type Units } from '#client/app/units.ts';
import { QuantityField } from '#client/ui/quantity-field.tsx';
import { type EditorAction } from './editor-state.ts';
import { type FieldId, type FieldRange } from './fields.ts';

interface ValueFieldProps extends FieldRange {
  readonly field: FieldId;
  readonly label: string;
  readonly kind: QuantityKind;
  readonly value: number;
  readonly chordMm: number;
  readonly units: Units;
  readonly decimals: number;
  readonly dispatch: (action: EditorAction) => void;
}

/** A value of the section in the list beside the sheet: the same as on the sheet, as an ordinary labelled field. */
export const ValueField = memo(function ValueField(props: ValueFieldProps) {
  const { field, label, kind, value, min, max, chordMm, units, decimals, dispatch } = props;
  const commit = useCallback(
    (next: number) => {
      dispatch({ type: 'set', field, value: next });
    },
    [dispatch, field],
  );
  return (
    <QuantityField
      label={label}
      kind={kind}
      value={value}
      min={min}
      max={max}
      decimals={decimals}
      chordMm={chordMm}
      secondary={kind === 'fraction' ? formatLength(value * chordMm, units) : undefined}
      onCommit={commit}
    />
  );
});
