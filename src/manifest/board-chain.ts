import { quoted } from '../quantity/index.js';
import { boardDocument } from './documents/board-document.js';
import type { Board } from './model.js';
import { nearest } from './nearest.js';
import type { OpenFile } from './open-files.js';
import type { Problem } from './problem.js';
import { child, type MapNode, markAt, type Node, nodeAt, problemAt } from './tree.js';
import { mergeBoards } from './variant.js';

/** A board file with its own id and the id of its parent, as far as they can be read. */
export interface BoardFile extends OpenFile {
  readonly id?: string;
  readonly basedOn?: string;
  /** True when its own keys have been checked without a problem. */
  readonly sound: boolean;
}

type Link = NonNullable<Board['lineage']>[number];

export interface ChainedBoard {
  readonly file: BoardFile;
  readonly root: MapNode;
  readonly basedOn: readonly string[];
  readonly overrides: readonly string[];
  readonly lineage: NonNullable<Board['lineage']>;
}

export function idOf(node: Node, key: string): string | undefined {
  const value = child(node, key);
  return value?.kind === 'scalar' && typeof value.value === 'string' ? value.value : undefined;
}

/** Follows `based_on` of every board; unknown parents and circles are problems. Boards on unsound ones are left out. */
export function chainBoards(
  boards: readonly BoardFile[],
  complete: boolean,
): { readonly chained: readonly ChainedBoard[]; readonly problems: readonly Problem[] } {
  const byId = new Map<string, BoardFile>();
  for (const board of boards) if (board.id !== undefined && !byId.has(board.id)) byId.set(board.id, board);
  const problems: Problem[] = [];
  const chained: ChainedBoard[] = [];
  for (const board of boards) {
    const chain = chainOf(board, byId, complete, problems);
    if (chain === undefined || board.root.kind !== 'map' || !chain.every((b) => b.sound)) continue;
    const oldest = chain.at(-1)!.root as MapNode;
    let overrides: string[] = [];
    let root = oldest;
    const lineage: Link[] = [{ board: chain.at(-1)!.id!, file: chain.at(-1)!.path, overrides: [] }];
    for (const younger of chain.slice(0, -1).reverse()) {
      overrides = [];
      root = mergeBoards(boardDocument, root, younger.root as MapNode, overrides);
      lineage.unshift({
        board: younger.id!,
        file: younger.path,
        overrides: overrides.map((path) => ({ path, text: shortText(nodeAt(younger.root, path.split('.'))) })),
      });
    }
    chained.push({ file: board, root, basedOn: chain.slice(1).map((b) => b.id!), overrides, lineage });
  }
  return { chained, problems };
}

/** What an override says, in a few words: a plain value or the value of a figure; a larger statement is only counted. */
function shortText(node: Node | undefined): string {
  if (node === undefined) return '';
  if (node.kind === 'scalar') return node.value === null ? 'dropped' : node.text;
  if (node.kind === 'list') {
    const plain = node.items.every((item) => item.kind === 'scalar');
    return plain ? node.items.map(shortText).join(', ') : `a list of ${node.items.length}`;
  }
  const value = child(node, 'value') ?? child(node, 'kind');
  return value === undefined ? 'stated anew' : shortText(value);
}

/** The board, its parent, … to the one that stands alone. */
function chainOf(
  board: BoardFile,
  byId: ReadonlyMap<string, BoardFile>,
  complete: boolean,
  problems: Problem[],
): readonly BoardFile[] | undefined {
  const chain = [board];
  const report = (found: string, allowed: string, fix?: string) => {
    problems.push(problemAt(markAt(board.root, ['based_on']), 'based_on', found, allowed, fix));
  };
  for (;;) {
    const parentId = chain.at(-1)!.basedOn;
    if (parentId === undefined) return chain;
    const parent = byId.get(parentId);
    if (parent === undefined) {
      // The unknown parent of a parent is reported there.
      if (chain.length === 1 && complete) {
        const others = [...byId.keys()].filter((id) => id !== board.id);
        const close = nearest(parentId, others);
        report(
          `the unknown board ${quoted(parentId)}`,
          `a board is based on another of the pack: ${others.slice(0, 12).join(', ') || 'there is none'}`,
          close && `Did you mean ${close}?`,
        );
      }
      return undefined;
    }
    if (parent === board) {
      report(
        `the circle ${[...chain, board].map((b) => b.id).join(' → ')}`,
        'a chain of boards ends at one that stands alone',
      );
      return undefined;
    }
    // A circle that this board only leads into is reported at its members.
    if (chain.includes(parent)) return undefined;
    chain.push(parent);
  }
}
