import { mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { onTestFinished } from 'vitest';
import { filesUnder, realDisk } from '../../src/publish/index.js';

/** A new folder that is removed when the running test ends. */
export function temporaryFolder(): string {
  const folder = mkdtempSync(join(tmpdir(), 'boardcase-test-'));
  onTestFinished(() => rmSync(folder, { recursive: true, force: true }));
  return folder;
}

export function writeTree(folder: string, files: Readonly<Record<string, string>>): void {
  for (const [path, content] of Object.entries(files)) {
    mkdirSync(dirname(join(folder, path)), { recursive: true });
    writeFileSync(join(folder, path), content);
  }
}

/** Path → text of every file under a folder. */
export function readTree(folder: string): Record<string, string> {
  return Object.fromEntries(
    filesUnder(realDisk, folder).map((path) => [path, readFileSync(join(folder, path), 'utf8')]),
  );
}
