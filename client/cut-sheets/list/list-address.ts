import { useCallback, useMemo } from 'react';
import { useSearchParams } from 'react-router';
import { z } from 'zod';
import { cutSheetListQuerySchema } from '#server/contracts/cut-sheets.ts';

const { search, status, sort } = cutSheetListQuerySchema.shape;

/** What the address says about the list; a part that cannot be read counts as absent. */
const addressSchema = z.object({
  search: search.catch(undefined),
  status: status.catch(undefined),
  sort: sort.catch('updated'),
});
export type SheetListAddress = z.infer<typeof addressSchema>;

/** The list's state lives in the address, so that a link shows the same list. */
export function useSheetListAddress() {
  const [params, setParams] = useSearchParams();
  const address = useMemo(() => addressSchema.parse(Object.fromEntries(params)), [params]);
  const change = useCallback(
    (part: Partial<SheetListAddress>) => {
      setParams((before) => paramsOf({ ...addressSchema.parse(Object.fromEntries(before)), ...part }), {
        replace: true,
        preventScrollReset: true,
      });
    },
    [setParams],
  );
  return [address, change] as const;
}

function paramsOf({ search: text, status: wanted, sort: order }: SheetListAddress): URLSearchParams {
  const params = new URLSearchParams();
  if (text) params.set('search', text);
  if (wanted) params.set('status', wanted);
  if (order !== 'updated') params.set('sort', order);
  return params;
}
