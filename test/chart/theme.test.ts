import { describe, expect, it } from 'vitest';
import { theme } from '../../src/chart/theme.js';

// WCAG 2.2, definitions of relative luminance and contrast ratio.
function luminance(hex: string): number {
  const [r, g, b] = [1, 3, 5].map((at) => {
    const c = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
    return c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}
function contrast(a: string, b: string): number {
  const [high, low] = [luminance(a), luminance(b)].sort((x, y) => y - x);
  return (high + 0.05) / (low + 0.05);
}

describe('palette', () => {
  it('measures contrast as WCAG does', () => {
    expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 9);
    // The grey that is known as the lightest to pass on white.
    expect(contrast('#767676', '#ffffff')).toBeCloseTo(4.54, 2);
  });

  it.each(['light', 'dark'] as const)('reads on paper and wash, %s', (scheme) => {
    const colours = theme[scheme];
    for (const ground of [colours.paper, colours.wash]) {
      for (const text of [colours.ink, colours.muted, colours.accent, ...Object.values(colours.status)]) {
        expect(contrast(text, ground), `${text} on ${ground}`).toBeGreaterThanOrEqual(4.5);
      }
    }
  });

  it('draws lines and limits that stand out from the paper of figures', () => {
    const { figure } = theme;
    for (const line of [...theme.series, theme.emphasis].map((style) => style.color).concat(figure.limit)) {
      expect(contrast(line, figure.paper), line).toBeGreaterThanOrEqual(3);
    }
    for (const text of [figure.ink, figure.muted, figure.limit, figure.accent]) {
      expect(contrast(text, figure.paper), text).toBeGreaterThanOrEqual(4.5);
    }
  });

  it('gives every line of a chart a dash of its own', () => {
    const dashes = theme.series.map((style) => style.dash.join(' '));
    expect(new Set(dashes).size).toBe(dashes.length);
    expect(dashes.length).toBeGreaterThanOrEqual(8);
  });
});
