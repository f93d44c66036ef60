import { describe, expect, it } from 'vitest';
import { formatProblem } from '../../src/manifest/index.js';
import { withArray } from './array-fixture.js';
import { type Contents, edited, load, packOf, problemsOf } from './fixture.js';

const GROUPS = withArray({
  array: '  groups: [{ id: tx, columns: [1] }, { id: rx, columns: [2, 3] }]\n',
  amplitude: '[1, 0, 0]',
});
const requirement = (keys: string): Contents =>
  edited(
    'requirements.yaml',
    'requirements:\n',
    `requirements:
  - id: r-isolation
    text: Transmit and receive columns are isolated.
    quantity: isolation
${keys}    weight: binding
    source: NF-RS-01 clause 4.7
    verification: calculation
`,
  );
const LIMIT = '    limit: { at_least: 25 dB }\n';
const texts = (keys: string, board: Contents = GROUPS) =>
  problemsOf(load({ ...board, ...requirement(keys) })).map(formatProblem);

describe('isolation as a requirement', () => {
  it('is between two groups, or between all', () => {
    const first = (keys: string) => packOf(load({ ...GROUPS, ...requirement(keys) })).requirements.requirements[0]!;
    expect(first(`${LIMIT}    between: [tx, rx]\n`)).toMatchObject({
      quantity: 'isolation',
      between: ['tx', 'rx'],
      limit: { direction: 'at_least', value: 25 },
    });
    expect(first(LIMIT).between).toBeUndefined();
  });

  it('may be asked of boards without groups, of which it will not be evaluated', () => {
    expect(packOf(load(requirement(`${LIMIT}    between: [tx, rx]\n`))).boards[0]!.groups).toBeUndefined();
  });

  it.each<[string, string, RegExp]>([
    [
      'an upper limit',
      '    limit: { at_most: 25 dB }\n',
      /limit\.at_most\n {2}found at_most for isolation; isolation has a limit at_least\.$/,
    ],
    [
      'a negative isolation',
      '    limit: { at_least: -25 dB }\n',
      /found "-25 dB"; an isolation lies between 0 and 120 dB\. Did you mean 25 dB\?$/,
    ],
    ['no limit', '', /found no key "limit"; isolation has a limit/],
    [
      'a group that no board has',
      `${LIMIT}    between: [tx, rxx]\n`,
      /requirements\[0\]\.between\[1\]\n {2}found the unknown group "rxx"; the group ids of the pack are: tx, rx\. Did you mean rx\?$/,
    ],
    [
      'a group with itself',
      `${LIMIT}    between: [tx, tx]\n`,
      /between\[1\]\n {2}found "tx" a second time; two different groups\.$/,
    ],
    ['three groups', `${LIMIT}    between: [tx, rx, tx]\n`, /between\n {2}found a list of 3; at most 2 here\.$/],
    ['a cut', `${LIMIT}    cut: azimuth\n`, /found cut for isolation; only quantities of the pattern have a cut/],
  ])('refuses %s', (_, keys, message) => {
    expect(texts(keys)).toEqual([expect.stringMatching(message)]);
  });

  it('alone is between groups', () => {
    const other = edited('requirements.yaml', 'at_most: -12 dB }\n', 'at_most: -12 dB }\n    between: [tx, rx]\n');
    expect(problemsOf(load({ ...GROUPS, ...other })).map(formatProblem)).toEqual([
      expect.stringMatching(/found between for reflection; only isolation is between two groups\. Remove between\.$/),
    ]);
  });

  it('does not blame a requirement for groups of a board that could not be read', () => {
    const broken = { 'boards/qs-2.yaml': 'id: [\n' };
    const found = problemsOf(load({ ...GROUPS, ...requirement(`${LIMIT}    between: [tx, rxx]\n`), ...broken }));
    expect(found.map((p) => p.file)).toEqual(['boards/qs-2.yaml']);
  });
});
