import { useUnits } from '#client/app/units.ts';
import { Button } from '#client/ui/button.tsx';
import { EmptyState } from '#client/ui/empty-state.tsx';
import { type Kerf, type Machine, type Material } from '#server/contracts/shop.ts';
import { linkIdOf, type ShopPlace } from './address.ts';
import { KerfCaution } from './cautions.tsx';
import { ItemTable } from './item-table.tsx';
import { KerfMatrix } from './kerf-matrix.tsx';
import { Part } from './part.tsx';
import { machineFeed, machineSize, materialDensity, materialFeed, materialSize } from './words.ts';

export interface ShopListsProps {
  /** Null while they are on their way. */
  machines: readonly Machine[] | null;
  materials: readonly Material[] | null;
  kerfs: readonly Kerf[] | null;
  place: ShopPlace;
  archive: boolean;
  mayWrite: boolean;
  go: (place: ShopPlace) => void;
}

/** Machines, materials, and the kerfs between them. */
export function ShopLists(props: ShopListsProps) {
  return (
    <>
      <Machines {...props} />
      <Materials {...props} />
      <Kerfs {...props} />
    </>
  );
}

function NewButton({ sort, go }: { sort: 'machine' | 'material'; go: ShopListsProps['go'] }) {
  return (
    <Button
      id={linkIdOf({ at: 'new', sort })}
      onClick={() => {
        go({ at: 'new', sort });
      }}
    >
      New {sort}
    </Button>
  );
}

function Machines({ machines, place, archive, mayWrite, go }: ShopListsProps) {
  const units = useUnits();
  return (
    <Part title="Machines" action={mayWrite && <NewButton sort="machine" go={go} />}>
      {machines?.length === 0 ? (
        <EmptyState title="No machine yet.">
          {mayWrite
            ? 'Enter what the shop cuts with: the form begins with plausible values.'
            : 'An owner or builder enters what the shop cuts with.'}
        </EmptyState>
      ) : (
        <ItemTable
          sort="machine"
          caption="Machines"
          items={machines}
          chosen={place.at === 'machine' ? place.id : null}
          archive={archive}
          columns={[
            { head: 'Size', width: 'w-84', text: ({ settings }) => machineSize(settings, units) },
            {
              head: 'Largest feed',
              width: 'w-32',
              end: true,
              text: ({ settings }) => machineFeed(settings, units),
            },
          ]}
        />
      )}
    </Part>
  );
}

function Materials({ materials, place, archive, mayWrite, go }: ShopListsProps) {
  const units = useUnits();
  return (
    <Part title="Materials" action={mayWrite && <NewButton sort="material" go={go} />}>
      {materials?.length === 0 ? (
        <EmptyState title="No material yet.">
          {mayWrite
            ? 'Enter the foams and sheets that the shop keeps: the form begins with plausible values.'
            : 'An owner or builder enters the foams and sheets that the shop keeps.'}
        </EmptyState>
      ) : (
        <ItemTable
          sort="material"
          caption="Materials"
          items={materials}
          chosen={place.at === 'material' ? place.id : null}
          archive={archive}
          columns={[
            {
              head: 'Size as it comes',
              width: 'w-68',
              text: ({ settings }) => materialSize(settings, units),
            },
            {
              head: 'Density',
              width: 'w-24',
              end: true,
              text: ({ settings }) => materialDensity(settings, units),
            },
            {
              head: 'Wire speed limit',
              width: 'w-36',
              end: true,
              text: ({ settings }) => materialFeed(settings, units),
            },
          ]}
        />
      )}
    </Part>
  );
}

function Kerfs({ machines, materials, kerfs, place, archive, mayWrite }: ShopListsProps) {
  if (!machines || !materials || !kerfs) return null;
  const matrices = [
    { caption: 'Hot wire in foam', foam: true },
    { caption: 'Laser and router in sheet', foam: false },
  ].map(({ caption, foam }) => ({
    caption,
    machines: machines.filter(({ settings: { kind } }) => (kind === 'wire' || kind === 'bow') === foam),
    materials: materials.filter(({ settings: { kind } }) => (kind === 'foam') === foam),
  }));
  const shown = matrices.filter((one) => one.machines.length > 0 && one.materials.length > 0);
  return (
    <Part title="Kerfs">
      <div className="flex flex-col gap-5">
        <KerfCaution />
        {shown.map((matrix) => (
          <KerfMatrix
            key={matrix.caption}
            {...matrix}
            kerfs={kerfs}
            place={place}
            archive={archive}
            mayWrite={mayWrite}
          />
        ))}
        {shown.length === 0 && (
          <p className="text-graphite">
            As soon as there is a machine and a material that it cuts, their kerf stands here.
          </p>
        )}
      </div>
    </Part>
  );
}
