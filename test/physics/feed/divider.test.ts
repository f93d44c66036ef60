import { describe, expect, it } from 'vitest';
import { abs, abs2, arg, complex, sub } from '../../../src/numerics/complex.js';
import {
  type CircuitState,
  type DividerPlan,
  solveCircuit,
  tJunction,
  wilkinson,
} from '../../../src/physics/feed/index.js';

/** The divider in ideal quarter-wave lines, at a frequency relative to that of its design. */
function ideal(plan: DividerPlan, impedance: number, relative = 1): CircuitState {
  const lines: { from: number; to: number; z: number }[] = [];
  let nodes = 1;
  const chain = (from: number, steps: readonly number[]): number =>
    steps.reduce((at, z) => {
      lines.push({ from: at, to: nodes, z });
      return nodes++;
    }, from);
  const junction = chain(0, plan.inputStep ? [plan.inputStep] : []);
  // A line of the ports' own impedance behind each arm, so that it has a node of its own even without a step.
  const first = plan.arms.map((steps) => chain(junction, steps.slice(0, 1)));
  const ends = plan.arms.map((steps, i) => chain(first[i], [...steps.slice(1), impedance]));
  return solveCircuit({
    nodes,
    lines: lines.map(({ from, to, z }) => ({
      from,
      to,
      gamma: complex(0, (Math.PI / 2) * relative),
      characteristic: complex(z),
      length: 1,
      part: 'lines',
    })),
    resistors: plan.isolation
      ? [{ from: first[0], to: first[1], resistance: plan.isolation.resistance, part: 'resistor' }]
      : [],
    ports: [0, ...ends].map((node) => ({ node, reference: impedance })),
  });
}

describe('Wilkinson divider', () => {
  it('equal: √2 Z0, 2 Z0, matched and isolated, half the power to each side', () => {
    const plan = wilkinson(50, 0.5);
    expect(plan.arms[0][0]).toBeCloseTo(50 * Math.SQRT2, 10);
    expect(plan.arms.map((a) => a.length)).toEqual([1, 1]);
    expect(plan.isolation!.resistance).toBeCloseTo(100, 10);
    const { scattering: s, loss } = ideal(plan, 50);
    for (let i = 0; i < 3; i++) expect(abs(s[i][i])).toBeLessThan(1e-12);
    expect(abs(s[1][2])).toBeLessThan(1e-12);
    expect(20 * Math.log10(abs(s[1][0]))).toBeCloseTo(-3.0103, 4);
    // Driven alone, an output gives half its power to the resistor; two waves alike give it nothing.
    const into = (a: number, b: number): number =>
      loss([complex(0), complex(a), complex(b)]).get('resistor')! / ((a * a + b * b) / 2);
    expect(into(1, 0)).toBeCloseTo(0.5, 12);
    expect(into(1, 1)).toBeLessThan(1e-12);
    expect(into(1, -1)).toBeCloseTo(1, 12);
  });

  it('equal, off its frequency: as even- and odd-mode analysis gives it', () => {
    const relative = 1.13;
    const { scattering: s } = ideal(wilkinson(50, 0.5), 50, relative);
    const t = Math.tan((Math.PI / 2) * relative);
    // One half with the ports' impedance 1: input 2, line √2; even: open beyond, odd: short beyond and 1 across the resistor's half.
    const z = Math.SQRT2;
    const quotient = (a: [number, number], b: [number, number]) => {
      const d = b[0] ** 2 + b[1] ** 2;
      return complex((a[0] * b[0] + a[1] * b[1]) / d, (a[1] * b[0] - a[0] * b[1]) / d);
    };
    const even = quotient([2 * z, z * z * t], [z, 2 * t]);
    // Odd: the shorted line j√2 t in parallel with 1.
    const odd = quotient([0, z * t], [1, z * t]);
    const reflection = (v: { re: number; im: number }) => quotient([v.re - 1, v.im], [v.re + 1, v.im]);
    const [e, o] = [reflection(even), reflection(odd)];
    // The test's own lines behind the arms turn the phase and nothing else.
    expect(abs(s[1][1])).toBeCloseTo(abs(complex((e.re + o.re) / 2, (e.im + o.im) / 2)), 10);
    expect(abs(s[1][2])).toBeCloseTo(abs(complex((e.re - o.re) / 2, (e.im - o.im) / 2)), 10);
  });

  it.each([0.5, 1 / 3, 0.2, 0.8])('splits the power, part %d to the first arm', (first) => {
    const plan = wilkinson(70, first);
    const { scattering: s } = ideal(plan, 70);
    expect(abs2(s[1][0])).toBeCloseTo(first, 12);
    expect(abs2(s[2][0])).toBeCloseTo(1 - first, 12);
    expect(arg(s[1][0]) - arg(s[2][0])).toBeCloseTo(0, 12);
    for (let i = 0; i < 3; i++) expect(abs(s[i][i])).toBeLessThan(1e-12);
    expect(abs(s[1][2])).toBeLessThan(1e-12);
  });

  it('two to one: the published values', () => {
    // Parad and Moynihan; k² = 2 at 50 ohm: 103.0 and 51.5 ohm, 106.1 ohm, and steps of 59.5 and 42.0 ohm.
    const { arms, isolation } = wilkinson(50, 1 / 3);
    expect(arms[0][0]).toBeCloseTo(102.99, 1);
    expect(arms[1][0]).toBeCloseTo(51.49, 1);
    expect(isolation!.resistance).toBeCloseTo(106.07, 1);
    expect(arms[0][1]).toBeCloseTo(59.46, 1);
    expect(arms[1][1]).toBeCloseTo(42.04, 1);
  });

  it.each([0.5, 0.25])('keeps below the highest impedance and still matches, part %d to the first arm', (first) => {
    const plan = wilkinson(75, first, { highest: 90 });
    expect(Math.max(...plan.arms.flat())).toBeCloseTo(90, 9);
    const { scattering: s } = ideal(plan, 75);
    expect(abs2(s[1][0])).toBeCloseTo(first, 12);
    for (let i = 0; i < 3; i++) expect(abs(s[i][i])).toBeLessThan(1e-12);
    expect(abs(s[1][2])).toBeLessThan(1e-12);
  });

  it('isolates less with a resistor of another value', () => {
    const { scattering: s } = ideal(wilkinson(50, 0.5, { resistance: 130 }), 50);
    expect(20 * Math.log10(abs(s[1][2]))).toBeGreaterThan(-25);
    expect(abs(s[0][0])).toBeLessThan(1e-12);
  });
});

