import { describe, expect, it } from 'vitest';
import { changesBetween, type RevisionData, readRevisionData } from '../../src/dossier/index.js';

type Verdict = RevisionData['verdicts'][number];

const verdict = (boardId: string, requirementId: string, extra: Partial<Verdict> = {}): Verdict => ({
  boardId,
  requirementId,
  status: 'meets',
  unit: 'dBi',
  value: 17,
  margin: 1,
  adverse: 0.4,
  favourable: 0.6,
  ...extra,
});

const requirement = (id: string, limit = 16) => ({ id, text: 'words', source: 'somewhere', limit });

function revision(extra: Partial<RevisionData> = {}): RevisionData {
  return {
    kind: 'pack',
    programVersion: '1.0.0',
    pack: { id: 'p', revision: 'A', date: '2026-01-01', status: 'released' },
    boards: [{ id: 'one', title: 'One', overall: 'meets' }],
    requirements: [requirement('r-gain'), requirement('r-match')],
    verdicts: [verdict('one', 'r-gain'), verdict('one', 'r-match')],
    inputs: [{ path: 'pack.yaml', sha256: 'a' }],
    ...extra,
  };
}

/** What becomes of a gain of 17 dBi with −0.4 / +0.6 dB when it moves. */
function moved(to: Partial<Verdict>, from: Partial<Verdict> = {}) {
  const before = revision({ verdicts: [verdict('one', 'r-gain', from)] });
  const now = revision({ verdicts: [verdict('one', 'r-gain', to)] });
  const { moved: beyond, within, unchanged, notComparable } = changesBetween(before, now);
  return { beyond: beyond.length, within, unchanged, notComparable };
}
const nothing = { beyond: 0, within: 0, unchanged: 0, notComparable: 0 };

describe('what changed between two revisions', () => {
  it('is nothing between a revision and itself', () => {
    expect(changesBetween(revision(), revision())).toEqual({
      flips: [],
      moved: [],
      within: 0,
      unchanged: 2,
      notComparable: 0,
      boards: { added: [], removed: [], changed: [] },
      requirements: { added: [], removed: [], changed: [] },
      inputs: { added: [], removed: [], changed: [] },
      programVersion: { from: '1.0.0', to: '1.0.0' },
    });
  });

  it('names verdicts that flipped, of requirements and of boards, the calculated ones behind a test too', () => {
    const now = revision({
      boards: [{ id: 'one', title: 'One', overall: 'misses' }],
      verdicts: [
        verdict('one', 'r-gain', { status: 'misses' }),
        verdict('one', 'r-match', { status: 'open until measured', calculated: 'misses' }),
      ],
    });
    const before = revision({
      verdicts: [
        verdict('one', 'r-gain'),
        verdict('one', 'r-match', { status: 'open until measured', calculated: 'meets' }),
      ],
    });
    expect(changesBetween(before, now).flips).toEqual([
      { boardId: 'one', from: { status: 'meets' }, to: { status: 'misses' } },
      { boardId: 'one', requirementId: 'r-gain', from: { status: 'meets' }, to: { status: 'misses' } },
      {
        boardId: 'one',
        requirementId: 'r-match',
        from: { status: 'open until measured', calculated: 'meets' },
        to: { status: 'open until measured', calculated: 'misses' },
      },
    ]);
  });

  it.each([
    ['down, inside both intervals', 0.7, { within: 1 }],
    ['down, outside the interval of the revision before', 0.55, { beyond: 1 }],
    ['up, inside the interval of the revision before, outside that of the new one', 1.45, { beyond: 1 }],
    ['up, inside both', 1.35, { within: 1 }],
    ['by the rounding of the data', 1 + 1e-12, { unchanged: 1 }],
  ])('sets a figure that moved %s against its uncertainty', (_, margin, result) => {
    expect(moved({ margin, value: 16 + margin })).toEqual({ ...nothing, ...result });
  });

  it('calls any change of a declared figure or word a move: nothing is uncertain about it', () => {
    const declared = { unit: 'N/mm', adverse: 0, favourable: 0 };
    expect(moved({ ...declared, margin: 0.2 }, { ...declared, margin: 0.1 })).toEqual({ ...nothing, beyond: 1 });
    const word = { unit: '', margin: null, adverse: null, favourable: null };
    expect(moved({ ...word, value: 'V-1' }, { ...word, value: 'V-0' })).toEqual({ ...nothing, beyond: 1 });
    expect(moved({ ...word, value: 'V-0' }, { ...word, value: 'V-0' })).toEqual({ ...nothing, unchanged: 1 });
  });

  it('compares nothing with what was not evaluated, or was judged against another limit', () => {
    const gap = { status: 'not evaluated', value: null, margin: null, adverse: null, favourable: null };
    expect(moved({}, gap)).toEqual({ ...nothing, notComparable: 1 });
    expect(moved({ adverse: null, favourable: null })).toEqual({ ...nothing, notComparable: 1 });
    const tightened = revision({ requirements: [requirement('r-gain', 17), requirement('r-match')] });
    const changes = changesBetween(revision(), { ...tightened, verdicts: [verdict('one', 'r-gain', { margin: 0 })] });
    expect(changes.requirements.changed).toEqual(['r-gain']);
    expect(changes).toMatchObject({ moved: [], notComparable: 1 });
  });

  it('does not take better words for another requirement', () => {
    const now = revision({ requirements: [{ ...requirement('r-gain'), text: 'new words' }, requirement('r-match')] });
    expect(changesBetween(revision(), now).requirements.changed).toEqual([]);
  });

  it('names boards, requirements and inputs that came, went or changed, and the program', () => {
    const now = revision({
      programVersion: '1.1.0',
      boards: [{ id: 'two', title: 'Two', overall: 'meets' }],
      requirements: [requirement('r-match'), requirement('r-tilt')],
      verdicts: [verdict('two', 'r-match')],
      inputs: [
        { path: 'pack.yaml', sha256: 'b' },
        { path: 'foils.yaml', sha256: 'c' },
      ],
    });
    expect(changesBetween(revision(), now)).toMatchObject({
      flips: [],
      boards: { added: ['two'], removed: ['one'], changed: [] },
      requirements: { added: ['r-tilt'], removed: ['r-gain'], changed: [] },
      inputs: { added: ['foils.yaml'], removed: [], changed: ['pack.yaml'] },
      programVersion: { from: '1.0.0', to: '1.1.0' },
    });
  });
});

describe('data of an earlier revision', () => {
  const bytes = (json: unknown) => new TextEncoder().encode(JSON.stringify(json));

  it('are read although a program of another time wrote more into them', () => {
    const found = readRevisionData(bytes({ ...revision(), futureField: { a: 1 } }));
    expect(found).toMatchObject({ data: revision() });
    expect(typeof found === 'string' ? '' : found.sha256).toMatch(/^[0-9a-f]{64}$/);
  });

  it.each([
    [new TextEncoder().encode('{'), /not JSON/],
    [new Uint8Array([0xff, 0xfe]), /not JSON/],
    [bytes({ ...revision(), kind: 'board' }), /not the data of a pack/],
    [bytes([]), /not the data of a pack/],
  ])('are refused in words when they are something else', (content, message) => {
    expect(readRevisionData(content)).toMatch(message);
  });
});
