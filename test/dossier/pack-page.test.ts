import { describe, expect, it } from 'vitest';
import {
  composePack,
  type DocumentPage,
  type PackInput,
  packData,
  packPage,
  readRevisionData,
} from '../../src/dossier/index.js';
import { inGroups } from '../../src/dossier/pack-page.js';
import type { Pack, Review } from '../../src/manifest/model.js';
import type { BoardVerdict } from '../../src/verdict/index.js';
import { board } from './board-fixture.js';
import { blocksOf, inputOf, notEvaluated, pageOf, plain, studies, textOf } from './pack-fixture.js';
import { studyOf } from './study-fixture.js';

/** The pack is of 2026-03-02. */
const review: Review = {
  file: 'review.yaml',
  decision: { board: 'qb-1', statement: 'Build qb-1.', reason: 'Most margin.', date: '2026-03-01', by: 'Board (role)' },
  openPoints: [
    { id: 'op-1', text: 'Measure.', owner: 'Laboratory (role)', due: '2026-03-01', status: 'open' },
    { id: 'op-2', text: 'Ask.', owner: 'Purchasing (role)', due: '2026-03-01', status: 'closed' },
  ],
  concessions: [
    concession('CN-1', 'qb-1', 'r-gain', '2026-03-02'),
    concession('CN-2', 'qb-2', 'r-gain', '2026-03-01'),
    concession('CN-3', 'qb-2', 'r-flame', '2026-09-01'),
  ],
  approvals: [
    { role: 'Quality engineer', organisation: 'Northfen', attests: 'The hashes.' },
    { role: 'RF lead', name: 'R. Lead', organisation: 'Northfen', date: '2026-03-02', attests: 'The layout.' },
  ],
  revisions: [{ revision: 'A', date: '2026-03-02', author: 'RF (role)', change: 'First issue.' }],
};

function concession(number: string, boardId: string, requirement: string, expiry: string) {
  return {
    number,
    board: boardId,
    requirement,
    text: 'Samples.',
    approver: 'Systems (role)',
    granted: '2026-02-01',
    expiry,
  };
}

/** The same boards with r-gain missed on the first two, whatever the fixture's figures say. */
function missing(input: PackInput): PackInput {
  const verdicts = input.verdicts.map(
    (verdict, i): BoardVerdict => ({
      ...verdict,
      requirements: verdict.requirements.map((r) =>
        i < 2 && r.requirementId === 'r-gain' ? { ...r, status: 'misses' } : r,
      ),
    }),
  );
  return { ...input, verdicts };
}

const input = missing(inputOf(studies(), { review } as Partial<Pack>));
const hashesOf = (of: PackInput) =>
  new Map(Object.keys(packData(of)).map((path) => [path, `hash of ${path}`] as const));
const packOf = (of: PackInput) => packPage(of, hashesOf(of));
const page = packOf(input);

function rows(of: DocumentPage, id: string): string[][] {
  const found = blocksOf(of).find((b) => b.kind === 'table' && b.id === id);
  if (found?.kind !== 'table') throw new Error(`no table ${id}`);
  return found.rows.map((row) => row.map((c) => c.content.map(plain).join('')));
}

