/** A copper face under one view of its texture, kept: an estimate costs as much as a solved column. */
import {
  applicableModels,
  type BandEstimates,
  type FaceConditions,
  type RoughFace,
  roughFace,
  roughnessEstimates,
} from '../physics/roughness/index.js';
import type { ValidityFlag } from '../physics/validity.js';
import type { FaceTexture } from './values.js';
import { isSide, type RoughnessView } from './views.js';

/** Estimates of a board's faces at some twenty frequencies, three temperatures and a dozen states. */
const KEPT = 4096;
const known = new Map<string, Estimated>();

interface Estimated {
  readonly estimates: BandEstimates;
  readonly flags: readonly ValidityFlag[];
}

/**
 * A model that needs more than is known of this face gives way to the middle estimate. Where what is known contradicts itself,
 * the estimates leave out what cannot hold and say so.
 *
 * @throws RangeError on a texture that is not physical
 */
export function faceUnder(view: RoughnessView, texture: FaceTexture, conditions: FaceConditions): RoughFace {
  const { texture: held, flags } = heldTexture(texture);
  if (!isSide(view) && applicableModels(held).includes(view)) {
    const face = roughFace(view, { ...held, ...conditions });
    return flags.length === 0 ? face : { ...face, flags: [...face.flags, ...flags] };
  }
  const key = JSON.stringify([held, conditions]);
  let found = known.get(key);
  if (!found) {
    found = estimated(held, conditions);
    if (known.size >= KEPT) known.clear();
    known.set(key, found);
  }
  const face = found.estimates[isSide(view) ? view : 'middle'];
  const said = [...flags, ...found.flags];
  return said.length === 0 ? face : { ...face, flags: [...face.flags, ...said] };
}

/** Nodules that a moved figure would push into each other touch instead. */
export function heldTexture(texture: FaceTexture): { readonly texture: FaceTexture; readonly flags: ValidityFlag[] } {
  const { nodule } = texture;
  if (!nodule || nodule.pitch >= 2 * nodule.radius) return { texture, flags: [] };
  return {
    texture: { ...texture, nodule: { ...nodule, pitch: 2 * nodule.radius } },
    flags: [
      note(
        'touching',
        'At the limit of a tolerance the nodules would overlap: they are taken as touching there, which is as close as they get.',
      ),
    ],
  };
}

/** With less knowledge where the whole of it is contradictory, such as a moved Rq beside a fixed lateral measure may be. */
function estimated(texture: FaceTexture, conditions: FaceConditions): Estimated {
  try {
    return { estimates: roughnessEstimates(texture, conditions), flags: shapeFlags(texture, conditions) };
  } catch (cause) {
    if (!(cause instanceof RangeError) || Object.keys(texture).length === 1) throw cause;
    return {
      estimates: roughnessEstimates({ rq: texture.rq }, conditions),
      flags: [
        note(
          'height-only',
          `What is stated beside Rq cannot hold at an Rq of ${(texture.rq * 1e6).toPrecision(3)} µm (${cause.message}): the band is that of Rq alone there, which is wider.`,
        ),
      ],
    };
  }
}

/** Where the models behind the estimates of a texture's shape are out of their range. */
function shapeFlags(texture: FaceTexture, conditions: FaceConditions): readonly ValidityFlag[] {
  if (texture.rq === 0) return [];
  return applicableModels(texture)
    .filter((model) => model === 'area-limited' || model === 'nodules')
    .flatMap((model) => roughFace(model, { ...texture, ...conditions }).flags);
}

const note = (code: string, text: string): ValidityFlag => ({
  code: `texture.${code}`,
  severity: 'note',
  model: 'roughness, estimates',
  text,
});
