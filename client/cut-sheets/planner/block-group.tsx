import { SelectField } from '#client/ui/select-field.tsx';
import { Button } from '#client/ui/button.tsx';
import { type Machine, type Material } from '#server/contracts/shop.ts';
import { usePlannerFields } from './planner-context.ts';
import { withValue } from './plan-values.ts';
import { CheckRow, ChoiceRow, Group, GroupSwitch, QuantityRow } from './rows.tsx';
import { withShopChoice } from './shop-choice.ts';
import { type PlanSources } from './use-plan-sources.ts';

const NEW_BLOCK = {
  lengthMm: 300,
  heightMm: 60,
  spanMm: 600,
  marginMm: 5,
  coreXMm: null,
  coreYMm: null,
  tiltDeg: 0,
  pair: false,
};

/** What the core is cut from, and by what. */
export function BlockGroup({ sources }: { sources: PlanSources }) {
  const { values } = usePlannerFields();
  const machines = (sources.machines ?? []).filter(({ settings }) => ['wire', 'bow'].includes(settings.kind));
  const foams = (sources.materials ?? []).filter(({ settings }) => settings.kind === 'foam');
  return (
    <Group title="Block and machine">
      <GroupSwitch path="block" label="Foam core from a block" initial={NEW_BLOCK} />
      <ShopRow path="machineId" label="Machine" none="none, no program" items={machines} sources={sources} />
      <ShopRow path="materialId" label="Foam" none="none" items={foams} sources={sources} />
      {values['block'] !== null && <BlockFields foams={foams} />}
    </Group>
  );
}

function BlockFields({ foams }: { foams: readonly Material[] }) {
  const { values, replace, enabled } = usePlannerFields();
  const foam = foams.find(({ id }) => id === values['materialId'])?.settings;
  return (
    <>
      <QuantityRow label="Block, along the chord" path="block.lengthMm" as="length" />
      <QuantityRow label="Block, height" path="block.heightMm" as="length" />
      <QuantityRow label="Block, along the span" path="block.spanMm" as="length" />
      {enabled && values['materialId'] !== null && (
        <Button
          size="small"
          disabled={foam?.kind !== 'foam'}
          className="self-end pointer-coarse:h-11"
          onClick={() => {
            if (foam?.kind !== 'foam') return;
            const { blockLengthMm, blockHeightMm, blockSpanMm } = foam;
            const size = { lengthMm: blockLengthMm, heightMm: blockHeightMm, spanMm: blockSpanMm };
            replace(withValue(values, 'block', { ...(values['block'] as object), ...size }));
          }}
        >
          Block as it comes
        </Button>
      )}
      <QuantityRow label="Margin around the cut" path="block.marginMm" as="length" />
      <QuantityRow label="Nose from the front" path="block.coreXMm" as="length" empty="middle" />
      <QuantityRow label="Nose above underside" path="block.coreYMm" as="length" empty="middle" />
      <QuantityRow label="Tilt, nose up" path="block.tiltDeg" as="angle" decimals={2} />
      <CheckRow path="block.pair" label="Mirrored pair from one block" />
    </>
  );
}

interface ShopRowProps {
  readonly path: 'machineId' | 'materialId';
  readonly label: string;
  readonly none: string;
  readonly items: readonly (Machine | Material)[];
  readonly sources: PlanSources;
}

function ShopRow({ path, label, none, items, sources }: ShopRowProps) {
  const { values, replace, errors, enabled } = usePlannerFields();
  const { materials, kerfs } = sources;
  const chosen = values[path];
  return (
    <div className="grid grid-cols-[minmax(0,1fr)_10.875rem] items-start gap-x-1.5">
      <span aria-hidden="true" className="flex min-h-7 items-center pointer-coarse:min-h-11">
        {label}
      </span>
      <SelectField
        label={label}
        hideLabel
        name={path}
        disabled={!enabled || materials === null || kerfs === null}
        error={errors.get(path)}
        options={shopOptions(items, chosen, none)}
        value={typeof chosen === 'string' ? chosen : ''}
        onChange={(event) => {
          const id = event.target.value === '' ? null : event.target.value;
          replace(withShopChoice(values, path, id, { materials: materials ?? [], kerfs: kerfs ?? [] }));
        }}
        className="font-semibold"
      />
    </div>
  );
}

/** The things to choose from: those in use, and the chosen one whatever became of it. */
export function shopOptions(items: readonly (Machine | Material)[], chosen: unknown, none: string) {
  return [
    { value: '', label: none },
    ...items
      .filter(({ id, archived }) => !archived || id === chosen)
      .map(({ id, name, archived }) => ({ value: id, label: archived ? `${name} (archived)` : name })),
  ];
}

/** How many panels, and how they are cut. */
export function CutGroup() {
  return (
    <>
      <ChoiceRow
        label="Order of the cut"
        path="cut.order"
        options={[
          { value: 'round', label: 'all the way round' },
          { value: 'two-passes', label: 'two passes' },
        ]}
      />
      <QuantityRow label="Tolerance of the contour" path="cut.toleranceMm" as="length" decimals={3} />
      <QuantityRow label="Points per surface, least" path="cut.pointsPerSurface" as="whole" decimals={0} />
      <QuantityRow label="Clearance from the block" path="cut.clearanceMm" as="length" />
      <QuantityRow label="Warm-up of the wire" path="cut.warmUpS" as="seconds" decimals={1} />
    </>
  );
}
