import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import { type z } from 'zod';
import {
  type Kerf,
  type KerfInput,
  type Machine,
  machineChangeSchema,
  machineCreateSchema,
  type MachineSettings,
  type Material,
  materialChangeSchema,
  materialCreateSchema,
  type MaterialSettings,
} from '#server/contracts/shop.ts';
import { shopEndpoints } from '#server/contracts/shop-endpoints.ts';
import { ProblemError, request } from './request.ts';

export type ShopSort = 'machine' | 'material';
export type ShopItem = Machine | Material;
export interface ItemInput {
  readonly name: string;
  readonly settings: MachineSettings | MaterialSettings;
}
export interface ItemChange extends Partial<ItemInput> {
  readonly revision: number;
  readonly archived?: boolean;
}

const all = ['shop'] as const;

export const machinesQuery = () =>
  queryOptions({
    queryKey: [...all, 'machines'] as const,
    queryFn: async ({ signal }) => (await request(shopEndpoints.listMachines, { signal })).items,
  });

export const materialsQuery = () =>
  queryOptions({
    queryKey: [...all, 'materials'] as const,
    queryFn: async ({ signal }) => (await request(shopEndpoints.listMaterials, { signal })).items,
  });

export const kerfsQuery = () =>
  queryOptions({
    queryKey: [...all, 'kerfs'] as const,
    queryFn: async ({ signal }) => (await request(shopEndpoints.listKerfs, { signal })).items,
  });

function createItem(sort: ShopSort, input: ItemInput): Promise<ShopItem> {
  return sort === 'machine'
    ? request(shopEndpoints.createMachine, { body: machineCreateSchema.parse(input) })
    : request(shopEndpoints.createMaterial, { body: materialCreateSchema.parse(input) });
}

function changeItem(sort: ShopSort, id: string, change: ItemChange): Promise<ShopItem> {
  return sort === 'machine'
    ? request(shopEndpoints.changeMachine, {
        params: { machineId: id },
        body: machineChangeSchema.parse(change),
      })
    : request(shopEndpoints.changeMaterial, {
        params: { materialId: id },
        body: materialChangeSchema.parse(change),
      });
}

/** Makes a machine or material, or changes the one of the id; {@link standingOf} tells of a change in between. */
export function useSaveItem(sort: ShopSort) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (wanted: { input: ItemInput } | { id: string; change: ItemChange }) =>
      'id' in wanted ? changeItem(sort, wanted.id, wanted.change) : createItem(sort, wanted.input),
    onSuccess: () => client.invalidateQueries({ queryKey: all }),
  });
}

/** Sets the kerf of a machine in a material; {@link standingOf} tells of another one set in between. */
export function useSaveKerf(place: Pick<Kerf, 'machineId' | 'materialId'>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: (kerf: KerfInput) => request(shopEndpoints.putKerf, { params: place, body: kerf }),
    onSuccess: () => client.invalidateQueries({ queryKey: all }),
  });
}

/** What stands there now, when a change was refused because another came in between; null for every other error. */
export function standingOf<Standing>(error: unknown, schema: z.ZodType<Standing>): Standing | null {
  if (!(error instanceof ProblemError) || error.problem.code !== 'revision-conflict') return null;
  const parsed = schema.safeParse((error.body as { current?: unknown }).current);
  return parsed.success ? parsed.data : null;
}
