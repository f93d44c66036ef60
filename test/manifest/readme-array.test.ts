import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { fixtureText, load, packOf } from './fixture.js';

const readme = readFileSync(new URL('../../README.md', import.meta.url), 'utf8');

describe('the array that the README shows', () => {
  it('is accepted on a board, and all of it reaches the model', () => {
    const shown = /```yaml\n(array:\n[^`]*feed:\n[^`]*)```/.exec(readme)![1]!;
    const text = fixtureText('boards/qs-1.yaml').replace(/array:\n[\s\S]*(?=tolerances:)/, () => shown);
    const launch = '# GHz S RI R 50\n76 0 0 0.9 0 0.9 0 0 0\n77 0 0 0.9 0 0.9 0 0 0\n';
    const [board] = packOf(load({ 'boards/qs-1.yaml': text, 'boards/launch.s2p': launch })).boards;
    expect(board).toMatchObject({
      sizedFor: { patches: 8, taper: { kind: 'dolph-chebyshev', sidelobeDb: 25 } },
      groups: [{ id: 'tx' }, { id: 'rx' }],
      feedNetwork: { divider: 'wilkinson', transition: { file: 'boards/launch.s2p' } },
    });
    expect(board!.columns.map(({ direction, dummy }) => [direction ?? 1, dummy ?? false])).toEqual([
      [1, true],
      [-1, false],
      [1, false],
      [-1, false],
      [1, false],
      [-1, true],
    ]);
    expect(board!.scan).toBeDefined();
  });
});
