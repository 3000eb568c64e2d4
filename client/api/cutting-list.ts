import { infiniteQueryOptions, queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { type z } from 'zod';
import { cuttingListEndpoints } from '#server/contracts/cutting-list-endpoints.ts';
import {
  type cutLogCreateSchema,
  type inspectionAnswerSchema,
  type inspectionCreateSchema,
  photoSchema,
} from '#server/contracts/cutting-list.ts';
import { fileUrl, problemOf, request, send } from './request.ts';

export type CutLogInput = z.input<typeof cutLogCreateSchema>;
export type InspectionInput = z.input<typeof inspectionCreateSchema>;
type InspectionAnswer = z.input<typeof inspectionAnswerSchema>;
export type InspectionFilter = {
  readonly sheetId?: string;
  readonly versionNumber?: number;
  readonly outcome?: 'within' | 'out' | 'unanswered';
};

const keys = {
  list: ['cutting-list'] as const,
  logs: ['cut-logs'] as const,
  inspections: ['inspections'] as const,
  desk: ['desk'] as const,
};

/** What waits at the machines; asked for again while the screen stands open. */
export const cuttingListQuery = () =>
  queryOptions({
    queryKey: keys.list,
    queryFn: async ({ signal }) => (await request(cuttingListEndpoints.cuttingList, { signal })).items,
    refetchInterval: 60_000,
  });

export const cutLogsQuery = (filter: { readonly sheetId?: string; readonly versionNumber?: number } = {}) =>
  infiniteQueryOptions({
    queryKey: [...keys.logs, filter] as const,
    queryFn: ({ pageParam, signal }) =>
      request(cuttingListEndpoints.listCutLogs, { query: { ...filter, cursor: pageParam }, signal }),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (page) => page.nextCursor ?? undefined,
  });

export function sendCutLog(log: CutLogInput) {
  return request(cuttingListEndpoints.logCut, { body: log });
}

export function checkFile(by: { readonly checksum: string } | { readonly code: string }) {
  return request(cuttingListEndpoints.checkFile, { query: by });
}

export const inspectionsQuery = (filter: InspectionFilter = {}) =>
  infiniteQueryOptions({
    queryKey: [...keys.inspections, 'list', filter] as const,
    queryFn: ({ pageParam, signal }) =>
      request(cuttingListEndpoints.listInspections, { query: { ...filter, cursor: pageParam }, signal }),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (page) => page.nextCursor ?? undefined,
  });

export const inspectionQuery = (id: string) =>
  queryOptions({
    queryKey: [...keys.inspections, 'one', id] as const,
    queryFn: ({ signal }) =>
      request(cuttingListEndpoints.getInspection, { params: { inspectionId: id }, signal }),
  });

export const inspectionStatisticsQuery = () =>
  queryOptions({
    queryKey: [...keys.inspections, 'statistics'] as const,
    queryFn: async ({ signal }) =>
      (await request(cuttingListEndpoints.inspectionStatistics, { signal })).items,
  });

export const deskQuery = () =>
  queryOptions({
    queryKey: keys.desk,
    queryFn: ({ signal }) => request(cuttingListEndpoints.desk, { signal }),
  });

function useRefreshInspections() {
  const client = useQueryClient();
  return () =>
    Promise.all([
      client.invalidateQueries({ queryKey: keys.inspections }),
      client.invalidateQueries({ queryKey: keys.desk }),
    ]);
}

/** Files the readings of a part. Give `key` once per part, so that a retry does not file it twice. */
export function useAddInspection() {
  const refresh = useRefreshInspections();
  return useMutation({
    mutationFn: (inspection: InspectionInput) =>
      request(cuttingListEndpoints.addInspection, { body: inspection }),
    onSuccess: refresh,
  });
}

export function useAnswerInspection(id: string) {
  const refresh = useRefreshInspections();
  return useMutation({
    mutationFn: (answer: InspectionAnswer) =>
      request(cuttingListEndpoints.answerInspection, { params: { inspectionId: id }, body: answer }),
    onSuccess: refresh,
  });
}

export function useAddPhoto(inspectionId: string) {
  const refresh = useRefreshInspections();
  return useMutation({
    mutationFn: async (file: File) => {
      const form = new FormData();
      form.set('file', file);
      const address = `/api/inspections/${encodeURIComponent(inspectionId)}/photos`;
      const response = await send(address, { method: 'POST', body: form });
      if (!response.ok) throw await problemOf(response);
      return photoSchema.parse(await response.json());
    },
    onSuccess: refresh,
  });
}

export function photoUrl(id: string): string {
  return fileUrl(cuttingListEndpoints.photo, { photoId: id }, undefined);
}
