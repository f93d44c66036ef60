import fc from 'fast-check';
import { beforeAll, describe, expect, it } from 'vitest';
import { columnWidths } from '../../../src/render/pdf/column-widths.js';
import { type Box, Flow } from '../../../src/render/pdf/flow.js';
import { page } from '../../../src/render/pdf/layout.js';
import { LineSetter } from '../../../src/render/pdf/lines.js';
import { Press } from '../../../src/render/pdf/press.js';
import { plain, textRuns } from '../../../src/render/pdf/runs.js';
import { replacementSign, safeText } from '../../../src/render/pdf/safe-text.js';

const sum = (values: readonly number[]) => values.reduce((total, value) => total + value, 0);
let press: Press;
beforeAll(() => {
  press = new Press({ CreationDate: new Date(0) });
  press.newPage();
});

describe('lines', () => {
  const set = (text: string, room: number, size = 9) => new LineSetter(press, size).lines(textRuns(text), room);
  const textOf = (lines: ReturnType<typeof set>) =>
    lines.map((line) => line.pieces.map((p) => p.text).join('')).join('');

  it('never grow wider than their room and lose no sign, whatever the text', () => {
    fc.assert(
      fc.property(
        fc.string({ unit: fc.constantFrom(...'abc WMiñß½−°.-/ \u05d0\u0627\u0301\u4e2d'), maxLength: 200 }),
        fc.integer({ min: 30, max: 300 }),
        (text, room) => {
          const lines = set(text, room);
          // Kerning may differ between signs measured singly and together: a hundredth of the size of type each.
          for (const line of lines) expect(line.width).toBeLessThanOrEqual(room + 0.5);
          const signs = (value: string) => [...value.replace(/ /g, '')].sort().join('');
          expect(signs(textOf(lines))).toBe(signs(text.replaceAll('\u4e2d', replacementSign)));
        },
      ),
      { seed: 11, numRuns: 300 },
    );
  });

  it('are filled greedily: the first word of a line would not have fitted on the line before', () => {
    const lines = set('one sentence of plain words that needs a few lines to be set in a narrow column', 90);
    expect(lines.length).toBeGreaterThan(3);
    lines.slice(1).forEach((line, i) => {
      const first = line.pieces[0].text.split(' ')[0];
      expect(lines[i].width + press.widthOf(` ${first}`, 'sans', 9)).toBeGreaterThan(90);
    });
  });

  it.each([
    ['the limit is 12.5 dBi here', '12.5 dBi'],
    ['not above ≤ −18.0 dB anywhere', '≤ −18.0 dB'],
    ['a spread of ± 0.25 N/mm over', '± 0.25 N/mm'],
    ['hot means 105 °C, cold', '105 °C,'],
  ])('keep a number with its unit and its sign of relation: %s', (text, together) => {
    for (let room = press.widthOf(together, 'sans', 9) + 1; room < 160; room += 3) {
      const lines = set(text, room).map((line) => line.pieces.map((piece) => piece.text).join(''));
      expect(lines.some((line) => line.includes(together))).toBe(true);
    }
  });

  it('break a long path after a separator where one is near the end', () => {
    const lines = set('manifests/quillback/boards/candidate-number-two.yaml', 110);
    for (const line of lines.slice(0, -1)) expect(line.pieces[0].text).toMatch(/[-/.]$/);
  });

  it('put words from the right in their order and keep their spaces', () => {
    const [line] = set('a \u05d0\u05d1 \u05d2\u05d3 b', 300);
    expect(line.pieces.map((piece) => piece.text).join('')).toBe('a \u05d2\u05d3 \u05d0\u05d1 b');
  });

  it('give a status room for its shape', () => {
    const setter = new LineSetter(press, 10);
    const bare = setter.lines([{ ...plain, text: 'meets' }], 200)[0].width;
    expect(setter.lines([{ ...plain, text: 'meets', shape: 'meets' }], 200)[0].width).toBeGreaterThan(bare + 10);
  });
});

describe('safe text', () => {
  it('replaces what has no picture and keeps what has', () => {
    expect(safeText('a\tb\r\nc\u2028d')).toBe('a b c d');
    expect(safeText('\ud800x\udc00')).toBe(`${replacementSign}x${replacementSign}`);
    expect(safeText('\u{1f4e1}é\u0301δ')).toBe('\u{1f4e1}é\u0301δ');
    expect(safeText('\u202eabc\u200b')).toBe(`${replacementSign}abc${replacementSign}`);
  });
});

