import type { ValidityFlag } from '../validity.js';
import { withoutMeanLine, withoutMeanPlane } from './form.js';
import { COARSEST_SAMPLING, gaussianMeanLine, gaussianMeanSurface } from './gaussian-filter.js';
import { type MapParameters, mapParameters, type ProfileParameters, profileParameters } from './parameters.js';
import {
  type HeightMap,
  measuredShare,
  type Profile,
  requireMap,
  requireProfile,
  withoutEnds,
  withoutRim,
} from './surface.js';

/** How measured heights become a roughness profile or scale-limited surface. */
export interface TextureConditions {
  /** Nesting index of the filter that takes out what is finer, m: Nis, or the S-filter. Left out: none. */
  readonly shortFilter?: number;
  /** Nesting index of the filter that takes out what is longer, m: Nic, or the L-filter. Left out: only the form is removed. */
  readonly longFilter?: number;
}

export interface EvaluatedProfile {
  readonly profile: Profile;
  readonly parameters: ProfileParameters;
  readonly flags: readonly ValidityFlag[];
}

export interface EvaluatedMap {
  readonly map: HeightMap;
  readonly parameters: MapParameters;
  readonly flags: readonly ValidityFlag[];
}

const MODEL = 'texture from measured heights';
/** Sections of an evaluation length by default of ISO 21920-3. */
const SECTIONS = 5;
/** Least share of measured points that is taken without remark. */
const MEASURED = 0.95;
/** Extent over correlation length below which figures are those of the spot. */
const FEWEST_LENGTHS = 10;
/** How far the two developed areas may differ on a grid that resolves the texture. */
const AREA_AGREEMENT = 0.1;

const micrometres = (x: number): string => `${(x * 1e6).toPrecision(3)} µm`;
const percent = (x: number): string => `${(100 * x).toPrecision(2)} %`;

/** What the filters leave out at either end: half of the longest nesting index, where the weighting function leans. */
export const runIn = ({ shortFilter = 0, longFilter = 0 }: TextureConditions): number =>
  Math.max(shortFilter, longFilter) / 2;

/**
 * Roughness profile and its parameters from measured heights: mean line by least squares taken off, then the Gaussian filters
 * of ISO 16610-21 with the nesting indices given, then half the longest index cut off at both ends. Sections of Rz are as
 * long as the long filter's index (ISO 21920-3).
 *
 * Form goes first, so that a tilt cannot leak in through the ends of the filters.
 *
 * @throws RangeError where nothing is left, or the data are not a profile
 */
export function evaluateProfile(measured: Profile, conditions: TextureConditions): EvaluatedProfile {
  requireProfile(measured);
  requireConditions(conditions);
  const { shortFilter, longFilter } = conditions;
  let profile = withoutMeanLine(measured);
  if (shortFilter !== undefined) profile = gaussianMeanLine(profile, shortFilter);
  if (longFilter !== undefined) profile = { ...profile, heights: less(profile, gaussianMeanLine(profile, longFilter)) };
  profile = withoutEnds(profile, runIn(conditions));
  if (longFilter === undefined && shortFilter !== undefined) profile = withoutMeanLine(profile);
  const parameters = profileParameters(profile, longFilter);
  const length = profile.heights.length * profile.spacing;
  const flags = commonFlags(measured.heights, measured.spacing, conditions, length, parameters.correlationLength);
  if (longFilter !== undefined && parameters.sections < SECTIONS)
    flags.push(
      flag(
        'sections',
        'outside',
        `Rz is the mean of ${parameters.sections} section${parameters.sections === 1 ? '' : 's'} of ${micrometres(longFilter)}; the default of ISO 21920-3 is ${SECTIONS}.`,
      ),
    );
  return { profile, parameters, flags };
}

/**
 * Scale-limited surface and its parameters from a measured height map: mean plane by least squares taken off, then the areal
 * Gaussian filters of ISO 16610-61 (S-filter, then L-filter), then half the longest index cut off all round.
 *
 * @throws RangeError where nothing is left, or the data are not a map
 */
