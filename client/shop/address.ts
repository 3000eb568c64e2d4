import { useSearchParams } from 'react-router';
import { type ShopSort } from '#client/api/shop.ts';

/** What stands at the side of the shop. */
export type ShopPlace =
  | { readonly at: 'nothing' }
  | { readonly at: 'new'; readonly sort: ShopSort }
  | { readonly at: ShopSort; readonly id: string }
  | { readonly at: 'kerf'; readonly machineId: string; readonly materialId: string };

export function placeIn(search: URLSearchParams): ShopPlace {
  const [wanted, machineId, materialId] = ['new', 'machine', 'material'].map((name) => search.get(name));
  if (machineId && materialId) return { at: 'kerf', machineId, materialId };
  if (machineId) return { at: 'machine', id: machineId };
  if (materialId) return { at: 'material', id: materialId };
  if (wanted === 'machine' || wanted === 'material') return { at: 'new', sort: wanted };
  return { at: 'nothing' };
}

function queryOf(place: ShopPlace): Record<string, string> {
  switch (place.at) {
    case 'nothing':
      return {};
    case 'new':
      return { new: place.sort };
    case 'kerf':
      return { machine: place.machineId, material: place.materialId };
    default:
      return { [place.at]: place.id };
  }
}

/** The way to a place, for links; the archive stays shown where it is. */
export function searchOf(place: ShopPlace, archive: boolean): string {
  const search = new URLSearchParams(queryOf(place));
  if (archive) search.set('archive', '1');
  return `?${search.toString()}`;
}

/** Where the focus goes when the side is left: the id of the link that leads there. */
export function linkIdOf(place: ShopPlace): string {
  return `shop-${Object.values(queryOf(place)).join('-')}`;
}

/** The state of the screen as the address carries it. */
export function useShopAddress() {
  const [search, setSearch] = useSearchParams();
  const archive = search.get('archive') === '1';
  return {
    place: placeIn(search),
    archive,
    go: (place: ShopPlace, options: { replace?: boolean; archive?: boolean } = {}) => {
      setSearch(searchOf(place, options.archive ?? archive), {
        replace: options.replace ?? false,
        preventScrollReset: true,
      });
    },
  };
}
