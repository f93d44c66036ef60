import { describe, expect, it } from 'vitest';
import { changeText, marginText, powerAbove, scientific, statedNumber, valueText } from '../../src/dossier/values.js';

const spaced = (text: string) => text.replaceAll('\u00a0', ' ');

describe('figures for people', () => {
  it('carry their unit', () => {
    expect(spaced(valueText(16.159, 'dBi'))).toBe('16.16 dBi');
    expect(spaced(valueText(-0.001, 'dB'))).toBe('0.00 dB');
    expect(spaced(valueText(12.34, 'deg'))).toBe('12.3°');
    expect(spaced(valueText(0.8, 'N/mm'))).toBe('0.8 N/mm');
    expect(spaced(valueText('V-0', ''))).toBe('V-0');
  });

  it('never let a small miss read as a margin of zero', () => {
    expect(spaced(marginText(-0.004, 'dB'))).toBe('−0.004 dB');
    expect(spaced(marginText(0.0004, 'dB'))).toBe('+0.0004 dB');
    expect(spaced(marginText(0, 'dB'))).toBe('0.00 dB');
    expect(spaced(marginText(-1e-15, 'dB'))).toBe('0.00 dB');
    expect(spaced(marginText(2.5, 'dBi'))).toBe('+2.50 dB');
  });

  it('hold number and unit together on a line', () => {
    expect(valueText(1, 'dB')).toBe('1.00\u00a0dB');
  });

  it('round changes as values are rounded', () => {
    expect(spaced(changeText(-0.004, 'dB'))).toBe('0.00 dB');
    expect(spaced(changeText(0.46, 'dB/cm'))).toBe('+0.460 dB/cm');
  });

  it('print stated numbers in full', () => {
    expect(spaced(statedNumber(-12))).toBe('−12');
    expect(spaced(statedNumber(0.00131))).toBe('0.00131');
  });

  it('write powers of ten with superscripts', () => {
    expect(spaced(scientific(2.41e-7))).toBe('2.4 × 10⁻⁷');
    expect(spaced(scientific(-3e8))).toBe('−3.0 × 10⁸');
    expect(spaced(powerAbove(3.1e-11))).toBe('10⁻¹⁰');
    expect(spaced(powerAbove(3.1e-15))).toBe('10⁻¹²');
    expect(spaced(powerAbove(0))).toBe('10⁻¹²');
  });
});
