import { join } from 'node:path';
import { type PreviousData, readRevisionData } from '../dossier/index.js';
import type { PackFiles, Problem } from '../manifest/index.js';
import type { Pack } from '../manifest/model.js';
import { type Output, OutputError } from '../publish/index.js';

export type PreviousFound = { readonly previous?: PreviousData } | { readonly problem: Problem };

/**
 * Data of the revision that a pack names as its previous one: from the output folder, or from a file under the root.
 *
 * @throws OutputError when the output folder does not hold that revision
 */
export function findPrevious(pack: Pack, files: PackFiles, output: Output): PreviousFound {
  const { previous } = pack;
  if (previous === undefined) return {};
  if ('revision' in previous) {
    const place = join(pack.id, previous.revision, packData);
    const bytes = output.readFile(pack.id, previous.revision, packData);
    const found = bytes === undefined ? 'which is not there' : fitting(pack, bytes);
    if (typeof found !== 'string') return { previous: found };
    throw new OutputError(
      `the pack names revision ${previous.revision} as its previous one, whose data are ${place} in the output ` +
        `folder: ${found}. Build that revision first, or name its data with previous: { data: <file> }`,
    );
  }
  const bytes = files.read(previous.file);
  const found = bytes instanceof Uint8Array ? fitting(pack, bytes) : 'a file that cannot be read';
  if (typeof found !== 'string') return { previous: found };
  const allowed = 'the data/pack.json of an earlier revision of this pack';
  return { problem: { file: previous.file, line: 1, column: 1, path: '', found, allowed } };
}

const packData = 'data/pack.json';

function fitting(pack: Pack, bytes: Uint8Array): PreviousData | string {
  const found = readRevisionData(bytes);
  if (typeof found === 'string') return found;
  const { id, revision } = found.data.pack;
  if (id !== pack.id) return `data of the pack ${id}`;
  return revision === pack.revision ? `data of revision ${revision}, which is this one` : found;
}
