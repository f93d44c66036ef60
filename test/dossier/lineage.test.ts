import { describe, expect, it } from 'vitest';
import { lineageBlocks } from '../../src/dossier/lineage.js';
import { retunedNotice, retuningBlocks } from '../../src/dossier/retuning.js';
import { board } from './board-fixture.js';
import { inlinesOf, plain } from './pack-fixture.js';

const wordsOf = (blocks: ReturnType<typeof lineageBlocks>): string => blocks.flatMap(inlinesOf).map(plain).join('|');

describe('chain of boards', () => {
  it('runs from the oldest to the board itself and says which overrides no longer hold', () => {
    const blocks = lineageBlocks(
      board('c', {
        lineage: [
          { board: 'c', file: 'v.csv', overrides: [{ path: 'stack_up.strip.foil', text: 'kf-1' }] },
          {
            board: 'b',
            file: 'b.yaml',
            overrides: [
              { path: 'stack_up.strip.foil', text: 'kf-2' },
              { path: 'cost', text: 'stated anew' },
              { path: 'stack_up.strip', text: 'stated anew' },
            ],
          },
          { board: 'a', file: 'a.yaml', overrides: [] },
        ],
      }),
    );
    const [table] = blocks;
    if (table?.kind !== 'table') throw new Error('no table');
    expect(table.rows.map((row) => row[0]!.content[0])).toEqual(['a', 'b', 'c']);
    expect(wordsOf(blocks)).toContain('stands alone');
    expect(wordsOf(blocks)).toContain('stack_up.strip.foil| kf-2 (replaced by c)');
    // A statement of which a part is replaced later no longer holds as a whole.
    expect(wordsOf(blocks)).toContain('stack_up.strip| stated anew (replaced by c)');
    expect(wordsOf(blocks)).toMatch(/cost\| stated anew(?! \()/);
  });

  it('is not shown for a board that stands alone', () => {
    expect(lineageBlocks(board('a', { lineage: [{ board: 'a', file: 'a.yaml', overrides: [] }] }))).toEqual([]);
    expect(lineageBlocks(board('a'))).toEqual([]);
  });
});

describe('retuning in a dossier', () => {
  const drawn = board('a').columns;
  const columns = drawn.map((c) => ({ ...c, patches: c.patches.map((p) => ({ ...p, length: 1.05e-3 })) }));

  it('prints the factor, the reflection before and after, and every length before and after', () => {
    const retuned = { factor: 0.98, drawnDb: -4.2, retunedDb: -18.25, drawn };
    const words = wordsOf(retuningBlocks(board('a', { columns, retune: 'length', retuned })));
    expect(words).toContain('0.9800');
    expect(words).toMatch(/−4\.2\d? dB/);
    expect(words).toMatch(/−18\.[23]\d? dB/);
    expect(words).toContain('Patch|1.07|1.05');
    expect(words).toContain('Link|1.22|1.22');
    expect(words).toContain('0.85 and 1.176');
    const notice = retunedNotice(board('a', { columns, retune: 'length', retuned }));
    expect(wordsOf(notice)).toContain('multiplied by 0.9800');
    expect(retunedNotice(board('a'))).toEqual([]);
  });

  it('prints why a layout was not retuned, and nothing for one that was not to be', () => {
    const reason = 'the layout could not be retuned: no minimum';
    expect(wordsOf(retuningBlocks(board('a', { retune: 'length', retuned: { reason } })))).toContain(reason);
    expect(retuningBlocks(board('a'))).toEqual([]);
  });
});
