import { CommanderError } from 'commander';
import { OutputError } from '../publish/index.js';
import { describeFault, Fault, UsageError } from './errors.js';
import { type ExitCode, exitCodes } from './exit-codes.js';
import type { CommandIo } from './io.js';
import { programVersion } from './version.js';

/** Says what ended a command, and whose it is to mend. */
export function tellFailure(error: unknown, io: CommandIo): ExitCode {
  // commander has said what is wrong; asking for help or the version also arrives here, with 0.
  if (error instanceof CommanderError) return error.exitCode === 0 ? exitCodes.done : exitCodes.badInput;
  if (error instanceof UsageError || error instanceof OutputError) {
    io.err(error.message);
    return exitCodes.badInput;
  }
  const fault = error instanceof Fault ? error : new Fault('running the command', 'not known', error);
  io.err(describeFault(fault, programVersion));
  return exitCodes.fault;
}
