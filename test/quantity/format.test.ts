import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  DIMENSIONS,
  type Dimension,
  type FormatOptions,
  formatNumber,
  formatQuantity,
  formatSpread,
  fromBase,
  parseQuantity,
  toBase,
} from '../../src/quantity/index.js';

/** Expected texts are written with plain spaces; the gap is a no-break space. */
const plain = (text: string) => text.replaceAll('\u00a0', ' ');

describe('formatQuantity', () => {
  it.each<[number, Dimension, FormatOptions, string]>([
    [127e-6, 'length', {}, '127 µm'],
    [18e-6, 'length', {}, '18.0 µm'],
    [0.4e-6, 'length', {}, '0.400 µm'],
    [1.06e-3, 'length', {}, '1.06 mm'],
    [127e-6, 'length', { unit: 'mm', decimals: 3 }, '0.127 mm'],
    [0, 'length', {}, '0 µm'],
    [76.5e9, 'frequency', {}, '76.50 GHz'],
    [100e6, 'frequency', {}, '100.00 MHz'],
    [-40, 'temperature', {}, '−40 °C'],
    [-12.4, 'level', {}, '−12.40 dB'],
    [-0.001, 'level', {}, '0.00 dB'],
    [0.5, 'level', { plus: true }, '+0.50 dB'],
    [0, 'level', { plus: true }, '0.00 dB'],
    [13.246, 'gain', {}, '13.25 dBi'],
    [Math.PI / 60, 'angle', {}, '3.0°'],
    [21.6, 'loss_per_length', {}, '0.216 dB/cm'],
    [58e6, 'conductivity', {}, '58.0 MS/m'],
    [50, 'resistance', {}, '50.0 Ω'],
    [0.654, 'ratio', {}, '65.4 %'],
    [0.654, 'ratio', { unit: '1' }, '0.654'],
    [-40e-6, 'temperature_coefficient', {}, '−40.0 ppm/K'],
    [Number.NaN, 'level', {}, '–'],
    [Number.NEGATIVE_INFINITY, 'level', {}, '−∞ dB'],
  ])('%d as %s', (value, dimension, options, expected) => {
    expect(plain(formatQuantity(value, dimension, options))).toBe(expected);
  });

  it('refuses a unit of another dimension', () => {
    expect(() => formatQuantity(1, 'length', { unit: 'GHz' })).toThrow(RangeError);
  });

  it('is read back as written, to half the last digit printed', () => {
    const dimensions = Object.keys(DIMENSIONS) as Dimension[];
    const mantissa = fc.double({ min: -999, max: 999, noNaN: true });
    const unitOf = fc
      .constantFrom(...dimensions)
      .chain((d) => fc.tuple(fc.constant(d), fc.constantFrom(...DIMENSIONS[d].units)));
    fc.assert(
      fc.property(mantissa, unitOf, fc.integer({ min: 0, max: 6 }), (m, [dimension, unit], decimals) => {
        const base = toBase(String(m), unit);
        const text = formatQuantity(base, dimension, { unit: unit.spellings[0]!, decimals });
        const read = parseQuantity(text, dimension);
        // 1e-12 for the two conversions, which lose a few units in the last place of 296 K.
        if (!read.ok) throw new Error(`${text}: ${read.problem.allowed}`);
        expect(Math.abs(fromBase(read.value, unit) - fromBase(base, unit))).toBeLessThanOrEqual(
          0.5 * 10 ** -decimals + 1e-12,
        );
      }),
      { seed: 11, numRuns: 1000 },
    );
  });

  it('customary units print a number near one to a thousand and are read back within their digits', () => {
    const sizes = fc.double({ min: 1e-9, max: 0.9, noNaN: true });
    fc.assert(
      fc.property(sizes, (length) => {
        const read = parseQuantity(formatQuantity(length, 'length'), 'length');
        // Three significant digits: half a unit in the third, at worst 0.5 % of the value.
        expect(read.ok && Math.abs(read.value / length - 1)).toBeLessThanOrEqual(0.0051);
      }),
      { seed: 13 },
    );
  });
});

describe('formatNumber', () => {
  it('uses the minus sign and never a signed zero', () => {
    expect(formatNumber(-2.345678, 2)).toBe('\u22122.35');
    expect(formatNumber(-0.004, 2)).toBe('0.00');
    expect(formatNumber(3, 1, { plus: true })).toBe('+3.0');
  });
});

describe('formatSpread', () => {
  it.each<[number, number, number, Dimension | 'number', string | undefined, string]>([
    [3, 0.05, 0.05, 'number', undefined, '3.00 ± 0.05'],
    [3.005, 0.05, 0.05, 'number', undefined, '3.005 ± 0.050'],
    [127e-6, 8e-6, 8e-6, 'length', undefined, '127 ± 8 µm'],
    [127e-6, 12.7e-6, 12.7e-6, 'length', undefined, '127.0 ± 12.7 µm'],
    [0.4e-6, 0.05e-6, 0.05e-6, 'length', undefined, '0.40 ± 0.05 µm'],
    [0.0015, 0.0002, 0.0004, 'number', undefined, '0.0015 (−0.0002, +0.0004)'],
    [1.7e6, 0.5e6, 0.5e6, 'conductivity', undefined, '1.7 ± 0.5 MS/m'],
    [18e-6, 0, 0, 'length', undefined, '18 µm'],
    [0.0015, 0, 0, 'number', undefined, '0.0015'],
    [0, 15e-6, 15e-6, 'length', undefined, '0 ± 15 µm'],
    [-40e-6, 20e-6, 20e-6, 'temperature_coefficient', undefined, '−40 ± 20 ppm/K'],
    [0.9, 0, 0.2, 'level', undefined, '0.9 (0.0, +0.2) dB'],
    [23, 2, 2, 'temperature', 'degC', '23 ± 2 °C'],
    [127e-6, 8e-6, 8e-6, 'length', 'mm', '0.127 ± 0.008 mm'],
  ])('%d −%d +%d as %s', (value, minus, plus, dimension, unit, expected) => {
    expect(plain(formatSpread(value, minus, plus, dimension, unit ? { unit } : {}))).toBe(expected);
  });
});
