/** What the holder of a name tells about itself. */
export interface Holder {
  readonly pid?: number;
  /** Where it serves, once it does. */
  readonly address?: string;
  /** It is on its way out. */
  readonly ending?: boolean;
}

/** The name that a folder goes by on this machine. */
export function folderName(folder: string): string;

/** Takes a name that only one process may hold at a time; the kernel frees it with the process. */
export function hold(
  name: string,
  options?: {
    readonly state?: () => Omit<Holder, 'pid'>;
    readonly patient?: (other: Holder) => boolean;
    readonly patienceMs?: number;
  },
): Promise<{ release(): void } | { readonly takenBy: Holder }>;

/** A look at the npm that started this process, if one did: whether it is gone. */
export function npmWatch(): () => boolean;
