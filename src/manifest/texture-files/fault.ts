import type { Problem } from '../problem.js';

/** What keeps a file of measured heights from being read; turned into a problem where the file is known. */
export class TextureFault extends Error {
  constructor(
    readonly found: string,
    readonly allowed: string,
    readonly place: { readonly line?: number; readonly column?: number; readonly path?: string } = {},
    readonly fix?: string,
  ) {
    super(`found ${found}; ${allowed}`);
  }

  problemIn(file: string): Problem {
    const { line = 1, column = 1, path = '' } = this.place;
    return {
      file,
      line,
      column,
      path,
      found: this.found,
      allowed: this.allowed,
      ...(this.fix ? { fix: this.fix } : {}),
    };
  }
}
