import type { Board, Texture } from '../manifest/model.js';
import {
  ASSUMED_RZ_OVER_RQ,
  correlationLengthFromAreaRatio,
  GENTLE_LENGTH_OVER_RQ,
} from '../physics/roughness/index.js';
import type { FaceState } from '../study/results.js';
import { figureBlock } from './blocks.js';
import { type FaceGroup, faceGroups } from './copper-faces.js';
import type { Block, ToothDrawing } from './document.js';
import { micrometres } from './figures.js';
import { sketchProfile } from './tooth-profile.js';
import { rounded } from './values.js';

type Face = ToothDrawing['faces'][number];

/** What a sketch says of itself, so that nobody takes it for a measurement. */
const SKETCH = 'Sketch from stated figures, not a measurement';
/** Least width that is drawn, µm; wide enough to see a few nodules, narrow enough to see a skin depth. */
const LEAST_WIDTH = 16;
/** Correlation lengths that a sketch shows at least. */
const LEAST_LENGTHS = 5;
/** Heights of all panels together over the width: the drawing stays under half a page. */
const TALLEST = 0.42;
const SAMPLES = { least: 160, most: 640 } as const;

const um = (metres: number): number => metres * 1e6;
const height = (value: number): number => rounded(value, 3);

/** Correlation length to draw with, µm, and where it comes from. */
function lengthOf({ rq, correlationLength, developedAreaRatio, lay }: Texture): {
  readonly value: number;
  readonly words: string;
} {
  if (correlationLength !== undefined)
    return { value: um(correlationLength.value), words: `correlation length ${micrometres(correlationLength.value)}` };
  if (developedAreaRatio !== undefined && developedAreaRatio.value > 0) {
    const value = correlationLengthFromAreaRatio(rq.value, developedAreaRatio.value, lay ?? 'isotropic');
    return { value: um(value), words: `correlation length ${micrometres(value)} from Sdr` };
  }
  const value = GENTLE_LENGTH_OVER_RQ * rq.value;
  return {
    value: um(value),
    words: `correlation length not stated, the gentle ${micrometres(value)} assumed: a finer texture of the same Rq would look steeper and lose more`,
  };
}

export function textureOf({ stackUp: { strip, ground } }: Board, place: FaceState['place']): Texture {
  if (place === 'ground') return ground.dielectricFace.texture;
  return place === 'underside' ? strip.dielectricFace.texture : strip.outerFace.texture;
}

/** Balls at the pitch, stacked on what lies below them; heights above the flat of the base. */
function stacks(
  nodule: NonNullable<Texture['nodule']>,
  widthUm: number,
  ground: (x: number) => number,
): NonNullable<Face['nodules']> {
  const radius = um(nodule.radius.value);
  const pitch = um(nodule.pitch.value);
  const count = Math.max(1, Math.floor((widthUm - 2 * radius) / pitch) + 1);
  const first = (widthUm - (count - 1) * pitch) / 2;
  const centres = Array.from({ length: count }, (_, i) => first + i * pitch).flatMap((x) =>
    Array.from({ length: nodule.layers }, (_, n) => [height(x), height(ground(x) + radius * (2 * n + 1))] as const),
  );
  return { radiusUm: height(radius), centres };
}

/** Height of the mean plane over the flat between the balls, µm: their volume over their area. */
function meanOfBalls({ radius, pitch, layers }: NonNullable<Texture['nodule']>): number {
  return um((layers * (4 / 3) * Math.PI * radius.value ** 3) / pitch.value ** 2);
}

