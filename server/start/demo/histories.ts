import { type ExportFormat, type ExportOptions } from '#geometry/formats/export.ts';
import { type Shape } from '#geometry/shapes/shape.ts';

/** When a step was taken: whole days before the day of filling in, and the time of that day in UTC. */
export interface Moment {
  readonly daysAgo: number;
  readonly time: `${number}:${number}`;
}

export interface Signed {
  readonly at: Moment;
  readonly by: 'owner' | 'designer' | 'builder' | 'technician';
}

/** How a cut file was asked for; what is not said is as the export panel offers it. */
export type FileOptions = Partial<ExportOptions[ExportFormat]> & { readonly chordMm: number };

/** What happened to a section, in order. */
export type Step = Signed &
  (
    | { readonly did: 'save'; readonly shape: Shape; readonly note: string }
    | { readonly did: 'release' | 'withdraw'; readonly version: number; readonly reason: string }
    | { readonly did: 'archive' }
    | {
        readonly did: 'take file';
        readonly version: number;
        readonly format: ExportFormat;
        readonly options: FileOptions;
      }
    | { readonly did: 'keep draft'; readonly shape: Shape; readonly chordMm: number }
  );

export interface History {
  readonly name: string;
  readonly purpose: string;
  readonly steps: readonly [Step & { readonly did: 'save' }, ...Step[]];
}

type By = Signed['by'];
export type Time = Moment['time'];

export function save(daysAgo: number, time: Time, by: By, shape: Shape, note: string) {
  return { did: 'save', at: { daysAgo, time }, by, shape, note } as const;
}

export function release(daysAgo: number, time: Time, by: By, version: number, reason: string) {
  return { did: 'release', at: { daysAgo, time }, by, version, reason } as const;
}

export function takeFile(
  daysAgo: number,
  time: Time,
  by: By,
  version: number,
  format: ExportFormat,
  options: FileOptions,
) {
  return { did: 'take file', at: { daysAgo, time }, by, version, format, options } as const;
}

export function withdraw(daysAgo: number, time: Time, by: By, version: number, reason: string) {
  return { did: 'withdraw', at: { daysAgo, time }, by, version, reason } as const;
}
