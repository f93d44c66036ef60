import { describe, expect, it } from 'vitest';
import { formatProblem } from '../../src/manifest/index.js';
import { type ArrayText, boardText, withArray } from './array-fixture.js';
import { load, problemsOf } from './fixture.js';

const sizedFor = (change: Readonly<Record<string, string>> = {}, more = ''): ArrayText => {
  const keys = {
    frequency: '76.5 GHz',
    patches: '6',
    taper: 'uniform',
    least_width: '75 um',
    least_gap: '100 um',
    grid: '1 um',
    ...change,
  };
  const written = Object.entries(keys).map(([key, value]) => `${key}: ${value}`);
  return { undrawn: true, array: `  sized_for: { ${written.join(', ')} }\n${more}` };
};
const taper = (written: string): ArrayText => sizedFor({ taper: written });
const INSET = '  inset: { depth: 0.2 mm, gap: 0.1 mm }\n';
const SIDE = '  side_feed: { link: 2, side: +y }\n';
const TRAVELLING = '  termination: { width: 0.15 mm }\n';
const MATCHING = '  matching: [{ width: 0.3 mm, length: 0.6 mm }]\n';
const network = (keys: string): string => `  network: { ${keys} }\n`;
const NETWORK = 'divider: tee, line_width: 0.15 mm, trunk_length: 3 mm, level_length: 4 mm';
const groups = (written: string, more: Partial<ArrayText> = {}): ArrayText => ({
  array: `  groups: [${written}]\n`,
  ...more,
});

