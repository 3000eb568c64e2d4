import { existsSync, readFileSync } from 'node:fs';
import ts from 'typescript';
import { expect, test } from 'vitest';
import { sourceFiles } from './source-files.ts';

/** The writers of a DXF file are parts of one method and are read back together; the layers of cut files are read in those. */
const testedThrough: Readonly<Record<string, string>> = {
  'geometry/formats/dxf-layers.ts': 'geometry/formats/dxf.ts',
  'geometry/formats/dxf-r12.ts': 'geometry/formats/dxf.ts',
  'geometry/formats/dxf-r2000-tables.ts': 'geometry/formats/dxf.ts',
  'geometry/formats/dxf-r2000.ts': 'geometry/formats/dxf.ts',
  'geometry/formats/dxf-tags.ts': 'geometry/formats/dxf.ts',
  'geometry/cutting/files/layers.ts': 'geometry/cutting/files/cut-files.ts',
  'geometry/formats/drawing.ts': 'geometry/formats/svg.ts',
  'geometry/formats/section-drawing.ts': 'geometry/formats/export.ts',
};

const testOf = (file: string) => `tests/${file.replace(/\.ts$/, '.test.ts')}`;

/** Whether a file holds types alone, which the compiler tests. */
function isTypesOnly(file: string): boolean {
  const { outputText } = ts.transpileModule(readFileSync(file, 'utf8'), {
    compilerOptions: { target: ts.ScriptTarget.ESNext, module: ts.ModuleKind.ESNext, removeComments: true },
  });
  return outputText.trim() === 'export {};';
}

/** Files whose own test or the one they are tested through is missing. */
function untested(files: readonly string[]): string[] {
  return files.filter((file) => !existsSync(testOf(testedThrough[file] ?? file)) && !isTypesOnly(file));
}

const files = sourceFiles().filter((file) => file.startsWith('geometry/'));

test('each file of geometry/ has a test of the same name', () => {
  expect(files).toContain('geometry/shapes/naca4.ts');
  expect(untested(files)).toEqual([]);
});

test('what is tested through another file has no test of its own, and is still there', () => {
  for (const file of Object.keys(testedThrough)) {
    expect(existsSync(file), file).toBe(true);
    expect(existsSync(testOf(file)), file).toBe(false);
  }
});

test('a file without a test is found', () => {
  expect(untested(['geometry/formats/dxf-tags.ts', 'server/refusal.ts', 'geometry/point.ts'])).toEqual(['server/refusal.ts']); // prettier-ignore
});
