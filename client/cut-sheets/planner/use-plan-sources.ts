import { useQuery } from '@tanstack/react-query';
import { type Shape } from '#geometry/shapes/shape.ts';
import { type End } from '#geometry/cutting/plan.ts';
import { type SheetVersion } from '#server/contracts/cut-sheets.ts';
import { type VersionStatus } from '#server/contracts/sections.ts';
import { type Kerf, type Machine, type Material } from '#server/contracts/shop.ts';
import { versionQuery } from '#client/api/sections.ts';
import { kerfsQuery, machinesQuery, materialsQuery } from '#client/api/shop.ts';
import { type PlanValues, valueAt } from './plan-values.ts';

/** The section version that an end is made from. */
export interface EndSource {
  readonly sectionId: string;
  readonly versionNumber: number;
  /** Unknown until it has been fetched. */
  readonly shape: Shape | null;
  readonly name: string | null;
  readonly status: VersionStatus | null;
}

/** What the ids in the form stand for. */
export interface PlanSources {
  readonly root: EndSource;
  readonly tip: EndSource;
  /** Null until they have been fetched. */
  readonly machines: readonly Machine[] | null;
  readonly materials: readonly Material[] | null;
  readonly kerfs: readonly Kerf[] | null;
  readonly error: Error | null;
  readonly retry: () => void;
}

/** Looks up what the form names. What the saved version pins is known at once. */
export function usePlanSources(values: PlanValues, version: SheetVersion): PlanSources {
  const root = useEnd(values, version, 'root');
  const tip = useEnd(values, version, 'tip');
  const machines = useQuery(machinesQuery());
  const materials = useQuery(materialsQuery());
  const kerfs = useQuery(kerfsQuery());
  const queries = [root.query, tip.query, machines, materials, kerfs];
  return {
    root: root.source,
    tip: tip.source,
    machines: machines.data ?? null,
    materials: materials.data ?? null,
    kerfs: kerfs.data ?? null,
    error: queries.find((query) => query.isError && query.data === undefined)?.error ?? null,
    retry: () => {
      for (const query of queries) if (query.isError) void query.refetch();
    },
  };
}

function useEnd(values: PlanValues, version: SheetVersion, end: End) {
  const sectionId = String(valueAt(values, `panel.${end}.sectionId`) ?? '');
  const number = Number(valueAt(values, `panel.${end}.versionNumber`) ?? 0);
  const query = useQuery({ ...versionQuery(sectionId, number), enabled: sectionId !== '' && number > 0 });
  const pinned = version.plan.panel[end];
  const isPinned = pinned.sectionId === sectionId && pinned.versionNumber === number;
  const known = version[end];
  const source: EndSource = {
    sectionId,
    versionNumber: number,
    shape: isPinned ? version.pinned.panel[end].shape : (query.data?.shape ?? null),
    name: query.data?.sectionName ?? (known.sectionId === sectionId ? known.sectionName : null),
    status: query.data?.status ?? (isPinned ? known.status : null),
  };
  return { source, query };
}
