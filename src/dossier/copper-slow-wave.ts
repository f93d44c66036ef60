import { formatNumber } from '../quantity/index.js';
import type { SlowWave } from '../study/results.js';
import { cell, number, prose, table } from './blocks.js';
import type { Block } from './document.js';
import { sideTitle } from './model-words.js';
import { GAP } from './values.js';

const percent = (ratio: number): string => `${formatNumber(100 * ratio, 2, { plus: true })}${GAP}%`;
const degrees = (radians: number): string => `${formatNumber((radians * 180) / Math.PI, 2, { plus: true })}°`;
const megahertz = (hertz: number): string => `${formatNumber(hertz / 1e6, 0, { plus: true })}${GAP}MHz`;

/** How the texture slows the wave: permittivity, resonance and beam, and whether that is in the figures. */
export function slowWaveBlocks(slowWave: readonly SlowWave[]): readonly Block[] {
  if (slowWave.length === 0) return [];
  const applied = slowWave.every((entry) => entry.applied);
  return [
    table(
      'slow-wave',
      'Slowing of the wave by the texture of both faces to the laminate, against smooth faces, at the band centre',
      [
        'Estimate|0.8',
        '#Effective permittivity, line|1.2',
        '#Effective permittivity, widest patch|1.2',
        '#Resonance|1',
        '#Column tilt|1',
        'In the figures|1.6',
      ],
      slowWave.map((entry) => [
        cell(sideTitle(entry.side)),
        number(percent(entry.lineRise)),
        number(percent(entry.patchRise)),
        number(megahertz(entry.resonanceShift)),
        number(degrees(entry.tiltShift)),
        cell(entry.applied ? 'applied' : 'already in the design value'),
      ]),
    ),
    prose(
      applied
        ? 'The permittivity of the laminate is stated without any effect of copper, so the slowing is applied to lines, resonance and beam.'
        : 'The permittivity of the laminate is a design value, fitted on lines with rough copper: it holds the slowing already. The table prints it and the figures do not add it again. On another foil or thickness than the fitted one the design value does not hold.',
    ),
  ];
}
