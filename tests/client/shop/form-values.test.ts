import { describe, expect, it } from 'vitest';
import { FIELDS } from '#client/shop/fields.ts';
import { fieldsOf, type ItemKind, placeOf, readItem, textsOf } from '#client/shop/form-values.ts';
import { startingSettings } from '#client/shop/use-item-form.ts';

const kinds = Object.keys(FIELDS) as ItemKind[];
const sortOf = (kind: ItemKind) => (kind === 'foam' || kind === 'sheet' ? 'material' : 'machine');

/** Paths of all values in settings but the kind. */
function pathsOf(value: object, before = ''): string[] {
  return Object.entries(value).flatMap(([key, inner]) => {
    if (before === '' && key === 'kind') return [];
    const isGroup = typeof inner === 'object' && inner !== null && !Array.isArray(inner);
    return isGroup ? pathsOf(inner as object, `${before}${key}.`) : [`${before}${key}`];
  });
}

describe.each(kinds)('the fields of a %s', (kind) => {
  it('are all its settings, each once', () => {
    const paths = fieldsOf(kind).map(({ path }) => path);
    expect(paths.sort()).toEqual(pathsOf(startingSettings[kind]).sort());
  });

  it.each(['mm', 'inch'] as const)('give the same settings back that they were made of, in %s', (units) => {
    const settings = startingSettings[kind];
    const texts = { name: 'Bench', kind, values: textsOf(settings, units) };
    expect(readItem(sortOf(kind), texts, settings, units)).toEqual({ input: { name: 'Bench', settings } });
  });
});

describe('reading a form', () => {
  const settings = { ...startingSettings.bow, wireLengthMm: 900.123456 };
  const bow = (values: object, name = 'Bow') => ({
    name,
    kind: 'bow' as const,
    values: { ...textsOf(settings, 'inch'), ...values },
  });

  it('keeps an untouched value exactly, whatever it is rounded to on the screen', () => {
    const read = readItem('machine', bow({ wireDiameterMm: '0.02 in' }), settings, 'inch');
    expect(read.input?.settings).toMatchObject({ wireLengthMm: 900.123456, wireDiameterMm: 0.508 });
  });

  it('names every field at fault', () => {
    const read = readItem('machine', bow({ wireLengthMm: 'long', wireDiameterMm: '9 mm' }, ' '), null, 'mm');
    expect([...(read.errors ?? new Map<string, string>())]).toEqual([
      ['wireLengthMm', 'A number is missing.'],
      ['name', 'Give it a name.'],
      ['wireDiameterMm', expect.stringContaining('between 0 and 3 mm')],
    ]);
  });

  it('finds the field that an answer of the server speaks of', () => {
    const at = (path: string) => placeOf(path.split('.'), 'wire');
    expect(at('name')).toBe('name');
    expect(at('settings.travelXMm')).toBe('travelXMm');
    expect(at('settings.controller.axes.leftX')).toBe('controller-axes-leftX');
    expect(at('settings.controller.axes')).toBe('controller-axes-leftX');
    expect(at('settings.controller.header.3')).toBe('controller-header');
    expect(at('settings.kind')).toBe('root');
    expect(at('revision')).toBe('root');
  });
});
