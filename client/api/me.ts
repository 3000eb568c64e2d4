import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { accountEndpoints } from '#server/contracts/account-endpoints.ts';
import { type Preferences } from '#server/contracts/people.ts';
import { request } from './request.ts';

/** Who is signed in. Fetched once a session; a refusal (401) is an answer, not something to retry. */
export const meQuery = () =>
  queryOptions({
    queryKey: ['me'] as const,
    queryFn: ({ signal }) => request(accountEndpoints.me, { signal }),
    staleTime: Infinity,
    retry: false,
  });

export function useChangePreferences() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (preferences: Partial<Preferences>) =>
      request(accountEndpoints.changePreferences, { body: preferences }),
    onSuccess: (me) => client.setQueryData(meQuery().queryKey, me),
  });
}

export function useChangePassword() {
  return useMutation({
    mutationFn: (passwords: { current: string; next: string }) =>
      request(accountEndpoints.changePassword, { body: passwords }),
  });
}
