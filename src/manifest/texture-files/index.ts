import { readTextureCsv } from './csv.js';
import type { TextureFileResult } from './texture-file.js';
import { readX3p } from './x3p.js';

export { readTextureCsv } from './csv.js';
export {
  LARGEST_TEXTURE_FILE,
  type MeasuredHeights,
  MOST_POINTS,
  type TextureFile,
  type TextureFileResult,
} from './texture-file.js';
export { readX3p } from './x3p.js';

/** Reads measured heights by what the bytes are: a zip archive as X3P, anything else as separated values. */
export function readTextureFile(path: string, bytes: Uint8Array): TextureFileResult {
  const zip = bytes[0] === 0x50 && bytes[1] === 0x4b;
  return zip ? readX3p(path, bytes) : readTextureCsv(path, bytes);
}
