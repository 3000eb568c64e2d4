import { expect, test } from 'vitest';
import { findingsOf, hasErrors, mm, note, stationText, warning } from '#geometry/cutting/findings.ts';
import { planSchema } from '#geometry/cutting/plan.ts';
import { PLAN } from './plans.ts';

test('what the schema refuses becomes errors with dotted fields and whole sentences', () => {
  const refused = planSchema.safeParse({
    ...PLAN,
    cut: { ...PLAN.cut, toleranceMm: 7, extra: 1 },
    features: [{ ...PLAN.features[0], diameterMm: 'wide' }, { kind: 'door' }],
  });
  expect(findingsOf(refused.error!).map(({ path, message }) => [path, message])).toEqual([
    ['features.0.diameterMm', 'The tube’s diameter must be between 0.5 and 200 mm.'],
    ['features.1.kind', 'A feature is a slot, a strip, a tube or a hinge.'],
    ['cut.toleranceMm', 'The tolerance must be between 0.001 and 0.5 mm.'],
    ['cut.extra', 'There is no field extra in a plan.'],
  ]);
});

test('only errors keep a sheet back', () => {
  expect(hasErrors([note('a', 'b', 'C.'), warning('a', 'b', 'C.')])).toBe(false);
  expect(hasErrors(findingsOf(planSchema.safeParse(null).error!))).toBe(true);
});

test('lengths and stations in messages', () => {
  expect([mm(1.005), mm(12, 0), mm(0.12345, 3), stationText(0.4567)]).toEqual([
    '1 mm',
    '12 mm',
    '0.123 mm',
    '45.7 %',
  ]);
});
