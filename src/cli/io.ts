import type { Terminal } from './progress.js';

/** Where a command reads its surroundings and writes its words. */
export interface CommandIo {
  /** For results: the closing line, schemas. */
  out(text: string): void;
  /** For problems. */
  err(text: string): void;
  /** Where progress may be shown; none when nobody is looking. */
  readonly terminal?: Terminal;
  readonly env: Readonly<Record<string, string | undefined>>;
}

export const processIo: CommandIo = {
  out: (text) => void process.stdout.write(`${text}\n`),
  err: (text) => void process.stderr.write(`${text}\n`),
  terminal: process.stderr.isTTY && !process.env.CI ? process.stderr : undefined,
  env: process.env,
};
