import { describe, expect, it } from 'vitest';
import { textWidth } from '../../src/chart/font.js';

describe('advance widths', () => {
  // DejaVu Sans 2.37, hmtx table: figures 1303, U+2212 1716, space 651, of 2048 units per em (values from memory).
  it('are those of the font', () => {
    expect(textWidth('0', 2048)).toBe(1303);
    expect(textWidth('\u2212', 2048)).toBe(1716);
    expect(textWidth(' ', 2048)).toBe(651);
  });

  it('add up, scale with size and are wider in bold', () => {
    expect(textWidth('−18 dB', 11)).toBeCloseTo(
      Array.from('−18 dB').reduce((sum, sign) => sum + textWidth(sign, 11), 0),
      9,
    );
    expect(textWidth('gain', 22)).toBeCloseTo(2 * textWidth('gain', 11), 9);
    expect(textWidth('gain', 11, true)).toBeGreaterThan(textWidth('gain', 11));
    expect(textWidth('', 11)).toBe(0);
  });

  it('measure a sign outside the basic plane as one sign', () => {
    expect(textWidth('\u{1d6ff}', 10)).toBeLessThanOrEqual(10.5);
  });
});
