import type { Board, Requirement } from '../manifest/model.js';
import type {
  Cut,
  FaceFigures,
  FaceState,
  LineLossByFace,
  LinePoint,
  ModelCurves,
  PointResult,
  SlowWave,
} from '../study/results.js';
import { type BoardVerdict, quantityOf, type RequirementVerdict } from '../verdict/index.js';
import { confirmationData } from './confirmation-data.js';
import { type BoardContext, bandPoints, boardContexts, markingOf, noticesOf, type PackInput } from './context.js';
import {
  type BoardData,
  boardDataSchema,
  type ConditionData,
  type PackData,
  type PointData,
  packDataSchema,
  type VerdictData,
} from './data-schema.js';
import { complexData, cutFiguresData as figuresData, matrixData, maybe, num } from './data-values.js';
import { boardData as boardPath, PACK_DATA } from './links.js';
import { exponentAbove } from './values.js';

const cutData = (c: Cut) => ({ angleRad: Array.from(c.angle, num), gainDbi: Array.from(c.gainDbi, maybe) });
const curvesData = ({ x, curves, band }: ModelCurves) => ({
  x: x.map(num),
  curves: curves.map(({ model, y }) => ({ model, y: y.map(maybe) })),
  band: { low: band.low.map(maybe), middle: band.middle.map(maybe), high: band.high.map(maybe) },
});

const linePointData = (p: LinePoint) => ({
  frequencyHz: num(p.frequency),
  temperatureC: num(p.temperatureC),
  lossDbPerM: maybe(p.lossDbPerM),
  effectivePermittivity: maybe(p.effectivePermittivity),
  impedanceOhm: maybe(p.impedance),
});

const faceFiguresData = (f: FaceFigures) => ({
  lossFactor: maybe(f.lossFactor),
  reactance: maybe(f.reactance),
  planeShiftM: maybe(f.planeShift),
  slowWaveLengthM: maybe(f.slowWaveLength),
});

const faceData = ({ face, place, rq, skinDepth, known, band, models, narrowing, saturation }: FaceState) => ({
  face,
  place,
  rqM: maybe(rq),
  skinDepthM: maybe(skinDepth),
  known,
  band: band.map((entry) => ({ side: entry.side, ...faceFiguresData(entry), reason: entry.reason })),
  models: models.map((entry) => ({
    model: entry.model,
    ...faceFiguresData(entry),
    outOfRange: entry.flags.filter(({ severity }) => severity === 'outside').map(({ text }) => text),
  })),
  narrowing: narrowing.map(({ quantity, measurement, spreadNow, wouldNarrowTo }) => ({
    quantity,
    measurement,
    spreadNow: maybe(spreadNow),
    wouldNarrowTo: maybe(wouldNarrowTo),
  })),
  saturation: saturation.map(({ model, text }) => ({ model, text })),
});

const lossByFaceData = ({ side, faces, dielectric, total, effectivePermittivity, impedance }: LineLossByFace) => ({
  side,
  faces: faces.map(({ face, smooth, finish, texture }) => ({
    face,
    smoothDbPerM: maybe(smooth),
    finishDbPerM: maybe(finish),
    textureDbPerM: maybe(texture),
  })),
  dielectricDbPerM: maybe(dielectric),
  totalDbPerM: maybe(total),
  effectivePermittivity: maybe(effectivePermittivity),
  impedanceOhm: maybe(impedance),
});

const slowWaveData = ({ side, lineRise, patchRise, resonanceShift, tiltShift, applied }: SlowWave) => ({
  side,
  lineRise: maybe(lineRise),
  patchRise: maybe(patchRise),
  resonanceShiftHz: maybe(resonanceShift),
  tiltShiftRad: maybe(tiltShift),
  applied,
});