function profileOf(texture: Texture, widthUm: number): Pick<Face, 'note' | 'profile' | 'nodules'> {
  const { measured, nodule, rq } = texture;
  if (measured?.section !== undefined) {
    const { interval, heights } = measured.section;
    const shown = heights.slice(0, Math.floor(widthUm / um(interval)) + 1);
    return {
      note: `Measured ${measured.kind === 'map' ? 'height map, one line of it' : 'profile'}: ${measured.file}`,
      profile: { intervalUm: um(interval), heightsUm: shown.map((z) => height(um(z))) },
    };
  }
  const lateral = texture.correlationLength !== undefined || texture.developedAreaRatio !== undefined;
  if (nodule !== undefined && !lateral) {
    const base = -meanOfBalls(nodule);
    const balls = `${nodule.layers === 1 ? 'one layer' : `${nodule.layers} layers`} of balls of radius ${micrometres(nodule.radius.value)} at a pitch of ${micrometres(nodule.pitch.value)}, cut through their centres`;
    return {
      note: `${SKETCH}: ${balls}, on a flat base`,
      profile: { intervalUm: widthUm, heightsUm: [height(base), height(base)] },
      nodules: stacks(nodule, widthUm, () => base),
    };
  }
  const { value, words } = lengthOf(texture);
  if (!(rq.value > 0)) {
    return { note: 'Smooth: Rq is zero', profile: { intervalUm: widthUm, heightsUm: [0, 0] } };
  }
  const samples = Math.min(SAMPLES.most, Math.max(SAMPLES.least, Math.ceil((16 * widthUm) / value)));
  const heights = sketchProfile({ rq: um(rq.value), correlationLength: value, width: widthUm, samples });
  const interval = widthUm / (samples - 1);
  const at = (x: number) => heights[Math.min(samples - 1, Math.round(x / interval))];
  return {
    note: `${SKETCH}: Gaussian profile of this Rq, ${words}${nodule === undefined ? '' : '; with its nodules upon it'}`,
    profile: { intervalUm: interval, heightsUm: heights.map(height) },
    ...(nodule === undefined ? {} : { nodules: stacks(nodule, widthUm, at) }),
  };
}

const rzOf = ({ rq, rz, stated }: Texture): Face['rz'] => {
  if (rz !== undefined) return { um: height(um(rz.value)), assumed: false };
  if (stated.parameter === 'Rz' || stated.parameter === 'Sz') return { um: height(um(stated.value)), assumed: false };
  return { um: height(um(ASSUMED_RZ_OVER_RQ * rq.value)), assumed: true };
};

/** 1, 1.5, 2, 3, 5 or 8 times a power of ten at or above. */
function roundUp(value: number): number {
  const power = 10 ** Math.floor(Math.log10(value));
  const step = [1, 1.2, 1.5, 2, 2.5, 3, 4, 5, 6, 8, 10].find((s) => s * power >= value * (1 - 1e-9)) ?? 10;
  return Number((step * power).toPrecision(6));
}

/** One width for all faces of the board: the pictures compare. */
function widthFor(textures: readonly Texture[]): number {
  const tall = textures.map((texture) => {
    const { nodule } = texture;
    const balls = nodule === undefined ? 0 : um(2 * nodule.radius.value * nodule.layers);
    return Math.max(rzOf(texture).um, 6 * um(texture.rq.value), balls + um(texture.rq.value));
  });
  const rough = textures.filter(({ rq, measured }) => rq.value > 0 && measured?.section === undefined);
  const long = rough.map((texture) =>
    texture.nodule !== undefined && texture.correlationLength === undefined && texture.developedAreaRatio === undefined
      ? 4 * um(texture.nodule.pitch.value)
      : LEAST_LENGTHS * lengthOf(texture).value,
  );
  return roundUp(Math.max(LEAST_WIDTH, ...long, tall.reduce((a, b) => a + b, 0) / TALLEST));
}

/** The teeth of all copper faces at one true scale in both directions, beside the skin depth. */
export function toothDrawing(board: Board, groups: readonly FaceGroup[]): ToothDrawing {
  const textures = groups.map(({ face }) => textureOf(board, face.place));
  const widthUm = widthFor(textures);
  return {
    drawing: 'tooth',
    widthUm,
    faces: groups.map(({ name, face }, i) => ({
      label: name,
      above: face.place === 'outer' ? 'outside' : 'laminate',
      skinDepthUm: height(um(face.skinDepth)),
      rqUm: height(um(face.rq)),
      rz: rzOf(textures[i]),
      ...profileOf(textures[i], widthUm),
    })),
  };
}

export function toothFigure(board: Board, faces: readonly FaceState[]): Block {
  const groups = faceGroups(faces);
  const drawn = toothDrawing(board, groups);
  const rough = drawn.faces.reduce((a, b) => (b.rqUm > a.rqUm ? b : a));
  const ratio = rough.rqUm / rough.skinDepthUm;
  return figureBlock({
    id: 'tooth',
    title: 'The tooth of each copper face to scale, beside the skin depth',
    reading: `The largest Rq is ${rounded(rough.rqUm, 2)} µm, ${rounded(ratio, 1)} times the skin depth of ${rough.skinDepthUm} µm: ${rough.label.charAt(0).toLowerCase()}${rough.label.slice(1)}.`,
    alt: `Sections through the copper faces at one scale in both directions, copper below, each with bars for skin depth, Rq and Rz: ${drawn.faces.map((f) => `${f.label}, Rq ${f.rqUm} µm (${f.note})`).join('; ')}.`,
    content: drawn,
  });
}