describe('T-junction', () => {
  it.each([0.5, 0.3, 0.85])('splits the power without loss, part %d to the first arm', (first) => {
    const { scattering: s, loss } = ideal(tJunction(65, first), 65);
    expect(abs2(s[1][0])).toBeCloseTo(first, 12);
    expect(abs2(s[2][0])).toBeCloseTo(1 - first, 12);
    expect(abs(s[0][0])).toBeLessThan(1e-12);
    for (let i = 0; i < 3; i++)
      for (let j = 0; j < 3; j++) {
        const product = [0, 1, 2].reduce(
          (sum, k) => ({
            re: sum.re + s[k][i].re * s[k][j].re + s[k][i].im * s[k][j].im,
            im: sum.im + s[k][i].re * s[k][j].im - s[k][i].im * s[k][j].re,
          }),
          complex(0),
        );
        expect(abs(sub(product, complex(i === j ? 1 : 0)))).toBeLessThan(1e-12);
        expect(abs(sub(s[i][j], s[j][i]))).toBeLessThan(1e-12);
      }
    expect(loss([complex(1), complex(0.2), complex(0, 1)]).get('lines')).toBeCloseTo(0, 12);
  });

  it('needs a step before the junction alone where it splits evenly', () => {
    const plan = tJunction(50, 0.5);
    expect(plan.inputStep).toBeCloseTo(50 / Math.SQRT2, 10);
    expect(plan.arms).toEqual([[], []]);
  });
});

it('refuses nonsense with the value received', () => {
  expect(() => tJunction(50, 1)).toThrow('got 1');
  expect(() => wilkinson(0, 0.5)).toThrow('got 0');
  expect(() => wilkinson(50, 0.5, { resistance: -1 })).toThrow('got -1');
});
