/** An option, an argument or the environment that the user can mend. */
export class UsageError extends Error {
  override name = 'UsageError';
}

/** Something that should never happen, with what is needed to look into it. */
export class Fault extends Error {
  override name = 'Fault';

  /**
   * @param stage     what was being done
   * @param packHash  hash over the files of the pack read so far
   */
  constructor(
    readonly stage: string,
    readonly packHash: string,
    cause: unknown,
  ) {
    super(cause instanceof Error ? cause.message : String(cause), { cause });
  }
}

/** For the terminal: whose fault it is, what to send, and only then where in the program it happened. */
export function describeFault(fault: Fault, programVersion: string): string {
  const { cause } = fault;
  const where =
    cause instanceof Error && cause.stack
      ? cause.stack
          .split('\n')
          .slice(1, 5)
          .map((line) => line.trim())
      : [];
  return [
    `A fault in boardcase, not in your files, while ${fault.stage}. The last good output is unchanged.`,
    'Please report it with these lines:',
    `  boardcase ${programVersion}, node ${process.version}`,
    `  pack's hash ${fault.packHash}`,
    `  ${fault.message}`,
    ...where.map((line) => `    ${line}`),
  ].join('\n');
}
