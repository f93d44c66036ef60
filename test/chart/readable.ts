import { expect } from 'vitest';
import { textWidth } from '../../src/chart/font.js';
import type { Drawing, TextShape } from '../../src/chart/shapes.js';

export const texts = (list: Drawing) => list.shapes.filter((shape) => shape.shape === 'text');

function box(text: TextShape) {
  const width = textWidth(text.text, text.size, text.bold);
  const x = text.x - (text.anchor === 'start' ? 0 : text.anchor === 'middle' ? width / 2 : width);
  return { x1: x, x2: x + width, y1: text.y - text.size * 0.75, y2: text.y + text.size * 0.2 };
}

/** No text outside the picture, and none on another. */
export function expectReadable(list: Drawing): void {
  const level = texts(list).filter((text) => !text.rotate);
  level.forEach((text, i) => {
    const a = box(text);
    expect(a.x1, text.text).toBeGreaterThanOrEqual(0);
    expect(a.x2, text.text).toBeLessThanOrEqual(list.width);
    expect(a.y1, text.text).toBeGreaterThanOrEqual(0);
    expect(a.y2, text.text).toBeLessThanOrEqual(list.height);
    for (const other of level.slice(i + 1)) {
      const b = box(other);
      const touch =
        Math.min(a.x2, b.x2) - Math.max(a.x1, b.x1) > 0.2 && Math.min(a.y2, b.y2) - Math.max(a.y1, b.y1) > 0.2;
      expect(touch, `"${text.text}" and "${other.text}"`).toBe(false);
    }
  });
}
