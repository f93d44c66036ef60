import { writeFileSync } from 'node:fs';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { CALIBRATION_RANGE, calibrate } from '../physics/calibration/index.js';
import type { CalibrationRecord } from '../physics/column/calibration-record.js';
import { NETWORK_CONSTANTS } from '../physics/column/index.js';
import { tellFailure } from './failures.js';
import { processIo } from './io.js';
import { noProgress, terminalProgress } from './progress.js';

const DATA_FILE = 'src/physics/column/calibration-data.ts';
/** More would differ between versions of the engine that runs it. */
const DIGITS = 4;

/** The data file as source, as the formatter would leave it. */
export function calibrationSource(record: CalibrationRecord): string {
  return [
    '/**',
    ' * Made by `npm run calibrate`: the edge network against the full wave of single patches, without lines, at the end of a',
    ' * line and between two lines; never columns. Not to be edited.',
    ' */',
    "import type { CalibrationRecord } from './calibration-record.js';",
    '',
    `export const CALIBRATION: CalibrationRecord = ${literal(record, '')};`,
    '',
  ].join('\n');
}

function literal(value: unknown, indent: string): string {
  if (typeof value === 'number') return String(Number(value.toPrecision(DIGITS)));
  if (Array.isArray(value)) return `[${value.map((v) => literal(v, indent)).join(', ')}]`;
  const inner = `${indent}  `;
  const lines = Object.entries(value as object).map(([name, v]) => `${inner}${name}: ${literal(v, inner)},\n`);
  return `{\n${lines.join('')}${indent}}`;
}

function main(): void {
  const progress = processIo.terminal ? terminalProgress(processIo.terminal) : noProgress;
  const record = calibrate(CALIBRATION_RANGE, NETWORK_CONSTANTS, progress);
  progress.end();
  writeFileSync(fileURLToPath(new URL(`../../${DATA_FILE}`, import.meta.url)), calibrationSource(record));
  const { residuals, fittedResiduals, floor } = record;
  processIo.out(`${record.cases} patches, root mean square of network less full wave: in use, fitted, own doubt`);
  for (const name of Object.keys(residuals) as (keyof typeof residuals)[])
    processIo.out(
      `  ${name.padEnd(16)} ${[residuals, fittedResiduals, floor].map((r) => r[name].toFixed(4)).join('  ')}`,
    );
  processIo.out(`Written to ${DATA_FILE}`);
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? '').href) {
  try {
    main();
  } catch (error) {
    process.exitCode = tellFailure(error, processIo);
  }
}
