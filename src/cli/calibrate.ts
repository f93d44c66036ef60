import { writeFileSync } from 'node:fs';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { CALIBRATION_RANGE, calibrate, MIDDLE_RANGE } from '../physics/calibration/index.js';
import type { CalibrationRecord } from '../physics/column/calibration-record.js';
import { NETWORK_CONSTANTS } from '../physics/column/index.js';
import { tellFailure } from './failures.js';
import { processIo } from './io.js';
import { noProgress, terminalProgress } from './progress.js';

const DATA_FILE = 'src/physics/column/calibration-data.ts';
/** More would differ between versions of the engine that runs it. */
const DIGITS = 4;

/** The data file as source, as the formatter would leave it. */
export function calibrationSource(whole: CalibrationRecord, middle: CalibrationRecord): string {
  return [
    '/**',
    ' * Made by `npm run calibrate`: the edge network against the full wave of single patches, without lines, at the end of a',
    ' * line and between two lines; never columns. Not to be edited.',
    ' */',
    "import type { CalibrationRecord } from './calibration-record.js';",
    '',
    `export const CALIBRATION: CalibrationRecord = ${literal(whole, '')};`,
    '',
    '/** The same over the middle of the range, where columns were compared too. */',
    `export const MIDDLE_CALIBRATION: CalibrationRecord = ${literal(middle, '')};`,
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

function table(record: CalibrationRecord): string[] {
  const { cases, residuals, fittedResiduals, floor } = record;
  const names = Object.keys(residuals) as (keyof typeof residuals)[];
  const row = (name: (typeof names)[number]): string =>
    [residuals, fittedResiduals, floor].map((r) => r[name].toFixed(4)).join('  ');
  return [
    `${cases} patches, root mean square off the full wave: constants in use, fitted; full wave off itself`,
    ...names.map((name) => `  ${name.padEnd(16)} ${row(name)}`),
  ];
}

function main(): void {
  const progress = processIo.terminal ? terminalProgress(processIo.terminal) : noProgress;
  const [whole, middle] = [CALIBRATION_RANGE, MIDDLE_RANGE].map((range) =>
    calibrate(range, NETWORK_CONSTANTS, progress),
  );
  progress.end();
  writeFileSync(fileURLToPath(new URL(`../../${DATA_FILE}`, import.meta.url)), calibrationSource(whole, middle));
  for (const line of ['Whole range:', ...table(whole), 'Middle of it:', ...table(middle)]) processIo.out(line);
  processIo.out(`Written to ${DATA_FILE}`);
}

if (import.meta.url === pathToFileURL(process.argv[1] ?? '').href) {
  try {
    main();
  } catch (error) {
    process.exitCode = tellFailure(error, processIo);
  }
}
