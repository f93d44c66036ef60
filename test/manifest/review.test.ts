import { describe, expect, it } from 'vitest';
import { formatProblem } from '../../src/manifest/index.js';
import { type Contents, fixtureText, load, packOf, problemsOf } from './fixture.js';

const review = `decision:
  board: qs-1
  statement: Build qs-1.
  reason: It has the most margin.
  date: 2026-10-30
  by: Review board (role)
open_points:
  - { id: op-1, text: Texture of the treated face., owner: Purchasing (role), due: 2026-12-01, status: in_work }
concessions:
  - number: CN-1
    board: qs-2
    requirement: r-gain
    text: Samples only.
    approver: Systems (role)
    granted: 2026-10-20
    expiry: 2027-01-31
approvals:
  - { role: Quality engineer, organisation: Northfen Sensing (invented), attests: The hashes are right. }
  - { role: RF lead, name: R. Lead, organisation: Northfen Sensing (invented), date: 2026-11-01, attests: The layout. }
revisions:
  - { revision: A, date: 2026-11-02, author: RF design (role), change: First issue. }
`;

const withPack = (extra: string): Contents => ({ 'pack.yaml': `${fixtureText('pack.yaml')}${extra}` });
const withReview = (text: string): Contents => ({ ...withPack('review: review.yaml\n'), 'review.yaml': text });
const messages = (contents: Contents) => problemsOf(load(contents)).map(formatProblem);

describe('the review of a pack', () => {
  it('is read into the pack, and is one of its input files', () => {
    const pack = packOf(load(withReview(review)));
    expect(pack.review).toEqual({
      file: 'review.yaml',
      decision: {
        board: 'qs-1',
        statement: 'Build qs-1.',
        reason: 'It has the most margin.',
        date: '2026-10-30',
        by: 'Review board (role)',
      },
      openPoints: [
        {
          id: 'op-1',
          text: 'Texture of the treated face.',
          owner: 'Purchasing (role)',
          due: '2026-12-01',
          status: 'in work',
        },
      ],
      concessions: [
        {
          number: 'CN-1',
          board: 'qs-2',
          requirement: 'r-gain',
          text: 'Samples only.',
          approver: 'Systems (role)',
          granted: '2026-10-20',
          expiry: '2027-01-31',
        },
      ],
      approvals: [
        {
          role: 'Quality engineer',
          organisation: 'Northfen Sensing (invented)',
          attests: 'The hashes are right.',
        },
        {
          role: 'RF lead',
          name: 'R. Lead',
          organisation: 'Northfen Sensing (invented)',
          date: '2026-11-01',
          attests: 'The layout.',
        },
      ],
      revisions: [{ revision: 'A', date: '2026-11-02', author: 'RF design (role)', change: 'First issue.' }],
    });
    expect(pack.inputs.map((input) => input.path)).toContain('review.yaml');
  });

  it('may be left out, and may decide for no board', () => {
    expect(packOf(load()).review).toBeUndefined();
    const pack = packOf(load(withReview(review.replace('board: qs-1', 'board: none'))));
    expect(pack.review?.decision).not.toHaveProperty('board');
    expect(packOf(load(withReview('open_points: []\n'))).review).toEqual({
      file: 'review.yaml',
      openPoints: [],
      concessions: [],
      approvals: [],
      revisions: [],
    });
  });

  it.each([
    [
      'board: qs-1',
      'board: qs-11',
      /^review\.yaml:2:10 {2}decision\.board\n.*unknown board "qs-11".*Did you mean qs-1\?/,
    ],
    [
      'board: qs-2',
      'board: qs-3',
      /concessions\[0\]\.board\n.*the board ids of the pack are: qs-1, qs-2.*Did you mean/,
    ],
    ['requirement: r-gain', 'requirement: r-gian', /concessions\[0\]\.requirement\n.*Did you mean r-gain\?/],
    ['expiry: 2027-01-31', 'expiry: 2026-10-19', /expiry\n.*on or after that of granted, 2026-10-20/],
    ['expiry: 2027-01-31', 'expiry: 2027-02-30', /expiry\n.*a date of the calendar/],
    ['granted: 2026-10-20', 'granted: 2026-11-03', /granted\n.*on or before the date of the pack, 2026-11-02/],
    ['date: 2026-10-30', 'date: 2026-11-03', /decision\.date\n.*on or before the date of the pack/],
    ['reason: It has the most margin.', 'reason: " "', /decision\.reason\n.*text/],
    ['status: in_work', 'status: done', /open_points\[0\]\.status/],
    ['approver: Systems (role)', 'aprover: Systems (role)', /Did you mean approver\?/],
    ['revision: A,', 'revision: B,', /revisions\[0\]\.revision\n.*the last entry is the revision of the pack, "A"/],
    ['date: 2026-11-02,', 'date: 2026-11-01,', /revisions\[0\]\.date\n.*the date of the pack, 2026-11-02/],
    [
      'revisions:\n',
      'revisions:\n  - { revision: "0", date: 2026-11-03, author: RF, change: Draft. }\n',
      /revisions\[1\]\.date\n.*oldest first; the one before is of 2026-11-03/,
    ],
    [
      'concessions:\n',
      'concessions:\n  - { number: CN-1, board: qs-1, requirement: r-gain, text: x, approver: y, granted: 2026-10-20, expiry: 2027-01-31 }\n',
      /concessions\[1\]\.number\n.*a second time/,
    ],
  ])('with "%s" as "%s" is refused with place and mend', (from, to, message) => {
    expect(review).toContain(from);
    const found = messages(withReview(review.replace(from, to)));
    expect(found).toHaveLength(1);
    expect(found[0]).toMatch(message);
  });

  it('does not accuse ids when the boards or requirements themselves could not be read', () => {
    const found = messages({ ...withReview(review), 'requirements.yaml': 'requirements: 5\n' });
    expect(found.join('\n')).not.toMatch(/^review\.yaml/m);
  });

  it('that cannot be found is reported where it is named', () => {
    expect(messages(withPack('review: no-review.yaml\n'))[0]).toMatch(/^pack\.yaml:\d+:9 {2}review\n.*no-review\.yaml/);
  });
});

