import {
  infiniteQueryOptions,
  type QueryClient,
  queryOptions,
  useMutation,
  useQueryClient,
} from '@tanstack/react-query';
import { type z } from 'zod';
import { cutSheetEndpoints } from '#server/contracts/cut-sheet-endpoints.ts';
import {
  type cutSheetChangeSchema,
  type cutSheetCreateSchema,
  type CutSheetListQuery,
  type sheetDraftInputSchema,
  type sheetVersionCreateSchema,
} from '#server/contracts/cut-sheets.ts';
import { fileUrl, ProblemError, request } from './request.ts';

export type CutSheetFilter = Partial<Omit<CutSheetListQuery, 'cursor'>>;
type CutSheetCreate = z.input<typeof cutSheetCreateSchema>;
type CutSheetChange = z.input<typeof cutSheetChangeSchema>;
type SheetVersionCreate = z.input<typeof sheetVersionCreateSchema>;
export type SheetDraftInput = z.input<typeof sheetDraftInputSchema>;

const keys = {
  all: ['cut-sheets'] as const,
  lists: ['cut-sheets', 'list'] as const,
  one: (id: string) => ['cut-sheets', 'one', id] as const,
};

export const cutSheetsQuery = (filter: CutSheetFilter = {}) =>
  infiniteQueryOptions({
    queryKey: [...keys.lists, filter] as const,
    queryFn: ({ pageParam, signal }) =>
      request(cutSheetEndpoints.listCutSheets, { query: { ...filter, cursor: pageParam }, signal }),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (page) => page.nextCursor ?? undefined,
  });

export const cutSheetQuery = (id: string) =>
  queryOptions({
    queryKey: [...keys.one(id), 'sheet'] as const,
    queryFn: ({ signal }) => request(cutSheetEndpoints.getCutSheet, { params: { sheetId: id }, signal }),
  });

/** Versions of a cut sheet, newest first. */
export const sheetVersionsQuery = (id: string) =>
  infiniteQueryOptions({
    queryKey: [...keys.one(id), 'versions'] as const,
    queryFn: ({ pageParam, signal }) =>
      request(cutSheetEndpoints.listSheetVersions, {
        params: { sheetId: id },
        query: { cursor: pageParam },
        signal,
      }),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (page) => page.nextCursor ?? undefined,
  });

export const sheetVersionQuery = (id: string, number: number) =>
  queryOptions({
    queryKey: [...keys.one(id), 'versions', number] as const,
    queryFn: ({ signal }) =>
      request(cutSheetEndpoints.getSheetVersion, { params: { sheetId: id, number }, signal }),
  });

/** The person's own unsaved plan, or null when there is none. */
export const sheetDraftQuery = (id: string) =>
  queryOptions({
    queryKey: [...keys.one(id), 'draft'] as const,
    queryFn: async ({ signal }) => {
      try {
        return await request(cutSheetEndpoints.getSheetDraft, { params: { sheetId: id }, signal });
      } catch (error) {
        if (error instanceof ProblemError && error.status === 404) return null;
        throw error;
      }
    },
  });

/** The files of a version with their checksums. */
export const sheetFilesQuery = (id: string, number: number) =>
  queryOptions({
    queryKey: [...keys.one(id), 'versions', number, 'files'] as const,
    queryFn: async ({ signal }) =>
      (await request(cutSheetEndpoints.listSheetFiles, { params: { sheetId: id, number }, signal })).items,
  });

export function sheetFileUrl(id: string, number: number, name: string): string {
  return fileUrl(cutSheetEndpoints.sheetFile, { sheetId: id, number, name }, undefined);
}

export const sheetDownloadsQuery = (id: string, number: number) =>
  infiniteQueryOptions({
    queryKey: [...keys.one(id), 'versions', number, 'downloads'] as const,
    queryFn: ({ pageParam, signal }) =>
      request(cutSheetEndpoints.listSheetDownloads, {
        params: { sheetId: id, number },
        query: { cursor: pageParam },
        signal,
      }),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (page) => page.nextCursor ?? undefined,
  });

/** Everything that is shown of cut sheets, the cutting list included, is asked for anew. */
async function refresh(client: QueryClient): Promise<void> {
  await Promise.all([
    client.invalidateQueries({ queryKey: keys.all }),
    client.invalidateQueries({ queryKey: ['cutting-list'] }),
    client.invalidateQueries({ queryKey: ['desk'] }),
  ]);
}

/** Makes a cut sheet with version 1. Give `key` once per intended sheet, so that a retry does not make two. */
export function useCreateCutSheet() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (sheet: CutSheetCreate) => request(cutSheetEndpoints.createCutSheet, { body: sheet }),
    onSuccess: () => refresh(client),
  });
}

/** Name, purpose, archive (`archived: true`) or take back. */
export function useChangeCutSheet(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (change: CutSheetChange) =>
      request(cutSheetEndpoints.changeCutSheet, { params: { sheetId: id }, body: change }),
    onSuccess: () => refresh(client),
  });
}

/** Saves the next version; a ProblemError with status 409 says that another came in between. */
export function useSaveSheetVersion(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (version: SheetVersionCreate) =>
      request(cutSheetEndpoints.saveSheetVersion, { params: { sheetId: id }, body: version }),
    onSuccess: () => refresh(client),
  });
}

export function useReleaseSheetVersion(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ number, reason }: { number: number; reason: string }) =>
      request(cutSheetEndpoints.releaseSheetVersion, { params: { sheetId: id, number }, body: { reason } }),
    onSuccess: () => refresh(client),
  });
}

export function useWithdrawSheetVersion(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ number, reason }: { number: number; reason: string }) =>
      request(cutSheetEndpoints.withdrawSheetVersion, { params: { sheetId: id, number }, body: { reason } }),
    onSuccess: () => refresh(client),
  });
}

/** Keeps an unsaved plan on the server; the last call wins. */
export function keepSheetDraft(id: string, draft: SheetDraftInput, signal?: AbortSignal) {
  return request(cutSheetEndpoints.keepSheetDraft, { params: { sheetId: id }, body: draft, signal });
}

export function dropSheetDraft(id: string, signal?: AbortSignal) {
  return request(cutSheetEndpoints.dropSheetDraft, { params: { sheetId: id }, signal });
}
