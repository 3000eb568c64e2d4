import { describe, expect, it } from 'vitest';
import { formatFlight, readFlight } from '#client/flight-conditions/quantities.ts';

describe('quantities of flight', () => {
  it.each([
    ['4.2', 'mass', 4.2],
    ['850 g', 'mass', 0.85],
    ['10 lb', 'mass', 4.5359237],
    ['58 dm²', 'area', 0.58],
    ['0.58', 'area', 0.58],
    ['60 km/h', 'speed', 60 / 3.6],
    ['1000 ft', 'altitude', 304.8],
    ['-12.5', 'temperature', -12.5],
    ['-12.5 °C', 'temperature', -12.5],
    ['5 %', 'station', 0.05],
    ['7,5', 'station', 0.075],
    ['0.3*2', 'lift', 0.6],
    ['24 cm', 'chord', 240],
    ['240', 'chord', 240],
    ['9 in', 'chord', 228.6],
    ['2.4', 'span', 2.4],
    ['1.2+1.2', 'span', 2.4],
    ['1800 mm', 'span', 1.8],
  ] as const)('reads %s of %s', (text, quantity, value) => {
    expect(readFlight(text, quantity, 'mm').value).toBeCloseTo(value, 12);
  });

  it('takes a bare length in inches from whom speaks inches', () => {
    expect(readFlight('10', 'chord', 'inch').value).toBe(254);
    expect(readFlight('100', 'span', 'inch').value).toBe(2.54);
  });

  it.each([
    ['', 'mass', 'Type a number, such as 4.2 or 850 g.'],
    ['fast', 'speed', 'A number is missing.'],
    ['12 %', 'chord', 'Type a length: there is no chord here that a percentage is of.'],
  ] as const)('says why it cannot read %j of %s', (text, quantity, sentence) => {
    const { error, value } = readFlight(text, quantity, 'mm');
    expect(value).toBeUndefined();
    expect(error).toBe(sentence);
  });

  it.each([
    [4.2, 'mass', '4.200 kg', '4.200 kg'],
    [0.05, 'station', '5.0 %', '5.0 %'],
    [-12.5, 'temperature', '-12.5 °C', '-12.5 °C'],
    [240, 'chord', '240.0 mm', '9.45 in'],
    [2.4, 'span', '2.400 m', '94.49 in'],
    [0.6, 'lift', '0.60', '0.60'],
  ] as const)('writes %d of %s', (value, quantity, mm, inch) => {
    expect(formatFlight(value, quantity, 'mm')).toBe(mm);
    expect(formatFlight(value, quantity, 'inch')).toBe(inch);
  });
});