describe('the revision before', () => {
  it('is named by its revision, or by a file that counts as an input', () => {
    expect(packOf(load(withPack('previous: { revision: "0" }\n'))).previous).toEqual({ revision: '0' });
    const pack = packOf(load({ ...withPack('previous: { data: old.json }\n'), 'old.json': '{}' }));
    expect(pack.previous).toEqual({ file: 'old.json' });
    expect(pack.inputs.map((input) => input.path)).toContain('old.json');
  });

  it.each([
    ['previous: { revision: A }', /previous\.revision\n.*"A", the revision of this pack; an earlier revision/],
    ['previous: { revision: B, data: old.json }', /exactly one of revision, data/],
    ['previous: {}', /exactly one of revision, data/],
    ['previous: { data: ../old.json }', /previous\.data\n.*stays under the root/],
    ['previous: { data: none.json }', /previous\.data\n.*no none\.json under the root/],
  ])('written as "%s" is refused', (line, message) => {
    const found = messages({ ...withPack(`${line}\n`), 'old.json': '{}' });
    expect(found).toHaveLength(1);
    expect(found[0]).toMatch(message);
  });
});

it.each(['pack', 'supplier-foil'])('a board cannot take the name of another PDF: %s', (id) => {
  const found = messages({ 'boards/qs-1.yaml': fixtureText('boards/qs-1.yaml').replace('id: qs-1', `id: ${id}`) });
  expect(found.find((message) => message.startsWith('boards/qs-1.yaml'))).toMatch(new RegExp(`"${id}"; another id`));
});

it('the marking is text of the pack', () => {
  expect(packOf(load()).marking).toBeUndefined();
  expect(packOf(load(withPack('marking: "confidential"\n'))).marking).toBe('confidential');
});
