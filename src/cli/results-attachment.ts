import { type Files, sha256 } from '../publish/index.js';
import type { Attachment } from '../render/pdf/index.js';

/** The results that a document speaks of, as a file attached to it. */
export function resultsAttachment(path: string, files: Files): Attachment {
  const content = files.get(path);
  if (content === undefined) throw new RangeError(`no results at ${path}`);
  return {
    name: path.slice(path.lastIndexOf('/') + 1),
    type: 'application/json',
    description: `results as data, SHA-256 ${sha256(content)}`,
    data: Buffer.from(content),
  };
}
