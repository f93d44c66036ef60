import { mapAutocorrelation, type ProfileAutocorrelation, profileAutocorrelation } from './autocorrelation.js';
import { mapDecayLengths, profileDecayLength, STANDARD_FALL } from './decay-length.js';
import { heightMoments } from './height-moments.js';
import { areaFigures, slopeAt } from './slopes.js';
import { type HeightMap, type Profile, requireMap, requireProfile } from './surface.js';

/** ISO 21920-2:2021, heights in m from the reference line. */
export interface ProfileParameters {
  readonly ra: number;
  readonly rq: number;
  readonly rp: number;
  readonly rv: number;
  /** Largest height of a section, mean over the sections. */
  readonly rz: number;
  /** Largest height over the whole length. */
  readonly rt: number;
  readonly rsk: number;
  readonly rku: number;
  /** Root-mean-square slope. */
  readonly rdq: number;
  /** Lag at which the autocorrelation first falls to 0.2, m. */
  readonly ral?: number;
  /** Lag at which it first falls to 1/e, m; not of the standard. */
  readonly correlationLength?: number;
  /** Whole sections that Rz is the mean of. */
  readonly sections: number;
  /** Standard error of Rq by the finite length, relative, for normal heights of this autocorrelation. */
  readonly rqStandardError: number;
}

/** ISO 25178-2:2021, heights in m from the reference surface. */
export interface MapParameters {
  readonly sa: number;
  readonly sq: number;
  readonly sp: number;
  readonly sv: number;
  readonly sz: number;
  readonly ssk: number;
  readonly sku: number;
  /** Root-mean-square gradient. */
  readonly sdq: number;
  /** Developed interfacial area ratio, as a ratio. */
  readonly sdr: number;
  /** The same from the triangles of the grid. */
  readonly sdrTriangles: number;
  /** Shortest lag at which the autocorrelation falls to 0.2, m. */
  readonly sal?: number;
  /** Texture aspect ratio: Sal over the longest such lag; absent where some direction does not fall. */
  readonly str?: number;
  /** Lag of the fall to 1/e, mean over directions, m; not of the standard. */
  readonly correlationLength?: number;
  readonly sqStandardError: number;
}

const ONE_OVER_E = Math.exp(-1);
/** The autocorrelation is summed to this many times its fall to 0.2; beyond is scatter of the estimate. */
const SUMMED_FALLS = 3;

/**
 * Parameters of a profile whose heights count from its reference line.
 *
 * @param sectionLength length of a section of Rz, m; without it the whole length is one section
 * @throws RangeError on a profile that is too short or mostly unmeasured
 */
export function profileParameters(profile: Profile, sectionLength?: number): ProfileParameters {
  requireProfile(profile);
  const { spacing, heights } = profile;
  const moments = heightMoments(heights);
  const acf = profileAutocorrelation(profile);
  const ral = profileDecayLength(acf, STANDARD_FALL);
  const correlationLength = profileDecayLength(acf, ONE_OVER_E);
  const section = Math.min(heights.length, Math.max(2, Math.round((sectionLength ?? Infinity) / spacing)));
  const { rz, sections } = meanSectionHeight(heights, section);
  return {
    ra: moments.mean,
    rq: moments.rms,
    rp: moments.peak,
    rv: moments.pit,
    rz,
    rt: moments.peak + moments.pit,
    rsk: moments.skewness,
    rku: moments.kurtosis,
    rdq: rmsSlope(profile),
    ...(ral === undefined ? {} : { ral }),
    ...(correlationLength === undefined ? {} : { correlationLength }),
    sections,
    rqStandardError: profileStandardError(acf, ral, heights.length),
  };
}

function rmsSlope({ spacing, heights }: Profile): number {
  let [n, square] = [0, 0];
  for (let i = 3; i < heights.length - 3; i++) {
    const slope = slopeAt(heights, i, 1, spacing);
    if (Number.isNaN(slope)) continue;
    n++;
    square += slope * slope;
  }
  return Math.sqrt(square / n);
}

function meanSectionHeight(heights: Float64Array, points: number): { rz: number; sections: number } {
  const sections = Math.max(1, Math.floor(heights.length / points));
  let sum = 0;
  for (let s = 0; s < sections; s++) {
    const { peak, pit } = heightMoments(heights.subarray(s * points, (s + 1) * points));
    sum += peak + pit;
  }
  return { rz: sum / sections, sections };
}

/** The variance of a mean square of correlated normal heights is 2σ⁴/L ∫ρ²dτ; half of its relative root is that of Rq. */
function profileStandardError(acf: ProfileAutocorrelation, ral: number | undefined, points: number): number {
  const reach = Math.min(acf.values.length - 1, Math.ceil((SUMMED_FALLS * (ral ?? Infinity)) / acf.spacing));
  let sum = acf.values[0] ** 2;
  for (let lag = 1; lag <= reach; lag++) sum += 2 * acf.values[lag] ** 2;
  return 0.5 * Math.sqrt((2 * sum) / points);
}

/**
 * Parameters of a height map whose heights count from its reference surface.
 *
 * @throws RangeError on a map that is too small or mostly unmeasured
 */
export function mapParameters(map: HeightMap): MapParameters {
  requireMap(map);
  const moments = heightMoments(map.heights);
  const acf = mapAutocorrelation(map);
  const fall = mapDecayLengths(acf, STANDARD_FALL);
  const correlationLength = mapDecayLengths(acf, ONE_OVER_E).mean;
  const radius = SUMMED_FALLS * (fall.longest ?? Infinity);
  const width = 2 * acf.reachX + 1;
  let sum = 0;
  for (let y = -acf.reachY; y <= acf.reachY; y++)
    for (let x = -acf.reachX; x <= acf.reachX; x++) {
      const rho = acf.values[(y + acf.reachY) * width + x + acf.reachX];
      if (Math.hypot(x * acf.spacingX, y * acf.spacingY) <= radius && !Number.isNaN(rho)) sum += rho * rho;
    }
  return {
    sa: moments.mean,
    sq: moments.rms,
    sp: moments.peak,
    sv: moments.pit,
    sz: moments.peak + moments.pit,
    ssk: moments.skewness,
    sku: moments.kurtosis,
    ...areaFigures(map),
    ...(fall.shortest === undefined ? {} : { sal: fall.shortest }),
    ...(fall.shortest === undefined || fall.longest === undefined ? {} : { str: fall.shortest / fall.longest }),
    ...(correlationLength === undefined ? {} : { correlationLength }),
    sqStandardError: 0.5 * Math.sqrt((2 * sum) / (map.columns * map.rows)),
  };
}
