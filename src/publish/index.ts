export { type Disk, filesUnder, realDisk } from './disk.js';
export type { Files } from './files.js';
export { hashOfSet, sha256 } from './hash.js';
export { type Output, openOutput, type Publication } from './output.js';
export { OutputError, onDisk } from './output-error.js';
export { packFilesUnder } from './pack-files.js';
export { type RevisionSummary, sortSummaries } from './revision.js';
export { recover, swapAll, unfinished } from './swap.js';
