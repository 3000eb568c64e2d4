import { describe, expect, it } from 'vitest';
import { formatShopQuantity, readShopQuantity } from '#client/shop/quantities.ts';

describe('reading', () => {
  it.each([
    ['620', 'length', 'mm', 620],
    ['2 in', 'length', 'mm', 50.8],
    ['2', 'length', 'inch', 50.8],
    ['600+20', 'length', 'mm', 620],
    ['200', 'feed', 'mm', 200],
    ['200 mm/min', 'feed', 'inch', 200],
    ['5 mm/s', 'feed', 'mm', 300],
    ['0.2 m/min', 'feed', 'mm', 200],
    ['10 in/min', 'feed', 'mm', 254],
    ['10', 'feed', 'inch', 254],
    ['2*100 mm/min', 'feed', 'mm', 200],
    ['32', 'density', 'inch', 32],
    ['32 kg/m³', 'density', 'mm', 32],
    ['32 KG/M3', 'density', 'mm', 32],
  ] as const)('takes %s as a %s typed in %s for %s', (text, quantity, units, value) => {
    expect(readShopQuantity(text, quantity, units)).toEqual({ value });
  });

  it.each([
    ['', 'length'],
    ['5 %', 'length'],
    ['1/0', 'length'],
    ['fast', 'feed'],
    ['', 'feed'],
    ['200 kg/m³', 'feed'],
    ['1/0', 'feed'],
    ['mm/min', 'feed'],
    ['32 mm', 'density'],
  ] as const)('says why it cannot take “%s” as a %s', (text, quantity) => {
    const read = readShopQuantity(text, quantity, 'mm');
    expect(read.value).toBeUndefined();
    expect(read.error).toMatch(/\w{3,}.*[.]$/);
  });
});

describe('writing', () => {
  it('names the unit of the person', () => {
    expect(formatShopQuantity(254, 'feed', 'mm', 0)).toBe('254 mm/min');
    expect(formatShopQuantity(254, 'feed', 'inch', 0)).toBe('10.0 in/min');
    expect(formatShopQuantity(254, 'length', 'inch', 1)).toBe('10.00 in');
    expect(formatShopQuantity(32, 'density', 'inch', 0)).toBe('32 kg/m³');
  });
});
