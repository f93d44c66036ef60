import { Command } from 'commander';
import { schema } from './command-schema.js';
import { start } from './command-start.js';
import { validate } from './command-validate.js';
import { type ExitCode, exitCodeHelp, exitCodes } from './exit-codes.js';
import { tellFailure } from './failures.js';
import type { CommandIo } from './io.js';
import { programVersion } from './version.js';

/** Runs one command line, without the name of the program, to its exit code. Never throws. */
export async function runCommandLine(args: readonly string[], io: CommandIo): Promise<ExitCode> {
  let code: ExitCode = exitCodes.done;
  const program = new Command('boardcase')
    .description('Compliance dossiers for automotive-radar antenna boards, from YAML manifests.')
    .version(programVersion)
    .exitOverride()
    .configureOutput({ writeOut: (text) => io.out(text.trimEnd()), writeErr: (text) => io.err(text.trimEnd()) })
    .addHelpText('after', `\n${exitCodeHelp()}`);
  const root = [
    '--root <dir>',
    'folder that the manifests may refer to (default: the folder of the pack file)',
  ] as const;

  program
    .command('start')
    .description('write a small commented pack of invented data, to begin with')
    .argument('<dir>', 'a new or empty folder')
    .action((dir) => {
      code = start(dir, io);
    });
  program
    .command('preview')
    .description('build a pack, show it on this computer only, and build again whenever a file of it changes')
    .argument('<pack.yaml>', 'the pack file')
    .option('--port <number>', 'port on 127.0.0.1; 0 for any free one', '8076')
    .option('--out <dir>', 'output folder (default: a temporary one, removed at the end)')
    .option('--audience <name>', 'show the copy for an audience of the pack')
    .option(...root)
    .action(async (pack, options) => {
      const { preview } = await import('./command-preview.js');
      const stop = new AbortController();
      for (const signal of ['SIGINT', 'SIGTERM'] as const) process.once(signal, () => stop.abort());
      code = await preview(pack, options, io, stop.signal);
    });
  program
    .command('build')
    .description('calculate, judge and write the dossiers of a pack')
    .argument('<pack.yaml>', 'the pack file')
    .option('--out <dir>', 'output folder: new, empty or written by boardcase', 'out')
    .option(...root)
    .option('--audience <name>', 'build the copy for an audience of the pack, without the entries hidden from it')
    .option('--gate', 'exit code 1 unless every binding requirement meets on every board')
    .action(async (pack, options) => {
      // Charts and PDFs take a second to load; the other commands do without.
      const { build } = await import('./command-build.js');
      code = await build(pack, options, io);
    });
  program
    .command('validate')
    .description('check the manifests of a pack; print every problem with its place and its mend')
    .argument('<pack.yaml>', 'the pack file')
    .option(...root)
    .action((pack, options) => {
      code = validate(pack, options, io);
    });
  program
    .command('schema')
    .description('print the JSON schemas of the manifests, for editors')
    .option('--out <dir>', 'write one file per kind of manifest instead')
    .action((options) => {
      code = schema(options, io);
    });

  try {
    await program.parseAsync(args, { from: 'user' });
    return code;
  } catch (error) {
    return tellFailure(error, io);
  }
}
