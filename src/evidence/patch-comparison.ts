/** Either engine against the independent solutions of edge-fed patches and of one patch between two lines. */
import { add, type Complex, complex, div, scale, sub } from '../numerics/complex.js';
import { factoriseReal, solveReal } from '../numerics/real-lu.js';
import { once } from './check.js';
import { type EngineName, patchProblem, prepare, sheetFaces } from './engine-problems.js';
import { PATCH_REFERENCES, type PatchReference, type UnitReference } from './patch-references.js';

/** Z = R/(1 + jQ(f/f0 − f0/f)) + jX. */
export interface EdgeResonance {
  readonly f0GHz: number;
  readonly ohm: number;
  readonly q: number;
  readonly seriesOhm: number;
}

/** Least squares in ohm by Gauss–Newton from a first guess. */
export function fitResonance(
  points: readonly { readonly fGHz: number; readonly z: Complex }[],
  guess: EdgeResonance,
): EdgeResonance {
  let x = [guess.f0GHz, guess.ohm, guess.q, guess.seriesOhm];
  const model = ([f0, r, q, s]: readonly number[], f: number): Complex =>
    add(div(complex(r), complex(1, q * (f / f0 - f0 / f))), complex(0, s));
  for (let iteration = 0; iteration < 30; iteration++) {
    const normal = new Float64Array(16);
    const right = new Float64Array(4);
    for (const { fGHz, z } of points) {
      const value = model(x, fGHz);
      const gradient = x.map((_, k) => {
        const step = 1e-6 * Math.max(1, Math.abs(x[k]));
        const moved = x.map((v, i) => (i === k ? v + step : v));
        return scale(sub(model(moved, fGHz), value), 1 / step);
      });
      const left = sub(z, value);
      gradient.forEach((a, i) => {
        right[i] += a.re * left.re + a.im * left.im;
        gradient.forEach((b, j) => {
          normal[4 * i + j] += a.re * b.re + a.im * b.im;
        });
      });
    }
    solveReal(factoriseReal(normal, 4), right);
    x = x.map((v, k) => v + right[k]);
  }
  return { f0GHz: x[0], ohm: x[1], q: x[2], seriesOhm: x[3] };
}

export interface ResonanceComparison {
  readonly reference: PatchReference;
  readonly copper: 'none' | 'smooth';
  readonly expected: { readonly f0GHz: number; readonly ohm: number; readonly q: number };
  readonly found: EdgeResonance;
}

/** Within the half-power width on either side and half as far again: where the fit of the references weighs most. */
const PLACES = [-1.5, -0.5, 0.5, 1.5];

const resonances = (engine: EngineName): (() => readonly ResonanceComparison[]) =>
  once(() =>
    PATCH_REFERENCES.flatMap((reference) =>
      // Loss moves all engines alike: the full wave, which costs more, is compared without it.
      reference.fits
        .filter(({ copper }) => engine === 'network' || copper === 'none')
        .map((expected): ResonanceComparison => {
          const { copper } = expected;
          const places = PLACES.map((t) => expected.f0GHz * (1 + t / (2 * expected.q)));
          const prepared = prepare(
            engine,
            patchProblem({ ...reference, lossTangent: copper === 'none' ? 0 : reference.lossTangent }),
            { low: places[0] * 1e9, high: places[PLACES.length - 1] * 1e9 },
          );
          const points = places.map((fGHz) => {
            const solution = prepared.solve({ frequency: fGHz * 1e9, faces: sheetFaces(copper, fGHz * 1e9) });
            const s = solution.scattering[0][0];
            const z = div(complex(1 + s.re, s.im), complex(1 - s.re, -s.im));
            return { fGHz, z: scale(z, solution.referenceImpedance[0]) };
          });
          return { reference, copper, expected, found: fitResonance(points, { ...expected, seriesOhm: 10 }) };
        }),
    ),
  );

export const edgeResonances: Readonly<Record<EngineName, () => readonly ResonanceComparison[]>> = {
  network: resonances('network'),
  'full wave': resonances('full wave'),
};

/** Engine less reference of one patch between two lines: rms over its frequencies of complex S11 and of |S21|. */
export function unitDifference(
  engine: EngineName,
  reference: UnitReference,
  fGHz: readonly number[],
): readonly { readonly reflection: number; readonly transmission: number }[] {
  const prepared = prepare(engine, patchProblem(reference, true), { low: 70e9, high: 82e9 });
  return reference.rows
    .filter(([f]) => fGHz.includes(f))
    .map(([f, re, im, through]) => {
      const solution = prepared.solve({ frequency: f * 1e9, faces: sheetFaces('none', f * 1e9) });
      const s = solution.scattering[0][0];
      const { power } = solution.excite([complex(1)]);
      return {
        reflection: Math.hypot(s.re - re, s.im - im),
        transmission: Math.sqrt(power.load / power.incident) - through,
      };
    });
}
