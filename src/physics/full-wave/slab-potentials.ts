/**
 * Potentials of currents and charges in the metal's plane of a slab, as tables of the distance ρ.
 *
 * A: jω G_A, transform of Vh, ohm/m². Q: G_q/(jω), transform of (Ve − Vh)/k², ohm (G_A = Vh/(jω),
 * G_q = jω (Ve − Vh)/k²; Michalski & Mosig 1997).
 *
 * Near the source the direct terms C e^{−jκρ}/(2πρ) are left out, and the rest is tabulated evenly in t with
 * ρ = s sinh t: the images n·2h, which show as singularities at ρ = ±2jnh, then all lie π/2 off the real t axis. Far from
 * the source the whole times ρ e^{jκρ}, κ that of air in the middle of the band, is tabulated evenly in log ρ, for the same
 * reason.
 */
import { type Complex, complex, exp, mul, scale } from '../../numerics/complex.js';
import { SPEED_OF_LIGHT } from '../constants.js';
import { hankelTable, type SpectrumPair, type TransformPair } from './hankel-table.js';
import { squareRoot } from './layer-line.js';
import { checkMedium, type SlabMedium } from './slab-medium.js';
import { type DirectTerm, type SlabSpectral, slabSpectral } from './slab-spectral.js';
import { guidedWave, guidesTm0Only } from './slab-wave.js';
import { fallingPath, windowedPath } from './sommerfeld-path.js';

export interface Band {
  readonly low: number;
  readonly high: number;
}

export interface PotentialTables {
  /** Near table: ρ = nearScale · sinh(m · nearStep). */
  readonly nearScale: number;
  readonly nearStep: number;
  readonly nearCount: number;
  /** Far table: ρ = farStart · e^{m · farStep}. */
  readonly farStart: number;
  readonly farStep: number;
  readonly farCount: number;
  readonly farWavenumber: number;
  /** That the tables serve, 1/m. */
  readonly largestWavenumber: number;
  at(frequency: number, medium: SlabMedium): Potentials;
}

export interface Potentials {
  readonly directA: DirectTerm;
  readonly directQ: DirectTerm;
  /** Less the direct terms; held by the tables and written over by the next call. */
  readonly near: TransformPair;
  /** Times ρ e^{jκρ}, κ = `farWavenumber` of the tables; the same. */
  readonly far: TransformPair;
}

/** How far temperature and texture may move the medium off the one prepared for. */
const MARGIN = 1.15;

/**
 * @param nearReach largest ρ of the near table, m
 * @param farStart  smallest of the far table, m
 * @param farReach  largest, m
 */
export function potentialTables(
  band: Band,
  medium: SlabMedium,
  nearReach: number,
  farStart: number,
  farReach: number,
): PotentialTables {
  checkMedium(medium);
  if (!(band.low > 0 && band.high >= band.low && Number.isFinite(band.high)))
    throw new RangeError(`potentialTables: band from ${band.low} to ${band.high} Hz`);
  const end = MARGIN * layerWavenumber(band.high, medium);
  const thinnest = thinnestLayer(medium) / MARGIN;
  const nearScale = 2 * thinnest;
  // Even in t, analytic to π/2 off the axis, and a wave in ρ: 0.3 rad a step at the far end.
  const nearStep = Math.min(0.1, 0.3 / (end * nearReach));
  const nearCount = Math.ceil(Math.asinh(nearReach / nearScale) / nearStep) + 5;
  const nearDistances = Float64Array.from({ length: nearCount }, (_, m) => nearScale * Math.sinh(m * nearStep));
  const nearTable = hankelTable(fallingPath(end, nearDistances[nearCount - 1], 11 / thinnest), nearDistances);

  const farWavenumber = (Math.PI * (band.low + band.high)) / SPEED_OF_LIGHT;
  // What the phase taken off leaves, at the edges of the band and of the guided wave: no more than 0.3 rad a step.
  const detuning = (2 * Math.PI * (band.high - band.low)) / SPEED_OF_LIGHT / 2;
  const slowest = guidesTm0Only(medium, band.high) ? guidedWave(medium, band.high).wavenumber : end;
  const beat = Math.max(detuning, slowest - farWavenumber);
  const farStep = Math.min(0.03, 0.3 / (beat * farReach));
  const farCount = Math.max(8, Math.ceil(Math.log(farReach / farStart) / farStep) + 4);
  const farDistances = Float64Array.from({ length: farCount }, (_, m) => farStart * Math.exp(m * farStep));
  const octave = Math.ceil(Math.LN2 / farStep);
  const farTables: { first: number; transform: ReturnType<typeof hankelTable> }[] = [];
  for (let first = 0; first < farCount; first += octave) {
    const distances = farDistances.slice(first, first + octave);
    const path = windowedPath(end, distances[0], distances[distances.length - 1]);
    farTables.push({ first, transform: hankelTable(path, distances) });
  }
  const near = transformPair(nearCount);
  const far = transformPair(farCount);

  function at(frequency: number, actual: SlabMedium): Potentials {
    if (layerWavenumber(frequency, actual) > end / 1.05)
      throw new RangeError(
        `potentials prepared for up to ${band.high} Hz and εr ${medium.permittivity}, not for these`,
      );
    if (thinnestLayer(actual) < thinnest)
      throw new RangeError(`potentials prepared for layers from ${thinnest} m, not for ${thinnestLayer(actual)} m`);
    const spectral = slabSpectral(actual, frequency);
    nearTable(remainder(spectral), near, 0);
    const whole = spectra(spectral);
    for (const { first, transform } of farTables) transform(whole, far, first);
    for (let m = 0; m < farCount; m++) {
      const rho = farDistances[m];
      const [c, s] = [rho * Math.cos(farWavenumber * rho), rho * Math.sin(farWavenumber * rho)];
      rotate(far.aRe, far.aIm, m, c, s);
      rotate(far.qRe, far.qIm, m, c, s);
    }
    return { directA: spectral.directA, directQ: spectral.directQ, near, far };
  }

  return {
    nearScale,
    nearStep,
    nearCount,
    farStart,
    farStep,
    farCount,
    farWavenumber,
    largestWavenumber: end / 1.05,
    at,
  };
}

