import type { Board } from '../manifest/model.js';
import { cell, table } from './blocks.js';
import type { Block, Inline } from './document.js';

type Lineage = NonNullable<Board['lineage']>;

/** The younger board that states a path anew, or something that holds it or lies in it. */
function replacedBy(lineage: Lineage, depth: number, path: string): string | undefined {
  const touches = (other: string) => other === path || other.startsWith(`${path}.`) || path.startsWith(`${other}.`);
  return lineage
    .slice(0, depth)
    .reverse()
    .find(({ overrides }) => overrides.some((other) => touches(other.path)))?.board;
}

/** Chain of `based_on`, oldest first: what each board overrides of the one before it, and what of that still holds. */
export function lineageBlocks({ lineage = [] }: Board): readonly Block[] {
  if (lineage.length < 2) return [];
  const rows = lineage.map(({ board, file, overrides }, depth) => {
    const items = overrides.flatMap(({ path, text }, i): Inline[] => {
      const later = replacedBy(lineage, depth, path);
      return [
        ...(i === 0 ? [] : ['; ']),
        { code: path },
        ` ${text}${later === undefined ? '' : ` (replaced by ${later})`}`,
      ];
    });
    const stands = depth === lineage.length - 1;
    return [
      cell(board),
      cell({ code: file }),
      cell(...(stands ? ['stands alone'] : items.length > 0 ? items : ['nothing'])),
    ];
  });
  return [
    table(
      'lineage',
      'Boards that this one is based on, the oldest first, with what each overrides of the one before',
      ['Board|0.8', 'Written in', 'Overrides|3'],
      rows.reverse(),
    ),
  ];
}
