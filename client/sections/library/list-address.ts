import { useCallback, useMemo } from 'react';
import { useSearchParams } from 'react-router';
import { z } from 'zod';
import { type SectionListFilter } from '#client/api/sections.ts';
import { sectionListQuerySchema } from '#server/contracts/sections.ts';

const { search, status, kind, sort, direction } = sectionListQuerySchema.shape;

/** What the address says about the list; a part that cannot be read counts as absent. */
const addressSchema = z.object({
  search: search.catch(undefined),
  status: status.catch(undefined),
  kind: kind.catch(undefined),
  sort: sort.catch('updated'),
  direction: direction.catch(undefined),
});
export type ListAddress = z.infer<typeof addressSchema>;
export type Sort = ListAddress['sort'];
type Direction = NonNullable<ListAddress['direction']>;

const PAGE_SIZE = 50;

/** The way a column is sorted when it is chosen: names from A, everything else from the newest or largest. */
function firstDirection(sort: Sort): Direction {
  return sort === 'name' ? 'ascending' : 'descending';
}

export function directionOf(address: ListAddress): Direction {
  return address.direction ?? firstDirection(address.sort);
}

/** The address after a press on the head of a column: that column, or the other way round. */
export function sortedBy(address: ListAddress, sort: Sort): Partial<ListAddress> {
  if (address.sort !== sort) return { sort, direction: undefined };
  return { direction: directionOf(address) === 'ascending' ? 'descending' : 'ascending' };
}

export function filterOf(address: ListAddress): SectionListFilter {
  const { search, status, kind, sort } = address;
  return {
    ...(search ? { search } : {}),
    ...(status ? { status } : {}),
    ...(kind ? { kind } : {}),
    sort,
    direction: directionOf(address),
    limit: PAGE_SIZE,
  };
}

/** The list's state lives in the address, so that a link shows the same list; only what differs from the start is written. */
export function useListAddress(): readonly [ListAddress, (change: Partial<ListAddress>) => void] {
  const [params, setParams] = useSearchParams();
  const address = useMemo(() => addressSchema.parse(Object.fromEntries(params)), [params]);
  const change = useCallback(
    (part: Partial<ListAddress>) => {
      setParams((before) => paramsOf({ ...addressSchema.parse(Object.fromEntries(before)), ...part }), {
        replace: true,
        preventScrollReset: true,
      });
    },
    [setParams],
  );
  return [address, change];
}

function paramsOf({ sort, direction, ...filters }: ListAddress): URLSearchParams {
  const params = new URLSearchParams();
  for (const [key, value] of Object.entries(filters)) if (value) params.set(key, value);
  if (sort !== 'updated') params.set('sort', sort);
  if (direction && direction !== firstDirection(sort)) params.set('direction', direction);
  return params;
}
