import { z } from 'zod';
import { type Exaggeration } from '#client/drawing/sheet-view.ts';

/** How the sheet is shown; none of it changes the section. */
export interface SheetSettings {
  readonly grid: boolean;
  readonly comb: boolean;
  readonly exaggeration: Exaggeration;
  /** Hold handles of a 4-digit section to whole digits. */
  readonly snap: boolean;
  readonly secondView: 'thickness' | 'curvature' | 'none';
  /** The station looked at, as a fraction of chord: where the spar is to stand. */
  readonly station: number;
  /** Number of the version drawn behind the section. */
  readonly ghost: number | null;
}

export const STATION_LIMITS = { smallest: 0.01, largest: 0.99 } as const;

export const FIRST_SETTINGS: SheetSettings = {
  grid: false,
  comb: false,
  exaggeration: 1,
  snap: false,
  secondView: 'thickness',
  station: 0.3,
  ghost: null,
};

const keptSchema = z
  .object({
    grid: z.boolean(),
    comb: z.boolean(),
    exaggeration: z.union([z.literal(1), z.literal(2), z.literal(4)]),
    snap: z.boolean(),
    secondView: z.enum(['thickness', 'curvature', 'none']),
    station: z.number().min(STATION_LIMITS.smallest).max(STATION_LIMITS.largest),
  })
  .partial();

/** Settings from their kept text; what is missing or damaged falls back to the first settings. */
export function readSettings(text: string | null): SheetSettings {
  if (text === null) return FIRST_SETTINGS;
  try {
    const kept = keptSchema.safeParse(JSON.parse(text));
    if (!kept.success) return FIRST_SETTINGS;
    return { ...FIRST_SETTINGS, ...withoutUndefined(kept.data) };
  } catch {
    return FIRST_SETTINGS;
  }
}

/** The text to keep: everything but the ghost, which belongs to one section. */
export function writeSettings({ ghost: _, ...kept }: SheetSettings): string {
  return JSON.stringify(kept);
}

function withoutUndefined(data: z.infer<typeof keptSchema>): Partial<SheetSettings> {
  return Object.fromEntries(Object.entries(data).filter(([, value]) => value !== undefined));
}
