import { formatNumber } from '../quantity/index.js';
import { cell, chapter, facts, figureBlock, number, prose, table } from './blocks.js';
import { type BoardContext, bandPoints } from './context.js';
import type { Chapter } from './document.js';
import { gainBudget } from './gain-budget.js';
import { engineTag } from './network-only.js';
import { celsius, GAP, gigahertz } from './values.js';

export const NO_RESULTS = 'Not evaluated for this board; the reason stands under Verdict.';

const levelText = (value: number): string => `${formatNumber(value, 2)}${GAP}dBi`;
const changeText = (value: number): string => `${formatNumber(value, 2, { plus: true })}${GAP}dB`;

export function budgetChapter(context: BoardContext): Chapter {
  const points = bandPoints(context);
  if (points === undefined) return chapter('budget', 'Gain budget', prose(NO_RESULTS));
  const { centre } = points;
  const { directivity, steps, realizedGain } = gainBudget(centre);
  const place = `${gigahertz(centre.frequency)}, ${celsius(centre.temperatureC)}${engineTag(context.study)}`;
  const largest = steps.reduce((a, b) => (b.change < a.change ? b : a));
  const gain = steps[steps.length - 2].level;
  return chapter(
    'budget',
    'Gain budget',
    figureBlock({
      id: 'budget-chart',
      title: `Gain budget at ${place}`,
      reading: `From ${levelText(directivity)} of directivity ${levelText(realizedGain)} of realized gain remain; the largest loss is ${largest.label.toLowerCase()} with ${changeText(largest.change)}.`,
      alt: `Waterfall from directivity down to realized gain: ${steps.map((s) => `${s.label} ${changeText(s.change)}`).join(', ')}.`,
      content: {
        chart: 'budget',
        unit: 'dBi',
        start: { label: 'Directivity', level: directivity },
        losses: steps.map(({ label, change }) => ({ label, change })),
        end: { label: 'Realized gain', level: realizedGain },
      },
    }),
    table(
      'budget-table',
      `Every loss from directivity to realized gain at ${place}`,
      ['Step|2', '#Share of accepted power', '#Change', '#Level after it'],
      [
        [cell('Directivity'), cell('–'), cell('–'), number(levelText(directivity))],
        ...steps.map(({ label, share, change, level }) => [
          cell(label),
          share === undefined ? cell('–') : number(`${formatNumber(100 * share, 2)}${GAP}%`),
          number(changeText(change)),
          number(levelText(level)),
        ]),
        [
          cell('Realized gain'),
          cell('–'),
          number(changeText(realizedGain - directivity)),
          number(levelText(realizedGain)),
        ],
      ],
    ),
    facts(
      'budget-facts',
      ['Gain at the input of the feed network', `${levelText(gain)} (feed loss in, mismatch out)`],
      [
        'Radiated share of the accepted power',
        `${formatNumber(100 * centre.shares.radiated, 2)} %, what the shares above leave`,
      ],
    ),
    prose(
      'The shares are linear parts of the power accepted at the column ports and act at once; together with the radiated share they are 100 %. ',
      'To write them in dB they are taken off one after the other in the order of the table: each change is the ratio of what is left after the loss to what was left before it. ',
      'The sum does not depend on that order, the single changes do slightly. Levels are rounded to 0.01 dB and each change is the difference of two rounded levels, so the printed figures close exactly; a change may therefore differ from its own rounded value by 0.01 dB. ',
      'Roughness is the extra over smooth copper, finish the extra over bare copper.',
    ),
  );
}
