import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { calibrationSource } from '../../src/cli/calibrate.js';
import { CALIBRATION, MIDDLE_CALIBRATION } from '../../src/physics/column/calibration-data.js';

const FILE = new URL('../../src/physics/column/calibration-data.ts', import.meta.url);

describe('the calibration file', () => {
  it('is as the program writes it', () => {
    expect(readFileSync(FILE, 'utf8')).toBe(calibrationSource(CALIBRATION, MIDDLE_CALIBRATION));
  });

  it('keeps four digits of what was found', () => {
    const found = { ...CALIBRATION, residuals: { ...CALIBRATION.residuals, reflection: 0.0123456 } };
    expect(calibrationSource(found, MIDDLE_CALIBRATION)).toContain('    reflection: 0.01235,\n');
  });
});
