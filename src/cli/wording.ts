import { formatProblem, type Problem } from '../manifest/index.js';
import { type ExitCode, exitCodes } from './exit-codes.js';
import type { CommandIo } from './io.js';

export function count(number: number, noun: string): string {
  return `${number} ${noun}${number === 1 ? '' : 's'}`;
}

export function tellProblems(problems: readonly Problem[], consequence: string, io: CommandIo): ExitCode {
  for (const problem of problems) io.err(formatProblem(problem));
  io.out(`${count(problems.length, 'problem')} found; ${consequence}`);
  return exitCodes.badInput;
}
