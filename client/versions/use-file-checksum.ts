import { useQuery } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import { OfflineError } from '#client/api/request.ts';
import { announcedChecksum } from './receive-file.ts';

const SETTLE_MS = 300;

/** The sha-256 of the file behind `url` in short, or why it is not known; asked for once typing has settled. */
export function useFileChecksum(url: string | null): string {
  const settled = useSettled(url);
  const query = useQuery({
    queryKey: ['file-checksum', settled],
    queryFn: ({ signal }) => announcedChecksum(settled ?? '', signal),
    enabled: settled !== null,
    staleTime: Infinity,
    retry: false,
  });
  if (url === null) return '–';
  if (settled !== url || query.isPending) return '…';
  if (query.error instanceof OfflineError) return 'offline';
  if (query.isError || query.data === null) return 'not known';
  return (query.data.slice(0, 12).match(/.{4}/g) ?? []).join(' ');
}

function useSettled<Value>(value: Value): Value {
  const [settled, setSettled] = useState(value);
  useEffect(() => {
    const timer = setTimeout(() => setSettled(value), SETTLE_MS);
    return () => clearTimeout(timer);
  }, [value]);
  return settled;
}
