import { type BoardFile, idOf } from './board-chain.js';
import { checkDocument } from './check.js';
import { boardDocument } from './documents/board-document.js';
import { variantDocument } from './documents/variant-document.js';
import type { OpenFile, Reader } from './open-files.js';
import { boardNameRules } from './pack-rules.js';
import type { Problem } from './problem.js';
import { child, type Node, nodeAt, problemAt } from './tree.js';
import { inTable, readVariantTable } from './variant-table.js';

/** Board files and tables of variants that a pack lists, each checked by itself. */
export function openBoards(
  reader: Reader,
  packFile: OpenFile,
): { readonly files: readonly BoardFile[]; readonly complete: boolean } {
  const listed = reader.openReferences(packFile, ['boards']);
  const tables = reader.openReferences(packFile, ['variants'], readVariantTable);
  const rows = tables.files.flatMap(({ path, root }) =>
    root.kind === 'list' ? root.items.map((item): OpenFile => ({ path, root: item })) : [],
  );
  const complete = listed.complete && (tables.complete || nodeAt(packFile.root, ['variants']) === undefined);
  const ids = new Map<string, string>();
  const boards = [...listed.files, ...rows].map((file): BoardFile => {
    const isRow = rows.includes(file);
    const isVariant = isRow || (file.root.kind === 'map' && file.root.entries.has('based_on'));
    const found = checkDocument(isVariant ? variantDocument : boardDocument, file.root).map((p) =>
      isRow ? inTable(p) : p,
    );
    reader.problems.push(...found, ...boardNameRules(file.root));
    uniqueId(file.root, 'id', file.path, ids, 'the boards of a pack have one id each', reader.problems);
    const id = idOf(file.root, 'id');
    const basedOn = idOf(file.root, 'based_on');
    return { ...file, sound: found.length === 0, ...(id ? { id } : {}), ...(basedOn ? { basedOn } : {}) };
  });
  return { files: boards, complete };
}

/** Reports an id that another item of its kind already has, and remembers it. */
export function uniqueId(
  node: Node,
  path: string,
  file: string,
  ids: Map<string, string>,
  allowed: string,
  problems: Problem[],
): void {
  const id = idOf(node, 'id');
  if (id === undefined) return;
  const first = ids.get(id);
  if (first === undefined) ids.set(id, file);
  else
    problems.push(
      problemAt(
        (child(node, 'id') ?? node).mark,
        path,
        `"${id}" a second time`,
        `${allowed}; the first is in ${first}`,
      ),
    );
}
