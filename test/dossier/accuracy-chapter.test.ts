import { describe, expect, it } from 'vitest';
import { accuracyChapter } from '../../src/dossier/accuracy-chapter.js';
import { accuracy, inlinesOf, plain } from './pack-fixture.js';

const { blocks } = accuracyChapter(accuracy);
const table = blocks.find((b) => b.kind === 'table');
const rows = table?.kind === 'table' ? table.rows.map((row) => row.map((c) => c.content.map(plain).join(''))) : [];

describe('accuracy of the solvers', () => {
  it('prints target and what is reached, in their unit', () => {
    expect(rows[0].slice(2)).toEqual(['w/h 0.5 to 10; 10 cases', '0.50 %', '0.21 %', 'within target']);
  });

  it('prints no rounding noise', () => {
    expect(rows[1].slice(3, 5)).toEqual(['1.0 × 10⁻⁶', 'below 1.0 × 10⁻⁸']);
  });

  it('says in words where a target is missed, and why', () => {
    expect(rows[2].slice(3)).toEqual(['0.0050', '0.011', 'target missed. The fourth order is missing.']);
    expect(inlinesOf(blocks[0]).map(plain).join('')).toContain('2 of 3 figures within the target');
  });

  it('says so where nothing was compared', () => {
    expect(accuracyChapter([]).blocks.map((b) => inlinesOf(b).map(plain).join(''))).toEqual([
      'The solvers were not compared for this build.',
    ]);
  });
});
