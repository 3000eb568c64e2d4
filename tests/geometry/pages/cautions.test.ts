import { expect, test } from 'vitest';
import { CAUTIONS } from '#geometry/pages/cautions.ts';

test('cautions are whole sentences and name what must be checked', () => {
  for (const words of Object.values(CAUTIONS)) expect(words).toMatch(/^[A-Z].*\.$/);
  expect(CAUTIONS.print).toMatch(/100 %.*scale bars.*before you cut/);
  expect(CAUTIONS.wire).toMatch(/burns/);
  expect(CAUTIONS.fumes).toMatch(/extraction/);
  expect(CAUTIONS.machine).toMatch(/cold wire.*emergency stop/);
});
