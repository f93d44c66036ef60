import type { Board, Figure, RoughnessModelName } from '../../src/manifest/model.js';
import { type Complex, complex, div } from '../../src/numerics/complex.js';
import type { BoardStudy, Cut, CutFigures, PointResult, PowerShares, Sweep } from '../../src/study/results.js';

/**
 * A study that behaves like one, from a few textbook relations: a resonator for the match, array factors for the cuts,
 * shares that grow with the loss factor. It stands in for the engine in tests of verdicts and pages; nothing else may
 * be concluded from its numbers.
 */
export interface Assumptions {
  /** Relative change of permittivity: moves resonance and beam. */
  readonly permittivity?: number;
  /** Loss factor of the dielectric faces. */
  readonly lossFactor?: number;
}

const MODELS: readonly RoughnessModelName[] = ['hammerstad', 'groiss', 'gradient'];
const C0 = 299792458;
const ANGLES = Float64Array.from({ length: 361 }, (_, i) => ((i - 180) / 2) * (Math.PI / 180));

export function lossFactorOf(model: RoughnessModelName, rq: number, skinDepth = 0.238e-6): number {
  const r = rq / skinDepth;
  if (model === 'hammerstad') return 1 + (2 / Math.PI) * Math.atan(1.4 * r * r);
  if (model === 'groiss') return r === 0 ? 1 : 1 + Math.exp(-((1 / (2 * r)) ** 1.6));
  return 1 + 0.9 * r ** 1.05;
}

/** Slow wave of both faces, relative in permittivity; only the gradient model carries a large one. */
const slowWave = (model: RoughnessModelName, rq: number): number =>
  (model === 'gradient' ? 0.012 : 0.001) * (rq / 1e-6);

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
  return { ...scaled, radiated: 1 - Object.values(scaled).reduce((a, b) => a + b, 0) };
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
    lineLossDbPerM: 24 * (0.5 + 0.5 * lossFactor) + 8,
    lineEffectivePermittivity: 2.35 * (1 + permittivity),
    powerResidual: 3.1e-13,
    farFieldClosure: 0.9981,
    cuts: { elevation, azimuth },
  };
}

export function sweepOf(board: Board, id: string, assumptions: Assumptions, frequencies = 5): Sweep {
  const { low, high } = board.band;
  const points = [board.temperature.lowC, board.temperature.nominalC, board.temperature.highC].flatMap((t) =>
    Array.from({ length: frequencies }, (_, i) =>
      pointOf(board, low + ((high - low) * i) / (frequencies - 1), t, assumptions),
    ),
  );
  return { id, label: id, points };
}

export function studyOf(board: Board, nominalModel: RoughnessModelName = 'groiss'): BoardStudy {
  const rq = board.stackUp.strip.dielectricFace.texture.rq.value;
  const assume = (model: RoughnessModelName, scale = 1, permittivity = 0): Assumptions => ({
    lossFactor: lossFactorOf(model, rq * scale),
    permittivity: permittivity + slowWave(model, rq * scale),
  });
  const models = MODELS.map((model) => ({ model, sweep: sweepOf(board, `model-${model}`, assume(model)) }));
  const tolerance = (
    id: string,
    label: string,
    figure: Figure,
    moved: (model: RoughnessModelName, sign: number) => Assumptions,
  ) => {
    const both = (model: RoughnessModelName) => ({
      model,
      low: sweepOf(board, `${id}-low-${model}`, moved(model, -1)),
      high: sweepOf(board, `${id}-high-${model}`, moved(model, 1)),
    });
    const byModel = MODELS.map(both);
    const { low, high } = byModel[MODELS.indexOf(nominalModel)];
    return { id, label, figure, low, high, byModel };
  };
  const roughness = Array.from({ length: 25 }, (_, i) => (i * 2.4e-6) / 24);
  const gigahertz = Array.from({ length: 11 }, (_, i) => 70e9 + i * 1.5e9);
  return {
    board,
    hash: 'ab'.repeat(32),
    nominal: models[MODELS.indexOf(nominalModel)].sweep,
    models,
    tolerances: [
      tolerance('permittivity', 'Permittivity', board.stackUp.laminate.material.permittivity, (m, s) =>
        assume(m, 1, s * 0.006),
      ),
      tolerance('roughness', 'Roughness of treated faces', board.stackUp.strip.dielectricFace.texture.rq, (m, s) =>
        assume(m, 1 + 0.1 * s),
      ),
    ],
    lineLoss: {
      x: gigahertz,
      curves: [
        { model: 'smooth', y: gigahertz.map((f) => (32 * f) / 77e9) },
        ...MODELS.map((model) => ({
          model,
          y: gigahertz.map((f) => ((20 + 12 * lossFactorOf(model, rq)) * f) / 77e9),
        })),
      ],
    },
    lossFactor: {
      x: roughness,
      curves: [
        { model: 'smooth', y: roughness.map(() => 1) },
        ...MODELS.map((model) => ({ model, y: roughness.map((x) => lossFactorOf(model, x)) })),
      ],
    },
    faces: ['strip, dielectric face', 'strip, outer face', 'ground, dielectric face'].map((face, i) => ({
      face,
      rq: i === 1 ? 0.25e-6 : rq,
      skinDepth: 0.238e-6,
      models: MODELS.map((model) => ({
        model,
        lossFactor: lossFactorOf(model, i === 1 ? 0.25e-6 : rq),
        reactance: model === 'gradient' ? -2.85 : lossFactorOf(model, i === 1 ? 0.25e-6 : rq),
        planeShift: model === 'gradient' ? 5.05 * (i === 1 ? 0.25e-6 : rq) : 0,
      })),
    })),
    flags: [
      {
        code: 'roughness.hammerstad-saturated',
        severity: 'saturated',
        model: 'Hammerstad',
        text: 'Within 5 % of its ceiling of 2 on the treated faces: it no longer tells rougher copper apart.',
      },
    ],
    notEvaluated: [],
    losslessClosure: 0.9987,
  };
}
