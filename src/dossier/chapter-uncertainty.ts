import { quantityTitle } from '../verdict/index.js';
import { cell, chapter, number, prose, table } from './blocks.js';
import { modelTitle } from './chapter-copper.js';
import type { BoardContext, Judged } from './context.js';
import type { Block, Cell, Chapter } from './document.js';
import { figureTextByPath } from './figures.js';
import { DEFINITIONS, EVIDENCE, link } from './links.js';
import { changeText, marginText, valueText } from './values.js';

const KIND = { engine: 'root sum of squares', roughness: 'linearly', tolerance: 'root sum of squares' } as const;

function partTable({ board, study }: BoardContext, { requirement, verdict }: Judged): Block {
  const { unit, parts, models, adverse = 0, favourable = 0, margin = 0 } = verdict;
  const against = (value: number): Cell => number(changeText(-value, unit));
  const forIt = (value: number): Cell => number(changeText(value, unit));
  const detailOf = (id: string, detail: string): string => {
    const tolerance = study.tolerances.find((t) => `tolerance-${t.id}` === id);
    return tolerance === undefined ? detail : `${figureTextByPath(board, tolerance.figure)}; ${detail}`;
  };
  const byModel = models.map((m) => `${modelTitle(m.model)} ${valueText(m.value, unit)}`).join(', ');
  return table(
    `uncertainty-${requirement.id}`,
    `${requirement.id}, ${quantityTitle(requirement)}: margin ${marginText(margin, unit)}, parts of its uncertainty`,
    ['Part|1.3', '#Against', '#For', 'Added', 'What was done|3'],
    [
      ...parts.map((part) => [
        cell(part.label),
        against(part.adverse),
        forIt(part.favourable),
        cell(KIND[part.kind]),
        cell(part.kind === 'roughness' ? `${part.detail}: ${byModel}` : detailOf(part.id, part.detail)),
      ]),
      [
        cell({ strong: 'Together' }),
        against(adverse),
        forIt(favourable),
        cell('–'),
        cell(`margin between ${marginText(margin - adverse, unit)} and ${marginText(margin + favourable, unit)}`),
      ],
    ],
  );
}

export function uncertaintyChapter(context: BoardContext): Chapter {
  const shown = context.judged.filter(({ verdict }) => verdict.parts.length > 0);
  return chapter(
    'uncertainty',
    'Uncertainty',
    prose(
      'Each part says how much smaller (against) or larger (for) the margin may be. Engine accuracy and tolerances are added by root sum of squares; the spread over the roughness models is added linearly, because nobody knows which model is right for this copper. The rule stands under ',
      link('Definitions', DEFINITIONS, 'uncertainty-rule'),
      ', the engine accuracy with its sources under ',
      link('Evidence', EVIDENCE, 'engine-accuracy'),
      '.',
    ),
    ...(shown.length === 0 ? [prose('No requirement was evaluated by calculation.')] : []),
    ...shown.map((entry) => partTable(context, entry)),
  );
}
