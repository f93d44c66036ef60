import { createHash } from 'node:crypto';
import { quoted } from '../quantity/index.js';
import type { PackFiles } from './files.js';
import type { InputFile } from './model.js';
import { resolveReference } from './paths.js';
import { dotted, type Path, type Problem } from './problem.js';
import { type ReadResult, readYaml } from './read-yaml.js';
import { makeSource, type Node, nodeAt, problemAt } from './tree.js';

/** A manifest that could be read as YAML. */
export interface OpenFile {
  readonly path: string;
  readonly root: Node;
}

/** Reads files once each, remembers their hashes and every problem met. */
export class Reader {
  readonly problems: Problem[] = [];
  private readonly hashes = new Map<string, string>();

  constructor(private readonly files: PackFiles) {}

  /** The pack file itself, named on the command line rather than by a manifest. */
  openPack(packPath: string): OpenFile | undefined {
    const resolved = resolveReference('', packPath);
    const start = { source: makeSource(packPath, ''), offset: 0 };
    if ('refused' in resolved) {
      this.problems.push(problemAt(start, '', quoted(packPath), resolved.refused, resolved.fix));
      return undefined;
    }
    const problem = (found: string, allowed: string) => {
      this.problems.push(problemAt({ source: makeSource(resolved.path, ''), offset: 0 }, '', found, allowed));
    };
    return this.open(resolved.path, problem);
  }

  /** Files named by a list (or one value) of a manifest, in order; those that fail are reported at the name. */
  openReferences(
    from: OpenFile,
    path: Path,
    read: (path: string, bytes: Uint8Array) => ReadResult = readYaml,
  ): { readonly files: readonly OpenFile[]; readonly complete: boolean } {
    const node = nodeAt(from.root, path);
    const items = node?.kind === 'list' ? node.items : node ? [node] : [];
    const files: OpenFile[] = [];
    let complete = node !== undefined;
    const seen = new Set<string>();
    for (const [i, item] of items.entries()) {
      const where = dotted(node?.kind === 'list' ? [...path, i] : path);
      let faulty = false;
      const problem = (found: string, allowed: string, fix?: string) => {
        this.problems.push(problemAt(item.mark, where, found, allowed, fix));
        faulty = true;
      };
      // Other kinds of value are reported by the check of the document.
      const name = item.kind === 'scalar' && typeof item.value === 'string' ? item.value : '';
      const resolved = resolveReference(from.path, name);
      let file: OpenFile | undefined;
      if (name === '') faulty = true;
      else if ('refused' in resolved) problem(quoted(name), resolved.refused, resolved.fix);
      else if (seen.has(resolved.path)) problem(`${quoted(name)} a second time`, 'a file is listed once');
      else {
        seen.add(resolved.path);
        file = this.open(resolved.path, problem, name, read);
      }
      if (file) files.push(file);
      if (faulty || !file) complete = false;
    }
    return { files, complete };
  }

  /** A file named by one value of a manifest that is no manifest itself: only read and hashed. Its path, or undefined. */
  openData(from: OpenFile, path: Path): string | undefined {
    return this.openBytes(from, path)?.path;
  }

  /** The same with its content. */
  openBytes(
    from: OpenFile,
    path: Path,
  ): { readonly path: string; readonly bytes: Uint8Array; readonly sha256: string } | undefined {
    const node = nodeAt(from.root, path);
    // Other kinds of value are reported by the check of the document.
    if (node?.kind !== 'scalar' || typeof node.value !== 'string') return undefined;
    const name = node.value;
    const problem = (found: string, allowed: string, fix?: string) => {
      this.problems.push(problemAt(node.mark, dotted(path), found, allowed, fix));
    };
    const resolved = resolveReference(from.path, name);
    if ('refused' in resolved) {
      problem(quoted(name), resolved.refused, resolved.fix);
      return undefined;
    }
    const bytes = this.bytesOf(resolved.path, problem, name);
    return bytes && { path: resolved.path, bytes, sha256: this.hashes.get(resolved.path)! };
  }

  private open(
    path: string,
    problem: (found: string, allowed: string) => void,
    name = path,
    readAs: (path: string, bytes: Uint8Array) => ReadResult = readYaml,
  ): OpenFile | undefined {
    const bytes = this.bytesOf(path, problem, name);
    if (bytes === undefined) return undefined;
    const read = readAs(path, bytes);
    if ('problems' in read) {
      this.problems.push(...read.problems);
      return undefined;
    }
    return { path, root: read.root };
  }

  private bytesOf(
    path: string,
    problem: (found: string, allowed: string) => void,
    name: string,
  ): Uint8Array | undefined {
    const bytes = this.files.read(path);
    if (bytes === undefined) {
      problem(quoted(name), `a file that exists; there is no ${path} under the root folder`);
      return undefined;
    }
    if (!(bytes instanceof Uint8Array)) {
      problem(quoted(name), `a file that may be read; ${bytes.refused}`);
      return undefined;
    }
    this.hashes.set(path, createHash('sha256').update(bytes).digest('hex'));
    return bytes;
  }

  /** Every file that was read, sorted by path. */
  inputs(): readonly InputFile[] {
    return [...this.hashes]
      .map(([path, sha256]) => ({ path, sha256 }))
      .sort((a, b) => (a.path < b.path ? -1 : a.path > b.path ? 1 : 0));
  }
}
