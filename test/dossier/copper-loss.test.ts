import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { lossByFace, roundedParts } from '../../src/dossier/copper-loss.js';
import { board } from './board-fixture.js';
import { plain } from './pack-fixture.js';
import { studyOf } from './study-fixture.js';

describe('rounded parts', () => {
  it('add up to the rounded sum and none is off by a whole digit', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: -50, max: 200, noNaN: true }), { minLength: 1, maxLength: 14 }),
        (parts) => {
          const total = parts.reduce((a, b) => a + b, 0);
          const rounded = roundedParts(parts, total);
          expect(rounded.reduce((a, b) => a + b, 0)).toBe(Math.round(total) + 0);
          rounded.forEach((value, i) => {
            expect(Math.abs(value - parts[i])).toBeLessThanOrEqual(1);
          });
        },
      ),
    );
  });
});

describe('loss by face', () => {
  const [block] = lossByFace(studyOf(board('qb-1')).lineLossByFace);
  const rows = block.kind === 'table' ? block.rows.map((row) => row.map((c) => c.content.map(plain).join(''))) : [];

  it('sums to the last digit under every estimate', () => {
    const parts = rows.slice(0, -1);
    const together = rows[rows.length - 1];
    expect(together[0]).toBe('Together');
    for (const column of [1, 2, 3]) {
      const sum = parts.reduce((total, row) => total + Math.round(1000 * Number(row[column].replace('−', '-'))), 0);
      expect(sum).toBe(Math.round(1000 * Number(together[column])));
    }
  });

  it('names what finish and texture add, and leaves out what is zero everywhere', () => {
    const names = rows.map(([name]) => name);
    expect(names).toContain('Strip top, finish');
    expect(names).toContain('Ground, texture');
    expect(names).not.toContain('Strip underside, finish');
    expect(names).not.toContain('Strip edges, texture');
  });
});
