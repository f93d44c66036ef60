import { lengthConversion } from '../physics/roughness/index.js';
import { RQ_CONVERSIONS, STANDARD_FALL } from '../physics/texture/index.js';
import {
  MAXIMUM_HEIGHTS,
  MEAN_HEIGHTS,
  type MeasuredDocument,
  type NodulesDocument,
  TEXTURE_PARAMETERS,
  type TextureDocument,
} from './documents/texture-document.js';
import type { EvaluatedTexture, Measurements } from './evaluated-texture.js';
import { figureOf, spreadDistance } from './figures.js';
import type { Figure, Texture } from './model.js';

const NONE: Measurements = new Map();

/**
 * A checked texture as the model holds it. Rq is converted where another height is stated, the correlation length where Sal
 * is, the doubt of the conversion added to the spread.
 *
 * @param path where it is written; each figure's own path begins with it
 */
export function textureOf(doc: TextureDocument, path: string, measurements: Measurements = NONE): Texture {
  const { lay, instrument, filter } = doc;
  const evaluated = doc.measured && measurements.get(doc.measured);
  if (doc.measured && !evaluated) throw new Error(`unread measured file of ${path} reached the model`);
  return {
    ...(evaluated && doc.measured ? fromFile(evaluated, doc.measured, `${path}.measured`) : stated(doc, path)),
    ...(lay === undefined ? {} : { lay }),
    ...(doc.nodules === undefined ? {} : { nodule: noduleOf(doc.nodules, `${path}.nodules`) }),
    ...(instrument === undefined ? {} : { instrument }),
    ...(filter === undefined ? {} : { filter }),
  };
}

function stated(doc: TextureDocument, path: string): Texture {
  const parameter = TEXTURE_PARAMETERS.find((p) => doc[p] !== undefined);
  if (parameter === undefined) throw new Error(`unchecked texture ${path} reached the model`);
  const height = figureOf(doc[parameter]!, 'length', `${path}.${parameter}`);
  const { factor, low, high, assumption } = RQ_CONVERSIONS[parameter];
  const value = height.value * factor;
  const maximum = MEAN_HEIGHTS.some((p) => p === parameter) && MAXIMUM_HEIGHTS.find((p) => doc[p] !== undefined);
  return {
    rq: {
      ...height,
      value,
      minus: Math.min(value, height.minus * factor + height.value * (factor - low)),
      plus: height.plus * factor + height.value * (high - factor),
    },
    ...lengthOf(doc, path),
    ...(doc.Sdr === undefined ? {} : { developedAreaRatio: figureOf(doc.Sdr, 'ratio', `${path}.Sdr`) }),
    ...(maximum ? { rz: figureOf(doc[maximum]!, 'length', `${path}.${maximum}`) } : {}),
    stated: { parameter, value: height.value },
    ...(assumption ? { conversion: assumption } : {}),
  };
}

function lengthOf(doc: TextureDocument, path: string): Pick<Texture, 'correlationLength' | 'lengthConversion'> {
  if (doc.correlation_length)
    return { correlationLength: figureOf(doc.correlation_length, 'length', `${path}.correlation_length`) };
  if (!doc.Sal) return {};
  const sal = figureOf(doc.Sal, 'length', `${path}.Sal`);
  const { factor, low, high, assumption } = lengthConversion(doc.Sal_threshold ?? STANDARD_FALL);
  const value = sal.value * factor;
  const [lower, upper] = [(sal.value - sal.minus) * low, (sal.value + sal.plus) * high];
  return {
    correlationLength: { ...sal, value, minus: value - lower, plus: upper - value },
    lengthConversion: assumption,
  };
}

export function noduleOf(
  { radius, pitch, per_area: perArea, layers }: NodulesDocument,
  path: string,
): NonNullable<Texture['nodule']> {
  return {
    radius: figureOf(radius, 'length', `${path}.radius`),
    pitch: pitch
      ? figureOf(pitch, 'length', `${path}.pitch`)
      : pitchOf(figureOf(perArea!, 'per_area', `${path}.per_area`)),
    layers: layers ?? 1,
  };
}

/** Pitch of a square lattice with so many sites per area. */
function pitchOf(perArea: Figure): Figure {
  const at = (n: number) => 1 / Math.sqrt(n);
  const value = at(perArea.value);
  return {
    ...perArea,
    value,
    minus: value - at(perArea.value + perArea.plus),
    plus: at(perArea.value - perArea.minus) - value,
  };
}

/** Spread of a measured texture as shares of its figures. */
export function sharesOf({ spread }: MeasuredDocument): { readonly minus: number; readonly plus: number } {
  const share = (written: string | number): number => spreadDistance(written, 1, 'number') ?? Number.NaN;
  return typeof spread === 'object'
    ? { minus: share(spread.minus), plus: share(spread.plus) }
    : { minus: share(spread), plus: share(spread) };
}

function fromFile(evaluated: EvaluatedTexture, doc: MeasuredDocument, path: string): Texture {
  const { rq, rz, correlationLength, developedAreaRatio, rqStandardError, measured, instrument, filter } = evaluated;
  const { minus, plus } = sharesOf(doc);
  const { document, revision, date } = doc;
  const figure = (value: number, key: string, doubt = 0): Figure => ({
    value,
    minus: Math.min(value, value * (minus + doubt)),
    plus: value * (plus + doubt),
    provenance: {
      basis: 'measured',
      method: `evaluated from a measured ${measured.kind === 'map' ? 'height map' : 'profile'}`,
      ...(document === undefined ? {} : { document }),
      ...(revision === undefined ? {} : { revision }),
      ...(date === undefined ? {} : { date }),
    },
    path: `${path}.${key}`,
  });
  const parameter = measured.kind === 'map' ? 'Sq' : 'Rq';
  const { assumption } = RQ_CONVERSIONS[parameter];
  return {
    rq: figure(rq, parameter, 2 * rqStandardError),
    ...(correlationLength === undefined ? {} : { correlationLength: figure(correlationLength, 'correlation_length') }),
    ...(developedAreaRatio === undefined ? {} : { developedAreaRatio: figure(developedAreaRatio, 'Sdr') }),
    ...(rz === undefined ? {} : { rz: figure(rz, 'Rz') }),
    measured,
    stated: { parameter, value: rq },
    ...(assumption ? { conversion: assumption } : {}),
    ...(instrument === undefined ? {} : { instrument }),
    filter,
  };
}
