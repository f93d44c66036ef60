import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { createRequire } from 'node:module';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { addTallies, type TestReport, tallyCheck, tallyTests } from './tally.js';

/** Types, lint, layers and tests, all of them whatever fails, with one closing line that any CI can read. */
const root = fileURLToPath(new URL('..', import.meta.url));
const require = createRequire(import.meta.url);
const reports = mkdtempSync(join(tmpdir(), 'boardcase-tests-'));
const reportFile = join(reports, 'report.json');

function run(name: string, args: readonly string[]): number | null {
  console.log(`\n== ${name}`);
  return spawnSync(process.execPath, args, { cwd: root, stdio: ['ignore', 'inherit', 'inherit'] }).status;
}

function readReport(): TestReport | undefined {
  try {
    return JSON.parse(readFileSync(reportFile, 'utf8'));
  } catch {
    return undefined;
  }
}

// Files beside a package's own entry, so that no shell and no search path comes in between.
const beside = (entry: string, file: string) => join(require.resolve(entry), '..', file);
const vitest = [beside('vitest/package.json', 'vitest.mjs'), 'run', '--reporter=default', '--reporter=json'];

const tally = addTallies([
  tallyCheck('types', run('types', [beside('typescript/package.json', 'bin/tsc'), '-p', 'test/tsconfig.json'])),
  tallyCheck(
    'lint',
    run('lint', [beside('@biomejs/biome/package.json', 'bin/biome'), 'check', '--error-on-warnings', '.']),
  ),
  tallyCheck('layers', run('layers', ['--import', 'tsx', 'test/layers/check-layers.ts'])),
  ((exitCode) => tallyTests(readReport(), exitCode))(run('tests', [...vitest, `--outputFile.json=${reportFile}`])),
]);
rmSync(reports, { recursive: true, force: true });

console.log('');
for (const remark of tally.remarks) console.log(remark);
console.log(`${tally.passed} passed, ${tally.failed} failed`);
process.exitCode = tally.failed === 0 ? 0 : 1;
