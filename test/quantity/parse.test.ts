import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  DIMENSIONS,
  type Dimension,
  dbFromNepers,
  nepersFromDb,
  parseQuantity,
  quantityPattern,
  visible,
} from '../../src/quantity/index.js';

const value = (written: unknown, dimension: Dimension) => {
  const read = parseQuantity(written, dimension);
  return read.ok ? read.value : read.problem;
};
const laminate = { low: 20e-6, high: 3e-3, subject: 'the thickness of a laminate', unit: 'mm' };
const dimensions = Object.keys(DIMENSIONS) as Dimension[];

describe('parseQuantity', () => {
  // Powers of ten must give the very double of the literal, hence toBe.
  it.each<[string, Dimension, number]>([
    ['127 um', 'length', 127e-6],
    ['127um', 'length', 127e-6],
    ['127 µm', 'length', 127e-6], // U+00B5
    ['127 μm', 'length', 127e-6], // U+03BC
    ['0.127 mm', 'length', 0.127e-3],
    ['400 nm', 'length', 400e-9],
    ['2 cm', 'length', 0.02],
    ['1.2e-3 m', 'length', 1.2e-3],
    ['1.2E−3 m', 'length', 1.2e-3], // U+2212
    ['.5 mm', 'length', 0.5e-3],
    ['5. mm', 'length', 5e-3],
    ['+5 mm', 'length', 5e-3],
    ['76.5 GHz', 'frequency', 76.5e9],
    ['0.3 THz', 'frequency', 0.3e12],
    ['100 MHz', 'frequency', 100e6],
    ['10 kHz', 'frequency', 1e4],
    ['-40 degC', 'temperature', -40],
    ['−40 °C', 'temperature', -40],
    ['5 K', 'temperature_difference', 5],
    ['-40 ppm/K', 'temperature_coefficient', -40e-6],
    ['0.2 %/K', 'temperature_coefficient', 0.2e-2],
    ['0.00393 1/K', 'temperature_coefficient', 0.00393],
    ['1.5 rad', 'angle', 1.5],
    ['-12 dB', 'level', -12],
    ['13.5 dBi', 'gain', 13.5],
    ['0.9 dB/cm', 'loss_per_length', 90],
    ['0.09 dB/mm', 'loss_per_length', 90],
    ['90 dB/m', 'loss_per_length', 90],
    ['58 MS/m', 'conductivity', 58e6],
    ['1.7e6 S/m', 'conductivity', 1.7e6],
    ['50 ohm', 'resistance', 50],
    ['50 Ω', 'resistance', 50], // U+03A9
    ['50 Ω', 'resistance', 50], // U+2126
    ['1.2 kohm', 'resistance', 1200],
    ['50 %', 'ratio', 0.5],
    ['0.5', 'ratio', 0.5],
    ['50\u00a0ohm', 'resistance', 50],
  ])('reads %s as %s', (written, dimension, expected) => {
    expect(value(written, dimension)).toBe(expected);
  });

  // The inch is 25.4 mm exactly (international yard and pound agreement, 1959); relative 1e-15 for one product of doubles.
  it.each<[string, Dimension, number]>([
    ['5 mil', 'length', 127e-6],
    ['1 in', 'length', 25.4e-3],
    ['2.54 dB/in', 'loss_per_length', 100],
    ['180 deg', 'angle', Math.PI],
    ['45°', 'angle', Math.PI / 4],
    ['296.15 K', 'temperature', 23],
  ])('reads %s with a factor', (written, dimension, expected) => {
    const read = value(written, dimension) as number;
    expect(Math.abs(read - expected) / Math.abs(expected)).toBeLessThan(1e-14);
  });

  it('takes a number only where no unit is due', () => {
    expect(value(0.5, 'ratio')).toBe(0.5);
    expect(value(127, 'length')).toMatchObject({ found: '127' });
  });

  it('does not guess where a number glued to 1/K ends', () => {
    expect(value('0.003931/K', 'temperature_coefficient')).toMatchObject({ found: '"0.003931/K"' });
  });

  it('gives no negative zero', () => {
    expect(Object.is(value('-0 deg', 'angle'), 0)).toBe(true);
  });

  // What a person most likely meant, by the range of the place.
  it.each<[unknown, Dimension, typeof laminate | undefined, string | undefined]>([
    [127, 'length', laminate, 'Did you mean 127 um?'],
    ['127', 'length', laminate, 'Did you mean 127 um?'],
    ['127 mm', 'length', laminate, 'Did you mean 127 um?'],
    ['-127 um', 'length', laminate, 'Did you mean 127 um?'],
    ['0.127', 'length', laminate, 'Did you mean 0.127 mm?'],
    ['5', 'length', laminate, 'Did you mean 5 mil?'],
    ['127 UM', 'length', laminate, 'Did you mean 127 um?'],
    ['127 GHz', 'length', laminate, 'Did you mean 127 um?'],
    ['1e9 um', 'length', laminate, undefined],
    ['76.5', 'frequency', undefined, 'Did you mean 76.5 GHz?'],
    ['76.5 Ghz', 'frequency', undefined, 'Did you mean 76.5 GHz?'],
    ['76.5 mm', 'frequency', undefined, undefined],
    ['23 C', 'temperature', undefined, 'Did you mean 23 degC?'],
    ['76,5 GHz', 'frequency', undefined, 'Write 76.5 GHz.'],
    ['12 dB', 'level', { low: -80, high: 0, subject: 'a reflection', unit: 'dB' }, 'Did you mean -12 dB?'],
    ['13 dB', 'gain', undefined, undefined],
    [65, 'ratio', { low: 0, high: 1, subject: 'an efficiency', unit: '%' }, 'Did you mean 65 %?'],
  ])('mends %s', (written, dimension, range, fix) => {
    const read = parseQuantity(written, dimension, range);
    expect(read.ok ? read : read.problem.fix).toBe(fix);
  });

  it('says what was found, the range in a fitting unit, and the units', () => {
    expect(parseQuantity('127 mm', 'length', laminate)).toEqual({
      ok: false,
      problem: {
        found: '"127 mm"',
        allowed: 'the thickness of a laminate lies between 0.02 and 3 mm',
        fix: 'Did you mean 127 um?',
      },
    });
    expect(value('wide', 'length')).toEqual({
      found: '"wide"',
      allowed: 'a length here carries its unit: um, mm, mil, nm, cm, in, m',
    });
  });

  it.each([
    null,
    true,
    undefined,
    {},
    [],
    '',
    ' ',
    'um',
    '1e999 m',
    '0x10 m',
    '1 2 mm',
    '1_000 um',
    'NaN m',
    'Infinity m',
    '--1 m',
    '1e m',
  ])('refuses %s as a length', (written) => {
    expect(parseQuantity(written, 'length').ok).toBe(false);
  });

  it('limits are inside the range', () => {
    expect(parseQuantity('0.02 mm', 'length', laminate).ok).toBe(true);
    expect(parseQuantity('3 mm', 'length', laminate).ok).toBe(true);
  });

  it('survives any text, and its pattern for editors accepts just what it reads', () => {
    const unit = fc.constantFrom(
      ...dimensions.flatMap((d) => DIMENSIONS[d].units.flatMap((u) => [...u.spellings])),
      '',
      'x',
    );
    const number = fc.oneof(
      fc.double({ noNaN: true, noDefaultInfinity: true, min: -1e200, max: 1e200 }).map(String),
      fc.constantFrom('.', '1.', '.1', '1e', '+1', '−2', '1,5', ''),
    );
    const text = fc.oneof(
      fc.string(),
      fc.tuple(number, fc.constantFrom('', ' ', '\u00a0'), unit).map((p) => p.join('')),
    );
    fc.assert(
      fc.property(text, fc.constantFrom(...dimensions), (written, dimension) => {
        expect(new RegExp(quantityPattern(dimension), 'u').test(written)).toBe(parseQuantity(written, dimension).ok);
      }),
      { seed: 7, numRuns: 2000 },
    );
  });
});

describe('visible', () => {
  it('shows what could steer a terminal or turn a line around', () => {
    expect(visible('a\u001b[31m\u202eb\u0000\ud800c')).toBe('a\\u001b[31m\\u202eb\\u0000\\ud800c');
    expect(visible('127 µm ± 5 😀')).toBe('127 µm ± 5 😀');
  });
});

describe('nepers', () => {
  // Pozar, Microwave Engineering, 4th ed., section 2.1 (value from memory): 1 Np = 8.686 dB, four printed digits.
  it('1 Np is 8.686 dB', () => {
    expect(Math.abs(dbFromNepers(1) - 8.686)).toBeLessThan(0.0005);
    expect(nepersFromDb(dbFromNepers(3.7))).toBeCloseTo(3.7, 14);
  });
});
