import { type ReactNode, useRef } from 'react';
import { formatLength, formatPercent, type Units, useUnits } from '#client/app/units.ts';
import { Button } from '#client/ui/button.tsx';
import { Menu, MenuItem } from '#client/ui/menu.tsx';
import { PLAN_LIMITS } from '#geometry/cutting/plan.ts';
import { NEW_FEATURES } from './new-parts.ts';
import { usePlannerFields } from './planner-context.ts';
import { type PlanValues, withValue } from './plan-values.ts';
import { ChoiceRow, EndHeads, Group, PairRow, QuantityRow } from './rows.tsx';
import { NameRow } from './name-row.tsx';

type Kind = keyof typeof NEW_FEATURES;
interface FeatureValues {
  readonly kind: Kind;
  readonly [field: string]: unknown;
}

const KINDS: readonly { readonly kind: Kind; readonly label: string }[] = [
  { kind: 'slot', label: 'Slot for a spar' },
  { kind: 'strip', label: 'Strip through both surfaces' },
  { kind: 'tube', label: 'Tube with its entry slit' },
  { kind: 'hinge', label: 'Hinge line' },
];
const WORDS: Readonly<Record<Kind, string>> = { slot: 'Slot', strip: 'Strip', tube: 'Tube', hinge: 'Hinge' };
const SURFACES = [
  { value: 'upper', label: 'upper surface' },
  { value: 'lower', label: 'lower surface' },
];

function featuresOf(values: PlanValues): readonly FeatureValues[] {
  return values['features'] as unknown as readonly FeatureValues[];
}

/** Slots, strips, tubes and hinges, in the order in which they are numbered. */
export function FeaturesGroup() {
  const { values, replace, enabled } = usePlannerFields();
  const list = useRef<HTMLOListElement>(null);
  const features = featuresOf(values);
  const set = (next: readonly FeatureValues[]) => replace(withValue(values, 'features', next));
  const add = (kind: Kind) => {
    set([...features, NEW_FEATURES[kind]]);
    requestAnimationFrame(() => {
      const last = list.current?.lastElementChild?.querySelector('details');
      if (last) last.open = true;
      last?.querySelector('input')?.focus();
    });
  };
  const move = (from: number, to: number) => {
    const next = [...features];
    next.splice(to, 0, ...next.splice(from, 1));
    set(next);
  };
  return (
    <Group
      title="Features"
      aside={
        enabled &&
        features.length < PLAN_LIMITS.features && (
          <Menu
            trigger="+ add"
            label="Add a feature"
            className="px-1 text-ink hover:underline pointer-coarse:min-h-11"
          >
            {KINDS.map(({ kind, label }) => (
              <MenuItem key={kind} onSelect={() => add(kind)}>
                {label}
              </MenuItem>
            ))}
          </Menu>
        )
      }
    >
      {features.length === 0 && <p className="text-graphite">None: a plain core.</p>}
      <ol ref={list} className="flex flex-col">
        {features.map((feature, index) => (
          <FeatureItem
            key={index}
            feature={feature}
            index={index}
            last={index === features.length - 1}
            onMove={(to) => move(index, to)}
            onRemove={() => set(features.filter((_, i) => i !== index))}
          />
        ))}
      </ol>
    </Group>
  );
}

interface FeatureItemProps {
  readonly feature: FeatureValues;
  readonly index: number;
  readonly last: boolean;
  readonly onMove: (to: number) => void;
  readonly onRemove: () => void;
}

