/** The packages of a package-lock.json, as far as the comparison needs them. */
export interface Lock {
  readonly packages: Readonly<Record<string, { readonly version?: string; readonly optional?: boolean }>>;
}

/** Whether a version of Node.js, such as “20.20.2”, satisfies a range such as “>=20.19”. */
export function isNodeNewEnough(version: string, needed: string): boolean;

/** Whether what npm has installed is what the lock asks for. */
export function isInstalled(lock: Lock, installed: Lock): boolean;

/** Checks Node's version and installs the packages when they are missing or the lock has changed since. */
export function install(root: string): Promise<void>;
