import { describe, expect, it } from 'vitest';
import { composePack } from '../../src/dossier/index.js';
import { NOT_MODELLED } from '../../src/dossier/statements.js';
import { blocksOf, inlinesOf, inputOf, pageOf, plain, studies, textOf } from './pack-fixture.js';

const document = composePack(inputOf(studies()));
const dossier = pageOf(document, 'board/qb-1');
const verdictText = (id: string): string =>
  pageOf(document, id)
    .chapters[0].blocks.flatMap((block) => [
      'title' in block ? block.title : '',
      'caption' in block ? block.caption : '',
      inlinesOf(block).map(plain).join(''),
    ])
    .join('\n');

describe('dossier', () => {
  it('has its chapters in the order in which a reviewer decides', () => {
    expect(dossier.chapters.map((c) => c.id)).toEqual([
      'verdict',
      'board',
      'budget',
      'patterns',
      'match',
      'coupling',
      'engines',
      'copper',
      'conditions',
      'uncertainty',
      'materials',
      'definitions',
      'validity',
      'balance',
      'inputs',
      'cautions',
    ]);
  });

  it('says on page one what is not modelled, what figures are compared with, and what they rest on', () => {
    for (const id of ['board/qb-1', 'board/qb-3']) {
      const text = verdictText(id);
      for (const line of NOT_MODELLED) expect(text).toContain(line);
      expect(text).toMatch(/Fascia[\s\S]*Housing[\s\S]*chip[\s\S]*Vias[\s\S]*Edges of the board/);
      expect(text).toContain('No board of this build has been measured.');
      expect(text).toContain('Figures that are typical, estimated or used outside their frequency');
    }
  });

  it('opens with the status and the reason for it', () => {
    const [first] = dossier.chapters[0].blocks;
    expect(first).toMatchObject({ kind: 'verdict', status: 'undecided' });
    expect(inlinesOf(first).map(plain).join('')).toContain('r-match');
  });

  it('lists the strongest assumption first', () => {
    const table = blocksOf(dossier).find((b) => b.kind === 'table' && b.id === 'assumptions');
    const names = table?.kind === 'table' ? table.rows.map((row) => plain(row[0].content[0])) : [];
    // Used outside its frequency and only typical; used outside its frequency; estimated; typical.
    expect(names.slice(0, 3)).toEqual([
      'Loss tangent of the laminate',
      'Permittivity of the laminate',
      'Conductivity of the strip copper',
    ]);
    expect(names[names.length - 1]).toMatch(/^Rq/);
    expect(names).not.toContain('Thickness of the laminate');
  });

  it('shows value, limit, margin, uncertainty, place and status of every requirement', () => {
    const table = blocksOf(dossier).find((b) => b.kind === 'table' && b.id === 'results');
    const rows = table?.kind === 'table' ? table.rows.map((r) => r.map((c) => c.content.map(plain).join(''))) : [];
    const gain = rows.find((row) => row[0].startsWith('r-gain'));
    expect(gain?.[1]).toBe('≥ 13.5 dBi');
    expect(gain?.[2]).toMatch(/^\d+\.\d\d dBi$/);
    expect(gain?.[3]).toBe('76.90 GHz, 105 °C');
    expect(gain?.[4]).toMatch(/^\+\d\.\d\d dB$/);
    expect(gain?.[5]).toMatch(/^−\d\.\d\d \/ \+\d\.\d\d dB$/);
    expect(gain?.[6]).toBe('meets');
    const tested = rows.find((row) => row[0].startsWith('r-efficiency'));
    expect(tested?.[6]).toBe('open until measured (calculated: undecided)');
  });

  it('draws the requirement into the pattern cut, outside the main lobe', () => {
    const figure = blocksOf(dossier).find((b) => b.kind === 'figure' && b.id === 'cut-elevation');
    const content = figure?.kind === 'figure' ? figure.content : undefined;
    if (content === undefined || !('chart' in content) || content.chart !== 'cut') throw new Error('no cut chart');
    expect(content.series).toHaveLength(3);
    const [mask] = content.masks;
    expect(mask.label).toContain('r-sidelobe');
    expect(mask.pieces.map((p) => p.level)).toEqual([-12, -12]);
    const centre = content.series[1].points;
    for (const [angle, level] of centre) {
      const limited = mask.pieces.some((p) => angle >= p.from && angle <= p.to);
      if (level > -3) expect(limited).toBe(false);
      if (Math.abs(angle) > 25) expect(limited).toBe(true);
    }
  });

  it('names files, hashes, parents, overrides and the program', () => {
    const text = textOf(pageOf(document, 'board/qb-2'));
    expect(text).toContain('boards/qb-2.yaml');
    expect(text).toContain('ab'.repeat(32));
    expect(text).toMatch(/stack_up\.laminate\.material nf-33/);
    expect(text).toContain('boardcase 0.1.0');
    expect(text).toMatch(/Based on[\s\S]*qb-1/);
  });

  it('of a board whose columns cannot be evaluated gives the reason, and of figures those of its line alone', () => {
    const page = pageOf(document, 'board/qb-3');
    const [first] = page.chapters[0].blocks;
    expect(first).toMatchObject({ kind: 'verdict', status: 'incomplete' });
    expect(textOf(page)).toContain('the board has a cover layer');
    const charts = blocksOf(page).flatMap((b) => (b.kind === 'figure' && 'chart' in b.content ? [b.id] : []));
    expect(charts).toEqual(['loss-factor', 'effective-permittivity', 'line-loss']);
    const rows = blocksOf(page).find((b) => b.kind === 'table' && b.id === 'results');
    const line = rows?.kind === 'table' ? rows.rows.find(([name]) => plain(name.content[0]) === 'r-line') : undefined;
    expect(line?.map((c) => c.content.map(plain).join('')).at(-1)).toBe('meets');
    expect(textOf(page)).toContain('of the feed line only');
  });

  it('flags models used outside their range on page one', () => {
    const [first] = studies();
    const flag = {
      code: 'c',
      severity: 'outside' as const,
      model: 'Column network',
      text: 'k0h is 0.4, range to 0.33.',
    };
    const page = pageOf(composePack(inputOf([{ ...first, flags: [flag] }])), 'board/qb-1');
    const cautions = page.chapters[0].blocks.filter((b) => b.kind === 'caution');
    expect(cautions.map((b) => b.title)).toContain('Models used outside their stated range');
  });
});
