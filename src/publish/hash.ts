import { createHash } from 'node:crypto';

/** SHA-256 as 64 lower-case hexadecimal digits. */
export function sha256(content: Uint8Array | string): string {
  return createHash('sha256').update(content).digest('hex');
}

/**
 * One hash for a set of named contents, whatever the order they come in: the SHA-256 of the lines
 * `<sha256>  <name>`, sorted by name, that `sha256sum` would print for the same files.
 */
export function hashOfSet(entries: Iterable<readonly [name: string, sha256: string]>): string {
  const lines = [...entries]
    .sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0))
    .map(([name, hash]) => `${hash}  ${name}\n`);
  return sha256(lines.join(''));
}
