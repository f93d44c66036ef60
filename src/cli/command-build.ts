import { join } from 'node:path';
import { openOutput, packFilesUnder, realDisk } from '../publish/index.js';
import { visible } from '../quantity/index.js';
import { type BuildOutcome, buildPack } from './build.js';
import { type ExitCode, exitCodes } from './exit-codes.js';
import type { CommandIo } from './io.js';
import { placeOf } from './pack-place.js';
import { noProgress, terminalProgress } from './progress.js';
import { boardList } from './render-top.js';
import { sourceDateEpoch } from './source-date.js';
import { studyWorkers } from './study-job.js';
import { programVersion } from './version.js';
import { count, tellProblems } from './wording.js';

export interface BuildCommand {
  readonly root?: string;
  readonly out: string;
  readonly gate?: boolean;
  readonly audience?: string;
}

export async function build(packFile: string, command: BuildCommand, io: CommandIo): Promise<ExitCode> {
  const { root, packPath } = placeOf(packFile, command.root);
  const outcome = await buildPack(
    { packPath, programVersion, audience: command.audience },
    {
      files: packFilesUnder(root),
      openOutput: () => openOutput(command.out, realDisk),
      progress: io.terminal ? terminalProgress(io.terminal) : noProgress,
      workers: studyWorkers(),
      epoch: sourceDateEpoch(io.env.SOURCE_DATE_EPOCH),
    },
  );
  if (outcome.kind === 'bad input') return tellProblems(outcome.problems, 'nothing was written', io);
  return tellBuilt(outcome, command, io);
}

/** Says what was built and where; under `--gate`, what keeps it from passing. */
export function tellBuilt(
  { summary, verdicts, publication }: Extract<BuildOutcome, { kind: 'built' }>,
  { out, gate }: BuildCommand,
  io: CommandIo,
): ExitCode {
  const { packId, revision, boards } = summary;
  const open = verdicts.filter((verdict) => verdict.overall !== 'meets');
  if (gate) for (const { boardId, overall, reason } of open) io.err(`${boardId} ${overall}: ${visible(reason)}`);
  const done = publication === 'written' ? 'written to' : 'released and unchanged, left as it is in';
  io.out(
    `${packId} revision ${revision}, ${count(boards.length, 'board')}: ${boardList(boards)}; ` +
      `${done} ${join(out, packId, revision)}`,
  );
  return gate && open.length > 0 ? exitCodes.requirementsNotMet : exitCodes.done;
}
