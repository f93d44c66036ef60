import { quantityTitle } from '../verdict/index.js';
import { cell, chapter, facts, number, plainTable, prose } from './blocks.js';
import type { BoardContext, Judged } from './context.js';
import type { Block, Cell, Chapter } from './document.js';
import { figureTextByPath } from './figures.js';
import { bandText, celsius, changePair, count, temperatureText } from './values.js';

/** More columns than this do not fit a printed page. */
const COLUMNS = 5;

function effectCell({ verdict }: Judged, toleranceId: string): Cell {
  const part = verdict.parts.find((p) => p.id === `tolerance-${toleranceId}`);
  if (part?.atLimits === undefined || typeof verdict.value !== 'number') return cell('–');
  const { low, high } = part.atLimits;
  const { unit, value } = verdict;
  return number(changePair(low - value, high - value, unit));
}

function toleranceTables({ board, study, judged }: BoardContext): readonly Block[] {
  const shown = judged.filter(({ verdict }) => verdict.parts.some((p) => p.kind === 'tolerance'));
  if (study.tolerances.length === 0) return [prose('No figure of this board declares a spread.')];
  if (shown.length === 0) return [prose('No requirement was evaluated, so no tolerance has an effect to show.')];
  const groups = Array.from({ length: Math.ceil(shown.length / COLUMNS) }, (_, i) =>
    shown.slice(i * COLUMNS, (i + 1) * COLUMNS),
  );
  return groups.map((group, n) =>
    plainTable(
      `tolerances-${n + 1}`,
      'Change of the worst value at the lower / upper limit of each tolerance, other figures nominal',
      [
        { title: 'Tolerance', width: 1.6 },
        { title: 'Range', width: 1.2 },
        ...group.map(({ requirement }) => ({
          title: `${requirement.id}: ${quantityTitle(requirement)}`,
          numeric: true,
        })),
      ],
      study.tolerances.map((tolerance) => [
        cell(tolerance.label),
        cell(figureTextByPath(board, tolerance.figure)),
        ...group.map((entry) => effectCell(entry, tolerance.id)),
      ]),
    ),
  );
}

export function conditionsChapter(context: BoardContext): Chapter {
  const { board, study } = context;
  const grid = study.nominal.points.length === 0 ? study.nominal.line : study.nominal.points;
  const temperatures = [...new Set(grid.map((p) => p.temperatureC))];
  const frequencies = new Set(grid.map((p) => p.frequency)).size;
  return chapter(
    'conditions',
    'Conditions',
    facts(
      'condition-facts',
      ['Operating band', bandText(board.band)],
      [
        'Frequencies evaluated',
        frequencies === 0
          ? 'none'
          : `${count(frequencies, 'frequency', 'frequencies')}${study.nominal.points.length === 0 ? ', of the feed line only' : ''}`,
      ],
      ['Temperature range', temperatureText(board.temperature)],
      ['Temperatures evaluated', temperatures.length === 0 ? 'none' : temperatures.map(celsius).join(', ')],
      ['Tolerances', count(study.tolerances.length, 'declared spread')],
    ),
    prose(
      'A requirement without a band or temperature range of its own applies over those of the board. Where its range ends between two evaluated points, the value there is interpolated linearly.',
    ),
    ...toleranceTables(context),
  );
}
