import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { textWidth } from '../../src/chart/font.js';
import { choosePlace, shorten, spread, stackFlags } from '../../src/chart/labels.js';
import { wrapText } from '../../src/chart/wrap.js';

const seed = 20261116;
const height = fc.double({ min: -20, max: 320, noNaN: true });

describe('spreading labels', () => {
  it('leaves alone what does not touch, and shares a place evenly', () => {
    expect(spread([10, 100, 50], 14, 0, 300)).toEqual([10, 100, 50]);
    expect(spread([100, 100], 14, 0, 300)).toEqual([93, 107]);
    expect(spread([300, 300, 300], 14, 0, 300)).toEqual([272, 286, 300]);
  });

  it('keeps the gap, the order and the bounds while there is room', () => {
    fc.assert(
      fc.property(fc.array(height, { maxLength: 20 }), (wanted) => {
        const placed = spread(wanted, 14, 0, 300);
        const order = wanted.map((_, i) => i).sort((a, b) => wanted[a] - wanted[b] || a - b);
        order.forEach((index, n) => {
          expect(placed[index]).toBeGreaterThanOrEqual(-1e-6);
          expect(placed[index]).toBeLessThanOrEqual(300 + 1e-6);
          if (n > 0) expect(placed[index] - placed[order[n - 1]]).toBeGreaterThanOrEqual(14 - 1e-6);
        });
      }),
      { seed },
    );
  });
});

describe('labels over vertical marks', () => {
  it('never lie on each other or on the line of another', () => {
    const flag = fc.record({ text: fc.string({ minLength: 1, maxLength: 24 }), at: fc.integer({ min: 0, max: 450 }) });
    fc.assert(
      fc.property(fc.uniqueArray(flag, { maxLength: 6, selector: (f) => Math.round(f.at / 10) }), (flags) => {
        const placed = stackFlags(flags, 11, 600);
        const extent = (i: number) => {
          const width = textWidth(placed[i].text, 11) + 4;
          return placed[i].align === 'left'
            ? [placed[i].at, placed[i].at + width]
            : [placed[i].at - width, placed[i].at];
        };
        for (let i = 0; i < placed.length; i += 1) {
          for (let j = 0; j < placed.length; j += 1) {
            if (i === j) continue;
            const [a, b] = extent(i);
            const [c, d] = extent(j);
            if (placed[i].row === placed[j].row) expect(b < c || d < a).toBe(true);
            // The line of j rises through the row of i.
            if (placed[j].row > placed[i].row) expect(placed[j].at < a || placed[j].at > b).toBe(true);
          }
        }
      }),
      { seed },
    );
  });
});

describe('places for names of limits', () => {
  const box = (x: number, y: number) => ({ x, y, width: 50, height: 13 });

  it('avoid other names first, then curves', () => {
    expect(choosePlace([box(0, 0), box(100, 0)], [box(40, 5)], [])).toEqual(box(100, 0));
    expect(choosePlace([box(0, 0), box(100, 0)], [], [[10, 5]])).toEqual(box(100, 0));
    expect(choosePlace([box(0, 0), box(100, 0)], [box(90, 5)], [[10, 5]])).toEqual(box(0, 0));
  });
});

describe('long texts', () => {
  it('are cut to a width by whole signs', () => {
    expect(shorten('Gradient', 11, 100)).toBe('Gradient');
    const cut = shorten('\u{1d6ff}'.repeat(100), 11, 100);
    expect(textWidth(cut, 11)).toBeLessThanOrEqual(100);
    expect(cut).not.toMatch(/\p{Surrogate}/u);
    expect(cut.endsWith('…')).toBe(true);
  });

  it('wrap without losing a sign', () => {
    fc.assert(
      fc.property(fc.string({ maxLength: 80, unit: 'grapheme' }), (text) => {
        const lines = wrapText(text, 8, 60);
        for (const line of lines) expect(textWidth(line, 8) <= 60 || Array.from(line).length === 1).toBe(true);
        expect(lines.join('').replace(/\s+/gu, '')).toBe(text.replace(/\s+/gu, ''));
      }),
      { seed },
    );
  });
});
