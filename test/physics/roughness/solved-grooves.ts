import { type Complex, complex, mul, scale } from '../../../src/numerics/complex.js';
import { complexMatrix, factorise, solveInPlace } from '../../../src/numerics/complex-lu.js';

/** A periodic profile z = f(x), metal below: heights and slopes at even steps. Lengths in skin depths. */
export interface Grooves {
  readonly period: number;
  readonly height: Float64Array;
  readonly slope: Float64Array;
}

/** Weights of an even rule about a logarithmic singularity, by distance in steps (S. Kapur and V. Rokhlin, SIAM J. Numer. Anal. 34(4), 1997; sixth order). */
const CORRECTIONS = [
  4.967362978287758, -16.20501504859126, 25.85153762831639, -22.22599466791883, 9.930104998037539, -1.817995878141594,
];
/** Beyond so many skin depths two points of the metal do not feel each other: e⁻¹⁸. */
const REACH = 18;

/** K0 and K1 of (1 + j) r: ∫ e^{−z cosh t} cosh(nt) dt by even steps, which converges as fast as the integrand falls. */
function modifiedBessel(r: number, out: Float64Array): void {
  const step = 0.08;
  const end = Math.acosh(1 + 40 / r);
  out.fill(0);
  for (let t = 0, weight = 0.5 * step; t < end; t += step, weight = step) {
    const c = Math.cosh(t);
    const size = weight * Math.exp(-r * c);
    const [re, im] = [size * Math.cos(r * c), -size * Math.sin(r * c)];
    out[0]! += re;
    out[1]! += im;
    out[2]! += c * re;
    out[3]! += c * im;
  }
}

/** Single and double layer of the metal, 1/2π K0(γr) and its normal derivative, times steps and corrections; row major. */
function layers({ period, height: f, slope }: Grooves) {
  const n = f.length;
  const step = period / n;
  const single = complexMatrix(n);
  const double = complexMatrix(n);
  const still = { single: new Float64Array(n * n), double: new Float64Array(n * n) };
  const k = new Float64Array(4);
  const wave = (2 * Math.PI) / period;
  for (let i = 0; i < n; i++)
    for (let j = 0; j < n; j++) {
      if (i === j) continue;
      const apart = Math.min(Math.abs(i - j), n - Math.abs(i - j));
      const weight = step * (1 + (CORRECTIONS[apart - 1] ?? 0));
      let dx = (i - j) * step;
      dx -= period * Math.round(dx / period);
      const dz = f[i]! - f[j]!;
      const at = i * n + j;
      for (const x of [dx - period, dx, dx + period]) {
        const r = Math.hypot(x, dz);
        if (r > REACH) continue;
        modifiedBessel(r, k);
        // (1 + j) K1 (r − r′)·n/r, n·ds/dx′ = (−f′, 1)
        const normal = (weight * (dz - x * slope[j]!)) / (2 * Math.PI * r);
        single.re[at]! += (weight * k[0]!) / (2 * Math.PI);
        single.im[at]! += (weight * k[1]!) / (2 * Math.PI);
        double.re[at]! += normal * (k[2]! - k[3]!);
        double.im[at]! += normal * (k[2]! + k[3]!);
      }
      const spread = 2 * Math.cosh(wave * dz) - 2 * Math.cos(wave * dx);
      still.single[at] = (-weight * Math.log(spread)) / (4 * Math.PI);
      still.double[at] = (weight * (Math.sinh(wave * dz) - Math.sin(wave * dx) * slope[j]!)) / (period * spread);
    }
  return { n, step, single, double, still };
}

/**
 * Surface impedance of grooves, K + jX in units of the smooth surface resistance, to the mean plane, by boundary integrals
 * (Maxwell without displacement current, no roughness model). Across: the magnetic field lies along the grooves and is 1 on
 * the metal; the impedance is its flux. Along: the electric field lies along them; metal and air share field and slope.
 */
export function solvedGrooves(grooves: Grooves): { across: Complex; along: Complex } {
  const { n, step, single, double, still } = layers(grooves);
  const { period, height: f } = grooves;

  const flux = { re: new Float64Array(n), im: new Float64Array(n) };
  for (let i = 0; i < n; i++) {
    flux.re[i] = 0.5;
    for (let j = 0; j < n; j++) {
      flux.re[i]! += double.re[i * n + j]!;
      flux.im[i]! += double.im[i * n + j]!;
    }
  }
  const size = 2 * n + 1;
  const joined = complexMatrix(size);
  const right = { re: new Float64Array(size), im: new Float64Array(size) };
  for (let i = 0; i < n; i++) {
    for (let j = 0; j < n; j++) {
      const at = i * n + j;
      const [metal, air] = [i * size + j, (n + i) * size + j];
      joined.re[metal] = double.re[at]! + (i === j ? 0.5 : 0);
      joined.im[metal] = double.im[at]!;
      joined.re[metal + n] = -single.re[at]!;
      joined.im[metal + n] = -single.im[at]!;
      joined.re[air] = (i === j ? 0.5 : 0) - still.double[at]!;
      joined.re[air + n] = still.single[at]!;
    }
    // Field of a unit slope far above, half of it from either side, and a constant.
    joined.re[(n + i) * size + 2 * n] = -1;
    right.re[n + i] = 0.5 * f[i]!;
    joined.re[2 * n * size + n + i] = step / period;
  }
  right.re[2 * n] = 1;

  const sum = (values: Float64Array, from = 0): number => values.subarray(from, from + n).reduce((s, v) => s + v, 0);
  solveInPlace(factorise(single), flux.re, flux.im);
  solveInPlace(factorise(joined), right.re, right.im);
  // E far above is A + z: A from the constant, the surface's field and the moment of its slope.
  const far = (v: Float64Array): number => {
    let total = sum(v);
    for (let i = 0; i < n; i++) total -= f[i]! * v[n + i]!;
    return v[2 * n]! + (total * step) / (2 * period);
  };
  return {
    // (1 + j)/γ0 = 1; (1 + j) γ0 = 2j
    across: scale(complex(sum(flux.re), sum(flux.im)), step / period),
    along: mul(complex(0, 2), complex(far(right.re), far(right.im))),
  };
}
