import { type ReactNode } from 'react';
import { type ShopItem } from '#client/api/shop.ts';
import { Moment } from '#client/ui/moment.tsx';
import { cuts, type Kerf, type Machine, type Material } from '#server/contracts/shop.ts';
import { linkIdOf, type ShopPlace } from './address.ts';
import { ItemFacts } from './item-facts.tsx';
import { ItemForm } from './item-form.tsx';
import { KerfForm } from './kerf-form.tsx';
import { Side } from './part.tsx';
import { KIND_WORDS } from './words.ts';

export interface ShopSideProps {
  place: Exclude<ShopPlace, { at: 'nothing' }>;
  machines: readonly Machine[];
  materials: readonly Material[];
  kerfs: readonly Kerf[];
  mayWrite: boolean;
  go: (place: ShopPlace, options?: { replace?: boolean }) => void;
}

/** The form, or for readers the facts, of what the address names. */
export function ShopSide(props: ShopSideProps) {
  const { place, machines, materials, mayWrite, go } = props;
  const common = {
    key: linkIdOf(place),
    returnTo: linkIdOf(place),
    onClose: () => {
      go({ at: 'nothing' });
    },
  };
  const absent = (what: string): ReactNode => (
    <Side {...common} key={common.key} title={what}>
      <p>The address leads to nothing of this workshop that you can see here.</p>
    </Side>
  );
  if (place.at === 'kerf') return <KerfSide {...props} place={place} common={common} absent={absent} />;
  if (place.at === 'new') {
    if (!mayWrite) return absent('Nothing to make here');
    return (
      <Side {...common} key={common.key} title={`New ${place.sort}`}>
        <ItemForm
          sort={place.sort}
          item={null}
          onSaved={(made) => {
            go({ at: place.sort, id: made.id }, { replace: true });
          }}
        />
      </Side>
    );
  }
  const items: readonly ShopItem[] = place.at === 'machine' ? machines : materials;
  const item = items.find(({ id }) => id === place.id);
  if (!item) return absent(`There is no such ${place.at}`);
  return (
    <Side {...common} key={common.key} title={item.name} under={<Changed item={item} />}>
      {mayWrite ? <ItemForm sort={place.at} item={item} onSaved={noStep} /> : <ItemFacts item={item} />}
    </Side>
  );
}

/** What is saved stays at the side. */
const noStep = () => undefined;

interface KerfSideProps extends ShopSideProps {
  place: Extract<ShopPlace, { at: 'kerf' }>;
  common: { key: string; returnTo: string; onClose: () => void };
  absent: (what: string) => ReactNode;
}

function KerfSide({ place, machines, materials, kerfs, mayWrite, common, absent }: KerfSideProps) {
  const machine = machines.find(({ id }) => id === place.machineId);
  const material = materials.find(({ id }) => id === place.materialId);
  const paired = machine && material && cuts(machine.settings.kind, material.settings.kind);
  if (!paired || !mayWrite) return absent('No kerf to set here');
  const kerf = kerfs.find((one) => one.machineId === machine.id && one.materialId === material.id);
  return (
    <Side {...common} key={common.key} title={`Kerf: ${machine.name}`} under={`in ${material.name}`}>
      <KerfForm machine={machine} material={material} kerf={kerf ?? null} />
    </Side>
  );
}

function Changed({ item }: { item: ShopItem }) {
  return (
    <>
      {KIND_WORDS[item.settings.kind]}
      {item.archived && ', in the archive'} · changed <Moment at={item.updatedAt} /> by {item.updatedBy.name}
    </>
  );
}
