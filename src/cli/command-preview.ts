import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { formatProblem } from '../manifest/index.js';
import { OutputError, openOutput, packFilesUnder, realDisk } from '../publish/index.js';
import { type BuildOutcome, buildPack } from './build.js';
import { describeFault, Fault, UsageError } from './errors.js';
import { type ExitCode, exitCodes } from './exit-codes.js';
import type { CommandIo } from './io.js';
import { placeOf } from './pack-place.js';
import { type PreviewState, startServer } from './preview-server.js';
import { noProgress, terminalProgress } from './progress.js';
import { boardList } from './render-top.js';
import { studyWorkers } from './study-job.js';
import { programVersion } from './version.js';
import { watchedFiles } from './watched-files.js';
import { count } from './wording.js';

export interface PreviewCommand {
  readonly root?: string;
  /** Without it the pages go to a folder that is removed at the end. */
  readonly out?: string;
  readonly port: string;
  readonly audience?: string;
}

/** Editors save in several steps; a build waits until this many ms have passed without another change. */
const QUIET = 150;

/**
 * Builds, serves on this computer, and builds again whenever a file of the pack changes.
 *
 * @param until  ends the preview when it is aborted
 */
export async function preview(
  packFile: string,
  command: PreviewCommand,
  io: CommandIo,
  until: AbortSignal,
): Promise<ExitCode> {
  const { root, packPath } = placeOf(packFile, command.root);
  const port = portOf(command.port);
  const own = command.out === undefined ? mkdtempSync(join(tmpdir(), 'boardcase-preview-')) : undefined;
  const out = command.out ?? own ?? '';
  let state: PreviewState = { standing: 'Building …', problems: '', failed: false, good: 0, page: null };
  try {
    const server = await startServer(out, port, state);
    const change = pulse();
    const watched = watchedFiles(root, packFilesUnder(root), change.now);
    until.addEventListener('abort', change.now);
    const tell = (next: Partial<PreviewState>) => {
      state = { ...state, ...next };
      server.tell(state);
    };
    io.out(`preview at ${server.address} (this computer only); end it with Ctrl-C`);
    try {
      while (!until.aborted) {
        change.clear();
        tell({ standing: 'Building …' });
        const effects = {
          files: watched.files,
          openOutput: () => openOutput(out, realDisk),
          progress: io.terminal ? terminalProgress(io.terminal) : noProgress,
          workers: studyWorkers(),
        };
        const next = await attempt(() =>
          buildPack({ packPath, programVersion, audience: command.audience, quick: true }, effects),
        );
        tell(typeof next === 'string' ? failedState(state, next) : goodState(state, next));
        if (state.failed) io.err(state.problems);
        io.out(state.standing);
        await change.next;
        if (!until.aborted) await new Promise((resolve) => setTimeout(resolve, QUIET));
      }
    } finally {
      watched.stop();
      await server.close();
    }
  } finally {
    if (own !== undefined) rmSync(own, { recursive: true, force: true });
  }
  return exitCodes.done;
}

type Built = Extract<BuildOutcome, { kind: 'built' }>;

/** What was built, or the words for what kept it from being built. */
async function attempt(build: () => Promise<BuildOutcome>): Promise<Built | string> {
  try {
    const outcome = await build();
    return outcome.kind === 'built' ? outcome : outcome.problems.map(formatProblem).join('\n');
  } catch (error) {
    if (error instanceof OutputError || error instanceof UsageError) return error.message;
    return describeFault(error instanceof Fault ? error : new Fault('previewing', 'not known', error), programVersion);
  }
}

function goodState({ good }: PreviewState, { summary }: Built): PreviewState {
  const { packId, revision, boards } = summary;
  return {
    standing: `Built ${packId} revision ${revision}, ${count(boards.length, 'board')}: ${boardList(boards)}.`,
    problems: '',
    failed: false,
    good: good + 1,
    page: `/site/${packId}/${revision}/index.html`,
  };
}

function failedState(state: PreviewState, problems: string): PreviewState {
  const standing =
    state.good === 0 ? 'Not built: see the problems.' : 'Not built: see the problems. Below is the last good build.';
  return { ...state, standing, problems, failed: true };
}

function portOf(text: string): number {
  const port = Number(text);
  if (!/^\d{1,5}$/.test(text) || port > 65535) {
    throw new UsageError(`the port is "${text}"; it is a whole number up to 65535, 0 for any free one`);
  }
  return port;
}

/** Something that happens again and again: `next` is done when it happens after the last `clear`. */
function pulse() {
  let ring = () => {};
  const beat = {
    next: Promise.resolve(),
    now: () => ring(),
    clear() {
      beat.next = new Promise((resolve) => {
        ring = resolve;
      });
    },
  };
  return beat;
}
