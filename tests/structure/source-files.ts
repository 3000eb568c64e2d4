import { readdirSync, readFileSync } from 'node:fs';
import { posix } from 'node:path';
import ts from 'typescript';

const folders = ['client', 'geometry', 'migrations', 'server'];

/** The program's own source files, by their paths from the root. */
export function sourceFiles(): string[] {
  return folders.flatMap((folder) =>
    readdirSync(folder, { recursive: true, encoding: 'utf8' })
      .map((name) => `${folder}/${name}`)
      .filter((path) => /\.(ts|tsx|mjs)$/.test(path) && !/\.d\.m?ts$/.test(path)),
  );
}

/** The files of ours that a file imports, statically or later, values or types. */
export function importsOf(file: string): string[] {
  const { importedFiles } = ts.preProcessFile(readFileSync(file, 'utf8'), true, true);
  return importedFiles.flatMap(({ fileName }) => {
    if (fileName.startsWith('#')) return [fileName.slice(1)];
    return fileName.startsWith('.') ? [posix.join(posix.dirname(file), fileName)] : [];
  });
}
