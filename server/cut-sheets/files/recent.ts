/**
 * Keeps what was made last, so that a list of files and the downloads after it make them once. What failed is not kept.
 * @param most how many are kept; the one that was not asked for longest goes first
 */
export function recently<Made>(most: number): (key: string, make: () => Promise<Made>) => Promise<Made> {
  const kept = new Map<string, Promise<Made>>();
  return (key, make) => {
    const made = kept.get(key) ?? make();
    kept.delete(key);
    kept.set(key, made);
    for (const oldest of kept.keys()) {
      if (kept.size <= most) break;
      kept.delete(oldest);
    }
    made.catch(() => {
      if (kept.get(key) === made) kept.delete(key);
    });
    return made;
  };
}
