import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { formatProblem } from '../../src/manifest/index.js';
import { type ArrayText, boardOf, boardsOf, withArray } from './array-fixture.js';
import { type Contents, load, packOf, problemsOf } from './fixture.js';

const network = (more = ''): ArrayText => ({
  feed: `  network: { divider: wilkinson, line_width: 0.15 mm, trunk_length: 3 mm, level_length: 4.5 mm${more} }\n`,
});
const WITH_FILE = network(', transition: { file: ../transitions/waveguide.s2p }');
const PATH = 'transitions/waveguide.s2p';

/** A passive two-port that is not reciprocal in phase, so that a swap of its ports shows. */
const points = (frequencies: readonly number[]) =>
  frequencies.map((f) => `${f} 0.1 0.01 0.9 ${f / 1000} 0.8 -0.1 0.2 0.02`).join('\n');
const TOUCHSTONE = `! measured\n# GHz S RI R 50\n${points([75, 76, 76.5, 77, 78])}\n`;
const problemIn = (file: string, text = WITH_FILE) =>
  problemsOf(load({ ...withArray(text), [PATH]: file })).map(formatProblem);

describe('a feed network', () => {
  it('stands in place of the paths, the weights beside it', () => {
    const { feedNetwork, feed } = boardOf({ ...network(), amplitude: '[0.5, 1, 0.5]' });
    expect(feedNetwork).toEqual({ divider: 'wilkinson', lineWidth: 0.15e-3, trunkLength: 3e-3, levelLength: 4.5e-3 });
    expect(feed).toEqual([0.5, 1, 0.5].map((amplitude) => ({ amplitude, phase: 0 })));
  });

  it('reads its transition with the path as the root sees it, and hashes the file', () => {
    const contents: Contents = { ...withArray(WITH_FILE), [PATH]: TOUCHSTONE };
    const pack = packOf(load(contents));
    const { transition } = pack.boards[0]!.feedNetwork!;
    expect(transition).toMatchObject({ file: PATH, referenceImpedance: 50 });
    expect(transition!.points.map((p) => p.frequency)).toEqual([75e9, 76e9, 76.5e9, 77e9, 78e9]);
    expect(transition!.points[1]!.s).toEqual([
      [0.1, 0.01],
      [0.9, 0.076],
      [0.8, -0.1],
      [0.2, 0.02],
    ]);
    const sha256 = createHash('sha256').update(TOUCHSTONE).digest('hex');
    expect(pack.inputs).toContainEqual({ path: PATH, sha256 });
    // A board based on it inherits the reference as relative to the file where it stands.
    expect(pack.boards[1]!.feedNetwork).toEqual(pack.boards[0]!.feedNetwork);
  });

  it('keeps of a long file what the band needs, with room for interpolation at either end', () => {
    const many = Array.from({ length: 401 }, (_, i) => 60 + i * 0.1);
    const { transition } = boardOf(WITH_FILE, { [PATH]: `# GHz S RI R 50\n${points(many)}\n` }).feedNetwork!;
    const kept = transition!.points.map((p) => p.frequency / 1e9);
    // The band is 76.1 to 76.9 GHz.
    expect(kept.filter((f) => f < 76.09)).toHaveLength(4);
    expect(kept.filter((f) => f > 76.91)).toHaveLength(4);
    expect(kept.length).toBeLessThan(20);
  });

  it('takes data that end where the band ends, as decimals can say it', () => {
    for (const unit of ['GHz', 'MHz', 'kHz'] as const) {
      const scale = { GHz: 1, MHz: 1e3, kHz: 1e6 }[unit];
      const edges = `# ${unit} S RI R 50\n${76.1 * scale} 0 0 0.9 0 0.9 0 0 0\n${76.9 * scale} 0 0 0.9 0 0.9 0 0 0\n`;
      expect(boardOf(WITH_FILE, { [PATH]: edges }).feedNetwork!.transition!.points).toHaveLength(2);
    }
  });

  it('merges in a variant and gives way to a path', () => {
    const MODELINE = 'id: qs-2\ntitle: Variant\nbased_on: qs-1\n';
    const variant = (keys: string) => boardsOf(network(), { 'boards/qs-2.yaml': MODELINE + keys })[1]!;
    const longer = variant('feed: { network: { level_length: 6 mm } }\n');
    expect(longer.feedNetwork).toMatchObject({ divider: 'wilkinson', levelLength: 6e-3 });
    expect(longer.overrides).toEqual(['feed.network.level_length']);
    const other = variant('feed: { path: { line: { width: 0.15 mm, length: 9 mm } } }\n');
    expect(other.feedNetwork).toBeUndefined();
    expect(other.overrides).toEqual(['feed.path']);
    expect(other.feed[0]!.line).toEqual({ width: 0.15e-3, length: 9e-3 });
    const fed = boardsOf({}, { 'boards/qs-2.yaml': `${MODELINE}feed:\n${network().feed}` })[1]!;
    expect(fed.feedNetwork).toEqual({
      divider: 'wilkinson',
      lineWidth: 0.15e-3,
      trunkLength: 3e-3,
      levelLength: 4.5e-3,
    });
    expect(fed.feed[0]!.lossDb).toBeUndefined();
  });

  it('says in which line of the file something cannot be read', () => {
    expect(problemIn(TOUCHSTONE.replace('76 0.1', '76 zero'))).toEqual([
      expect.stringMatching(/^transitions\/waveguide\.s2p:4:1\n {2}found "zero" where a number belongs; /),
    ]);
    expect(problemIn(TOUCHSTONE.replace(' R 50', ' R 50 Q'))).toEqual([
      expect.stringMatching(/^transitions\/waveguide\.s2p:2:1\n {2}found option "q"; allowed are Hz, kHz, .*\.$/),
    ]);
    expect(problemIn('')).toHaveLength(1);
  });

  it.each<[string, string, RegExp]>([
    [
      'data that do not cover the band',
      `# GHz S RI R 50\n${points([76.2, 77])}\n`,
      /waveguide\.s2p", data from 76\.20.GHz to 77\.00.GHz; the data cover the band of the board, 76\.10.GHz to 76\.90.GHz\.$/,
    ],
    [
      'a transition that amplifies',
      TOUCHSTONE.replace('76 0.1 0.01 0.9', '76 0.1 0.01 1.3'),
      /a gain of power of 1\.\d+ at 76\.00.GHz; a transition is passive\. Is the format in its option line, RI, MA or DB, right\?$/,
    ],
    [
      'a file too large',
      `${TOUCHSTONE}!${' '.repeat(1024 * 1024)}\n`,
      /waveguide\.s2p", 1\d{6} bytes; a Touchstone file here has at most 1048576 bytes\.$/,
    ],
  ])('refuses %s', (_, file, message) => {
    const [problem, ...others] = problemIn(file);
    expect(problem).toMatch(message);
    expect(problem).toMatch(/^boards\/qs-1\.yaml:\d+:\d+ {2}feed\.network\.transition\.file\n/);
    expect(others).toEqual([]);
  });

  it('takes a lossless transition, whose power balance measurement may exceed a little', () => {
    const lossless = '# GHz S MA R 50\n75 0.6 0 0.8 90 0.8 90 0.6 0\n78 0.61 0 0.81 90 0.81 90 0.61 0\n';
    expect(boardOf(WITH_FILE, { [PATH]: lossless }).feedNetwork!.transition!.points).toHaveLength(2);
  });

  it.each<[string, string, RegExp]>([
    ['no file', 'missing.s2p', /found "missing\.s2p"; a file that exists; there is no boards\/missing\.s2p under/],
    ['a way out of the root', '../../x.s2p', /found "\.\.\/\.\.\/x\.s2p"; a reference stays under the root folder/],
    ['an absolute path', '/etc/x.s2p', /no absolute paths/],
    [
      'another number of ports',
      'x.s3p',
      /found "x\.s3p", another kind of file; a Touchstone file of a two-port, \.s2p\.$/,
    ],
  ])('reads a file under the root only: %s', (_, file, message) => {
    const texts = problemsOf(load(withArray(network(`, transition: { file: ${file} }`)))).map(formatProblem);
    expect(texts).toEqual([expect.stringMatching(message)]);
  });
});