const CASES: readonly (readonly [name: string, change: ArrayText, message: RegExp])[] = [
  [
    'a direction that is none',
    { array: '  direction: revers\n' },
    /array\.direction\n {2}found "revers"; one of forward, reversed, alternate\. Did you mean reversed\?$/,
  ],
  [
    'a stagger without unit',
    { array: '  stagger: 0.4\n' },
    /array\.stagger\n {2}found 0\.4; a length here carries its unit/,
  ],
  [
    'stagger beside offsets',
    { array: '  offset_x: [0 mm, 1 mm, 0 mm]\n  stagger: 1 mm\n' },
    /array\.stagger\n {2}found offset_x and stagger together; the offset of every column, or one for every second/,
  ],
  [
    'a side without a link',
    { array: '  side_feed: { side: +y }\n', columns: 1 },
    /array\.side_feed\n {2}found no key "link"; it is needed: Number of the link/,
  ],
  [
    'a link that is none',
    { array: '  side_feed: { link: 4, side: +y }\n', columns: 1 },
    /array\.side_feed\.link\n {2}found "4"; the links are 1 to 3\.$/,
  ],
  [
    'a side that is none',
    { array: '  side_feed: { link: 1, side: left }\n', columns: 1 },
    /side_feed\.side\n {2}found "left"; one of \+y, -y, outward\.$/,
  ],
  [
    'a middle column fed outward',
    { array: '  side_feed: { link: 1, side: outward }\n', columns: 1 },
    /side_feed\.side\n {2}found "outward"; outward has a meaning where no column lies in the middle/,
  ],
  [
    'a side feed through the next column',
    { array: SIDE, columns: 2 },
    /array\.side_feed\n {2}found a feed line of column 1, 2\.00.mm long, that meets column 2; feed lines from the side reach no other column\. Write side: outward\.$/,
  ],
  [
    'a side feed of four columns',
    { array: '  side_feed: { link: 2, side: outward }\n', columns: 4 },
    /found a feed line of column 2, 2\.00.mm long, that meets column 1; [^.]*\.$/,
  ],
  [
    'an inset with a side feed',
    { array: INSET + SIDE, columns: 1 },
    /array\.side_feed\n {2}found inset and side_feed together; a column fed from its side has no line/,
  ],
  [
    'matching with a side feed',
    { array: MATCHING + SIDE, columns: 1 },
    /found matching and side_feed together; matching sections lie before the first patch/,
  ],
  [
    'a travelling wave with an inset',
    { array: INSET + TRAVELLING },
    /found termination and inset together; a travelling-wave column is fed at the edge/,
  ],
  [
    'a travelling wave fed from its side',
    { array: SIDE + TRAVELLING, columns: 1 },
    /found termination and side_feed together/,
  ],
  [
    'a travelling wave retuned',
    { array: `${TRAVELLING}  retune: length\n` },
    /array\.retune\n {2}found termination and retune together; retuning seeks the match/,
  ],
  [
    'an inset past the middle of the patch',
    { array: '  inset: { depth: 0.54 mm, gap: 0.1 mm }\n' },
    /array\.inset\.depth\n {2}found "0\.54 mm"; an inset ends before the middle of the first patch, which is 1\.06.mm long\.$/,
  ],
  [
    'slots as wide as the patch',
    { array: '  inset: { depth: 0.2 mm, gap: 0.28 mm }\n' },
    /array\.inset\.gap\n {2}found "0\.28 mm"; a line 150.µm wide with a slot at either side leaves something of the first patch/,
  ],
  [
    'an inset around the last matching section',
    { array: `${MATCHING}  inset: { depth: 0.2 mm, gap: 0.2 mm }\n` },
    /array\.inset\.gap\n {2}found "0\.2 mm"; a line 300.µm wide/,
  ],
  [
    'matching sections wider than the pitch',
    { array: '  matching: [{ width: 2.2 mm, length: 0.6 mm }]\n' },
    /array\.pitch\n {2}found "2\.15 mm"; columns of patches .* overlap at this pitch\.$/,
  ],
  [
    'too many dummies',
    { array: '  dummy_columns: 2\n' },
    /array\.dummy_columns\n {2}found "2"; so many at each side leave none of the 3 columns to be driven\.$/,
  ],
  [
    'a dummy that is not there',
    { array: '  dummy_columns: [4]\n' },
    /array\.dummy_columns\[0\]\n {2}found 4; the columns are 1 to 3\.$/,
  ],
  [
    'a dummy twice',
    { array: '  dummy_columns: [1, 1]\n', amplitude: '[0, 1, 1]' },
    /dummy_columns\[1\]\n {2}found column 1 a second time; a column is named once\.$/,
  ],
  [
    'a dummy that is driven',
    { array: '  dummy_columns: [3]\n' },
    /feed\.amplitude\[2\]\n {2}found "1"; column 3 is a dummy and never driven\. Write 0\.$/,
  ],
  ['column 0', { array: '  dummy_columns: [0]\n' }, /dummy_columns\[0\]\n {2}found 0; a number from 1 to 64\.$/],
  ['half a column', { array: '  dummy_columns: 0.5\n' }, /array\.dummy_columns\n {2}found 0\.5; a whole number\.$/],
  [
    'a group out of range',
    groups('{ id: tx, columns: [1, 4] }'),
    /array\.groups\[0\]\.columns\[1\]\n {2}found 4; the columns are 1 to 3\.$/,
  ],
  [
    'groups that overlap',
    groups('{ id: tx, columns: [1, 2] }, { id: rx, columns: [2, 3] }'),
    /groups\[1\]\.columns\[0\]\n {2}found column 2 a second time; a column belongs to one group; it is in tx\.$/,
  ],
  [
    'a group twice',
    groups('{ id: tx, columns: [1] }, { id: tx, columns: [3] }'),
    /groups\[1\]\.id\n {2}found "tx" a second time; a group is given once\.$/,
  ],
  [
    'a dummy in a group',
    { array: '  dummy_columns: [3]\n  groups: [{ id: tx, columns: [3] }]\n', amplitude: '[1, 1, 0]' },
    /groups\[0\]\.columns\[0\]\n {2}found the dummy column 3; a dummy column belongs to no group\.$/,
  ],
  [
    'a group with a name that is none',
    groups('{ id: TX, columns: [1] }'),
    /groups\[0\]\.id\n {2}found "TX"; an id holds .* Did you mean tx\?$/,
  ],
  [
    'a scan upside down',
    { array: '  scan: { low: 30 deg, high: -30 deg }\n' },
    /array\.scan\.high\n {2}found low "30 deg" and high "-30 deg"; high lies above low\.$/,
  ],
  [
    'a scan behind the board',
    { array: '  scan: { low: -30 deg, high: 130 deg }\n' },
    /a beam direction lies between -90 and 90 deg/,
  ],
  [
    'a scan of one column',
    { array: '  scan: { low: -30 deg, high: 30 deg }\n', amplitude: '[0, 1, 0]' },
    /array\.scan\n {2}found a scan of a single driven column; two driven columns or more steer a beam\.$/,
  ],
  [
    'neither patches nor what they are sized for',
    { undrawn: true },
    /array\.patches\n {2}found neither patches nor sized_for; exactly one/,
  ],
  [
    'dimensions beside what they are sized for',
    { ...sizedFor(), undrawn: false },
    /array\.sized_for\n {2}found patches and links and sized_for together; with sized_for the program works out the column\. .*where it is inherited write patches: ~, links: ~\.$/,
  ],
  [
    'an inset beside what a column is sized for',
    sizedFor({}, INSET),
    /found inset and sized_for together; .* write inset: ~\.$/,
  ],
  [
    'a frequency out of the band',
    sizedFor({ frequency: '77.5 GHz' }),
    /array\.sized_for\.frequency\n {2}found "77\.5 GHz"; a frequency in the band of the board\.$/,
  ],
  [
    'a feed line too narrow to make',
    sizedFor({ least_width: '160 um' }),
    /array\.feed_line\.width\n {2}found "0\.15 mm"; at least the narrowest copper of sized_for, 160.µm\.$/,
  ],
  [
    'a grid in millimetres',
    sizedFor({ grid: '1 mm' }),
    /sized_for\.grid\n {2}found "1 mm"; the grid lies between 0\.1 and 50 um\. Did you mean 1 um\?$/,
  ],
  ['a taper with a wrong word', taper('unifrom'), /sized_for\.taper\n {2}found "unifrom"; .*Did you mean uniform\?$/],
  [
    'a taper with two names',
    taper('{ dolph_chebyshev: 25 dB, given: [1, 1, 1, 1, 1, 1] }'),
    /found dolph_chebyshev and given together; exactly one of dolph_chebyshev, taylor, given/,
  ],
  ['a taper without a name', taper('{}'), /sized_for\.taper\n {2}found none of dolph_chebyshev, taylor, given/],
  [
    'sidelobes with a lost sign',
    taper('{ dolph_chebyshev: -25 dB }'),
    /a sidelobe level below the beam lies between 10 and 60 dB\. Did you mean 25 dB\?$/,
  ],
  [
    'too few amplitudes of a taper',
    taper('{ given: [1, 1, 1] }'),
    /taper\.given\n {2}found 3 amplitudes; one per patch, 6 here\.$/,
  ],
  ['an amplitude of nothing', taper('{ given: [1, 1, 0, 1, 1, 1] }'), /taper\.given\[2\]\n {2}found 0; /],
  [
    'too many sidelobes of a taper',
    taper('{ taylor: { sidelobe: 25 dB, n_bar: 7 } }'),
    /taylor\.n_bar\n {2}found 7; at most the number of patches, 6\.$/,
  ],
  [
    'a path beside a network',
    { feed: `  path: { line: { width: 0.15 mm, length: 9 mm } }\n${network(NETWORK)}` },
    /feed\.network\n {2}found path and network together; exactly one of path, network is needed/,
  ],
  ['neither path nor network', { feed: '' }, /feed\n {2}found none of path, network; exactly one/],
  [
    'a divider that is none',
    { feed: network(NETWORK.replace('tee', 'tea')) },
    /network\.divider\n {2}found "tea"; one of tee, wilkinson\. Did you mean tee\?$/,
  ],
  [
    'a network without lengths',
    { feed: network(NETWORK.replace(', level_length: 4 mm', '')) },
    /feed\.network\n {2}found no key "level_length"; it is needed/,
  ],
  [
    'a network with a trunk of nothing',
    { feed: network(NETWORK.replace('trunk_length: 3 mm', 'trunk_length: 0 mm')) },
    /network\.trunk_length\n {2}found "0 mm"; the length of the line from the input to the first divider lies between/,
  ],
  [
    'a network to one column',
    { feed: network(NETWORK), amplitude: '[0, 1, 0]' },
    /feed\.network\n {2}found a network to a single driven column; two driven columns or more\. Write path\.$/,
  ],
];