export function evaluateMap(measured: HeightMap, conditions: TextureConditions): EvaluatedMap {
  requireMap(measured);
  requireConditions(conditions);
  const { shortFilter, longFilter } = conditions;
  let map = withoutMeanPlane(measured);
  if (shortFilter !== undefined) map = gaussianMeanSurface(map, shortFilter);
  if (longFilter !== undefined) map = { ...map, heights: less(map, gaussianMeanSurface(map, longFilter)) };
  map = withoutRim(map, runIn(conditions));
  if (longFilter === undefined && shortFilter !== undefined) map = withoutMeanPlane(map);
  const parameters = mapParameters(map);
  const spacing = Math.max(measured.spacingX, measured.spacingY);
  const extent = Math.min(map.columns * map.spacingX, map.rows * map.spacingY);
  const flags = commonFlags(measured.heights, spacing, conditions, extent, parameters.correlationLength);
  const { sdr, sdrTriangles } = parameters;
  if (sdr > 0 && Math.abs(sdrTriangles / sdr - 1) > AREA_AGREEMENT)
    flags.push(
      flag(
        'resolution',
        'outside',
        `The developed area ratio is ${percent(sdr)} by slopes and ${percent(sdrTriangles)} by the triangles of the grid: the grid does not resolve the texture, and both depend on it.`,
      ),
    );
  return { map, parameters, flags };
}

function requireConditions({ shortFilter, longFilter }: TextureConditions): void {
  for (const index of [shortFilter, longFilter])
    if (index !== undefined && !(Number.isFinite(index) && index > 0))
      throw new RangeError(`a nesting index must be a positive length in m, got ${index}`);
  if (shortFilter !== undefined && longFilter !== undefined && !(shortFilter < longFilter))
    throw new RangeError(
      `the short filter's nesting index ${shortFilter} m must lie below the long one's ${longFilter} m`,
    );
}

const less = (a: { heights: Float64Array }, b: { heights: Float64Array }): Float64Array =>
  a.heights.map((z, i) => z - b.heights[i]);

const flag = (code: string, severity: ValidityFlag['severity'], text: string): ValidityFlag => ({
  code: `texture.${code}`,
  severity,
  model: MODEL,
  text,
});

function commonFlags(
  heights: Float64Array,
  spacing: number,
  { shortFilter, longFilter }: TextureConditions,
  extent: number,
  correlationLength: number | undefined,
): ValidityFlag[] {
  const flags: ValidityFlag[] = [];
  const finest = shortFilter ?? longFilter;
  if (finest !== undefined && finest < COARSEST_SAMPLING * spacing)
    flags.push(
      flag(
        'filter-sampling',
        'outside',
        `Points lie ${micrometres(spacing)} apart; a Gaussian filter of ${micrometres(finest)} needs them at most ${micrometres(finest / COARSEST_SAMPLING)} apart.`,
      ),
    );
  if (shortFilter === undefined || longFilter === undefined)
    flags.push(
      flag(
        'bandwidth',
        'note',
        `${longFilter === undefined ? 'Only a tilt was taken off' : `Waves longer than ${micrometres(longFilter)} were taken off`}, and waves finer than ${shortFilter === undefined ? 'the instrument resolves' : micrometres(shortFilter)}: heights, slopes and lengths belong to that band of wavelengths.`,
      ),
    );
  const share = measuredShare(heights);
  if (share < MEASURED)
    flags.push(
      flag(
        'unmeasured',
        'outside',
        `${percent(1 - share)} of the points were not measured; steep flanks go missing first, so slopes and areas come out low.`,
      ),
    );
  if (correlationLength === undefined || extent < FEWEST_LENGTHS * correlationLength)
    flags.push(
      flag(
        'extent',
        'outside',
        correlationLength === undefined
          ? `The autocorrelation does not fall within half of the ${micrometres(extent)} evaluated: no length can be stated.`
          : `The evaluated extent of ${micrometres(extent)} is ${(extent / correlationLength).toFixed(1)} correlation lengths; below ${FEWEST_LENGTHS} the figures are those of the spot.`,
      ),
    );
  return flags;
}
