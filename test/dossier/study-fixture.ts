import type { Board, Figure, Texture } from '../../src/manifest/model.js';
import { type Complex, complex, div } from '../../src/numerics/complex.js';
import { skinDepth } from '../../src/physics/material/index.js';
import {
  applicableModels,
  type RoughFace,
  type RoughnessModel,
  resonanceShift,
  roughFace,
  roughnessBand,
  roughnessEstimates,
  saturationStatement,
  slowWaveLength,
  type TextureKnowledge,
  tiltShift,
} from '../../src/physics/roughness/index.js';
import type {
  BoardStudy,
  Cut,
  CutFigures,
  FaceState,
  LinePoint,
  ModelCurves,
  PointResult,
  PowerShares,
  RoughnessSide,
  Sweep,
} from '../../src/study/results.js';
import { confirmedOf, scatteringOf } from './engine-fixture.js';

/**
 * A study that behaves like one, from a few textbook relations: a resonator for the match, array factors for the cuts,
 * shares that grow with the loss factor. It stands in for the engine in tests of verdicts and pages; nothing else may
 * be concluded from its numbers.
 */
export interface Assumptions {
  /** Relative change of permittivity: moves resonance and beam. */
  readonly permittivity?: number;
  /** Loss factor of the faces to the laminate. */
  readonly lossFactor?: number;
}

const SIDES: readonly RoughnessSide[] = ['low', 'middle', 'high'];
const C0 = 299792458;
const CONDITIONS = { frequency: 76.5e9, conductivity: 5.8e7 } as const;
const ANGLES = Float64Array.from({ length: 361 }, (_, i) => ((i - 180) / 2) * (Math.PI / 180));

/** What a manifest knows of a texture, for the physics. */
export function knowledgeOf(texture: Texture, scale = 1): TextureKnowledge {
  const { rq, correlationLength, developedAreaRatio, lay, nodule, rz } = texture;
  return {
    rq: rq.value * scale,
    ...(correlationLength === undefined ? {} : { correlationLength: correlationLength.value }),
    ...(developedAreaRatio === undefined ? {} : { developedAreaRatio: developedAreaRatio.value }),
    ...(lay === undefined ? {} : { lay }),
    ...(rz === undefined ? {} : { rz: rz.value }),
    ...(nodule === undefined
      ? {}
      : { nodule: { radius: nodule.radius.value, pitch: nodule.pitch.value, layers: nodule.layers } }),
  };
}

/** Figures of the faces are the engine's own: pages print its sentences, and three sides in true order. */
const estimates = (texture: Texture, scale = 1, permittivity = 3) =>
  roughnessEstimates(knowledgeOf(texture, scale), { ...CONDITIONS, permittivity });

const figuresOfFace = (face: RoughFace) => ({
  lossFactor: face.lossFactor,
  reactance: face.reactance,
  planeShift: face.planeShift,
  slowWaveLength: slowWaveLength(face),
});

export function faceState(
  face: string,
  place: FaceState['place'],
  texture: Texture,
  known: string,
  permittivity: number,
): FaceState {
  const conditions = { ...CONDITIONS, permittivity };
  const knowledge = knowledgeOf(texture);
  const band = roughnessBand(knowledge, conditions);
  const models = applicableModels(knowledge);
  return {
    face,
    place,
    rq: knowledge.rq,
    skinDepth: skinDepth(conditions.frequency, conditions.conductivity),
    known,
    band: SIDES.map((side) => ({ side, ...figuresOfFace(band[side]), reason: band[side].reason })),
    models: models.map((model) => {
      const found = roughFace(model, { ...knowledge, ...conditions });
      return { model, ...figuresOfFace(found), flags: found.flags };
    }),
    narrowing: band.narrowing,
    saturation: models.flatMap((model) => {
      const text = saturationStatement(model, knowledge, conditions);
      return text === undefined ? [] : [{ model, text }];
    }),
  };
}

