import type { FarField } from '../../../src/physics/column/index.js';
import { ETA0, SPEED_OF_LIGHT } from '../../../src/physics/constants.js';

export interface PointSource {
  /** Wavelengths. */
  readonly x: number;
  readonly y: number;
  readonly re: number;
  readonly im?: number;
}

export const FREQUENCY = 77e9;
const WAVELENGTH = SPEED_OF_LIGHT / FREQUENCY;

/** Field of one source in a direction, [Eθ, Eφ], 1 for 1 W/sr. */
type Element = (cosTheta: number, cosPhi: number, sinPhi: number) => readonly [number, number];

/** Purely co-polar along x after Ludwig, `strength` over cos θ. */
export const ludwig =
  (strength: (cosTheta: number) => number): Element =>
  (ct, c, s) => [c * strength(ct), -s * strength(ct)];

/** Short magnetic current along y on the ground plane, as a radiating edge on a very thin slab. */
export const slot: Element = (ct, c, s) => [c, -s * ct];

/** Sources at the height of the ground; by default each radiates alike into every direction of the half space. */
export function pointSources(sources: readonly PointSource[], element: Element = ludwig(() => 1)): FarField {
  const span = (values: readonly number[]): number => (Math.max(...values) - Math.min(...values)) * WAVELENGTH;
  const field: FarField = {
    frequency: FREQUENCY,
    extent: { x: span(sources.map((s) => s.x)), y: span(sources.map((s) => s.y)) },
    at(u, v, out) {
      out.fill(0);
      const sin2 = u * u + v * v;
      if (sin2 >= 1) return;
      let [re, im] = [0, 0];
      for (const s of sources) {
        const phase = 2 * Math.PI * (u * s.x + v * s.y);
        const [a, b] = [s.re, s.im ?? 0];
        re += a * Math.cos(phase) - b * Math.sin(phase);
        im += a * Math.sin(phase) + b * Math.cos(phase);
      }
      const k = Math.sqrt(2 * ETA0);
      const sine = Math.sqrt(sin2);
      const [c, s] = sine === 0 ? [1, 0] : [u / sine, v / sine];
      const [theta, phi] = element(Math.sqrt(1 - sin2), c, s);
      out[0] = k * theta * re;
      out[1] = k * theta * im;
      out[2] = k * phi * re;
      out[3] = k * phi * im;
    },
    cut: (plane) => (angle) => {
      const out = new Float64Array(4);
      const sine = Math.sin(angle);
      if (plane === 'elevation') field.at(sine, 0, out);
      else field.at(0, sine, out);
      return out.reduce((sum, e) => sum + e * e, 0) / (2 * ETA0);
    },
  };
  return field;
}

/** `count` equal sources along x, `spacing` wavelengths apart, phase by `lag` rad from one to the next. */
export const row = (count: number, spacing: number, lag = 0, element?: Element): FarField =>
  pointSources(
    Array.from({ length: count }, (_, i) => ({ x: i * spacing, y: 0, re: Math.cos(-i * lag), im: Math.sin(-i * lag) })),
    element,
  );
