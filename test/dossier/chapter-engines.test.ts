import { describe, expect, it } from 'vitest';
import { composePack } from '../../src/dossier/index.js';
import { ENGINE_LIMITS } from '../../src/dossier/statements.js';
import { blocksOf, inputOf, pageOf, plain, studies, textOf } from './pack-fixture.js';

const document = composePack(inputOf(studies()));
const chapterText = (page: string, id: string): string => {
  const found = pageOf(document, page);
  return textOf({ ...found, chapters: found.chapters.filter((chapter) => chapter.id === id) });
};
const tableOf = (page: string, id: string) => {
  const found = blocksOf(pageOf(document, page)).find((block) => block.kind === 'table' && block.id === id);
  if (found?.kind !== 'table') throw new Error(`no table ${id}`);
  return found.rows.map((row) => row.map((cell) => cell.content.map(plain).join('')));
};

describe('chapter of two engines', () => {
  it('sets both engines side by side at every compared frequency', () => {
    const rows = tableOf('board/qb-1', 'engine-comparison');
    const gain = rows.filter(([name]) => name.startsWith('Gain'));
    expect(gain.map(([, frequency]) => frequency)).toEqual(['76.10 GHz', '76.50 GHz', '76.90 GHz']);
    for (const [, , fullWave, network, difference] of gain) {
      const level = (text: string) => Number(text.replace(/ dBi?$/, '').replace('−', '-'));
      expect(Math.abs(level(fullWave) - level(network) - level(difference))).toBeLessThan(0.0101);
      expect(difference).not.toBe('0.00 dB');
    }
  });

  it('says what each run rests on and where both engines end', () => {
    const text = chapterText('board/qb-1', 'engines');
    expect(text).toMatch(/4310[\s\S]*82\.0 µm × 80\.0 µm/);
    for (const limit of ENGINE_LIMITS) expect(text).toContain(limit);
  });

  it('draws full wave and network into the match of a confirmed board, with the limit', () => {
    for (const id of ['match-passive', 'match-active']) {
      const figure = blocksOf(pageOf(document, 'board/qb-1')).find((b) => b.kind === 'figure' && b.id === id);
      if (figure?.kind !== 'figure' || !('chart' in figure.content) || figure.content.chart !== 'lines')
        throw new Error('no chart');
      const symbols = figure.content.series.filter(({ symbol }) => symbol !== undefined);
      expect(symbols.map(({ label }) => label)).toEqual(['Full wave', 'Network before correction']);
      expect(new Set(symbols.map(({ symbol }) => symbol)).size).toBe(2);
      for (const { points } of symbols) expect(points.map(([x]) => x)).toEqual([76.1, 76.5, 76.9]);
      expect(figure.content.limits).toHaveLength(1);
    }
  });
});

describe('network only', () => {
  it('stands with its reason in its chapter, on page one, and beside every figure of columns', () => {
    expect(chapterText('board/qb-2', 'engines')).toContain('the pack switched the full wave off');
    expect(chapterText('board/qb-2', 'verdict')).toContain('Network only');
    const rows = tableOf('board/qb-2', 'results');
    const value = (id: string) => rows.find(([name]) => name.startsWith(id))?.[2];
    for (const id of ['r-gain', 'r-match', 'r-active', 'r-sidelobe', 'r-tilt', 'r-mask', 'r-efficiency'])
      expect(value(id), id).toMatch(/ network only$/);
    for (const id of ['r-line', 'r-flame', 'r-peel']) expect(value(id), id).not.toContain('network only');
    const figures = blocksOf(pageOf(document, 'board/qb-2')).flatMap((b) => (b.kind === 'figure' ? [b] : []));
    for (const id of [
      'budget-chart',
      'cut-elevation',
      'cut-azimuth',
      'match-passive',
      'match-active',
      'coupling-matrix',
    ])
      expect(figures.find((figure) => figure.id === id)?.title, id).toMatch(/, network only$/);
    expect(figures.find(({ id }) => id === 'loss-factor')?.title).not.toContain('network only');
  });

  it('is said neither of a confirmed board nor of one without figures of columns', () => {
    for (const id of ['board/qb-1', 'board/qb-3'])
      for (const chapter of ['verdict', 'budget', 'match'])
        expect(chapterText(id, chapter)).not.toContain('network only');
    expect(chapterText('board/qb-3', 'engines')).toContain('the board has a cover layer');
  });
});

describe('results of a board that is not evaluated', () => {
  it('give the reason once, below the table', () => {
    const text = chapterText('board/qb-3', 'verdict');
    expect(text.split('the board has a cover layer')).toHaveLength(2);
    expect(tableOf('board/qb-3', 'results').filter((row) => row[2] === 'none: reason below').length).toBeGreaterThan(5);
  });
});
