import { LENGTH_LIMITS } from '#geometry/formats/options.ts';
import { formatLength, useUnits } from '#client/app/units.ts';
import { QuantityField } from '#client/ui/quantity-field.tsx';
import { SelectField } from '#client/ui/select-field.tsx';
import { type Choice, MAGNIFICATIONS, OFFERED_ALIGNMENTS } from './choice.ts';
import { ALIGNMENT_NAMES } from './words.ts';

interface ControlsProps {
  readonly choice: Choice;
  readonly onChange: (part: Partial<Choice>) => void;
}

const FITTING = 'fitting';
const ALIGNMENT_OPTIONS = OFFERED_ALIGNMENTS.map((value) => ({ value, label: ALIGNMENT_NAMES[value] }));
const MAGNIFICATION_OPTIONS = [
  { value: FITTING, label: 'As large as fits' },
  ...MAGNIFICATIONS.map((factor) => ({ value: String(factor), label: `×${factor}` })),
];

/** How the versions are laid on each other, at which chord, and how large their deviations are drawn. */
export function Controls({ choice, onChange }: ControlsProps) {
  const units = useUnits();
  const { alignment, chordMm, magnification } = choice;
  const { min, max } = LENGTH_LIMITS.chordMm;
  return (
    <div className="flex flex-col gap-3">
      <SelectField
        label="Aligned by"
        options={ALIGNMENT_OPTIONS}
        value={alignment}
        onChange={({ target }) => {
          const next = OFFERED_ALIGNMENTS.find((offered) => offered === target.value);
          if (next) onChange({ alignment: next });
        }}
      />
      <SelectField
        label="Deviations drawn"
        options={MAGNIFICATION_OPTIONS}
        value={magnification === null ? FITTING : String(magnification)}
        onChange={({ target }) =>
          onChange({ magnification: target.value === FITTING ? null : Number(target.value) })
        }
      />
      <QuantityField
        label="Chord"
        secondary={formatLength(chordMm, units === 'mm' ? 'inch' : 'mm')}
        kind="length"
        chordMm={chordMm}
        value={chordMm}
        min={min}
        max={max}
        decimals={2}
        onCommit={(next) => onChange({ chordMm: next })}
      />
    </div>
  );
}
