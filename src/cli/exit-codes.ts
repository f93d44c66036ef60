/** What the exit code of every command says; printed by `--help`. */
export const exitCodes = {
  done: 0,
  requirementsNotMet: 1,
  badInput: 2,
  fault: 3,
} as const;
export type ExitCode = (typeof exitCodes)[keyof typeof exitCodes];

const meanings: Readonly<Record<keyof typeof exitCodes, string>> = {
  done: 'done; with --gate also: every binding requirement meets on every board',
  requirementsNotMet: 'with --gate: everything was built, and a binding requirement does not meet (or stays open)',
  badInput: 'a manifest, an option or the output folder needs mending; the last good output is unchanged',
  fault: 'a fault in this program; the last good output is unchanged',
};

export function exitCodeHelp(): string {
  const names = Object.keys(exitCodes) as (keyof typeof exitCodes)[];
  return ['Exit codes:', ...names.map((name) => `  ${exitCodes[name]}  ${meanings[name]}`)].join('\n');
}
