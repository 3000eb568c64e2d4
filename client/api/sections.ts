import {
  infiniteQueryOptions,
  type QueryClient,
  queryOptions,
  useMutation,
  useQueryClient,
} from '@tanstack/react-query';
import { type z } from 'zod';
import { sectionEndpoints } from '#server/contracts/section-endpoints.ts';
import {
  type draftInputSchema,
  type sectionChangeSchema,
  type sectionCreateSchema,
  type SectionListQuery,
  type versionCreateSchema,
} from '#server/contracts/sections.ts';
import { ProblemError, request } from './request.ts';

/** What a list of sections is asked for; the cursor belongs to the pages, not to the question. */
export type SectionListFilter = Partial<Omit<SectionListQuery, 'cursor'>>;
type SectionCreate = z.input<typeof sectionCreateSchema>;
type SectionChange = z.input<typeof sectionChangeSchema>;
type VersionCreate = z.input<typeof versionCreateSchema>;
export type DraftInput = z.input<typeof draftInputSchema>;

const keys = {
  lists: ['sections', 'list'] as const,
  one: (id: string) => ['sections', 'one', id] as const,
};

export const sectionsQuery = (filter: SectionListFilter = {}) =>
  infiniteQueryOptions({
    queryKey: [...keys.lists, filter] as const,
    queryFn: ({ pageParam, signal }) =>
      request(sectionEndpoints.listSections, { query: { ...filter, cursor: pageParam }, signal }),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (page) => page.nextCursor ?? undefined,
  });

export const sectionQuery = (id: string) =>
  queryOptions({
    queryKey: [...keys.one(id), 'section'] as const,
    queryFn: ({ signal }) => request(sectionEndpoints.getSection, { params: { sectionId: id }, signal }),
  });

/** Versions of a section, newest first. */
export const versionsQuery = (id: string) =>
  infiniteQueryOptions({
    queryKey: [...keys.one(id), 'versions'] as const,
    queryFn: ({ pageParam, signal }) =>
      request(sectionEndpoints.listVersions, {
        params: { sectionId: id },
        query: { cursor: pageParam },
        signal,
      }),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (page) => page.nextCursor ?? undefined,
  });

export const versionQuery = (id: string, number: number) =>
  queryOptions({
    queryKey: [...keys.one(id), 'versions', number] as const,
    queryFn: ({ signal }) =>
      request(sectionEndpoints.getVersion, { params: { sectionId: id, number }, signal }),
  });

/** The person's own unsaved work on a section, or null when there is none. */
export const draftQuery = (id: string) =>
  queryOptions({
    queryKey: [...keys.one(id), 'draft'] as const,
    queryFn: async ({ signal }) => {
      try {
        return await request(sectionEndpoints.getDraft, { params: { sectionId: id }, signal });
      } catch (error) {
        if (error instanceof ProblemError && error.status === 404) return null;
        throw error;
      }
    },
  });

export const downloadsQuery = (id: string, number: number) =>
  infiniteQueryOptions({
    queryKey: [...keys.one(id), 'versions', number, 'downloads'] as const,
    queryFn: ({ pageParam, signal }) =>
      request(sectionEndpoints.listDownloads, {
        params: { sectionId: id, number },
        query: { cursor: pageParam },
        signal,
      }),
    initialPageParam: undefined as string | undefined,
    getNextPageParam: (page) => page.nextCursor ?? undefined,
  });

async function refreshSection(client: QueryClient, id: string): Promise<void> {
  await Promise.all([
    client.invalidateQueries({ queryKey: keys.one(id) }),
    client.invalidateQueries({ queryKey: keys.lists }),
  ]);
}

/** Makes a section with version 1. Give `key` once per intended section, so that a retry does not make two. */
export function useCreateSection() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (section: SectionCreate) => request(sectionEndpoints.createSection, { body: section }),
    onSuccess: async (section) => {
      client.setQueryData(sectionQuery(section.id).queryKey, section);
      await client.invalidateQueries({ queryKey: keys.lists });
    },
  });
}

/** Name, purpose, archive (`archived: true`) or take back. */
export function useChangeSection(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (change: SectionChange) =>
      request(sectionEndpoints.changeSection, { params: { sectionId: id }, body: change }),
    onSuccess: () => refreshSection(client, id),
  });
}

/** Saves the next version; a ProblemError with status 409 says that another came in between. */
export function useSaveVersion(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (version: VersionCreate) =>
      request(sectionEndpoints.saveVersion, { params: { sectionId: id }, body: version }),
    onSuccess: () => refreshSection(client, id),
  });
}

export function useReleaseVersion(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ number, reason }: { number: number; reason?: string }) =>
      request(sectionEndpoints.releaseVersion, {
        params: { sectionId: id, number },
        body: reason === undefined ? {} : { reason },
      }),
    onSuccess: () => refreshSection(client, id),
  });
}

export function useWithdrawVersion(id: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ number, reason }: { number: number; reason: string }) =>
      request(sectionEndpoints.withdrawVersion, { params: { sectionId: id, number }, body: { reason } }),
    onSuccess: () => refreshSection(client, id),
  });
}

/** Keeps unsaved work on the server; the last call wins. */
export function keepDraft(id: string, draft: DraftInput, signal?: AbortSignal) {
  return request(sectionEndpoints.keepDraft, { params: { sectionId: id }, body: draft, signal });
}

export function dropDraft(id: string, signal?: AbortSignal) {
  return request(sectionEndpoints.dropDraft, { params: { sectionId: id }, signal });
}