/** Slow wave of both faces, relative in permittivity. */
const slowWave = (side: RoughnessSide, rq: number): number =>
  ({ low: 0.001, middle: 0.004, high: 0.012 })[side] * (rq / 1e-6);

function cutOf(plane: Cut['plane'], gainDbi: number, field: (angle: number) => number): Cut {
  const power = Array.from(ANGLES, (angle) => Math.max(field(angle) ** 2, 1e-12));
  const top = Math.max(...power);
  return { plane, angle: ANGLES, gainDbi: Float64Array.from(power, (p) => gainDbi + 10 * Math.log10(p / top)) };
}

function figuresOf(cut: Cut): CutFigures {
  const level = Array.from(cut.gainDbi);
  const top = level.indexOf(Math.max(...level));
  const walk = (step: number) => {
    let i = top;
    while (level[i + step] !== undefined && level[i + step] > level[top] - 3.0103) i += step;
    const slope = level[i] - level[i + step];
    return cut.angle[i] + step * (0.5 * (Math.PI / 180)) * ((level[i] - level[top] + 3.0103) / slope);
  };
  const peaks = level.filter((l, i) => i !== top && l > (level[i - 1] ?? Infinity) && l > (level[i + 1] ?? Infinity));
  return {
    beamDirection: cut.angle[top],
    halfPowerBeamwidth: walk(1) - walk(-1),
    sidelobeDb: peaks.length === 0 ? Number.NaN : Math.max(...peaks) - level[top],
  };
}

const arrayFactor = (weights: readonly number[], phase: number): number => {
  const re = weights.reduce((sum, w, i) => sum + w * Math.cos(i * phase), 0);
  const im = weights.reduce((sum, w, i) => sum + w * Math.sin(i * phase), 0);
  return Math.hypot(re, im);
};

function sharesOf(lossFactor: number, temperatureC: number): PowerShares {
  const resistance = Math.sqrt(1 + 0.00393 * (temperatureC - 20));
  const face = { stripUnderside: 0.035, stripTop: 0.008, stripEdges: 0.016, ground: 0.03 };
  const scaled = {
    stripUnderside: face.stripUnderside * resistance,
    stripTop: face.stripTop * resistance,
    stripEdges: face.stripEdges * resistance,
    ground: face.ground * resistance,
    roughness: (face.stripUnderside + face.ground) * resistance * (lossFactor - 1),
    finish: 0.009,
    dielectric: 0.045 * (1 + 0.0005 * (temperatureC - 25)),
    surfaceWave: 0.03,
  };
  return { ...scaled, load: 0, radiated: 1 - Object.values(scaled).reduce((a, b) => a + b, 0) };
}

function match(board: Board, frequency: number, temperatureC: number, permittivity: number, offset: number): Complex {
  const centre = (board.band.low + board.band.high) / 2;
  const resonance = centre * (1 - permittivity / 2 - 20e-6 * (temperatureC - board.temperature.nominalC));
  const x = 25 * ((frequency - resonance) / resonance);
  const detuned = div(complex(0, x), complex(1, x));
  return complex(detuned.re + 0.05 + offset, detuned.im);
}