function layerWavenumber(frequency: number, medium: SlabMedium): number {
  return (
    ((2 * Math.PI * frequency) / SPEED_OF_LIGHT) *
    Math.sqrt(Math.max(medium.permittivity, medium.cover?.permittivity ?? 1))
  );
}

const thinnestLayer = ({ height, cover }: SlabMedium): number => Math.min(height, cover?.thickness ?? height);

function transformPair(count: number): TransformPair {
  const column = (): Float64Array => new Float64Array(count);
  return { aRe: column(), aIm: column(), qRe: column(), qIm: column() };
}

/** (re + j im)[m] times c + js */
function rotate(re: Float64Array, im: Float64Array, m: number, c: number, s: number): void {
  const [a, b] = [re[m], im[m]];
  re[m] = a * c - b * s;
  im[m] = a * s + b * c;
}

/** Vh and (Ve − Vh)/k². */
export function spectra(spectral: SlabSpectral): SpectrumPair {
  return (kRe, kIm, out) => {
    spectral.voltages(kRe, kIm, out);
    const [dr, di] = [out[0] - out[2], out[1] - out[3]];
    const [kkRe, kkIm] = [kRe * kRe - kIm * kIm, 2 * kRe * kIm];
    const size = kkRe * kkRe + kkIm * kkIm;
    out[0] = out[2];
    out[1] = out[3];
    out[2] = (dr * kkRe + di * kkIm) / size;
    out[3] = (di * kkRe - dr * kkIm) / size;
  };
}

/** The same less the direct terms. */
function remainder(spectral: SlabSpectral): SpectrumPair {
  const whole = spectra(spectral);
  const direct = [spectral.directA, spectral.directQ].map(({ amplitude, wavenumber }) => ({
    amplitude,
    squared: mul(wavenumber, wavenumber),
  }));
  const u = new Float64Array(2);
  return (kRe, kIm, out) => {
    whole(kRe, kIm, out);
    const [kkRe, kkIm] = [kRe * kRe - kIm * kIm, 2 * kRe * kIm];
    for (let q = 0; q < 2; q++) {
      const { amplitude, squared } = direct[q];
      squareRoot(kkRe - squared.re, kkIm - squared.im, u);
      const size = u[0] * u[0] + u[1] * u[1];
      out[2 * q] -= (amplitude.re * u[0] + amplitude.im * u[1]) / size;
      out[2 * q + 1] -= (amplitude.im * u[0] - amplitude.re * u[1]) / size;
    }
  };
}

/** C e^{−jκρ}/(2πρ), ρ > 0. */
export function directPotential(term: DirectTerm, rho: number): Complex {
  const wave = exp(mul(complex(0, -rho), term.wavenumber));
  return scale(mul(term.amplitude, wave), 1 / (2 * Math.PI * rho));
}
