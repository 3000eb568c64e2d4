import { type Plan } from '#geometry/cutting/plan.ts';
import {
  type Count,
  countFindings,
  makeArchive,
  type MadeFile,
  type MadeFiles,
  makeFiles,
  type SheetOrder,
} from './make.ts';

/** Where plans are worked out and files made. */
export interface SheetWorks {
  count(plan: Plan): Promise<Count>;
  make(order: SheetOrder): Promise<MadeFiles>;
  archive(files: readonly Pick<MadeFile, 'downloadName' | 'bytes'>[]): Promise<Uint8Array>;
}

/** Does it on the spot: for programs that serve nobody meanwhile, and where no thread can be had. */
export const worksInPlace: SheetWorks = {
  count: async (plan) => countFindings(plan),
  make: makeFiles,
  archive: async (files) => makeArchive(files),
};