export function pointOf(
  board: Board,
  frequency: number,
  temperatureC: number,
  assumptions: Assumptions = {},
): PointResult {
  const { permittivity = 0, lossFactor = 1.6 } = assumptions;
  const k0 = (2 * Math.PI * frequency) / C0;
  const column = board.columns[0];
  const spacing = column.patches[0].length + (column.links[0]?.length ?? 0);
  const centre = (board.band.low + board.band.high) / 2;
  const lag = 2 * Math.PI * ((frequency / centre) * (1 + permittivity / 2) - 1);
  const taper = column.patches.map((patch) => patch.width);
  const weights = board.feed.map((path) => path.amplitude);
  const wavelength = C0 / frequency;
  const area = board.columns.length * board.pitch * column.patches.length * spacing;
  const directivity = (0.9 * 4 * Math.PI * area) / wavelength ** 2;
  const shares = sharesOf(lossFactor, temperatureC);
  const feedTransmission = 10 ** (-0.06 * (1 + 0.001 * (temperatureC - 25)));
  const columnReflection = board.columns.map((_, i) => match(board, frequency, temperatureC, permittivity, 0.005 * i));
  const activeReflection = board.columns.map(() => match(board, frequency, temperatureC, permittivity, 0.03));
  const incident = weights.reduce((sum, w) => sum + w * w, 0);
  const back = activeReflection.reduce((sum, g, i) => sum + weights[i] ** 2 * (g.re ** 2 + g.im ** 2), 0);
  const mismatch = 1 - back / incident;
  const gain = directivity * shares.radiated * feedTransmission;
  const gainDbi = 10 * Math.log10(gain);
  const elevation = cutOf(
    'elevation',
    gainDbi,
    (a) => Math.cos(a) * arrayFactor(taper, k0 * spacing * Math.sin(a) - lag),
  );
  const azimuth = cutOf('azimuth', gainDbi, (a) => Math.cos(a) * arrayFactor(weights, k0 * board.pitch * Math.sin(a)));
  const scattering = scatteringOf(columnReflection);
  return {
    frequency,
    temperatureC,
    directivity,
    gain,
    realizedGain: gain * mismatch,
    radiationEfficiency: shares.radiated,
    feedTransmission,
    mismatch,
    shares,
    columnReflection,
    activeReflection,
    referenceImpedance: board.columns.map(() => 70.5),
    elevation: figuresOf(elevation),
    azimuth: figuresOf(azimuth),
    powerResidual: 3.1e-13,
    farFieldClosure: 0.9981,
    cuts: { elevation, azimuth },
    scattering,
  };
}

export const linePoint = (
  frequency: number,
  temperatureC: number,
  { permittivity = 0, lossFactor = 1.6 }: Assumptions,
): LinePoint => ({
  frequency,
  temperatureC,
  lossDbPerM: 24 * (0.5 + 0.5 * lossFactor) + 8,
  effectivePermittivity: 2.35 * (1 + permittivity),
  impedance: 70.5,
});

export function sweepOf(board: Board, id: string, assumptions: Assumptions, frequencies = 5): Sweep {
  const { low, high } = board.band;
  const points = [board.temperature.lowC, board.temperature.nominalC, board.temperature.highC].flatMap((t) =>
    Array.from({ length: frequencies }, (_, i) =>
      pointOf(board, low + ((high - low) * i) / (frequencies - 1), t, assumptions),
    ),
  );
  const line = points.map(({ frequency, temperatureC }) => linePoint(frequency, temperatureC, assumptions));
  return { id, label: id, points, line };
}

