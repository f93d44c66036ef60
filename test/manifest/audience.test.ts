import { describe, expect, it } from 'vitest';
import { audienceOf, packFor } from '../../src/manifest/index.js';
import type { Audience, Pack } from '../../src/manifest/model.js';
import { type Contents, edited, load, packOf, problemsOf } from './fixture.js';

const withAudiences = (yaml: string, changes: Contents = {}) =>
  load({ ...edited('pack.yaml', 'analysis:\n', `audiences:\n${yaml}\nanalysis:\n`), ...changes });
const hiding = (hide: string) => withAudiences(`  - { id: partner, hide: [${hide}] }`);
function copyOf(hide: string, changes: Contents = {}): { readonly pack: Pack; readonly copy: Pack } {
  const pack = packOf(withAudiences(`  - { id: partner, hide: [${hide}] }`, changes));
  return { pack, copy: packFor(pack, pack.audiences![0]!) };
}
/** Without the words that name the parent, which a copy without the parent must not say. */
const quietTitle = edited('boards/qs-2.yaml', 'title: As qs-1 with rougher foil', 'title: Rougher foil');

describe('a copy for an audience', () => {
  it('is a pack of its own, under a name that no pack can have', () => {
    const { pack, copy } = copyOf('cost');
    expect(copy).toMatchObject({ id: 'quillback-small--partner', audience: 'partner', revision: pack.revision });
    expect(copy.audiences).toBeUndefined();
    expect(problemsOf(load(edited('pack.yaml', 'id: quillback-small', 'id: a--b')))[0]?.path).toBe('id');
  });

  it('holds no cost, author or description that is hidden', () => {
    const { copy } = copyOf('cost, authors, descriptions, sources');
    for (const board of copy.boards) expect([board.cost, board.description]).toEqual([undefined, undefined]);
    const text = JSON.stringify(copy);
    for (const hidden of ['M. Ellery', 'S. Oduya', '4.1,', 'Invented variant', 'NF-RS-01'])
      expect(text).not.toContain(hidden);
  });

  it('holds no declared property that is hidden, and no requirement on it', () => {
    const { copy } = copyOf('declared/flammability');
    const text = JSON.stringify(copy);
    expect(text).not.toContain('flammability');
    expect(text).toContain('lead-time');
    const none = JSON.stringify(copyOf('declared').copy);
    for (const word of ['flammability', 'lead-time', 'peel-strength']) expect(none).not.toContain(word);
  });

  it('holds nothing of a hidden board: not its id, its file, its place in a chain or under a figure', () => {
    const { copy } = copyOf('boards/qs-1', quietTitle);
    expect(copy.boards.map((board) => board.id)).toEqual(['qs-2']);
    const text = JSON.stringify(copy);
    expect(text).not.toContain('qs-1');
    const [board] = copy.boards;
    expect(board).toMatchObject({ basedOn: [], overrides: [], lineage: [] });
    expect(board!.stackUp.laminate.thickness.path).toBe('inherited: stack_up.laminate.thickness');
  });

  it('cuts a chain at the first hidden board, and keeps what is said before it', () => {
    const changes = {
      ...quietTitle,
      ...edited('pack.yaml', 'requirements: req', 'variants: [v.csv]\nrequirements: req'),
      'v.csv': 'id,title,based_on,cost.amount\nqs-3,Third,qs-2,1\n',
    };
    const pack = packOf(load(changes));
    const copy = packFor(pack, { id: 'x', hide: ['boards/qs-1'] });
    const third = copy.boards.find(({ id }) => id === 'qs-3')!;
    expect(third.basedOn).toEqual(['qs-2']);
    expect(third.lineage!.map(({ board, overrides }) => [board, overrides.length])).toEqual([['qs-3', 1]]);
    expect(JSON.stringify(third.lineage)).not.toContain('kf-10');
  });

  it('names the files of what it shows without any hash', () => {
    const { pack, copy } = copyOf('boards/qs-2');
    expect(copy.inputs.map(({ path }) => path)).toEqual([
      'boards/qs-1.yaml',
      'foils.yaml',
      'laminates.yaml',
      'requirements.yaml',
    ]);
    for (const { sha256 } of pack.inputs) expect(JSON.stringify(copy)).not.toContain(sha256);
  });

  it('takes nothing from the pack but what it names', () => {
    const { pack } = copyOf('cost');
    const more = { ...pack, planted: 'MARKER', previous: { revision: 'MARKER' } } as Pack;
    expect(JSON.stringify(packFor(more, pack.audiences![0]!))).not.toContain('MARKER');
  });

  it('leaves the reviewed out with what they concern, and persons with the authors', () => {
    const { pack } = copyOf('cost');
    const review = {
      file: 'review.yaml',
      decision: { board: 'qs-2', statement: 's', reason: 'MARKER-1', date: '2026-01-01', by: 'MARKER-2' },
      openPoints: [{ id: 'o-1', text: 't', owner: 'MARKER-3', due: '2026-01-01', status: 'open' as const }],
      concessions: [
        { number: '1', board: 'qs-2', requirement: 'r-gain', text: 'MARKER-4', approver: 'a', granted: '', expiry: '' },
        {
          number: '2',
          board: 'qs-1',
          requirement: 'r-gain',
          text: 'kept',
          approver: 'MARKER-5',
          granted: '',
          expiry: '',
        },
        {
          number: '3',
          board: 'qs-1',
          requirement: 'r-match',
          text: 'MARKER-6',
          approver: 'a',
          granted: '',
          expiry: '',
        },
      ],
      approvals: [{ role: 'r', name: 'MARKER-7', organisation: 'o', attests: 'a' }],
      revisions: [{ revision: 'A', date: '2026-01-01', author: 'MARKER-8', change: 'c' }],
    };
    const audience: Audience = { id: 'x', hide: ['boards/qs-2', 'requirements/r-match', 'authors'] };
    const copy = packFor({ ...pack, review }, audience);
    expect(JSON.stringify(copy)).not.toContain('MARKER');
    expect(copy.review!.concessions.map(({ text }) => text)).toEqual(['kept']);
    expect(packFor({ ...pack, review }, { id: 'x', hide: ['review'] }).review).toBeUndefined();
  });
});

