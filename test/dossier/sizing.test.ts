import { load } from 'js-yaml';
import { describe, expect, it } from 'vitest';
import { manifestFields, sizedNotice, sizingBlocks } from '../../src/dossier/sizing.js';
import { parseQuantity } from '../../src/quantity/index.js';
import { board } from './board-fixture.js';

const sizedFor = {
  frequency: 76.5e9,
  patches: 6,
  taper: { kind: 'dolph-chebyshev', sidelobeDb: 20 },
  leastWidth: 1e-4,
  leastGap: 1e-4,
  grid: 1e-6,
} as const;
const sized = {
  by: 'full wave',
  networkDb: -18.13,
  fullWaveDb: -16.2,
  notes: ['Link 2 is as narrow as it may be.'],
} as const;

describe('sized columns', () => {
  it('can be written back into a manifest to the last digit', () => {
    const [column] = board('qb-1').columns;
    const matching = [{ width: 0.3017e-3, length: 0.6e-3 }];
    const inset = { depth: 0.31e-3, gap: 0.12e-3 };
    const written = manifestFields({ ...column, matching, inset })
      .map(({ field, text }) => `${field}: ${text}`)
      .join('\n');
    const metres = (value: unknown): unknown => {
      if (typeof value === 'string') {
        const read = parseQuantity(value, 'length');
        return 'value' in read ? Number(read.value.toPrecision(9)) : read;
      }
      if (Array.isArray(value)) return value.map(metres);
      return Object.fromEntries(Object.entries(value as object).map(([name, entry]) => [name, metres(entry)]));
    };
    expect(metres(load(written))).toEqual({
      feed_line: column.feedLine,
      matching,
      inset,
      patches: column.patches,
      links: column.links,
    });
  });

  it('are said on page one and explained in the board chapter, with the notes of the sizing', () => {
    const subject = board('qb-1', { sizedFor, sized });
    expect(sizedNotice(subject)).toHaveLength(1);
    const text = JSON.stringify(sizingBlocks(subject)).replaceAll('\u00a0', ' ');
    for (const words of [
      'Dolph–Chebyshev, sidelobes at −20 dB',
      '−18.13 dB',
      '−16.20 dB',
      'corrected by the full wave',
      sized.notes[0],
    ])
      expect(text).toContain(words);
  });

  it('say why where there is no sizing, and nothing for a drawn layout', () => {
    const failed = board('qb-1', { sizedFor, sized: { reason: 'no layout on the grid holds the taper' } });
    expect(sizedNotice(failed)).toEqual([]);
    expect(JSON.stringify(sizingBlocks(failed))).toContain('no layout on the grid holds the taper');
    expect(sizingBlocks(board('qb-1'))).toEqual([]);
  });
});