describe('messages on arrays and feeds', () => {
  it.each([
    [
      'a slot that etching closes',
      '0 um, spread: 110 um',
      /found copper that grows by up to 110.µm; the narrowest gap of a column is 100.µm wide\.$/,
    ],
    [
      'a line that etching takes away',
      '-60 um, spread: 90 um',
      /found copper that shrinks by up to 150.µm; the narrowest copper of a column is 150.µm wide\.$/,
    ],
  ])('%s', (_, etch, message) => {
    const text = boardText({ array: '  inset: { depth: 0.2 mm, gap: 0.1 mm }\n' }).replace('0 um, spread: 15 um', etch);
    const texts = problemsOf(load({ 'boards/qs-1.yaml': text })).map(formatProblem);
    expect(texts).toEqual([expect.stringMatching(message)]);
    expect(texts[0]).toMatch(/^boards\/qs-1\.yaml:\d+:\d+ {2}tolerances\.etch\n/);
  });

  it.each(CASES)('%s: one fault, one message, where it stands', (_name, change, message) => {
    const texts = problemsOf(load(withArray(change))).map(formatProblem);
    expect(texts).toEqual([expect.stringMatching(message)]);
    expect(texts[0]).toMatch(/^boards\/qs-1\.yaml:\d+:\d+ {2}[^\n]+\n {2}found [^\n]+; [^\n]+[.?]$/);
  });

  it('point at what a variant gives, not at what it inherits', () => {
    const variant = (keys: string, parent: ArrayText) =>
      problemsOf(
        load({ ...withArray(parent), 'boards/qs-2.yaml': `id: qs-2\ntitle: Variant\nbased_on: qs-1\n${keys}` }),
      ).map((p) => [p.file, p.line, p.path]);
    expect(variant(`array:\n  ${sizedFor().array!.trim()}\n`, { array: MATCHING })).toEqual([
      ['boards/qs-2.yaml', 5, 'array.sized_for'],
    ]);
    expect(variant('array: { inset: { depth: 0.2 mm, gap: 0.1 mm } }\n', { array: TRAVELLING })).toEqual([
      ['boards/qs-2.yaml', 4, 'array.inset'],
    ]);
  });
});