function FeatureItem({ feature, index, last, onMove, onRemove }: FeatureItemProps) {
  const { enabled, marks } = usePlannerFields();
  const units = useUnits();
  const path = `features.${index}`;
  const word = WORDS[feature.kind];
  const worst = worstMark([...marks].filter(([at]) => at.startsWith(`${path}.`)).map(([, mark]) => mark));
  return (
    <li className="border-b border-hair">
      <details>
        <summary
          className={`grid min-h-7 grid-cols-[1.25rem_minmax(0,1fr)_auto] list-none items-center gap-x-1 pointer-coarse:min-h-11 [&::-webkit-details-marker]:hidden ${worst}`}
        >
          <span className="text-graphite">{index + 1}</span>
          <span className="truncate font-semibold">{nameOf(feature, units)}</span>
          <span className="text-graphite">{placeOf(feature)}</span>
        </summary>
        <div className="flex flex-col gap-1 pt-1 pb-2 pl-5">
          <NameRow path={`${path}.name`} />
          <KindFields kind={feature.kind} path={path} />
          {enabled && (
            <div className="mt-1 flex gap-1">
              <Move
                label={`Move ${word} ${index + 1} up`}
                disabled={index === 0}
                onClick={() => onMove(index - 1)}
              >
                up
              </Move>
              <Move
                label={`Move ${word} ${index + 1} down`}
                disabled={last}
                onClick={() => onMove(index + 1)}
              >
                down
              </Move>
              <Button size="small" className="ml-auto pointer-coarse:h-11" onClick={onRemove}>
                {`Remove ${word.toLowerCase()} ${index + 1}`}
              </Button>
            </div>
          )}
        </div>
      </details>
    </li>
  );
}

function Move(props: { label: string; disabled: boolean; onClick: () => void; children: ReactNode }) {
  const { label, ...rest } = props;
  return <Button size="small" aria-label={label} className="pointer-coarse:h-11" {...rest} />;
}

function worstMark(marks: readonly string[]): string {
  if (marks.includes('error')) return 'shadow-[inset_3px_0_0_var(--brick)] pl-1.5';
  return marks.includes('warning') ? 'shadow-[inset_3px_0_0_var(--amber)] pl-1.5' : '';
}

function nameOf({ kind, name, widthMm, diameterMm }: FeatureValues, units: Units): string {
  const size = kind === 'tube' ? diameterMm : widthMm;
  const called = typeof name === 'string' && name.trim() !== '' ? name : WORDS[kind];
  return typeof size === 'number' ? `${called}, ${formatLength(size, units, 1)}` : called;
}

function placeOf({ rootStation, surface, entry, hingeSurface }: FeatureValues): string {
  const side = surface ?? entry ?? hingeSurface;
  const station = typeof rootStation === 'number' ? formatPercent(rootStation, 1) : '';
  return typeof side === 'string' ? `${station} ${side}` : `${station} through`;
}

function KindFields({ kind, path }: { kind: Kind; path: string }) {
  const at = (field: string) => `${path}.${field}`;
  const stations = (
    <>
      <EndHeads />
      <PairRow label="Station" as="station" root={at('rootStation')} tip={at('tipStation')} />
    </>
  );
  switch (kind) {
    case 'slot':
      return (
        <>
          <ChoiceRow label="From" path={at('surface')} options={SURFACES} />
          <QuantityRow label="Width" path={at('widthMm')} as="length" decimals={2} />
          {stations}
          <PairRow label="Depth" as="length" decimals={2} root={at('rootDepthMm')} tip={at('tipDepthMm')} />
        </>
      );
    case 'strip':
      return (
        <>
          <QuantityRow label="Width" path={at('widthMm')} as="length" decimals={2} />
          {stations}
        </>
      );
    case 'tube':
      return (
        <>
          <ChoiceRow label="Slit from" path={at('entry')} options={SURFACES} />
          <QuantityRow label="Diameter" path={at('diameterMm')} as="length" decimals={2} />
          {stations}
          <PairRow
            label="Above middle"
            as="length"
            decimals={2}
            root={at('rootHeightMm')}
            tip={at('tipHeightMm')}
          />
        </>
      );
    case 'hinge':
      return (
        <>
          <ChoiceRow label="Hinge at" path={at('hingeSurface')} options={SURFACES} />
          <QuantityRow label="Bevel, whole angle" path={at('bevelDeg')} as="angle" />
          <QuantityRow label="Web that stays" path={at('webMm')} as="length" decimals={2} />
          {stations}
        </>
      );
  }
}
