import type { Texture } from '../manifest/model.js';
import type { RoughnessModel } from '../physics/roughness/index.js';
import { formatNumber } from '../quantity/index.js';
import type { FaceState, ModelCurves } from '../study/results.js';
import { figureBlock } from './blocks.js';
import type { BoardContext } from './context.js';
import type { Block, LinesChart } from './document.js';
import { micrometres } from './figures.js';
import { modelTitle } from './model-words.js';
import { textureOf } from './tooth-drawing.js';
import { GAP, limitText, rounded } from './values.js';

type Place = (x: number, y: number) => readonly [number, number];

/** Hammerstad and Groiss end at two; from 5 % below it they no longer tell textures apart. */
const SATURATED_AT: Partial<Record<RoughnessModel, number>> = { hammerstad: 1.9, groiss: 1.9 };

/** Rq from which a model with a ceiling is saturated, read from its curve of the loss factor; undefined for the others. */
export function saturatedFrom({ x, curves }: ModelCurves, model: RoughnessModel): number | undefined {
  const level = SATURATED_AT[model];
  const y = curves.find((curve) => curve.model === model)?.y;
  if (level === undefined || y === undefined) return undefined;
  const i = y.findIndex((value) => value >= level);
  if (i < 0) return undefined;
  if (i === 0) return x[0];
  return x[i - 1] + ((x[i] - x[i - 1]) * (level - y[i - 1])) / (y[i] - y[i - 1]);
}

/** All models, and the middle of the band as a line of its own; the one behind the nominal figures is emphasised. */
function seriesOf(
  { x, curves, band }: ModelCurves,
  nominal: string,
  place: Place,
  saturation: (model: RoughnessModel) => number | undefined,
): LinesChart['series'] {
  const points = (y: readonly number[]) => x.flatMap((value, i) => (Number.isFinite(y[i]) ? [place(value, y[i])] : []));
  return [
    { label: 'Middle estimate', ...(nominal === 'band' ? { emphasis: true } : {}), points: points(band.middle) },
    ...curves.map(({ model, y }) => {
      const from = saturation(model);
      return {
        label: from === undefined ? modelTitle(model) : `${modelTitle(model)} (dotted: saturated)`,
        ...(model === nominal ? { emphasis: true } : {}),
        ...(from === undefined ? {} : { saturatedFrom: place(from, 0)[0] }),
        points: points(y),
      };
    }),
  ];
}

function bandOf({ x, band }: ModelCurves, place: Place): LinesChart['band'] {
  return {
    label: 'Band, low to high',
    points: x.flatMap((value, i) => {
      if (!Number.isFinite(band.low[i]) || !Number.isFinite(band.high[i])) return [];
      const [at, low] = place(value, band.low[i]);
      const [, high] = place(value, band.high[i]);
      // The estimates are ordered by loss; what else they move may run the other way.
      return [[at, Math.min(low, high), Math.max(low, high)] as const];
    }),
  };
}

/** Low, middle and high of the band nearest to a place. */
function bandAt(
  { x, band }: ModelCurves,
  at: number,
): { readonly low: number; readonly middle: number; readonly high: number } {
  const i = x.reduce((best, value, k) => (Math.abs(value - at) < Math.abs(x[best] - at) ? k : best), 0);
  return { low: band.low[i], middle: band.middle[i], high: band.high[i] };
}

const names = (curves: ModelCurves): string => curves.curves.map((c) => modelTitle(c.model)).join(', ');
const DRAWN = 'the band from low to high estimate is shaded, saturated parts of a curve are dotted';

export function lineLossFigure({ input, board, study, judged }: BoardContext): Block {
  const place: Place = (x, y) => [rounded(x / 1e9, 3), rounded(y / 100, 4)];
  const { low, middle, high } = bandAt(study.lineLoss, (board.band.low + board.band.high) / 2);
  const limits = judged
    .map(({ requirement }) => requirement)
    .filter((r) => r.quantity === 'line_loss' && r.limit !== undefined)
    .map((r) => ({
      label: `${r.id}: ${limitText(r, 'dB/cm')}`,
      level: r.limit?.value ?? Number.NaN,
      forbidden: r.limit?.direction === 'at_least' ? ('below' as const) : ('above' as const),
    }));
  const loss = (value: number) => `${formatNumber(value / 100, 3)}${GAP}dB/cm`;
  const onFaces = (model: RoughnessModel) =>
    study.faces.some(({ place: where, saturation }) => where !== 'outer' && saturation.some((s) => s.model === model));
  return figureBlock({
    id: 'line-loss',
    title: 'Loss of the feed line over frequency, by roughness model',
    reading: `Near the band centre the line loses ${loss(low)} to ${loss(high)}, middle estimate ${loss(middle)}.`,
    alt: `Line loss in dB/cm over frequency, one curve each for ${names(study.lineLoss)}; ${DRAWN}; the edges of the operating band are marked.`,
    content: {
      chart: 'lines',
      xTitle: 'Frequency (GHz)',
      yTitle: 'Loss of the feed line (dB/cm)',
      series: seriesOf(study.lineLoss, input.pack.analysis.roughnessModel, place, (model) =>
        onFaces(model) ? study.lineLoss.x[0] : undefined,
      ),
      band: bandOf(study.lineLoss, place),
      limits,
      marks: [
        { label: 'lower band edge', at: rounded(board.band.low / 1e9, 4) },
        { label: 'upper band edge', at: rounded(board.band.high / 1e9, 4) },
      ],
    },
  });
}

