import { skinDepth } from '../physics/material/index.js';
import {
  evaluateMap,
  evaluateProfile,
  type HeightMap,
  type Profile,
  type TextureConditions,
} from '../physics/texture/index.js';
import type { ValidityFlag } from '../physics/validity.js';
import { formatQuantity } from '../quantity/index.js';
import type { MeasuredDocument } from './documents/texture-document.js';
import type { MeasuredTexture } from './model.js';
import type { TextureFile } from './texture-files/index.js';

/** What a measured file says of a face, SI. */
export interface EvaluatedTexture {
  readonly rq: number;
  /** Relative, from the finite length. */
  readonly rqStandardError: number;
  /** Of a profile; the Sz of a map grows with its area and stands for no Rz. */
  readonly rz?: number;
  readonly correlationLength?: number;
  /** Of a map; the slopes of one profile do not tell the area. */
  readonly developedAreaRatio?: number;
  readonly measured: MeasuredTexture;
  readonly instrument?: string;
  /** The filters in words. */
  readonly filter: string;
}

/** Measured files, evaluated, by the document that names them. */
export type Measurements = ReadonlyMap<MeasuredDocument, EvaluatedTexture>;

/** Points of the piece kept for the drawing, and its length at least where the data allow it, m. */
const SECTION_POINTS = 400;
const SECTION_LENGTH = 40e-6;
const FEWEST_POINTS = 16;
/** Texture aspect ratio under which a texture has a direction (ISO 25178-2 gives no number; common practice is 0.3 to 0.5). */
const DIRECTED = 0.5;
/** Where the resolution of a measurement is compared with the skin depth of copper. */
const REFERENCE = { frequency: 77e9, conductivity: 58e6 };

const length = (metres: number): string => formatQuantity(metres, 'length');
const percent = (x: number): string => `${(100 * x).toPrecision(2)} %`;

/**
 * Figures of a measured face with what a reviewer must know of them.
 *
 * @throws RangeError where the filters leave nothing to evaluate
 */
export function evaluatedTexture(
  file: TextureFile,
  conditions: TextureConditions,
  source: Pick<MeasuredTexture, 'file' | 'sha256'>,
): EvaluatedTexture {
  const { heights, instrument } = file;
  const about = { ...(instrument === undefined ? {} : { instrument }), filter: filterText(conditions) };
  if (heights.kind === 'profile') {
    const { profile, parameters, flags } = evaluateProfile(heights.profile, conditions);
    const { rq, rz, correlationLength, rqStandardError } = parameters;
    const interval = heights.profile.spacing;
    const remarks = [
      'A least-squares line was taken off',
      ...resolutionRemarks(interval, conditions),
      ...remarksOf(flags),
      ...errorRemark(rqStandardError),
      'A profile tells nothing of the developed area ratio',
    ];
    return {
      rq: figured(rq),
      rqStandardError: figured(finite(rqStandardError)),
      ...(rz > 0 ? { rz: figured(rz) } : {}),
      ...(correlationLength === undefined ? {} : { correlationLength: figured(correlationLength) }),
      measured: made(source, 'profile', conditions, interval, profile.heights.length * interval, profile, remarks),
      ...about,
    };
  }
  const { map, parameters, flags } = evaluateMap(heights.map, conditions);
  const { sq, sdr, str, correlationLength, sqStandardError } = parameters;
  const interval = Math.max(heights.map.spacingX, heights.map.spacingY);
  const extent = Math.min(map.columns * map.spacingX, map.rows * map.spacingY);
  const remarks = [
    'A least-squares plane was taken off',
    ...resolutionRemarks(interval, conditions),
    ...remarksOf(flags),
    ...errorRemark(sqStandardError),
    ...(str === undefined || str >= DIRECTED
      ? []
      : [`The texture has a direction (texture aspect ratio Str ${str.toPrecision(2)})`]),
  ];
  return {
    rq: figured(sq),
    rqStandardError: figured(finite(sqStandardError)),
    ...(correlationLength === undefined ? {} : { correlationLength: figured(correlationLength) }),
    ...(sdr > 0 ? { developedAreaRatio: figured(sdr) } : {}),
    measured: made(source, 'map', conditions, interval, extent, middleRow(map), remarks),
    ...about,
  };
}

const finite = (x: number): number => (Number.isFinite(x) ? x : 0);

/** Four digits, far inside the standard error of any measured length: what is printed and asked for is what is calculated with. */
const figured = (x: number): number => Number(x.toPrecision(4));

function made(
  source: Pick<MeasuredTexture, 'file' | 'sha256'>,
  kind: MeasuredTexture['kind'],
  { shortFilter, longFilter }: TextureConditions,
  interval: number,
  extent: number,
  line: Profile,
  remarks: readonly string[],
): MeasuredTexture {
  const section = sectionOf(line);
  return {
    ...source,
    kind,
    ...(shortFilter === undefined ? {} : { shortNestingIndex: shortFilter }),
    ...(longFilter === undefined ? {} : { longNestingIndex: longFilter }),
    interval,
    extent,
    ...(section === undefined ? {} : { section }),
    remarks,
  };
}

const filterText = ({ shortFilter, longFilter }: TextureConditions): string =>
  [
    shortFilter === undefined ? 'no short filter' : `short filter, nesting index ${length(shortFilter)}`,
    longFilter === undefined ? 'no long filter' : `long filter, nesting index ${length(longFilter)}`,
  ].join('; ');

/** Sentences without their last point, as members of a list. */
const remarksOf = (flags: readonly ValidityFlag[]): readonly string[] =>
  flags.map(({ text }) => text.replace(/\.$/, ''));

const errorRemark = (error: number): readonly string[] =>
  Number.isFinite(error)
    ? [`The finite extent leaves a standard error of ${percent(error)} of Rq; twice that is added to its spread`]
    : [];

/** Two points a wave at the least. Features of half a wave that are no larger than the skin depth decide the loss. */
function resolutionRemarks(interval: number, { shortFilter }: TextureConditions): readonly string[] {
  const finest = Math.max(2 * interval, shortFilter ?? 0);
  const depth = skinDepth(REFERENCE.frequency, REFERENCE.conductivity);
  if (finest <= 2 * depth) return [];
  return [
    `Waves shorter than ${length(finest)} are not seen, and two skin depths of copper at 77 GHz are ${length(2 * depth)}: finer texture, which loses more, may be there`,
  ];
}

const middleRow = ({ columns, rows, spacingX, heights }: HeightMap): Profile => {
  const start = Math.floor(rows / 2) * columns;
  return { spacing: spacingX, heights: heights.subarray(start, start + columns) };
};

/** The first whole stretch of measured points, thinned out where they lie closer than a drawing shows. */
function sectionOf({ spacing, heights }: Profile): MeasuredTexture['section'] {
  const step = Math.max(1, Math.floor(SECTION_LENGTH / (SECTION_POINTS * spacing)));
  let start = 0;
  for (let end = 0; end <= heights.length; end++) {
    if (end < heights.length && !Number.isNaN(heights[end])) continue;
    const stretch = heights.subarray(start, end);
    if (stretch.length >= FEWEST_POINTS * step) {
      const points = Math.min(SECTION_POINTS, Math.floor((stretch.length - 1) / step) + 1);
      // To a picometre: the drawing needs no more, and the model stays small.
      const kept = Array.from({ length: points }, (_, i) => Math.round(stretch[i * step] * 1e12) / 1e12 || 0);
      return { interval: spacing * step, heights: kept };
    }
    start = end + 1;
  }
  return undefined;
}