const pointData = (p: PointResult): PointData => ({
  frequencyHz: num(p.frequency),
  temperatureC: num(p.temperatureC),
  directivity: maybe(p.directivity),
  gain: maybe(p.gain),
  realizedGain: maybe(p.realizedGain),
  radiationEfficiency: maybe(p.radiationEfficiency),
  feedTransmission: maybe(p.feedTransmission),
  mismatch: maybe(p.mismatch),
  shares: Object.fromEntries(Object.entries(p.shares).map(([name, share]) => [name, maybe(share)])),
  columnReflection: p.columnReflection.map(complexData),
  activeReflection: p.activeReflection.map(complexData),
  referenceImpedanceOhm: p.referenceImpedance.map(maybe),
  elevation: figuresData(p.elevation),
  azimuth: figuresData(p.azimuth),
  powerResidual: Number.isFinite(p.powerResidual) ? num(10 ** exponentAbove(p.powerResidual)) : null,
  farFieldClosure: maybe(p.farFieldClosure),
  ...(p.scattering === undefined ? {} : { scattering: matrixData(p.scattering) }),
  ...(p.feed === undefined
    ? {}
    : {
        feed: {
          inputReflection: complexData(p.feed.inputReflection),
          transmission: maybe(p.feed.transmission),
          burnt: maybe(p.feed.burnt),
        },
      }),
});

function sizingData({ sized }: Board): Pick<BoardData, 'sizing'> {
  if (sized === undefined || 'reason' in sized) return {};
  const { by, networkDb, fullWaveDb } = sized;
  return { sizing: { by, networkReflectionDb: maybe(networkDb), fullWaveReflectionDb: maybe(fullWaveDb) } };
}

const verdictData = (boardId: string, v: RequirementVerdict): VerdictData => ({
  boardId,
  requirementId: v.requirementId,
  status: v.status,
  ...(v.calculated === undefined ? {} : { calculated: v.calculated }),
  unit: v.unit,
  value: typeof v.value === 'string' ? v.value : maybe(v.value),
  where:
    v.where === undefined ? null : { frequencyHz: num(v.where.frequency), temperatureC: num(v.where.temperatureC) },
  margin: maybe(v.margin),
  adverse: maybe(v.adverse),
  favourable: maybe(v.favourable),
  parts: v.parts.map(({ id, kind, label, detail, adverse, favourable, atLimits }) => ({
    id,
    kind,
    label,
    detail,
    adverse: num(adverse),
    favourable: num(favourable),
    ...(atLimits === undefined ? {} : { atLimits: { low: num(atLimits.low), high: num(atLimits.high) } }),
  })),
  bySide: v.sides.map(({ side, value, margin }) => ({ side, value: num(value), margin: num(margin) })),
  ...(v.reason === undefined ? {} : { reason: v.reason }),
});

const verdictsData = (verdict: BoardVerdict): VerdictData[] =>
  verdict.requirements.map((v) => verdictData(verdict.boardId, v));

function conditionData({ band, temperature }: Requirement['condition']): { condition?: ConditionData } {
  if (band === undefined && temperature === undefined) return {};
  return {
    condition: {
      ...(band === undefined ? {} : { bandHz: { low: num(band.low), high: num(band.high) } }),
      ...(temperature === undefined
        ? {}
        : { temperatureC: { low: num(temperature.lowC), high: num(temperature.highC) } }),
    },
  };
}

const requirementData = (r: Requirement): PackData['requirements'][number] => ({
  id: r.id,
  text: r.text,
  quantity: r.quantity,
  ...(r.cut === undefined ? {} : { cut: r.cut }),
  ...(r.between === undefined ? {} : { between: [...r.between] }),
  unit: quantityOf(r.quantity).unit,
  ...(r.limit === undefined ? {} : { limit: { direction: r.limit.direction, value: num(r.limit.value) } }),
  ...(r.mask === undefined
    ? {}
    : { mask: r.mask.map(({ from, to, levelDb }) => ({ fromRad: num(from), toRad: num(to), levelDb: num(levelDb) })) }),
  ...(r.property === undefined ? {} : { property: r.property }),
  ...(r.allowed === undefined ? {} : { allowed: [...r.allowed] }),
  ...conditionData(r.condition),
  weight: r.weight,
  verification: r.verification,
  source: r.source,
});

