import { SelectField } from '#client/ui/select-field.tsx';
import { CutGroup, shopOptions } from './block-group.tsx';
import { ListInput } from './list-input.tsx';
import { NEW_HOLES, NEW_RIBS, NEW_TABS, NEW_TEMPLATE } from './new-parts.ts';
import { usePlannerFields } from './planner-context.ts';
import { valueAt } from './plan-values.ts';
import { ChoiceRow, FoldedGroup, GroupSwitch, QuantityRow } from './rows.tsx';
import { withRibChoice } from './shop-choice.ts';
import { type PlanSources } from './use-plan-sources.ts';

/** The parts of a plan that are seldom changed: each says in its head what it holds. */
export function FoldedGroups({ sources }: { sources: PlanSources }) {
  const { values } = usePlannerFields();
  const has = (path: string) => valueAt(values, path) !== null;
  const order = valueAt(values, 'cut.order') === 'two-passes' ? 'two passes' : 'all the way round';
  const stations = valueAt(values, 'inspection.stations');
  return (
    <div className="flex flex-col gap-2">
      <StockGroup
        summary={has('stock.leadingEdgeStation') || has('stock.trailingEdgeStation') ? 'yes' : 'none'}
      />
      <FoldedGroup title="Cut settings" summary={order}>
        <CutGroup />
        <QuantityRow label="Least web between features" path="limits.minimumWebMm" as="length" />
        <QuantityRow label="Least trailing edge" path="limits.minimumTrailingEdgeMm" as="length" />
        <QuantityRow label="Caution above speed ratio" path="limits.speedRatio" as="number" decimals={1} />
      </FoldedGroup>
      <FoldedGroup title="Ribs" summary={has('ribs') ? 'wanted' : 'none'}>
        <RibFields sources={sources} />
      </FoldedGroup>
      <FoldedGroup title="Templates" summary={has('template') ? 'wanted' : 'none'}>
        <TemplateFields />
      </FoldedGroup>
      <FoldedGroup
        title="Inspection"
        summary={Array.isArray(stations) ? `${stations.length} stations` : 'stations?'}
      >
        <ListInput label="Stations of the chord" path="inspection.stations" as="station" />
        <QuantityRow label="Tolerance, either way" path="inspection.toleranceMm" as="length" decimals={2} />
        <ChoiceRow
          label="Measured on"
          path="inspection.measured"
          options={[
            { value: 'core', label: 'the bare core' },
            { value: 'with-skin', label: 'the part with skin' },
          ]}
        />
      </FoldedGroup>
      <FoldedGroup title="Order" summary={`${String(values['quantity'])} panels`}>
        <QuantityRow label="Panels wanted" path="quantity" as="whole" decimals={0} />
        <ChoiceRow
          label="Paper of templates"
          path="paper"
          options={['A4', 'A3', 'Letter'].map((value) => ({ value, label: value }))}
        />
      </FoldedGroup>
    </div>
  );
}

function StockGroup({ summary }: { summary: string }) {
  return (
    <FoldedGroup title="Edge stock" summary={summary}>
      <QuantityRow label="Leading edge up to" path="stock.leadingEdgeStation" as="station" empty="none" />
      <QuantityRow label="Trailing edge from" path="stock.trailingEdgeStation" as="station" empty="none" />
    </FoldedGroup>
  );
}

function RibFields({ sources }: { sources: PlanSources }) {
  const { values } = usePlannerFields();
  return (
    <>
      <GroupSwitch path="ribs" label="Cut ribs from sheet" initial={NEW_RIBS} />
      {values['ribs'] !== null && (
        <>
          <RibShopRow path="ribMachineId" label="Machine" sources={sources} />
          <RibShopRow path="ribMaterialId" label="Material" sources={sources} />
          <RibStations />
          <QuantityRow label="Thickness of a rib" path="ribs.materialThicknessMm" as="length" decimals={2} />
          <QuantityRow label="Fit allowance" path="ribs.fitAllowanceMm" as="length" decimals={2} />
          <QuantityRow label="Sheet, width" path="ribs.sheet.widthMm" as="length" />
          <QuantityRow label="Sheet, height" path="ribs.sheet.heightMm" as="length" />
          <QuantityRow label="Border of the sheet" path="ribs.sheet.borderMm" as="length" />
          <QuantityRow label="Between two ribs" path="ribs.sheet.spacingMm" as="length" />
          <QuantityRow label="Height of the numbers" path="ribs.numberHeightMm" as="length" />
          <HoleFields />
          <TabFields />
        </>
      )}
    </>
  );
}

