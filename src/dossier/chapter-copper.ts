import type { RoughnessModelName } from '../manifest/model.js';
import { formatNumber, formatQuantity } from '../quantity/index.js';
import type { FaceState, ModelCurves } from '../study/results.js';
import { cell, chapter, figureBlock, number, prose, table } from './blocks.js';
import { NO_RESULTS } from './chapter-budget.js';
import type { BoardContext } from './context.js';
import type { Block, Chapter, LinesChart } from './document.js';
import { micrometres } from './figures.js';
import { GAP, limitText, rounded, statedNumber } from './values.js';

const MODEL_TITLES: Readonly<Record<RoughnessModelName | 'smooth', string>> = {
  smooth: 'Smooth copper',
  hammerstad: 'Hammerstad',
  groiss: 'Groiss',
  gradient: 'Gradient',
};
export const modelTitle = (model: RoughnessModelName | 'smooth'): string => MODEL_TITLES[model];

/** Hammerstad and Groiss end at two; within 5 % of it they no longer tell textures apart. */
const CEILING: Partial<Record<RoughnessModelName, number>> = { hammerstad: 2, groiss: 2 };
const NEAR_CEILING = 0.95;

const at = (curves: ModelCurves, x: number): readonly { readonly model: string; readonly y: number }[] => {
  const i = curves.x.reduce((best, value, k) => (Math.abs(value - x) < Math.abs(curves.x[best] - x) ? k : best), 0);
  return curves.curves.map(({ model, y }) => ({ model, y: y[i] }));
};

const extremes = (values: readonly number[]): readonly [number, number] => [Math.min(...values), Math.max(...values)];

function seriesOf(
  { x, curves }: ModelCurves,
  nominal: string,
  xy: (x: number, y: number) => readonly [number, number],
): LinesChart['series'] {
  return curves.map(({ model, y }) => ({
    label: modelTitle(model),
    ...(model === nominal ? { emphasis: true } : {}),
    points: x.flatMap((value, i) => (Number.isFinite(y[i]) ? [xy(value, y[i])] : [])),
  }));
}

/** Shaded from the lowest to the highest roughness model; smooth copper is not a model of rough copper. */
function bandOf(curves: ModelCurves, xy: (x: number, y: number) => readonly [number, number]): LinesChart['band'] {
  const models = curves.curves.filter((c) => c.model !== 'smooth');
  if (models.length < 2) return undefined;
  const points = curves.x.flatMap((x, i) => {
    const values = models.map((c) => c.y[i]);
    if (!values.every(Number.isFinite)) return [];
    const [low, high] = extremes(values);
    return [[xy(x, low)[0], xy(x, low)[1], xy(x, high)[1]] as const];
  });
  return { label: 'Spread between models', points };
}

function lineLossFigure({ input, board, study, judged }: BoardContext): Block {
  const xy = (x: number, y: number) => [rounded(x / 1e9, 3), rounded(y / 100, 4)] as const;
  const centre = (board.band.low + board.band.high) / 2;
  const here = at(study.lineLoss, centre);
  const [low, high] = extremes(here.filter((c) => c.model !== 'smooth').map((c) => c.y / 100));
  const smooth = here.find((c) => c.model === 'smooth');
  const limits = judged
    .map(({ requirement }) => requirement)
    .filter((r) => r.quantity === 'line_loss' && r.limit !== undefined)
    .map((r) => ({
      label: `${r.id}: ${limitText(r, 'dB/cm')}`,
      level: r.limit?.value ?? Number.NaN,
      forbidden: r.limit?.direction === 'at_least' ? ('below' as const) : ('above' as const),
    }));
  const loss = (value: number) => `${formatNumber(value, 3)}${GAP}dB/cm`;
  return figureBlock({
    id: 'line-loss',
    title: 'Loss of the feed line over frequency, by roughness model',
    reading: `Near the band centre the models give ${loss(low)} to ${loss(high)}${smooth === undefined ? '' : `; smooth copper would give ${loss(smooth.y / 100)}`}.`,
    alt: `Line loss in dB/cm over frequency, one curve each for ${study.lineLoss.curves.map((c) => modelTitle(c.model)).join(', ')}, with the edges of the operating band marked.`,
    content: {
      chart: 'lines',
      xTitle: 'Frequency (GHz)',
      yTitle: 'Loss of the feed line (dB/cm)',
      series: seriesOf(study.lineLoss, input.pack.analysis.roughnessModel, xy),
      band: bandOf(study.lineLoss, xy),
      limits,
      marks: [
        { label: 'lower band edge', at: rounded(board.band.low / 1e9, 4) },
        { label: 'upper band edge', at: rounded(board.band.high / 1e9, 4) },
      ],
    },
  });
}