const boardFile = (boardId: string): string => boardPath(boardId).replace(/^data\//, '');

const header = ({ pack, programVersion }: PackInput) => ({
  program: 'boardcase' as const,
  programVersion,
  marking: markingOf(pack),
  notices: [...noticesOf(pack)],
});

function retuningData({ retuned }: Board): Pick<BoardData, 'retuning'> {
  if (retuned === undefined || 'reason' in retuned) return {};
  const { factor, drawnDb, retunedDb } = retuned;
  return { retuning: { factor, drawnReflectionDb: drawnDb, reflectionDb: retunedDb } };
}

function boardData(context: BoardContext): BoardData {
  const { input, board, study, verdict } = context;
  const points = bandPoints(context);
  const chosen = points === undefined ? [] : [points.low, points.centre, points.high];
  return {
    ...header(input),
    kind: 'board',
    packId: input.pack.id,
    revision: input.pack.revision,
    boardId: board.id,
    title: board.title,
    inputsHash: study.hash,
    ...retuningData(board),
    nominalRoughness: input.pack.analysis.roughnessModel,
    nominal: study.nominal.points.map(pointData),
    nominalLine: study.nominal.line.map(linePointData),
    sides: study.sides.map(({ side, sweep }) => ({
      side,
      points: sweep.points.map(pointData),
      line: sweep.line.map(linePointData),
    })),
    cuts: [...new Set(chosen)].map((p) => ({
      frequencyHz: num(p.frequency),
      temperatureC: num(p.temperatureC),
      elevation: cutData(p.cuts.elevation),
      azimuth: cutData(p.cuts.azimuth),
    })),
    lineLossDbPerM: curvesData(study.lineLoss),
    lossFactor: curvesData(study.lossFactor),
    effectivePermittivity: curvesData(study.effectivePermittivity),
    lineLossByFace: study.lineLossByFace.map(lossByFaceData),
    slowWave: study.slowWave.map(slowWaveData),
    faces: study.faces.map(faceData),
    flags: study.flags.map(({ code, severity, model, text }) => ({ code, severity, model, text })),
    notEvaluated: study.notEvaluated.map(({ quantities, reason }) => ({ quantities: [...quantities], reason })),
    losslessClosure: maybe(study.losslessClosure),
    confirmation: confirmationData(study.confirmation),
    ...sizingData(board),
    verdicts: verdictsData(verdict),
  };
}

function previousData({ previous }: PackInput): PackData['previous'] {
  if (previous === undefined) return null;
  const { revision, date, status } = previous.data.pack;
  return { revision, date, status, programVersion: previous.data.programVersion, sha256: previous.sha256 };
}

function reviewData({ review }: PackInput['pack']): PackData['review'] {
  if (review === undefined) return null;
  const { decision } = review;
  return {
    decision: decision === undefined ? null : { ...decision, board: decision.board ?? null },
    openPoints: review.openPoints.map((point) => ({ ...point })),
    concessions: review.concessions.map((concession) => ({ ...concession })),
    approvals: review.approvals.map(({ name, date, ...rest }) => ({ ...rest, name: name ?? null, date: date ?? null })),
    revisions: review.revisions.map((entry) => ({ ...entry })),
  };
}

/** What `data/pack.json` holds. */
export function packFile(input: PackInput, boards: readonly BoardContext[]): PackData {
  const { id, title, documentNumber, revision, date, status, authors, owner, requirements, inputs } = input.pack;
  return {
    ...header(input),
    kind: 'pack',
    pack: { id, title, documentNumber, revision, date, status, authors: [...authors], owner },
    boards: boards.map(({ board, study, verdict }) => ({
      id: board.id,
      title: board.title,
      overall: verdict.overall,
      reason: verdict.reason,
      inputsHash: study.hash,
      cost: board.cost === undefined ? null : { amount: num(board.cost.amount), currency: board.cost.currency },
      data: boardFile(board.id),
    })),
    previous: previousData(input),
    review: reviewData(input.pack),
    requirements: requirements.requirements.map(requirementData),
    verdicts: boards.flatMap(({ verdict }) => verdictsData(verdict)),
    evidence: input.evidence.map((e) => ({
      id: e.id,
      topic: e.topic,
      quantity: e.quantity,
      source: e.source,
      howKnown: e.howKnown,
      unit: e.unit,
      expected: maybe(e.expected),
      value: maybe(e.value),
      deviation: maybe(e.deviation),
      tolerance: maybe(e.tolerance),
      ok: e.ok,
    })),
    inputs: inputs.map(({ path, sha256 }) => ({ path, sha256 })),
  };
}

/**
 * Results of a pack as plain JSON values, by file name, each checked against its schema.
 *
 * @throws ZodError when a result does not fit its schema, which is a fault of the program
 */
export function packData(input: PackInput): Readonly<Record<string, PackData | BoardData>> {
  const boards = boardContexts(input);
  return {
    [PACK_DATA]: packDataSchema.parse(packFile(input, boards)),
    ...Object.fromEntries(
      boards.map((context) => [`data/${boardFile(context.board.id)}`, boardDataSchema.parse(boardData(context))]),
    ),
  };
}
