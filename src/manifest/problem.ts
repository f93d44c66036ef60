import { visible } from '../quantity/index.js';

/** Something in a manifest that its author must mend. */
export interface Problem {
  /** Relative to the root folder, forward slashes. */
  readonly file: string;
  /** From 1. */
  readonly line: number;
  /** From 1, in characters. */
  readonly column: number;
  /** Dotted, with `[i]` from 0 for items of lists; empty for the file as a whole. */
  readonly path: string;
  /** What stands there: `"127 mm"`, `no key "band"`. */
  readonly found: string;
  /** What may stand there. */
  readonly allowed: string;
  /** A sentence: the likely mend. */
  readonly fix?: string;
}

export type Path = readonly (string | number)[];

/** `stack_up.below[0].thickness` */
export function dotted(path: Path): string {
  let text = '';
  for (const part of path) text += typeof part === 'number' ? `[${part}]` : text === '' ? part : `.${part}`;
  return text;
}

/** Two lines for a terminal or a log; nothing in it can steer the terminal. */
export function formatProblem(problem: Problem): string {
  const { file, line, column, path, found, allowed, fix } = problem;
  const head = `${visible(file)}:${line}:${column}${path === '' ? '' : `  ${visible(path)}`}`;
  return `${head}\n  found ${visible(found)}; ${visible(allowed)}.${fix ? ` ${visible(fix)}` : ''}`;
}

const byText = (a: string, b: string) => (a < b ? -1 : a > b ? 1 : 0);

/** By file, line, column; the same problem once. */
export function sortProblems(problems: readonly Problem[]): readonly Problem[] {
  const seen = new Map(
    problems.map((p) => [JSON.stringify([p.file, p.line, p.column, p.path, p.found, p.allowed]), p]),
  );
  return [...seen.values()].sort(
    (a, b) =>
      byText(a.file, b.file) ||
      a.line - b.line ||
      a.column - b.column ||
      byText(a.path, b.path) ||
      byText(a.found, b.found),
  );
}