/** Faces with the same Rq share a mark, which would otherwise print over itself; notes in brackets stay in the table. */
function faceMarks(faces: readonly FaceState[]): NonNullable<LinesChart['marks']> {
  const places = [...new Set(faces.map((face) => rounded(face.rq * 1e6, 4)))];
  return places.map((place) => ({
    label: faces
      .filter((face) => rounded(face.rq * 1e6, 4) === place)
      .map((face) => face.face.replace(/ \(.*$/, ''))
      .join(' + '),
    at: place,
  }));
}

function lossFactorFigure({ input, study }: BoardContext): Block {
  const xy = (x: number, y: number) => [rounded(x * 1e6, 4), rounded(y, 4)] as const;
  const rough = study.faces.reduce((a, b) => (b.rq > a.rq ? b : a));
  const [low, high] = extremes(rough.models.map((m) => m.lossFactor));
  return figureBlock({
    id: 'loss-factor',
    title: 'Loss factor over roughness at the band centre, with this board’s faces',
    reading: `On the roughest face (${rough.face}, Rq ${micrometres(rough.rq)}) the models give ${formatNumber(low, 2)} to ${formatNumber(high, 2)} times the loss of smooth copper.`,
    alt: `Loss factor over Rq in micrometres, one curve per roughness model with the spread between them shaded, and marks for ${study.faces.map((f) => `${f.face} at ${micrometres(f.rq)}`).join(', ')}.`,
    content: {
      chart: 'lines',
      xTitle: 'Rq (µm)',
      yTitle: 'Loss factor K (1)',
      series: seriesOf(study.lossFactor, input.pack.analysis.roughnessModel, xy),
      band: bandOf(study.lossFactor, xy),
      marks: faceMarks(study.faces),
    },
  });
}

function faceTable(faces: readonly FaceState[]): Block {
  return table(
    'faces',
    'Copper faces at the band centre and nominal temperature, by roughness model',
    ['Face|1.6', '#Rq', '#Skin depth', '#Rq / skin depth', 'Model', '#Loss factor K', '#Reactance X', '#Plane shift'],
    faces.flatMap(({ face, rq, skinDepth, models }) =>
      models.map(({ model, lossFactor, reactance, planeShift }) => [
        cell(face),
        number(micrometres(rq)),
        number(formatQuantity(skinDepth, 'length', { unit: 'um', decimals: 3 })),
        number(formatNumber(rq / skinDepth, 2)),
        cell(modelTitle(model)),
        number(formatNumber(lossFactor, 3)),
        number(formatNumber(reactance, 2)),
        number(planeShift === 0 ? '0' : formatQuantity(planeShift, 'length', { unit: 'um', decimals: 2 })),
      ]),
    ),
  );
}

/** A plain sentence per saturated model, naming the faces. */
function saturation({ study }: BoardContext): readonly Block[] {
  const models = [...new Set(study.faces.flatMap((f) => f.models.map((m) => m.model)))];
  return models.flatMap((model) => {
    const ceiling = CEILING[model];
    if (ceiling === undefined) return [];
    const faces = study.faces.filter((face) =>
      face.models.some((m) => m.model === model && m.lossFactor >= NEAR_CEILING * ceiling),
    );
    if (faces.length === 0) return [];
    return [
      prose(
        { strong: `${modelTitle(model)} is saturated. ` },
        `On ${faces.map((f) => f.face).join(' and ')} it is within 5 % of its ceiling of ${statedNumber(ceiling)}: rougher copper would give nearly the same figure. The plateau belongs to the formula, not to copper; do not rank foils by it.`,
      ),
    ];
  });
}

export function copperChapter(context: BoardContext): Chapter {
  const { input, study } = context;
  if (study.faces.length === 0 || study.lineLoss.curves.length === 0) {
    return chapter('copper', 'Copper and lines', prose(NO_RESULTS));
  }
  return chapter(
    'copper',
    'Copper and lines',
    prose(
      `Rq alone fixes neither loss nor phase of rough copper, so every verdict carries the spread between the models. Nominal figures use ${modelTitle(input.pack.analysis.roughnessModel)}.`,
    ),
    lineLossFigure(context),
    lossFactorFigure(context),
    ...saturation(context),
    faceTable(study.faces),
    prose(
      'K is the ratio of the power lost to that of a smooth face. X is the surface reactance in units of the smooth surface resistance, referred to the mean plane; smooth copper has 1. ',
      'The plane shift is the height of the electrostatic plane above the mean plane: the model’s laminate is thinner by it at each face.',
    ),
  );
}
