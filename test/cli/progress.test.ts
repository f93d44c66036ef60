import { expect, it } from 'vitest';
import { terminalProgress } from '../../src/cli/progress.js';

it('writes one line over and over, no longer than the terminal, and takes it away', () => {
  const written: string[] = [];
  const progress = terminalProgress({ columns: 20, write: (text) => written.push(text) });
  progress.stage('calculating', 2);
  progress.step();
  progress.step();
  progress.stage('checking the engine against published values');
  progress.end();
  expect(written[0]).toBe('\r\u001b[Kcalculating 0/2');
  expect(written).toContain('\r\u001b[Kcalculating 2/2');
  expect(written).toContain('\r\u001b[Kchecking the engine');
  expect(written.at(-1)).toBe('\r\u001b[K');
  expect(written.join('')).not.toContain('\n');
});