describe('column widths', () => {
  const wish = fc.record({
    least: fc.double({ min: 1, max: 300, noNaN: true }),
    cells: fc.array(fc.double({ min: 0, max: 900, noNaN: true }), { maxLength: 6 }),
    hint: fc.double({ min: 0.1, max: 5, noNaN: true }),
  });

  it('fill the room exactly and give each column its least while there is room for all', () => {
    fc.assert(
      fc.property(fc.array(wish, { minLength: 1, maxLength: 14 }), (columns) => {
        const widths = columnWidths(columns, 493);
        expect(sum(widths)).toBeCloseTo(493, 6);
        if (sum(columns.map((column) => column.least)) <= 493) {
          widths.forEach((width, i) => {
            expect(width).toBeGreaterThanOrEqual(columns[i].least - 1e-6);
          });
        } else {
          for (const width of widths) expect(width).toBeGreaterThan(0);
        }
      }),
      { seed: 5, numRuns: 300 },
    );
  });

  it('leave narrow columns whole where a wide one must shrink', () => {
    const wide = { least: 900, cells: [900], hint: 1 };
    expect(columnWidths([{ least: 40, cells: [40], hint: 1 }, wide], 493)).toEqual([40, 453]);
  });

  it('set no cell in two lines where there is room for all', () => {
    const widths = columnWidths(
      [
        { least: 40, cells: [40, 120], hint: 1 },
        { least: 40, cells: [200, 60], hint: 1 },
      ],
      493,
    );
    expect(widths[0]).toBeGreaterThanOrEqual(120);
    expect(widths[1]).toBeGreaterThanOrEqual(200);
  });

  it('give the room to the column whose text makes the rows high', () => {
    const short = { least: 40, cells: [60, 60, 60], hint: 1 };
    const long = { least: 40, cells: [900, 900, 900], hint: 1 };
    const [first, second] = columnWidths([short, long], 300);
    expect(second).toBeGreaterThan(4 * first);
  });
});

describe('flow of boxes', () => {
  interface Placed {
    readonly id: number;
    readonly page: number;
    readonly top: number;
  }
  const boxes = fc.array(
    fc.record({
      height: fc.integer({ min: 1, max: 120 }),
      before: fc.integer({ min: 0, max: 20 }),
      keep: fc.boolean(),
      newPage: fc.constant(false),
    }),
    { minLength: 1, maxLength: 60 },
  );

  it('never runs over the foot, keeps the order, and keeps together what fits on a page', () => {
    fc.assert(
      fc.property(boxes, (data) => {
        let current = -1;
        const counter = {
          get pageIndex() {
            return current;
          },
          newPage: () => {
            current += 1;
          },
        };
        const flow = new Flow(counter as unknown as Press, page.bodyTop + 300);
        const placed: Placed[] = [];
        flow.place(data.map((box, id): Box => ({ ...box, paint: (top) => placed.push({ id, page: current, top }) })));
        expect(placed.map((box) => box.id)).toEqual(data.map((_, i) => i));
        placed.forEach((box, i) => {
          expect(box.top + data[i].height).toBeLessThanOrEqual(page.bodyTop + 300 + 0.01);
          const next = placed[i + 1];
          if (next?.page === box.page) expect(next.top).toBe(box.top + data[i].height + data[i + 1].before);
        });
        let start = 0;
        for (let end = 1; end <= data.length; end += 1) {
          if (end < data.length && data[end - 1].keep) continue;
          const group = data.slice(start, end);
          const height = sum(group.map((box, i) => box.height + (i === 0 ? 0 : box.before)));
          if (height <= 300) expect(new Set(placed.slice(start, end).map((box) => box.page)).size).toBe(1);
          start = end;
        }
      }),
      { seed: 7, numRuns: 300 },
    );
  });

  it('shrinks a picture, as far as it may, rather than leave the rest of a page empty', () => {
    const place = (least: number) => {
      let current = -1;
      const counter = {
        get pageIndex() {
          return current;
        },
        newPage: () => {
          current += 1;
        },
      };
      const painted: [number, number][] = [];
      new Flow(counter as unknown as Press, page.bodyTop + 100).place([
        { height: 40, paint: () => undefined },
        { height: 10, keep: true, paint: () => undefined },
        { height: 60, least, keep: true, paint: (_, height) => painted.push([current, height]) },
        { height: 5, paint: (top) => expect(top).toBeLessThanOrEqual(page.bodyTop + 95) },
      ]);
      return painted;
    };
    expect(place(45)).toEqual([[0, 45]]);
    expect(place(46)).toEqual([[1, 60]]);
  });

  it('repeats the head where a row is the first on a page', () => {
    let current = -1;
    const counter = {
      get pageIndex() {
        return current;
      },
      newPage: () => {
        current += 1;
      },
    };
    const flow = new Flow(counter as unknown as Press, page.bodyTop + 100);
    const heads: number[] = [];
    const rows: [number, number][] = [];
    const repeat = { height: 10, paint: () => heads.push(current) };
    flow.place([
      { height: 10, keep: true, paint: () => undefined },
      ...Array.from({ length: 9 }, () => ({ height: 30, repeat, paint: (top: number) => rows.push([current, top]) })),
    ]);
    expect(heads).toEqual([1, 2]);
    expect(rows.map(([at]) => at)).toEqual([0, 0, 0, 1, 1, 1, 2, 2, 2]);
    expect(rows[3][1]).toBe(page.bodyTop + 10);
  });
});
