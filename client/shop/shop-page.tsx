import { useQuery } from '@tanstack/react-query';
import { kerfsQuery, machinesQuery, materialsQuery, type ShopItem } from '#client/api/shop.ts';
import { useMay } from '#client/app/session.tsx';
import { CheckboxField } from '#client/ui/checkbox-field.tsx';
import { ErrorState, sentenceOf } from '#client/ui/error-state.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { useShopAddress } from './address.ts';
import { ShopLists } from './shop-lists.tsx';
import { ShopSide } from './shop-side.tsx';

/** Machines, materials and kerfs of the workshop: tables, and what is chosen in them at the side. */
export function Component() {
  const { place, archive, go } = useShopAddress();
  const mayWrite = useMay('shop.write');
  const { machines, materials, kerfs, error, retry } = useShop();
  const loaded = machines && materials && kerfs;
  // Where there is room for one of them only, the side stands in the place of the tables.
  const side = loaded && place.at !== 'nothing';
  const shown = <Item extends ShopItem>(items: readonly Item[] | undefined) =>
    items?.filter((item) => archive || !item.archived) ?? null;
  const lists = { machines: shown(machines), materials: shown(materials), kerfs: kerfs ?? null };
  return (
    <div data-page="flowing" className="mx-auto w-full max-w-[100rem] px-4 pt-4 pb-10">
      <title>Shop · Ribwright</title>
      <div className="grid gap-x-8 lg:grid-cols-[minmax(0,1fr)_24rem]">
        <div className={`min-w-0 ${side ? 'max-lg:hidden' : ''}`}>
          <div className="flex min-h-8 flex-wrap items-center justify-between gap-x-4">
            <h1 className="text-xl font-extrabold">Shop</h1>
            <ArchiveField
              count={[...(machines ?? []), ...(materials ?? [])].filter((item) => item.archived).length}
              archive={archive}
              onChange={(shows) => {
                go(place, { archive: shows, replace: true });
              }}
            />
          </div>
          {error && <Failure error={error} loaded={Boolean(loaded)} retry={retry} />}
          {(!error || loaded) && (
            <ShopLists {...lists} place={place} archive={archive} mayWrite={mayWrite} go={go} />
          )}
        </div>
        <div
          className={`lg:sticky lg:top-15 lg:max-h-[calc(100dvh-4.5rem)] lg:self-start lg:overflow-y-auto lg:border-l lg:border-rule lg:pr-1 lg:pl-5 ${side ? '' : 'max-lg:hidden'}`}
        >
          {side ? (
            <ShopSide {...{ place, machines, materials, kerfs, mayWrite, go }} />
          ) : (
            <p className="text-graphite">
              {mayWrite
                ? 'Choose a machine, a material or a kerf to change it here.'
                : 'Choose a machine or a material to read all its settings here.'}
            </p>
          )}
        </div>
      </div>
    </div>
  );
}

function ArchiveField(props: { count: number; archive: boolean; onChange: (shows: boolean) => void }) {
  const { count, archive, onChange } = props;
  if (count === 0) return null;
  return (
    <CheckboxField
      label={`Show the archive (${String(count)})`}
      checked={archive}
      onChange={(event) => {
        onChange(event.target.checked);
      }}
    />
  );
}

function Failure({ error, loaded, retry }: { error: Error; loaded: boolean; retry: () => void }) {
  if (loaded) return <Notice tone="error">{sentenceOf(error)} What is shown was loaded before.</Notice>;
  return <ErrorState title="Machines and materials could not be loaded." error={error} retry={retry} />;
}

/** The three lists, and what went wrong with any of them. */
function useShop() {
  const queries = [useQuery(machinesQuery()), useQuery(materialsQuery()), useQuery(kerfsQuery())] as const;
  return {
    machines: queries[0].data,
    materials: queries[1].data,
    kerfs: queries[2].data,
    error: queries.find(({ error }) => error !== null)?.error ?? null,
    retry: () => {
      for (const query of queries) if (query.isError) void query.refetch();
    },
  };
}
