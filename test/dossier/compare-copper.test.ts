import { describe, expect, it } from 'vitest';
import { copperComparison } from '../../src/dossier/compare-copper.js';
import type { BoardContext } from '../../src/dossier/context.js';
import type { Board } from '../../src/manifest/model.js';
import { board, figure } from './board-fixture.js';
import { plain } from './pack-fixture.js';
import { studyOf } from './study-fixture.js';

const base = board('qb-1', { rq: 0.4e-6 });
const { strip } = base.stackUp;
/** The same Rq, and a correlation length ten times as long. */
const gentle: Board = {
  ...base,
  id: 'qb-2',
  stackUp: {
    ...base.stackUp,
    strip: {
      ...strip,
      dielectricFace: {
        ...strip.dielectricFace,
        texture: { ...strip.dielectricFace.texture, correlationLength: figure('c', 4e-6, 0.2e-6) },
      },
    },
  },
};
const contextOf = (subject: Board) => ({ board: subject, study: studyOf(subject) }) as unknown as BoardContext;
const rowsOf = (first: Board, second: Board) => {
  const [chapter] = copperComparison([contextOf(first), contextOf(second)]);
  const [table] = chapter.blocks;
  return table.kind === 'table' ? table.rows.map((row) => row.map((c) => c.content.map(plain).join(''))) : [];
};

describe('copper of two boards side by side', () => {
  it('shows bands that Rq does not tell apart', () => {
    const rows = rowsOf(base, gentle);
    const bands = rows[0]
      .slice(1)
      .map((text) => /K ([\d.]+) \/ ([\d.]+) \/ ([\d.]+)$/.exec(text)?.slice(1).map(Number));
    const [wide, narrow] = bands;
    if (wide === undefined || narrow === undefined) throw new Error(`no bands in ${rows[0].join('; ')}`);
    expect(rows[0][1]).toContain('Rq 0.400 µm');
    expect(rows[0][2]).toContain('Rq 0.400 µm');
    expect(narrow[2] - narrow[0]).toBeLessThan(0.5 * (wide[2] - wide[0]));
    expect(rows[1][1]).toBe(rows[1][2]);
    expect(rows.map(([name]) => name)).toContain('Loss of the feed line');
  });

  it('is left out where nothing is known of a board’s copper', () => {
    const without = { ...contextOf(base), study: { ...studyOf(base), faces: [] } };
    expect(copperComparison([without, contextOf(gentle)])).toEqual([]);
  });
});
