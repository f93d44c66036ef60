/** Difference of two engines' figures at one frequency, in the form in which it is carried. */
import { abs, arg, type Complex, sub, ZERO } from '../numerics/complex.js';
import type { CutDifference, EngineDifference } from './correction-model.js';
import type { CutFigures, EngineFigures } from './results.js';

/** A coupling that differs by more, 20 dB, is too small in one engine to be a measure of the other's. */
const LARGEST_RATIO = Math.LN10;

export function differenceOf(frequency: number, fullWave: EngineFigures, network: EngineFigures): EngineDifference {
  const share = (part: keyof EngineFigures['power']): number => lnRatio(fullWave.power[part], network.power[part]);
  return {
    frequency,
    reflection: fullWave.scattering.map((row, c) => sub(row[c], network.scattering[c][c])),
    coupling: fullWave.scattering.map((row, i) =>
      row.map((s, j) => (i === j ? ZERO : ratioOf(s, network.scattering[i][j]))),
    ),
    activeReflection: fullWave.activeReflection.map((s, c) => sub(s, network.activeReflection[c])),
    directivityDb: decibels(fullWave.directivity / network.directivity),
    mismatchDb: decibels(fullWave.mismatch / network.mismatch),
    shares: {
      radiated: share('radiated'),
      surfaceWave: share('surfaceWave'),
      metal: share('metal'),
      dielectric: share('dielectric'),
      load: share('load'),
    },
    elevation: cutDifference(fullWave.elevation, network.elevation),
    azimuth: cutDifference(fullWave.azimuth, network.azimuth),
  };
}

const decibels = (ratio: number): number => 10 * Math.log10(ratio);

/** 0 where either engine has none of it. */
const lnRatio = (a: number, b: number): number => (a > 0 && b > 0 ? Math.log(a / b) : 0);

function ratioOf(a: Complex, b: Complex): Complex {
  const re = Math.max(-LARGEST_RATIO, Math.min(LARGEST_RATIO, lnRatio(abs(a), abs(b))));
  const turn = arg(a) - arg(b);
  return { re, im: turn - 2 * Math.PI * Math.round(turn / (2 * Math.PI)) };
}

/** A figure that one of the two cuts does not have is not moved. */
function cutDifference(a: CutFigures, b: CutFigures): CutDifference {
  const finite = (value: number): number => (Number.isFinite(value) ? value : 0);
  return {
    direction: finite(a.beamDirection - b.beamDirection),
    width: finite(Math.log(a.halfPowerBeamwidth / b.halfPowerBeamwidth)),
    sidelobeDb: finite(a.sidelobeDb - b.sidelobeDb),
  };
}