export function studyOf(board: Board, nominal: RoughnessSide = 'middle'): BoardStudy {
  const { strip, ground, laminate } = board.stackUp;
  const texture = strip.dielectricFace.texture;
  const rq = texture.rq.value;
  const permittivity = laminate.material.permittivity.value;
  const assume = (side: RoughnessSide, scale = 1, change = 0): Assumptions => ({
    lossFactor: estimates(texture, scale)[side].lossFactor,
    permittivity: change + slowWave(side, rq * scale),
  });
  const sides = SIDES.map((side) => ({ side, sweep: sweepOf(board, `side-${side}`, assume(side)) }));
  const tolerance = (
    id: string,
    label: string,
    figure: Figure,
    moved: (side: RoughnessSide, sign: number) => Assumptions,
  ) => {
    const bySide = SIDES.map((side) => ({
      side,
      low: sweepOf(board, `${id}-low-${side}`, moved(side, -1)),
      high: sweepOf(board, `${id}-high-${side}`, moved(side, 1)),
    }));
    const { low, high } = bySide[SIDES.indexOf(nominal)];
    return { id, label, figure, low, high, bySide };
  };
  const heights = Array.from({ length: 17 }, (_, i) => (i * 2.4e-6) / 16);
  const gigahertz = Array.from({ length: 11 }, (_, i) => 70e9 + i * 1.5e9);
  const models = applicableModels(knowledgeOf(texture));
  const factor = (model: RoughnessModel, height: number) =>
    roughFace(model, { ...knowledgeOf(texture, height / rq), ...CONDITIONS, permittivity }).lossFactor;
  const overHeight = heights.map((height) => estimates(texture, height / rq));
  const curvesOver = (
    x: readonly number[],
    model: (name: RoughnessModel, at: number) => number,
    band: (side: RoughnessSide, i: number) => number,
  ): ModelCurves => ({
    x,
    curves: models.map((name) => ({ model: name, y: x.map((at) => model(name, at)) })),
    band: {
      low: x.map((_, i) => band('low', i)),
      middle: x.map((_, i) => band('middle', i)),
      high: x.map((_, i) => band('high', i)),
    },
  });
  const here = estimates(texture);
  const loss = (k: number, f: number) => ((20 + 12 * k) * f) / 77e9;
  return {
    board,
    hash: 'ab'.repeat(32),
    nominal: sides[SIDES.indexOf(nominal)].sweep,
    sides,
    tolerances: [
      tolerance('permittivity', 'Permittivity', laminate.material.permittivity, (side, sign) =>
        assume(side, 1, sign * 0.006),
      ),
      tolerance('roughness', 'Roughness of treated faces', texture.rq, (side, sign) => assume(side, 1 + 0.1 * sign)),
    ],
    lineLoss: curvesOver(
      gigahertz,
      (model, f) => loss(factor(model, rq), f),
      (side, i) => loss(here[side].lossFactor, gigahertz[i]),
    ),
    lossFactor: curvesOver(heights, factor, (side, i) => overHeight[i][side].lossFactor),
    effectivePermittivity: curvesOver(
      heights,
      (model, height) => 2.35 * (1 + 0.003 * (factor(model, height) - 1)),
      (side, i) => 2.35 * (1 + slowWave(side, heights[i])),
    ),
    lineLossByFace: SIDES.map((side) => {
      const k = here[side].lossFactor;
      const faces = [
        { face: 'underside', smooth: 8.41, finish: 0, texture: 8.41 * (k - 1) },
        { face: 'top', smooth: 2.37, finish: 1.133, texture: 0.214 },
        { face: 'edges', smooth: 4.613, finish: 2.209, texture: 0 },
        { face: 'ground', smooth: 6.18, finish: 0, texture: 6.18 * (k - 1) },
      ] as const;
      const dielectric = 7.377;
      const total = faces.reduce((sum, f) => sum + f.smooth + f.finish + f.texture, dielectric);
      return {
        side,
        faces,
        dielectric,
        total,
        effectivePermittivity: 2.35 * (1 + slowWave(side, rq)),
        impedance: 70.5,
      };
    }),
    slowWave: SIDES.map((side) => {
      const rise = slowWave(side, rq);
      return {
        side,
        lineRise: 0.75 * rise,
        patchRise: rise,
        resonanceShift: resonanceShift(rise, CONDITIONS.frequency),
        tiltShift: tiltShift(rise, 2.35),
        applied: laminate.material.permittivityKind === 'bulk',
      };
    }),
    faces: [
      faceState('strip underside (treated)', 'underside', texture, 'Rq only', permittivity),
      faceState('strip top and edges (foil), bare copper', 'outer', strip.outerFace.texture, 'Rq only', 1),
      faceState('ground (treated)', 'ground', ground.dielectricFace.texture, 'Rq only', permittivity),
    ],
    flags: [
      {
        code: 'roughness.hammerstad.saturated',
        severity: 'saturated',
        model: 'Hammerstad',
        text: 'Within 5 % of its ceiling of 2 on the treated faces: it no longer tells rougher copper apart.',
      },
    ],
    notEvaluated: [],
    losslessClosure: 0.9987,
    confirmation: confirmedOf(board, pointOf),
  };
}
