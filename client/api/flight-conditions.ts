import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { type ConditionChange, type ConditionInput } from '#server/contracts/flight-conditions.ts';
import { flightConditionEndpoints } from '#server/contracts/flight-condition-endpoints.ts';
import { request } from './request.ts';

const all = ['flight-conditions'] as const;

/** All flight conditions of the workshop, the default first. */
export const conditionsQuery = () =>
  queryOptions({
    queryKey: all,
    queryFn: async ({ signal }) =>
      (await request(flightConditionEndpoints.listFlightConditions, { signal })).items,
  });

/** Makes a flight condition, or changes the one of the id; `standingOf` tells of a change in between. */
export function useSaveCondition() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (wanted: { input: ConditionInput } | { id: string; change: ConditionChange }) =>
      'id' in wanted
        ? request(flightConditionEndpoints.changeFlightCondition, {
            params: { conditionId: wanted.id },
            body: wanted.change,
          })
        : request(flightConditionEndpoints.createFlightCondition, { body: wanted.input }),
    onSuccess: () => client.invalidateQueries({ queryKey: all }),
  });
}

/** Makes a flight condition the default of the workshop. */
export function useSetDefaultCondition() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (id: string) =>
      request(flightConditionEndpoints.setDefaultFlightCondition, { params: { conditionId: id } }),
    onSuccess: () => client.invalidateQueries({ queryKey: all }),
  });
}
