import { loadPack } from '../manifest/index.js';
import { packFilesUnder } from '../publish/index.js';
import { type ExitCode, exitCodes } from './exit-codes.js';
import type { CommandIo } from './io.js';
import { placeOf } from './pack-place.js';
import { count, tellProblems } from './wording.js';

export function validate(packFile: string, command: { readonly root?: string }, io: CommandIo): ExitCode {
  const { root, packPath } = placeOf(packFile, command.root);
  const loaded = loadPack(packFilesUnder(root), packPath);
  if ('problems' in loaded) return tellProblems(loaded.problems, 'the pack cannot be built', io);
  const { id, boards, requirements, inputs } = loaded.pack;
  io.out(
    `${id}: ${count(boards.length, 'board')}, ${count(requirements.requirements.length, 'requirement')}, ` +
      `${count(inputs.length, 'file')}: no problem found`,
  );
  return exitCodes.done;
}