describe('what an audience may say', () => {
  it.each([
    ['price', /"price"/, undefined],
    ['boards/qs-9', /unknown board "qs-9"/, /qs-1|qs-2/],
    ['requirements/r-gian', /unknown requirement "r-gian"/, /r-gain/],
    ['declared/flamability', /unknown declared property/, /flammability/],
    ['boards/qs-1, boards/qs-2', /every board/, undefined],
    ['"../boards"', /"\.\.\/boards"/, undefined],
  ])('refuses to hide %s', (hide, found, fix) => {
    const [problem] = problemsOf(hiding(hide));
    expect(problem).toMatchObject({ file: 'pack.yaml', path: expect.stringMatching(/^audiences\[0\]\.hide/) });
    expect(problem!.found).toMatch(found);
    if (fix) expect(problem!.fix).toMatch(fix);
  });

  it('refuses a text that is shown and names what is hidden, and says where it stands', () => {
    const [problem] = problemsOf(hiding('boards/qs-1'));
    expect(problem).toMatchObject({
      path: 'audiences[0].hide',
      found: 'the board "qs-1" hidden, and named in boards[qs-2].title',
    });
    const named = edited('requirements.yaml', 'text: The feed line', 'text: Unlike R-GAIN the feed line');
    const [other] = problemsOf(withAudiences('  - { id: partner, hide: [requirements/r-gain] }', named));
    expect(other!.found).toMatch(/"r-gain" hidden, and named in requirements\.requirements\[r-line-loss\]\.text/);
    // Part of a longer word is another word.
    const longer = edited('requirements.yaml', 'text: The feed line', 'text: Unlike r-gain-2 the feed line');
    packOf(withAudiences('  - { id: partner, hide: [requirements/r-gain] }', longer));
  });

  it('refuses a hidden author who is named elsewhere', () => {
    const notice = edited('pack.yaml', 'notice: Invented', 'notice: Ask M. Ellery. Invented');
    const text = String(notice['pack.yaml']).replace(
      'analysis:\n',
      'audiences:\n  - { id: p, hide: [authors] }\nanalysis:\n',
    );
    expect(problemsOf(load({ 'pack.yaml': text }))[0]!.found).toMatch(/"M\. Ellery" hidden, and named in notice/);
  });

  it('refuses the same audience twice', () => {
    const twice = '  - { id: partner, hide: [cost] }\n  - { id: partner, hide: [authors] }';
    expect(problemsOf(withAudiences(twice))[0]).toMatchObject({ path: 'audiences[1].id' });
  });

  it('answers to a name with the nearest one', () => {
    const pack = packOf(hiding('cost'));
    expect(audienceOf(pack, 'pack.yaml', 'partner')).toMatchObject({ hide: ['cost'] });
    expect(audienceOf(pack, 'pack.yaml', 'partners')).toMatchObject({ fix: 'Did you mean partner?' });
    expect(audienceOf(packOf(load()), 'pack.yaml', 'x')).toMatchObject({ allowed: 'the pack names no audience' });
  });
});