function RibStations() {
  const { values, setValue, enabled } = usePlannerFields();
  const kind = valueAt(values, 'ribs.stations.kind');
  return (
    <>
      <div className="grid grid-cols-[minmax(0,1fr)_10.875rem] items-start gap-x-1.5">
        <span aria-hidden="true" className="flex min-h-7 items-center pointer-coarse:min-h-11">
          Stations
        </span>
        <SelectField
          label="Stations of the ribs"
          hideLabel
          disabled={!enabled}
          options={[
            { value: 'count', label: 'evenly spaced' },
            { value: 'list', label: 'as listed' },
          ]}
          value={String(kind)}
          onChange={(event) =>
            setValue(
              'ribs.stations',
              event.target.value === 'list' ? { kind: 'list', mm: [0] } : { kind: 'count', count: 8 },
            )
          }
        />
      </div>
      {kind === 'list' ? (
        <ListInput label="From the root face" path="ribs.stations.mm" as="length" />
      ) : (
        <QuantityRow label="Number of ribs" path="ribs.stations.count" as="whole" decimals={0} />
      )}
    </>
  );
}

function HoleFields() {
  const { values } = usePlannerFields();
  return (
    <>
      <GroupSwitch path="ribs.lighteningHoles" label="Lightening holes" initial={NEW_HOLES} />
      {valueAt(values, 'ribs.lighteningHoles') !== null && (
        <>
          <QuantityRow
            label="At most"
            spoken="Most lightening holes"
            path="ribs.lighteningHoles.most"
            as="whole"
            decimals={0}
          />
          <QuantityRow label="Web between holes" path="ribs.lighteningHoles.minimumWebMm" as="length" />
          <QuantityRow label="Smallest diameter" path="ribs.lighteningHoles.smallestDiameterMm" as="length" />
        </>
      )}
    </>
  );
}

function TabFields() {
  const { values } = usePlannerFields();
  return (
    <>
      <GroupSwitch path="ribs.jigTabs" label="Jig tabs down to a flat board" initial={NEW_TABS} />
      {valueAt(values, 'ribs.jigTabs') !== null && (
        <>
          <QuantityRow label="First tab at" path="ribs.jigTabs.stations.0" as="station" />
          <QuantityRow label="Second tab at" path="ribs.jigTabs.stations.1" as="station" />
          <QuantityRow label="Width of a tab" path="ribs.jigTabs.widthMm" as="length" />
          <QuantityRow label="Height above the board" path="ribs.jigTabs.heightMm" as="length" />
        </>
      )}
    </>
  );
}

function TemplateFields() {
  const { values } = usePlannerFields();
  return (
    <>
      <GroupSwitch path="template" label="Print templates for a bow" initial={NEW_TEMPLATE} />
      {values['template'] !== null && (
        <>
          <QuantityRow label="Diameter of the wire" path="template.wireDiameterMm" as="length" decimals={2} />
          <QuantityRow label="Ticks per surface" path="template.ticks" as="whole" decimals={0} />
          <QuantityRow label="Ramp behind the edge" path="template.rampFraction" as="station" />
          <QuantityRow label="Pin holes" path="template.pinDiameterMm" as="length" />
          <QuantityRow label="First pin at" path="template.pinStations.0" as="station" />
          <QuantityRow label="Second pin at" path="template.pinStations.1" as="station" />
        </>
      )}
    </>
  );
}

interface RibShopRowProps {
  readonly path: 'ribMachineId' | 'ribMaterialId';
  readonly label: string;
  readonly sources: PlanSources;
}

function RibShopRow({ path, label, sources }: RibShopRowProps) {
  const { values, replace, errors, enabled } = usePlannerFields();
  const { machines, materials } = sources;
  const items =
    path === 'ribMachineId'
      ? (machines ?? []).filter(({ settings }) => ['laser', 'router'].includes(settings.kind))
      : (materials ?? []).filter(({ settings }) => settings.kind === 'sheet');
  const chosen = values[path];
  return (
    <div className="grid grid-cols-[minmax(0,1fr)_10.875rem] items-start gap-x-1.5">
      <span aria-hidden="true" className="flex min-h-7 items-center pointer-coarse:min-h-11">
        {label}
      </span>
      <SelectField
        label={`${label} of the ribs`}
        hideLabel
        name={path}
        disabled={!enabled || machines === null || materials === null}
        error={errors.get(path)}
        options={shopOptions(items, chosen, 'none')}
        value={typeof chosen === 'string' ? chosen : ''}
        onChange={(event) => {
          const id = event.target.value === '' ? null : event.target.value;
          replace(withRibChoice(values, path, id, { machines: machines ?? [], materials: materials ?? [] }));
        }}
      />
    </div>
  );
}
