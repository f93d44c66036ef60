import { describe, expect, it } from 'vitest';
import { copperChapter } from '../../src/dossier/chapter-copper.js';
import type { BoardContext } from '../../src/dossier/context.js';
import type { Block, Chapter, LinesChart } from '../../src/dossier/document.js';
import { askText } from '../../src/dossier/texture-asks.js';
import type { Board, RoughnessChoice } from '../../src/manifest/model.js';
import type { BoardStudy } from '../../src/study/results.js';
import { board, figure, laminate, pack } from './board-fixture.js';
import { inlinesOf, notEvaluated, plain } from './pack-fixture.js';
import { studyOf } from './study-fixture.js';

function contextOf(study: BoardStudy, roughnessModel: RoughnessChoice = 'band'): BoardContext {
  const subject = pack([study.board], { analysis: { roughnessModel, frequencyStep: 0.2e9 } });
  const input = {
    pack: subject,
    studies: [study],
    verdicts: [],
    evidence: [],
    methods: [],
    accuracy: [],
    programVersion: '0.1.0',
  };
  const verdict = { boardId: study.board.id, overall: 'undecided' as const, reason: '', requirements: [] };
  return { input, board: study.board, study, verdict, judged: [] };
}
const chapterOf = (subject: Board, choice?: RoughnessChoice): Chapter =>
  copperChapter(contextOf(studyOf(subject), choice));
const text = (blocks: readonly Block[]): string => blocks.map((b) => inlinesOf(b).map(plain).join('')).join('\n');
const rowsOf = ({ blocks }: Chapter, id: string): readonly (readonly string[])[] => {
  const found = blocks.find((b) => b.kind === 'table' && b.id === id);
  if (found?.kind !== 'table') throw new Error(`no table ${id}`);
  return found.rows.map((row) => row.map((c) => c.content.map(plain).join('')));
};
function linesOf({ blocks }: Chapter, id: string): LinesChart {
  const found = blocks.find((b) => b.kind === 'figure' && b.id === id);
  if (found?.kind !== 'figure' || !('chart' in found.content) || found.content.chart !== 'lines')
    throw new Error(`no lines ${id}`);
  return found.content;
}

const rough = chapterOf(board('qb-1', { rq: 1e-6 }));

describe('what is known of a face', () => {
  it('stands with its band in rising order, each estimate with a reason', () => {
    const rows = rowsOf(rough, 'faces').slice(0, 3);
    expect(rows.map((row) => row[4])).toEqual(['Low', 'Middle', 'High']);
    const factors = rows.map((row) => Number(row[5]));
    expect(factors).toEqual([...factors].sort((a, b) => a - b));
    expect(rows[0].slice(0, 4)).toEqual(['Strip underside (treated); ground (treated)', 'Rq only', '1.00 µm', '4.19']);
    for (const row of rows) expect(row[7].length).toBeGreaterThan(20);
  });
});

