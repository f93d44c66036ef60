import { caution, chapter, prose } from './blocks.js';
import { NO_RESULTS } from './chapter-budget.js';
import type { BoardContext } from './context.js';
import { lineLossFigure, lossFactorFigure, permittivityFigure } from './copper-curves.js';
import { bandTable, bandWords, modelTables, saturationBlocks } from './copper-faces.js';
import { lossByFace } from './copper-loss.js';
import { narrowingBlocks } from './copper-narrowing.js';
import { slowWaveBlocks } from './copper-slow-wave.js';
import type { Block, Chapter } from './document.js';
import { DEFINITIONS, link } from './links.js';
import { choiceText, modelTitle } from './model-words.js';
import { toothFigure } from './tooth-drawing.js';

/** Where the nominal figures rest on a formula that has reached its ceiling, the reader learns it first. */
function nominalCaution({ input, study }: BoardContext): readonly Block[] {
  const { roughnessModel } = input.pack.analysis;
  if (roughnessModel === 'band') return [];
  const faces = study.faces.filter(({ saturation }) => saturation.some(({ model }) => model === roughnessModel));
  if (faces.length === 0) return [];
  const title = modelTitle(roughnessModel);
  return [
    caution(`Nominal figures use ${title}, which is saturated here`, [
      `On ${faces.map(({ face }) => face).join(' and ')} ${title} has reached its ceiling of two. `,
      'It gives nearly the same figure for every rougher foil, so the nominal figures cannot rank foils and set no limit on their roughness. ',
      'Verdicts and limits use the band from low to high estimate all the same.',
    ]),
  ];
}

const drawn = (curves: { readonly x: readonly number[] }): boolean => curves.x.length > 0;

export function copperChapter(context: BoardContext): Chapter {
  const { input, board, study } = context;
  const { faces, lineLoss, lossFactor, effectivePermittivity } = study;
  if (faces.length === 0) return chapter('copper', 'Copper and lines', prose(NO_RESULTS));
  return chapter(
    'copper',
    'Copper and lines',
    ...nominalCaution(context),
    prose(
      'Rq alone fixes neither loss nor phase of rough copper. Every verdict therefore spans a band, from a low to a high estimate of what is known of each face. ',
      `Nominal figures use ${choiceText(input.pack.analysis.roughnessModel)}. What each model stands for is said under `,
      link('Definitions', DEFINITIONS, 'roughness-models'),
      '.',
    ),
    bandTable(faces),
    bandWords(faces),
    toothFigure(board, faces),
    ...(drawn(lossFactor) ? [lossFactorFigure(context)] : []),
    ...saturationBlocks(faces),
    ...(drawn(effectivePermittivity) ? [permittivityFigure(context)] : []),
    ...slowWaveBlocks(study.slowWave),
    ...(drawn(lineLoss) ? [lineLossFigure(context)] : []),
    ...lossByFace(study.lineLossByFace),
    ...modelTables(faces),
    prose(
      'X is the surface reactance in units of the smooth surface resistance, referred to the mean plane; smooth copper has 1. ',
      'The plane shift is the height of the electrostatic plane above the mean plane: the model’s laminate is thinner by it at each face.',
    ),
    prose({ strong: 'What would narrow the band' }),
    ...narrowingBlocks(faces),
  );
}
