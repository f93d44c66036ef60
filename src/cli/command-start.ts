import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { manifestSchemas, schemaText } from '../manifest/index.js';
import { onDisk, realDisk } from '../publish/index.js';
import { UsageError } from './errors.js';
import { type ExitCode, exitCodes } from './exit-codes.js';
import type { CommandIo } from './io.js';

/** `templates/` at the top of the package: two levels up both from `src/cli/` and from `dist/cli/`. */
const source = new URL('../../templates/start/', import.meta.url);

/** Files of a first pack: commented manifests with invented data, and the schemas that their first lines name. */
export function startFiles(): ReadonlyMap<string, string> {
  const files = new Map<string, string>();
  const add = (folder: string) => {
    for (const entry of readdirSync(new URL(folder, source), { withFileTypes: true })) {
      const path = folder + entry.name;
      if (entry.isDirectory()) add(`${path}/`);
      else files.set(path, readFileSync(new URL(path, source), 'utf8').replace(/\r\n/g, '\n'));
    }
  };
  add('');
  for (const [name, schema] of Object.entries(manifestSchemas())) files.set(`schema/${name}`, schemaText(schema));
  return files;
}

/** Writes a first pack into a new or empty folder; nothing that lies there is touched. */
export function start(folder: string, io: CommandIo): ExitCode {
  onDisk(`cannot write a pack to ${folder}`, () => {
    const there = realDisk.list(folder);
    if (there.length > 0) {
      throw new UsageError(`${folder} is not empty (it holds ${there[0]}); name a new or empty folder`);
    }
    for (const [path, text] of startFiles()) {
      const file = join(folder, path);
      realDisk.makeFolder(join(file, '..'));
      realDisk.write(file, text);
    }
  });
  const pack = join(folder, 'pack.yaml');
  io.out(
    `a pack of invented data was written to ${folder}; begin with ${pack}\n` +
      `  boardcase preview ${pack}\n  boardcase build ${pack} --out out`,
  );
  return exitCodes.done;
}
