import { mkdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { manifestSchemas, schemaText } from '../manifest/index.js';
import { onDisk } from '../publish/index.js';
import { type ExitCode, exitCodes } from './exit-codes.js';
import type { CommandIo } from './io.js';
import { count } from './wording.js';

/** Prints the schemas as one JSON object by file name, or writes each to its file. */
export function schema({ out }: { readonly out?: string }, io: CommandIo): ExitCode {
  if (out === undefined) {
    io.out(schemaText(manifestSchemas()).trimEnd());
    return exitCodes.done;
  }
  const names = onDisk(`cannot write the schemas to ${out}`, () => writeSchemas(out));
  io.out(`${count(names.length, 'schema')} written to ${out}: ${names.join(', ')}`);
  return exitCodes.done;
}

export function writeSchemas(folder: string): string[] {
  mkdirSync(folder, { recursive: true });
  const schemas = Object.entries(manifestSchemas());
  for (const [file, content] of schemas) writeFileSync(join(folder, file), schemaText(content));
  return schemas.map(([file]) => file);
}