/** Faces with the same Rq share a mark, which would otherwise print over itself. */
function faceMarks(faces: readonly FaceState[]): NonNullable<LinesChart['marks']> {
  const places = [...new Set(faces.map((face) => rounded(face.rq * 1e6, 4)))];
  return places.map((at) => ({
    label: faces
      .filter((face) => rounded(face.rq * 1e6, 4) === at)
      .map((face) => face.face.replace(/ \(.*$/, ''))
      .join(' + '),
    at,
  }));
}

const underside = (faces: readonly FaceState[]): FaceState =>
  faces.find(({ place }) => place === 'underside') ?? faces[0];

/** Where nodules are known they stay as they are at any Rq but zero, at which there would be none: that end is left out. */
function withoutSmoothEnd(curves: ModelCurves, textures: readonly Texture[]): ModelCurves {
  if (textures.every(({ nodule }) => nodule === undefined)) return curves;
  const rough = <T>(values: readonly T[]): readonly T[] => values.filter((_, i) => curves.x[i] > 0);
  const { low, middle, high } = curves.band;
  return {
    x: rough(curves.x),
    curves: curves.curves.map(({ model, y }) => ({ model, y: rough(y) })),
    band: { low: rough(low), middle: rough(middle), high: rough(high) },
  };
}

const NODULAR = '; it follows the nodules that are known, and hardly Rq';

export function lossFactorFigure({ input, board, study }: BoardContext): Block {
  const place: Place = (x, y) => [rounded(x * 1e6, 4), rounded(y, 4)];
  const { face, rq, band } = underside(study.faces);
  const texture = textureOf(board, 'underside');
  const curves = withoutSmoothEnd(study.lossFactor, [texture]);
  const k = (side: string) => formatNumber(band.find((entry) => entry.side === side)?.lossFactor ?? Number.NaN, 2);
  return figureBlock({
    id: 'loss-factor',
    title: 'Loss factor over roughness at the band centre, all models with the band',
    reading: `At Rq ${micrometres(rq)}, that of the ${face}, the band reaches from ${k('low')} to ${k('high')} times the loss of smooth copper, middle estimate ${k('middle')}${texture.nodule === undefined ? '' : NODULAR}.`,
    alt: `Loss factor over Rq in micrometres, one curve each for ${names(study.lossFactor)}; ${DRAWN}; marks for ${study.faces.map((f) => `${f.face} at ${micrometres(f.rq)}`).join(', ')}.`,
    content: {
      chart: 'lines',
      xTitle: 'Rq (µm); what else is known of the texture is kept',
      yTitle: 'Loss factor K (1)',
      yScale: 'log',
      series: seriesOf(curves, input.pack.analysis.roughnessModel, place, (model) =>
        saturatedFrom(study.lossFactor, model),
      ),
      band: bandOf(curves, place),
      marks: faceMarks(study.faces),
    },
  });
}

export function permittivityFigure({ input, board, study }: BoardContext): Block {
  const place: Place = (x, y) => [rounded(x * 1e6, 4), rounded(y, 5)];
  const inner = study.faces.filter(({ place: where }) => where !== 'outer');
  const { rq } = underside(study.faces);
  const curves = withoutSmoothEnd(study.effectivePermittivity, [
    textureOf(board, 'underside'),
    textureOf(board, 'ground'),
  ]);
  const { low, middle, high } = bandAt(curves, rq);
  const e = (value: number) => formatNumber(value, 4);
  const applied = study.slowWave.every((entry) => entry.applied);
  return figureBlock({
    id: 'effective-permittivity',
    title: 'Effective permittivity of the feed line over roughness at the band centre, all models with the band',
    reading: `Near Rq ${micrometres(rq)} on both faces to the laminate the low, middle and high estimate give ${e(low)}, ${e(middle)} and ${e(high)}${applied ? '' : '; the permittivity of the laminate is a design value that holds the slowing already, so that the curves move little'}.`,
    alt: `Effective permittivity over the Rq of both faces to the laminate, one curve each for ${names(study.effectivePermittivity)}; ${DRAWN}; marks at this board’s faces.`,
    content: {
      chart: 'lines',
      xTitle: 'Rq of both faces to the laminate (µm); the outer face is kept',
      yTitle: 'Effective permittivity (1)',
      series: seriesOf(curves, input.pack.analysis.roughnessModel, place, (model) =>
        saturatedFrom(study.lossFactor, model),
      ),
      band: bandOf(curves, place),
      marks: faceMarks(inner.length === 0 ? study.faces : inner),
    },
  });
}