describe('curves over roughness', () => {
  it.each(['loss-factor', 'effective-permittivity', 'line-loss'])('of %s show every model, and the band', (id) => {
    const { series, band } = linesOf(rough, id);
    const names = series.map(({ label }) => label.replace(/ \(.*/, ''));
    expect(names).toEqual([
      'Middle estimate',
      'Smooth copper',
      'Hammerstad',
      'Groiss',
      'Cannonball stacking',
      'Gradient',
      'Solved ball pile',
    ]);
    expect(band?.label).toBe('Band, low to high');
    for (const [, low, high] of band?.points ?? []) expect(low).toBeLessThanOrEqual(high);
    expect(band?.points.length).toBeGreaterThan(5);
  });

  it('mark the faces of this board', () => {
    expect(linesOf(rough, 'loss-factor').marks).toEqual([
      { label: 'strip underside + ground', at: 1 },
      { label: 'strip top and edges', at: 0.25 },
    ]);
    expect(linesOf(rough, 'effective-permittivity').marks).toHaveLength(1);
  });

  it('are dotted from where a formula is within 5 % of its ceiling, and only for formulas that have one', () => {
    const stuck = linesOf(rough, 'loss-factor').series.filter(({ saturatedFrom }) => saturatedFrom !== undefined);
    expect(stuck.map(({ label }) => label)).toEqual(['Hammerstad (dotted: saturated)', 'Groiss (dotted: saturated)']);
    // 1 + (2/π) atan(1.4 r²) = 1.9 at r = 2.12; δ = 0.239 µm. Read from a curve with steps of 0.15 µm.
    expect(stuck[0].saturatedFrom).toBeGreaterThan(0.507 - 0.05);
    expect(stuck[0].saturatedFrom).toBeLessThan(0.507 + 0.05);
  });

  it('leave out the smooth end where nodules are known, which there would be none of', () => {
    const subject = board('qb-1');
    const { strip } = subject.stackUp;
    const nodule = { radius: figure('r', 0.25e-6, 0), pitch: figure('p', 0.7e-6, 0), layers: 2 };
    const texture = { ...strip.dielectricFace.texture, nodule };
    const known = { ...strip, dielectricFace: { ...strip.dielectricFace, texture } };
    const { series, band } = linesOf(
      chapterOf({ ...subject, stackUp: { ...subject.stackUp, strip: known } }),
      'loss-factor',
    );
    expect(series.map(({ label }) => label)).toContain('Huray');
    for (const { points } of series) expect(points[0][0]).toBeGreaterThan(0);
    expect(band?.points[0][0]).toBeGreaterThan(0);
    expect(linesOf(rough, 'loss-factor').series[0].points[0][0]).toBe(0);
  });

  it('emphasise what the nominal figures rest on', () => {
    const emphasised = (chapter: Chapter) =>
      linesOf(chapter, 'loss-factor')
        .series.filter(({ emphasis }) => emphasis)
        .map(({ label }) => label);
    expect(emphasised(rough)).toEqual(['Middle estimate']);
    expect(emphasised(chapterOf(board('qb-1'), 'gradient'))).toEqual(['Gradient']);
  });
});

describe('saturation', () => {
  it('is said in a plain sentence for each face and formula', () => {
    const said = text(rough.blocks);
    expect(said).toMatch(/Strip underside \(treated\); ground \(treated\): Hammerstad's formula is saturated here/);
    expect(said).toMatch(/Groiss's formula is saturated here/);
    expect(text(chapterOf(board('qb-1', { rq: 0.3e-6 })).blocks)).not.toContain('formula is saturated');
  });

  it('of the nominal model is a caution at the head of the chapter', () => {
    const head = (choice: RoughnessChoice, rq = 1e-6) => chapterOf(board('qb-1', { rq }), choice).blocks[0];
    const block = head('hammerstad');
    expect(block).toMatchObject({ kind: 'caution', title: 'Nominal figures use Hammerstad, which is saturated here' });
    expect(text([block])).toContain('cannot rank foils');
    expect(head('band').kind).not.toBe('caution');
    expect(head('gradient').kind).not.toBe('caution');
    expect(head('hammerstad', 0.3e-6).kind).not.toBe('caution');
  });
});

describe('slow wave', () => {
  it('gives permittivity, resonance and tilt of each estimate and that it is applied', () => {
    const [low, middle, high] = rowsOf(rough, 'slow-wave');
    expect(low[0]).toBe('Low');
    expect(middle.slice(1)).toEqual(['+0.30 %', '+0.40 %', '−153 MHz', '+0.18°', 'applied']);
    expect(high[3]).toMatch(/^−\d+ MHz$/);
  });

  it('is printed and not added where the permittivity is a design value', () => {
    const subject = board('qb-1');
    const { laminate: used } = subject.stackUp;
    const material = laminate('nf-30', 3, { permittivityKind: 'design' });
    const chapter = chapterOf({ ...subject, stackUp: { ...subject.stackUp, laminate: { ...used, material } } });
    expect(rowsOf(chapter, 'slow-wave').map((row) => row[5])).toEqual(Array(3).fill('already in the design value'));
    expect(text(chapter.blocks)).toContain('do not add it again');
  });
});

describe('what would narrow the band', () => {
  it('is an ordered list with numbers that fall short of the band, and a sentence to ask with', () => {
    const lists = rough.blocks.filter((b) => b.kind === 'list');
    const ordered = lists[0];
    expect(ordered).toMatchObject({ kind: 'list', ordered: true });
    const left = ordered.kind === 'list' ? ordered.items.map(([first]) => Number(plain(first))) : [];
    expect(left.length).toBeGreaterThan(1);
    expect(left).toEqual([...left].sort((a, b) => a - b));
    const said = text(rough.blocks);
    const width = Number(/band of the loss factor is ([\d.]+) wide/.exec(said)?.[1]);
    for (const value of left) expect(value).toBeLessThan(width);
    expect(said).toContain(askText('area-ratio'));
    expect(said).toMatch(/S-filter nesting index/);
  });

  it('asks no more for what is known', () => {
    const subject = board('qb-1', { rq: 0.4e-6 });
    const { strip, ground } = subject.stackUp;
    const texture = {
      ...strip.dielectricFace.texture,
      correlationLength: figure('c', 1.1e-6, 0),
      developedAreaRatio: figure('d', 0.1, 0),
      lay: 'isotropic' as const,
    };
    const known: Board = {
      ...subject,
      stackUp: {
        ...subject.stackUp,
        strip: {
          ...strip,
          dielectricFace: { ...strip.dielectricFace, texture },
          outerFace: { ...strip.outerFace, texture },
        },
        ground: { ...ground, dielectricFace: { ...ground.dielectricFace, texture } },
      },
    };
    const said = text(chapterOf(known).blocks);
    expect(said).toContain('No further measurement among those considered would narrow the band.');
    expect(said).not.toContain('In the words of a request');
  });
});

describe('a board whose columns are not evaluated', () => {
  it('has its copper chapter all the same', () => {
    const chapter = copperChapter(contextOf(notEvaluated(studyOf(board('qb-3')))));
    expect(chapter.blocks.filter((b) => b.kind === 'figure').map((b) => b.id)).toEqual([
      'tooth',
      'loss-factor',
      'effective-permittivity',
      'line-loss',
    ]);
    expect(rowsOf(chapter, 'loss-by-face').length).toBeGreaterThan(5);
  });
});
