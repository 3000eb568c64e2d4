import type { SpawnOptions } from 'node:child_process';

/** The path of an installed program, also outside an ordinary user's PATH. */
export function findProgram(name: string): string | undefined;

/** The command line that runs a program so that it ends (SIGTERM) when this process dies, even by SIGKILL. */
export function tied(command: string, args: readonly string[]): [string, string[]];

/** Runs a program to its end and collects what it prints; code 127 where there is no such program. */
export function run(
  command: string,
  args: readonly string[],
  options?: SpawnOptions,
): Promise<{ readonly code: number; readonly output: string }>;
