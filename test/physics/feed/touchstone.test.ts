import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { abs, complex, polar, sub } from '../../../src/numerics/complex.js';
import {
  formatTouchstone,
  parseTouchstone,
  type ScatteringTable,
  scatteringAt,
  TouchstoneError,
  tableOf,
  transitionOf,
} from '../../../src/physics/feed/index.js';

const fault = (text: string, ports = 2): TouchstoneError => {
  try {
    parseTouchstone(text, ports);
  } catch (error) {
    if (error instanceof TouchstoneError) return error;
    throw error;
  }
  throw new Error('it was read without complaint');
};

describe('Touchstone', () => {
  it('reads a two-port in its own order, in any of the three number formats', () => {
    const files = [
      '! made up\n# GHz S RI R 50\n76 0.1 0 0 0.9 0 0.8 -0.2 0\n77 0 0 0 1 0 1 0 0 ! end\n',
      '#hz s ma r 50\n76e9 0.1 0 0.9 90 0.8 90 0.2 180\n77e9 0 0 1 90 1 90 0 0',
      `# MHz DB R 50 S\r\n76000 -20 0 ${20 * Math.log10(0.9)} 90 ${20 * Math.log10(0.8)} 90\r\n ${20 * Math.log10(0.2)} 180\r\n77000 -400 0 0 90 0 90 -400 0\r\n`,
    ];
    for (const file of files) {
      const { points, referenceImpedance } = parseTouchstone(file, 2);
      expect(referenceImpedance).toBe(50);
      expect(points.map((p) => p.frequency)).toEqual([76e9, 77e9]);
      const [[s11, s12], [s21, s22]] = points[0].s;
      expect(abs(sub(s11, complex(0.1)))).toBeLessThan(1e-12);
      expect(abs(sub(s21, complex(0, 0.9)))).toBeLessThan(1e-12);
      expect(abs(sub(s12, complex(0, 0.8)))).toBeLessThan(1e-12);
      expect(abs(sub(s22, complex(-0.2)))).toBeLessThan(1e-12);
    }
  });

  it('takes GHz S MA R 50 for what an option line leaves out, and passes over noise data', () => {
    const table = parseTouchstone(
      '#\n1 .5 0 .1 0 .1 0 .5 0\n2 .5 0 .1 0 .1 0 .5 0\n1 2.5 .3 40 .5\n2 2.6 .3 40 .5\n',
      2,
    );
    expect(table.points).toHaveLength(2);
    expect(table.points[1]).toMatchObject({ frequency: 2e9 });
  });

  it('reads rows of three and four ports', () => {
    const row = (k: number): string => [1, 2, 3].map((j) => `0.${k}${j} 0`).join(' ');
    const { points } = parseTouchstone(`# GHz S RI R 75\n77 ${row(1)}\n${row(2)}\n${row(3)}\n`, 3);
    expect(points[0].s[1][2].re).toBe(0.23);
    expect(points[0].s[2][1].re).toBe(0.32);
  });

  it('comes back from its own text', () => {
    const wave = fc.tuple(fc.double({ min: 0, max: 1, noNaN: true }), fc.double({ min: -3, max: 3, noNaN: true }));
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 4 }), fc.array(wave, { minLength: 32, maxLength: 32 }), (ports, waves) => {
        const matrix = (from: number) =>
          Array.from({ length: ports }, (_, r) =>
            Array.from({ length: ports }, (_, c) => polar(...waves[(from + r * ports + c) % 32])),
          );
        const table: ScatteringTable = {
          ports,
          referenceImpedance: 61.25,
          points: [76e9, 77.25e9].map((frequency, i) => ({ frequency, s: matrix(16 * i) })),
        };
        const text = formatTouchstone(table, ['two\nlines']);
        expect(text.startsWith('! two lines\n# GHz S RI R 61.25\n')).toBe(true);
        const back = parseTouchstone(text, ports);
        expect(back.points.map((p) => p.frequency)).toEqual([76e9, 77.25e9]);
        back.points.forEach((p, i) => {
          p.s.flat().forEach((value, k) => {
            expect(abs(sub(value, table.points[i].s.flat()[k]))).toBeLessThan(1e-8);
          });
        });
      }),
      { numRuns: 30 },
    );
  });

  it('wraps rows of more than four ports', () => {
    const s = Array.from({ length: 5 }, () => Array.from({ length: 5 }, () => complex(0.1)));
    const text = formatTouchstone({ ports: 5, referenceImpedance: 50, points: [{ frequency: 77e9, s }] });
    expect(text.trimEnd().split('\n')).toHaveLength(1 + 5 * 2);
  });

  it.each([
    ['76 0 0 1 0 1 0 0 0', 1, 'before the option line'],
    ['! nothing', 1, 'no option line'],
    ['# GHz S RI R 50\n', 2, 'no data'],
    ['# GHz Y RI R 50\n1 2 3', 1, 'parameters Y'],
    ['# GHz S RI R -5\n', 1, '"R -5"'],
    ['# GHz S polar\n', 1, '"polar"'],
    ['[Version] 2.0\n# GHz S RI\n', 1, '[Version]'],
    ['# GHz S RI\n76 0 0 1 0 1 0 0 0\n76.5 0 0 1 O 1 0 0 0\n', 3, '"O"'],
    ['# GHz S RI\n76 0 0 1 0 1 0 0 0\n75 0 0 1 0 1 0 0 0\n', 3, 'frequency 75'],
    ['# GHz S RI\n76 0 0 1 0 1 0 0 0 7\n', 2, 'more numbers than the 9'],
    ['# GHz S RI\n76 0 0 1 0 1 0 0 0\n77 0 0 1 0 1\n', 3, 'found 6 numbers'],
  ])('says what is wrong and where: %j', (text, line, words) => {
    const error = fault(text);
    expect(error.line).toBe(line);
    expect(error.message).toContain(words);
  });

  it('is taken between its points with their curvature, and flagged outside them', () => {
    const points = Array.from({ length: 9 }, (_, i) => ({
      frequency: 76e9 + i * 0.5e9,
      s: [[polar(0.9, -0.5 * i)]],
    }));
    const table = { ports: 1, referenceImpedance: 50, points };
    const at = (f: number) => scatteringAt(table, f);
    for (const f of [76.1e9, 77.25e9, 79.9e9]) {
      const exact = polar(0.9, (-0.5 * (f - 76e9)) / 0.5e9);
      expect(abs(sub(at(f).s[0][0], exact))).toBeLessThan(0.004);
      expect(at(f).flags).toEqual([]);
    }
    expect(abs(sub(at(77e9).s[0][0], points[2].s[0][0]))).toBeLessThan(1e-15);
    const beyond = at(82e9);
    expect(beyond.flags.map((f) => f.code)).toEqual(['feed.transition-range']);
    expect(abs(sub(beyond.s[0][0], points[8].s[0][0]))).toBeLessThan(1e-15);
  });

  it('keeps a transition as a pack holds it', () => {
    const table = parseTouchstone('# GHz S RI R 50\n76 1 2 3 4 5 6 7 8\n', 2);
    const transition = transitionOf(table);
    expect(transition.points[0].s).toEqual([
      [1, 2],
      [3, 4],
      [5, 6],
      [7, 8],
    ]);
    expect(tableOf(transition)).toEqual(table);
  });
});
