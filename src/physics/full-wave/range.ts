/** Where the full wave is used outside of what it was compared with. */
import type { Slab } from '../column/engine.js';
import { SPEED_OF_LIGHT } from '../constants.js';
import type { ValidityFlag } from '../validity.js';
import type { FullWaveProblem } from './problem.js';

/** k0 h and permittivity of the independent solutions it was compared with. */
const HEIGHTS = [0.14, 0.35] as const;
const PERMITTIVITIES = [2.9, 3.7] as const;
/** Strip thickness over slab height up to which edges alone stand for it. */
const THICKEST = 0.4;
const RESIDUAL = 1e-3;
/** Of S12 and S21 as read on the feed lines. */
const DISAGREEMENT = 0.01;

export function fullWaveFlags(
  problem: FullWaveProblem,
  slab: Slab,
  thickness: number,
  frequency: number,
  residual: number,
  disagreement: number,
): ValidityFlag[] {
  const flags: ValidityFlag[] = [];
  const flag = (code: string, severity: ValidityFlag['severity'], text: string): void => {
    flags.push({ code, severity, model: 'full wave', text });
  };
  const tall = (2 * Math.PI * frequency * slab.height) / SPEED_OF_LIGHT;
  if (tall < HEIGHTS[0] || tall > HEIGHTS[1])
    flag(
      'full-wave.height-range',
      'outside',
      `k0h is ${tall.toPrecision(2)}; compared with independent solutions from ${HEIGHTS[0]} to ${HEIGHTS[1]}.`,
    );
  if (slab.permittivity < PERMITTIVITIES[0] || slab.permittivity > PERMITTIVITIES[1])
    flag(
      'full-wave.permittivity-range',
      'outside',
      `Permittivity ${slab.permittivity}; compared with independent solutions from ${PERMITTIVITIES[0]} to ${PERMITTIVITIES[1]}.`,
    );
  if (thickness > THICKEST * slab.height)
    flag(
      'full-wave.thickness-range',
      'outside',
      `The metal is ${(thickness / slab.height).toPrecision(2)} of the slab's height thick; it is a sheet here, whose edges stand for its thickness.`,
    );
  if (residual > RESIDUAL)
    flag(
      'full-wave.residual',
      'outside',
      `The equations are solved to a relative residual of ${residual.toPrecision(2)} only.`,
    );
  if (disagreement > DISAGREEMENT)
    flag(
      'full-wave.reciprocity',
      'note',
      `Coupling read one way and the other differs by ${disagreement.toPrecision(2)}, since feed lines take up what the feeds radiate; their mean is given.`,
    );
  if (problem.cover)
    flag(
      'full-wave.cover',
      'note',
      'The cover is taken as flat and without end; no independent solution with a cover was at hand.',
    );
  return flags;
}