describe('the document of the whole pack', () => {
  it('says in this order what changed, what was found, what was decided, what belongs to it and who signs', () => {
    expect(page).toMatchObject({ id: 'pack', kind: 'pack', marking: 'internal: not for suppliers' });
    expect(page.titleBlock).toMatchObject({
      identificationNumber: 'QB-0001',
      revision: 'A',
      documentStatus: 'for review',
    });
    expect(page.chapters.map((c) => c.id)).toEqual([
      'changes',
      'verdicts',
      'differences',
      'decision',
      'open-points',
      'concessions',
      'dossiers',
      'revisions',
      'signing',
      'cautions',
      'statuses',
    ]);
  });

  it('has requirements down and boards across, with the count of what was not evaluated', () => {
    const matrix = rows(page, 'matrix');
    expect(matrix[0]).toEqual(['Overall', 'undecided', 'undecided', 'incomplete']);
    expect(matrix.find((row) => row[0].startsWith('r-gain'))?.[3]).toBe('not evaluated');
    expect(matrix.at(-1)).toEqual(['Not evaluated', '0', '0', '7']);
    expect(textOf(page)).toContain('7 requirements over all boards');
    expect(textOf(page)).toContain('the board has a cover layer');
  });

  it('splits many boards over tables that fit upright A4, none left out', () => {
    const many = Array.from({ length: 8 }, (_, i) =>
      notEvaluated(studyOf(board(`qb-${i + 1}`, { rq: (i + 1) * 1e-7 }))),
    );
    const of = packOf(inputOf(many));
    const columns = (prefix: string) =>
      blocksOf(of).flatMap((b) =>
        b.kind === 'table' && b.id.startsWith(prefix) ? [b.columns.slice(1).map((c) => c.title)] : [],
      );
    const ids = many.map((s) => s.board.id);
    expect(columns('matrix').map((c) => c.length)).toEqual([4, 4]);
    expect(columns('matrix').flat()).toEqual(ids);
    expect(columns('difference-table').flat()).toEqual(ids);
    expect(Math.max(...columns('difference-table').map((c) => c.length))).toBeLessThanOrEqual(4);
    expect(inGroups([1, 2, 3, 4, 5, 6, 7], 6)).toEqual([
      [1, 2, 3, 4],
      [5, 6, 7],
    ]);
  });

  it('lists each dossier with number, file and hash of its results', () => {
    expect(rows(page, 'dossier-table')[0]).toEqual([
      'qb-1: Board qb-1',
      'QB-0001-QB-1, qb-1.pdf',
      'data/board-qb-1.json hash of data/board-qb-1.json',
    ]);
    expect(textOf(page)).toContain('hash of data/pack.json');
    expect(() => packPage(input, new Map())).toThrow(/no hash of data\/board-qb-1\.json/);
  });

  it('leaves room to sign, and for name and date where they are not given', () => {
    const table = blocksOf(page).find((b) => b.kind === 'table' && b.id === 'signing-table');
    const signs = table?.kind === 'table' ? table.rows.map((row) => row.map((c) => c.signature === true)) : [];
    expect(signs).toEqual([
      [false, true, false, true, true, false],
      [false, false, false, false, true, false],
    ]);
    expect(rows(page, 'signing-table')[1]).toEqual(['RF lead', 'R. Lead', 'Northfen', '2026-03-02', '', 'The layout.']);
  });
});

