import { quantityTitle } from '../verdict/index.js';
import { cell, chapter, number, prose, table } from './blocks.js';
import type { BoardContext, Judged } from './context.js';
import type { Block, Cell, Chapter } from './document.js';
import { figureTextByPath } from './figures.js';
import { boardPage, DEFINITIONS, EVIDENCE, link } from './links.js';
import { sideTitle } from './model-words.js';
import { changeText, marginText, valueText } from './values.js';

function partTable({ board, study }: BoardContext, { requirement, verdict }: Judged): Block {
  const { unit, parts, sides, adverse = 0, favourable = 0, margin = 0 } = verdict;
  const against = (value: number): Cell => number(changeText(-value, unit));
  const forIt = (value: number): Cell => number(changeText(value, unit));
  const detailOf = (id: string, detail: string): string => {
    const tolerance = study.tolerances.find((t) => `tolerance-${t.id}` === id);
    if (tolerance === undefined) return detail;
    const shared = study.tolerances.filter((t) => t.label === tolerance.label).length > 1;
    return `${figureTextByPath(board, tolerance.figure)}${shared ? ` (${tolerance.figure.path})` : ''}`;
  };
  const bySide = sides.map((s) => `${sideTitle(s.side).toLowerCase()} ${valueText(s.value, unit)}`).join(', ');
  return table(
    `uncertainty-${requirement.id}`,
    `${requirement.id}, ${quantityTitle(requirement)}: margin ${marginText(margin, unit)}, parts of its uncertainty`,
    ['Part|2', '#Against', '#For', 'Range or ground|3'],
    [
      ...parts.map((part) => [
        cell(part.label),
        against(part.adverse),
        forIt(part.favourable),
        cell(
          part.kind === 'roughness'
            ? `worst value under each estimate of the copper’s texture: ${bySide}`
            : detailOf(part.id, part.detail),
        ),
      ]),
      [
        cell({ strong: 'Together' }),
        against(adverse),
        forIt(favourable),
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
      'Each part says how much smaller (against) or larger (for) the margin may be. Engine accuracy and tolerances are added by root sum of squares; the spread from the low to the high estimate of the copper’s texture is added linearly, because it is no random error. Every tolerance is moved alone to both its limits under every estimate, and its largest effect counts. Figures of columns have the accuracy of the full wave where it ran on the board, with what carrying its differences to other frequencies and states leaves open; without it they have that of the network, widened: see ',
      link('Two engines', boardPage(context.board.id), 'engines'),
      '. The rule stands under ',
      link('Definitions', DEFINITIONS, 'uncertainty-rule'),
      ', the engine accuracy with its sources under ',
      link('Evidence', EVIDENCE, 'engine-accuracy'),
      '.',
    ),
    ...(shown.length === 0 ? [prose('No requirement was evaluated by calculation.')] : []),
    ...shown.map((entry) => partTable(context, entry)),
  );
}
