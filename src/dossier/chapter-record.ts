import { formatNumber } from '../quantity/index.js';
import { caution, cell, chapter, facts, list, prose, table } from './blocks.js';
import { referenceText } from './chapter-board.js';
import type { BoardContext, PackInput } from './context.js';
import type { Block, Chapter } from './document.js';
import { lineageBlocks } from './lineage.js';
import { DEFINITIONS, link } from './links.js';
import { choiceText } from './model-words.js';
import { CAUTIONS } from './statements.js';
import { powerAbove } from './values.js';

export function shortDefinitions({ board }: BoardContext): Chapter {
  const to = (text: string, anchor: string) => link(text, DEFINITIONS, anchor);
  return chapter(
    'definitions',
    'Definitions and limits',
    list([
      [
        'Gain: at the input of the feed network, feed loss in, mismatch out. Realized gain: with mismatch. ',
        to('Gain', 'gain'),
      ],
      [
        `Reflection: at the true edge of the first patch, referred to the ${referenceText(board)}; unused ports terminated in it. `,
        to('Reflection', 'reflection'),
      ],
      [
        'Cuts: elevation is x-z (E plane), azimuth is y-z (H plane); direction positive towards +x and +y. ',
        to('Cuts', 'cuts'),
      ],
      ['Sidelobe level and beamwidth: relative to the maximum of the same cut. ', to('Beam figures', 'beam-figures')],
      ['Statuses and the rule behind them. ', to('Statuses', 'statuses')],
      ['What the calculation leaves out and how far its models reach. ', to('Limits', 'limits')],
    ]),
  );
}

const SEVERITY = { outside: 'outside its range', saturated: 'saturated', note: 'note' } as const;
const SEVERITY_ORDER = ['outside', 'saturated', 'note'] as const;

export function validityChapter({ study }: BoardContext): Chapter {
  const flags = SEVERITY_ORDER.flatMap((severity) => study.flags.filter((flag) => flag.severity === severity));
  return chapter(
    'validity',
    'Validity',
    flags.length === 0
      ? prose('No model was used outside its stated range, and none is saturated.')
      : table(
          'flags',
          'What limits the trust in a figure: models used outside their range, saturated models, notes',
          ['Model|1.2', 'Kind', 'What it means|4'],
          flags.map((flag) => [cell(flag.model), cell(SEVERITY[flag.severity]), cell(flag.text)]),
        ),
  );
}

/** Range of a closure figure over the points that have one. */
function closureText(values: readonly number[]): string {
  const known = values.filter(Number.isFinite);
  if (known.length === 0) return 'not evaluated';
  const [low, high] = [Math.min(...known), Math.max(...known)].map((v) => formatNumber(v, 4));
  return low === high ? low : `${low} to ${high}`;
}

export function balanceChapter({ study }: BoardContext): Chapter {
  const { points } = study.nominal;
  const residuals = points.map((p) => p.powerResidual).filter(Number.isFinite);
  return chapter(
    'balance',
    'Power balance',
    facts(
      'balance-facts',
      [
        'Circuit: largest residual',
        residuals.length === 0
          ? 'not evaluated'
          : `below ${powerAbove(Math.max(...residuals.map(Math.abs)))} of the input power at all ${residuals.length} points (below 10⁻⁹ by test)`,
      ],
      ['Far field and guided wave over power into the edges', closureText(points.map((p) => p.farFieldClosure))],
      [
        'The same on the lossless board at the band centre',
        `${closureText([study.losslessClosure])} (1 within 1 % by test)`,
      ],
    ),
    prose(
      'The first line compares the input power of the circuit with the sum of reflection, losses, surface wave and radiation. The others compare the power that the circuit sends into the patch edges with the far field and the surface wave of the same edges, integrated on their own.',
    ),
  );
}

/** Files, hashes and program version, which together say what a figure was computed from. */
export function inputsChapter(context: BoardContext): Chapter {
  const { board, study, input } = context;
  const { analysis, inputs, requirements } = input.pack;
  return chapter(
    'inputs',
    'Inputs',
    facts(
      'input-facts',
      ['Board file', { code: board.file }],
      ['Based on', board.basedOn.length === 0 ? 'no other board' : board.basedOn.join(', which is based on ')],
      ['Requirement set', `${requirements.title}: `, { code: requirements.file }],
      ['Nominal figures of rough copper', choiceText(analysis.roughnessModel)],
      ['Largest frequency step', `${formatNumber(analysis.frequencyStep / 1e6, 0)} MHz`],
      ['Program', `boardcase ${input.programVersion}`],
      ['Hash of the inputs of these results', { code: study.hash }],
    ),
    ...lineageBlocks(board),
    inputTable(inputs),
  );
}

export const inputTable = (inputs: PackInput['pack']['inputs']): Block =>
  table(
    'input-files',
    'Files read, with the SHA-256 of their bytes',
    ['File', 'SHA-256|2.4'],
    inputs.map(({ path, sha256 }) => [cell({ code: path }), cell({ code: sha256 })]),
  );

export const cautionsChapter = (): Chapter =>
  chapter('cautions', 'Cautions', caution('Before this document is relied on', ...CAUTIONS));
