import { useSearchParams } from 'react-router';

/** What stands beside the list: the id of a condition, a new one, or nothing that was chosen. */
export type ConditionPlace = string | 'new' | null;

/** The way to a place, for links; the archive stays shown where it is. */
export function searchOf(place: ConditionPlace, archive: boolean): string {
  const search = new URLSearchParams();
  if (place !== null) search.set('condition', place);
  if (archive) search.set('archive', '1');
  return `?${search.toString()}`;
}

/** Where the focus goes when a condition is left: the id of the link that leads there. */
export function linkIdOf(place: string): string {
  return `condition-${place}`;
}

/** The state of the screen as the address carries it. */
export function useConditionAddress() {
  const [search, setSearch] = useSearchParams();
  const archive = search.get('archive') === '1';
  const wanted = search.get('condition');
  return {
    place: wanted === '' ? null : wanted,
    archive,
    go: (place: ConditionPlace, options: { replace?: boolean; archive?: boolean } = {}) => {
      setSearch(searchOf(place, options.archive ?? archive), {
        replace: options.replace ?? false,
        preventScrollReset: true,
      });
    },
  };
}
