import { describe, expect, it } from 'vitest';
import { CanvasContext, fontOf } from '../../../src/render/pdf/canvas-context.js';
import type { Press } from '../../../src/render/pdf/press.js';

/** Notes what reaches the page. */
function recorder() {
  const calls: { readonly name: string; readonly args: readonly unknown[] }[] = [];
  const doc: unknown = new Proxy(
    {},
    {
      get:
        (_, name) =>
        (...args: unknown[]) => {
          calls.push({ name: String(name), args });
          return doc;
        },
    },
  );
  const press = {
    doc,
    glyphs: (text: string, face: string) => [{ text, face, fromRight: false }],
    widthOf: (text: string, _face: string, size: number) => text.length * size * 0.5,
    paintText: (...args: unknown[]) => calls.push({ name: 'paintText', args }),
  };
  const named = (name: string) => calls.filter((call) => call.name === name).map((call) => call.args);
  return {
    calls,
    named,
    context: (x = 0, y = 0, scale = 1) => new CanvasContext(press as unknown as Press, x, y, scale),
  };
}

describe('canvas calls on a page', () => {
  it('place a path where it was drawn, though the origin moves back before it is stroked', () => {
    const { named, context } = recorder();
    const canvas = context(100, 50, 2);
    canvas.translate(10, 20);
    canvas.beginPath();
    canvas.moveTo(1, 1);
    canvas.lineTo(3, 1);
    canvas.translate(-10, -20);
    canvas.lineWidth = 1.5;
    canvas.stroke();
    expect(named('moveTo')).toEqual([[122, 92]]);
    expect(named('lineTo')).toEqual([[126, 92]]);
    expect(named('lineWidth')).toEqual([[3]]);
  });

  it('keep the path over fill, so that stroke draws the same one', () => {
    const { named, context } = recorder();
    const canvas = context();
    canvas.beginPath();
    canvas.rect(1, 2, 3, 4);
    canvas.fill();
    canvas.stroke();
    expect(named('moveTo')).toEqual([
      [1, 2],
      [1, 2],
    ]);
    expect(named('closePath')).toHaveLength(2);
  });

  it.each([
    [[], undefined],
    [[1, 0], undefined],
    [[0, 0], undefined],
    [
      [6, 3],
      [12, 6],
    ],
    [
      [0, 4],
      [0.02, 8],
    ],
    [[5], [10]],
  ])('dash %j as %j', (dash, expected) => {
    const { named, context } = recorder();
    const canvas = context(0, 0, 2);
    canvas.setLineDash(dash);
    canvas.beginPath();
    canvas.moveTo(0, 0);
    canvas.lineTo(9, 0);
    canvas.stroke();
    expect(named('dash').map(([lengths]) => lengths)).toEqual(expected === undefined ? [] : [expected]);
  });

  it('undo matrix, colours and font with restore', () => {
    const { named, context } = recorder();
    const canvas = context();
    canvas.fillStyle = '#ff0000';
    canvas.save();
    canvas.translate(50, 50);
    canvas.fillStyle = '#00ff00';
    canvas.restore();
    canvas.fillRect(0, 0, 1, 1);
    expect(named('fillColor')).toEqual([[[255, 0, 0]]]);
    expect(named('moveTo')).toEqual([[0, 0]]);
  });

  it('draw nothing in a transparent colour and less of a pale one', () => {
    const { named, context } = recorder();
    const canvas = context();
    canvas.fillStyle = 'transparent';
    canvas.fillRect(0, 0, 1, 1);
    expect(named('fill')).toHaveLength(0);
    canvas.fillStyle = 'rgba(0, 0, 255, 0.5)';
    canvas.globalAlpha = 0.5;
    canvas.fillRect(0, 0, 1, 1);
    expect(named('fillOpacity')).toEqual([[0.25]]);
    canvas.fillStyle = 'no colour';
    expect(() => canvas.fillRect(0, 0, 1, 1)).toThrow(/not a plain colour/);
  });

  it('draw circles as round as four cubic pieces can be', () => {
    const { named, context } = recorder();
    const canvas = context();
    canvas.beginPath();
    canvas.moveTo(10, 0);
    canvas.arc(0, 0, 10, 0, 2 * Math.PI);
    canvas.fill();
    const curves = named('bezierCurveTo') as number[][];
    expect(curves).toHaveLength(4);
    let from = [10, 0];
    for (const [x1, y1, x2, y2, x, y] of curves) {
      // The middle of a cubic piece: (P0 + 3 P1 + 3 P2 + P3) / 8; a quarter turn is off by at most 2.7e-4.
      const middle = Math.hypot((from[0] + 3 * x1 + 3 * x2 + x) / 8, (from[1] + 3 * y1 + 3 * y2 + y) / 8);
      expect(Math.abs(middle - 10)).toBeLessThan(0.003);
      expect(Math.hypot(x, y)).toBeCloseTo(10, 9);
      from = [x, y];
    }
    expect(from[0]).toBeCloseTo(10, 9);
  });

  it('raise a quadratic curve to the same cubic', () => {
    const { named, context } = recorder();
    const canvas = context();
    canvas.beginPath();
    canvas.moveTo(0, 0);
    canvas.quadraticCurveTo(6, 12, 12, 0);
    canvas.stroke();
    expect(named('bezierCurveTo')).toEqual([[4, 8, 8, 8, 12, 0]]);
  });

  it.each([
    ['left', 10],
    ['center', 0],
    ['right', -10],
  ])('align text %s', (align, left) => {
    const { named, context } = recorder();
    const canvas = context();
    canvas.font = "bold 10px 'DejaVu Sans', sans-serif";
    canvas.textAlign = align;
    canvas.fillText('four', 10, 5);
    expect(named('paintText')).toEqual([['four', 'bold', 10, '#000000', left, 5]]);
  });

  it('read fonts', () => {
    expect(fontOf("11px 'DejaVu Sans', sans-serif")).toEqual({ size: 11, face: 'sans' });
    expect(fontOf("600 9.5px 'DejaVu Sans'")).toEqual({ size: 9.5, face: 'bold' });
    expect(fontOf("10px 'DejaVu Sans Mono'")).toEqual({ size: 10, face: 'mono' });
  });

  it('refuse what they cannot draw', () => {
    const canvas = recorder().context();
    expect(() => canvas.drawImage()).toThrow();
    expect(() => canvas.createLinearGradient()).toThrow();
  });
});
