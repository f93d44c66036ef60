import { LARGEST_FILE } from './files.js';
import type { Problem } from './problem.js';
import { makeSource, problemAt, type Source } from './tree.js';

/**
 * Bytes of a manifest as text: not too large, UTF-8, without a NUL byte. A byte order mark is dropped.
 *
 * @param kind  what the file ought to be, for the message: `YAML`
 */
export function readText(
  path: string,
  bytes: Uint8Array,
  kind: string,
): { readonly source: Source } | { readonly problems: readonly Problem[] } {
  const top = (found: string, allowed: string) => ({
    problems: [problemAt({ source: makeSource(path, ''), offset: 0 }, '', found, allowed)],
  });
  if (bytes.length > LARGEST_FILE) return top(`${bytes.length} bytes`, `a manifest has at most ${LARGEST_FILE} bytes`);
  const wanted = `a manifest is a ${kind} text file in UTF-8`;
  let text: string;
  try {
    text = new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    return top('bytes that are not UTF-8 text', wanted);
  }
  const source = makeSource(path, text);
  const nul = text.indexOf('\0');
  return nul < 0 ? { source } : { problems: [problemAt({ source, offset: nul }, '', 'a NUL byte', wanted)] };
}
