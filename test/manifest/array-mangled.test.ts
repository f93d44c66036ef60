import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { boardText } from './array-fixture.js';
import { type Contents, load } from './fixture.js';

const LAUNCH = '# GHz S RI R 50\n76 0 0 0.9 0 0.9 0 0 0\n77 0 0 0.9 0 0.9 0 0 0\n';
const NETWORK = `  network:
    { divider: tee, line_width: 0.15 mm, trunk_length: 3 mm, level_length: 4 mm, transition: { file: launch.s2p } }
`;
const DRAWN = boardText({
  columns: 4,
  amplitude: '[0, 1, 1, 0]',
  array: `  direction: alternate
  stagger: 0.2 mm
  dummy_columns: 1
  matching: [{ width: 0.3 mm, length: 0.6 mm }]
  inset: { depth: 0.2 mm, gap: 0.1 mm }
  groups: [{ id: tx, columns: [2] }, { id: rx, columns: [3] }]
  scan: { low: -30 deg, high: 30 deg }
`,
  feed: NETWORK,
});
const SIDE_FED = boardText({ columns: 2, array: '  side_feed: { link: 2, side: outward }\n' });
const SIZED = boardText({
  undrawn: true,
  array: `  dummy_columns: [3]
  sized_for:
    { frequency: 76.5 GHz, patches: 6, taper: { taylor: { sidelobe: 25 dB, n_bar: 4 } }, least_width: 75 um, least_gap: 75 um, grid: 1 um }
`,
  amplitude: '[1, 1, 0]',
});
const SCRAP = [
  '',
  '~',
  '[]',
  '{}',
  '0',
  '1',
  '-1',
  '64',
  '1e9',
  '.inf',
  'true',
  '"x"',
  '\n',
  ': ',
  '- ',
  '#',
  'mm',
  ' !',
];

/** Some characters of the array and the feed, or of the file of the transition, replaced by scrap. */
const cuts = fc.record({
  board: fc.constantFrom(DRAWN, SIDE_FED, SIZED),
  ofFile: fc.boolean(),
  at: fc.double({ min: 0, max: 1, noNaN: true }),
  length: fc.integer({ min: 0, max: 25 }),
  scrap: fc.constantFrom(...SCRAP),
});

const BOARD = 'boards/qs-1.yaml';
const LAUNCH_FILE = 'boards/launch.s2p';

describe('a mangled array, feed or transition', () => {
  it('starts from boards that are accepted', () => {
    for (const board of [DRAWN, SIDE_FED, SIZED])
      expect(load({ [BOARD]: board, [LAUNCH_FILE]: LAUNCH })).toHaveProperty('pack');
  });

  it('gives a pack or problems with their places, never an exception', () => {
    fc.assert(
      fc.property(cuts, ({ board, ofFile, at, length, scrap }) => {
        const mangled = (text: string, from: number, to: number) => {
          const start = from + Math.floor(at * (to - from));
          return text.slice(0, start) + scrap + text.slice(start + length);
        };
        const contents: Contents = ofFile
          ? { [BOARD]: DRAWN, [LAUNCH_FILE]: mangled(LAUNCH, 0, LAUNCH.length) }
          : { [BOARD]: mangled(board, board.indexOf('array:'), board.indexOf('tolerances:')), [LAUNCH_FILE]: LAUNCH };
        const result = load(contents);
        if ('problems' in result) {
          expect(result.problems.length).toBeGreaterThan(0);
          for (const { file, line, column, found, allowed } of result.problems) {
            expect(file === '' || found === '' || allowed === '').toBe(false);
            expect(Math.min(line, column)).toBeGreaterThanOrEqual(1);
          }
          return;
        }
        for (const { columns } of result.pack.boards)
          for (const { x, y, patches, links } of columns)
            for (const value of [x, y, ...[...patches, ...links].flatMap((p) => [p.width, p.length])])
              expect(Number.isFinite(value)).toBe(true);
      }),
      { seed: 77, numRuns: 250 },
    );
  }, 30_000);
});
