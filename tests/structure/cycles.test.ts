import { expect, test } from 'vitest';
import { importsOf, sourceFiles } from './source-files.ts';

/** The first chain of files that import each other in a circle, types included; null when there is none. */
function circleIn(imports: ReadonlyMap<string, readonly string[]>): readonly string[] | null {
  const done = new Set<string>();
  const visit = (file: string, above: readonly string[]): readonly string[] | null => {
    if (above.includes(file)) return [...above.slice(above.indexOf(file)), file];
    if (done.has(file)) return null;
    for (const next of imports.get(file) ?? []) {
      const circle = visit(next, [...above, file]);
      if (circle !== null) return circle;
    }
    done.add(file);
    return null;
  };
  for (const file of imports.keys()) {
    const circle = visit(file, []);
    if (circle !== null) return circle;
  }
  return null;
}

test('a circle is found, and a shared file is none', () => {
  expect(circleIn(new Map([['a', ['b', 'c']], ['b', ['c']], ['c', ['a']]]))).toEqual(['a', 'b', 'c', 'a']); // prettier-ignore
  expect(circleIn(new Map([['a', ['b', 'c']], ['b', ['c']], ['c', []]]))).toBeNull(); // prettier-ignore
});

test('no files import each other in a circle', () => {
  const imports = new Map(sourceFiles().map((file) => [file, importsOf(file)]));
  expect(imports.get('server/app.ts')).toContain('server/http/register.ts');
  expect(imports.get('server/http/register.ts')).toContain('server/contracts/endpoints.ts');
  expect(circleIn(imports)).toBeNull();
});