describe('what people decided', () => {
  const overview = pageOf(composePack(input), 'overview');

  it.each([
    ['pack', page],
    ['overview', overview],
  ])('stands on the %s: decision, open points, concessions, revisions', (_, of) => {
    const text = textOf(of);
    for (const words of ['Build qb-1.', 'Most margin.', 'Board (role), 2026-03-01', 'First issue.', 'Quality engineer'])
      expect(text).toContain(words);
    expect(rows(of, 'open-point-table')).toEqual([
      ['op-1', 'Measure.', 'Laboratory (role)', '2026-03-01: overdue', 'open'],
      ['op-2', 'Ask.', 'Purchasing (role)', '2026-03-01', 'closed'],
    ]);
    expect(rows(of, 'concession-table').map((row) => [row[0], row[3], row[6]])).toEqual([
      ['CN-1', 'misses', '2026-03-02'],
      ['CN-2', 'misses', '2026-03-01: expired'],
      ['CN-3', 'meets; without purpose: the requirement is not missed', '2026-09-01'],
    ]);
  });

  it('sets a concession beside the status and changes none', () => {
    const gain = rows(page, 'matrix').find((row) => row[0].startsWith('r-gain')) ?? [];
    expect(gain[1]).toMatch(/^misses .* dB, concession CN-1$/);
    expect(gain[2]).toMatch(/^misses .* dB, concession CN-2 \(expired\)$/);
    const flame = rows(page, 'matrix').find((row) => row[0].startsWith('r-flame')) ?? [];
    expect(flame[2]).not.toContain('CN-3');
    const bare = inputOf(studies());
    expect(rows(packOf(missing(bare)), 'matrix')[0]).toEqual(rows(page, 'matrix')[0]);
  });

  it('stands on the dossier of the board as well', () => {
    const text = textOf(pageOf(composePack(input), 'board/qb-2'));
    expect(text).toContain('CN-2 for r-gain');
    expect(text).toContain('2026-03-01: expired');
    expect(text).toContain('Without purpose: the requirement is not missed.');
  });

  it('is said to be missing where it is', () => {
    const text = textOf(packOf(inputOf(studies())));
    for (const words of [
      'No previous revision.',
      'No decision is recorded yet.',
      'No open point is recorded.',
      'No concession is recorded.',
      'No table of revisions is recorded.',
      'The pack names no signatory.',
    ])
      expect(text).toContain(words);
  });

  it('says none where the decision is for no board', () => {
    const { board: _, ...decision } = review.decision ?? { statement: '', reason: '', date: '', by: '' };
    const of = packOf(inputOf(studies(), { review: { ...review, decision } } as Partial<Pack>));
    const facts = blocksOf(of).find((b) => b.kind === 'facts' && b.id === 'decision-facts');
    const said = facts?.kind === 'facts' ? facts.items.find((item) => item.label === 'Board') : undefined;
    expect(said?.content).toEqual(['none']);
  });

  it('is in the data, which carry the marking too', () => {
    const data = packData(input)['data/pack.json'];
    expect(data).toMatchObject({
      marking: 'internal: not for suppliers',
      review: { concessions: [{ number: 'CN-1' }, {}, {}] },
    });
  });
});

describe('what changed since the revision before', () => {
  const earlier = inputOf(studies(), { revision: '0', date: '2026-01-05', status: 'released' } as Partial<Pack>);
  const found = readRevisionData(Buffer.from(JSON.stringify(packData(earlier)['data/pack.json'])));
  if (typeof found === 'string') throw new Error(found);

  it.each(['overview', 'pack'])('begins the %s: verdicts, figures, inputs and program', (kind) => {
    const now = { ...missing(inputOf(studies().slice(0, 2))), programVersion: '0.2.0', previous: found };
    const of = kind === 'pack' ? packOf(now) : pageOf(composePack(now), 'overview');
    expect(of.chapters[0]).toMatchObject({ id: 'changes', title: 'What changed since revision 0' });
    const text = textOf(of);
    expect(text).toContain('Compared with revision 0 of 2026-01-05 (released).');
    expect(text).toContain('removed: qb-3');
    expect(text).toContain('boardcase 0.1.0 before, 0.2.0 now');
    expect(text).toContain('none moved beyond the uncertainty, 0 within it');
    expect(rows(of, 'flips')).toEqual([
      ['qb-1', 'r-gain', 'meets', 'misses'],
      ['qb-2', 'r-gain', 'undecided', 'misses'],
    ]);
  });

  it('lists a figure that moved beyond its uncertainty with both uncertainties', () => {
    const verdicts = found.data.verdicts.map((v) =>
      v.boardId === 'qb-1' && v.requirementId === 'r-gain' && v.margin !== null && typeof v.value === 'number'
        ? { ...v, value: v.value - 5, margin: v.margin - 5 }
        : v,
    );
    const of = packOf({ ...inputOf(studies()), previous: { ...found, data: { ...found.data, verdicts } } });
    const [row, ...more] = rows(of, 'moves');
    expect(more).toEqual([]);
    expect(row.slice(0, 2)).toEqual(['qb-1', 'r-gain']);
    expect(row[4]).toBe('+5.00 dB');
    expect(row[5]).toMatch(/^−\d\.\d\d \/ \+\d\.\d\d dB$/);
  });

  it('is recorded in the data by the hash of the data compared with', () => {
    const data = packData({ ...inputOf(studies()), previous: found })['data/pack.json'];
    expect(data).toMatchObject({ previous: { revision: '0', status: 'released', sha256: found.sha256 } });
  });
});
