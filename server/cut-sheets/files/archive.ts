import { createHash } from 'node:crypto';
import { type Zippable, zipSync } from 'fflate';

/** A file of an archive. */
export interface ArchivedFile {
  /** Plain: letters, digits, `.`, `_` and `-`, no folder. */
  readonly name: string;
  readonly bytes: Uint8Array;
}

/** The name under which the manifest goes into an archive. */
export const MANIFEST_NAME = 'manifest.sha256';

const PLAIN_NAME = /^[A-Za-z0-9_][A-Za-z0-9._-]*$/;
const LEVEL = 6;

/** 1 January 1980, 00:00, the earliest time that a zip file can hold. It holds local time, so the zone of now decides which moment that is. */
const noTime = () => new Date(1980, 0, 1);

/**
 * A zip file of the files, ordered by name, each with the same time: the same files give the same bytes, whatever their order, the clock and the zone.
 *
 * @throws RangeError when a name is not plain or stands twice
 */
export function zipOf(files: readonly ArchivedFile[]): Uint8Array {
  const mtime = noTime();
  const entries = inOrder(files).map(({ name, bytes }): [string, Zippable[string]] => [
    name,
    [bytes, { level: LEVEL, mtime }],
  ]);
  return zipSync(Object.fromEntries(entries));
}

/**
 * The SHA-256 of each file, ordered by name, in the form that `sha256sum -c` reads (GNU coreutils): digest in hexadecimal, two blanks, name.
 *
 * @throws RangeError when a name is not plain or stands twice
 */
export function manifestOf(files: readonly ArchivedFile[]): string {
  return inOrder(files)
    .map(({ name, bytes }) => `${createHash('sha256').update(bytes).digest('hex')}  ${name}\n`)
    .join('');
}

function inOrder(files: readonly ArchivedFile[]): ArchivedFile[] {
  const sorted = [...files].sort((a, b) => (a.name < b.name ? -1 : 1));
  sorted.forEach(({ name }, i) => {
    if (!PLAIN_NAME.test(name)) throw new RangeError(`Not a plain name for a file in an archive: ${name}`);
    if (sorted[i + 1]?.name === name)
      throw new RangeError(`Two files of an archive have the same name: ${name}`);
  });
  return sorted;
}
