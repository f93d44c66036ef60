/** How much the texture of a board's copper slows the wave, under each estimate. */
import type { Board } from '../manifest/model.js';
import { microstripLine } from '../physics/line/index.js';
import { conductivityAt } from '../physics/material/index.js';
import { permittivityRise, resonanceShift, SLOW_WAVE_SHARE, tiltShift } from '../physics/roughness/index.js';
import { boardLine, effectivePermittivity, feedWidth } from './board-line.js';
import { bandCentre } from './conditions.js';
import { faceUnder } from './face-view.js';
import { nominalValues } from './nominal-values.js';
import type { SlowWave } from './results.js';
import { surfaces } from './surfaces.js';
import { ROUGHNESS_SIDES, type RoughnessView } from './views.js';

/**
 * Of the feed line by two solved lines, rough and smooth; of the patches, which are wide lines, by their faces' slow-wave
 * lengths. Where the permittivity is a design value both are printed and neither is in any figure of the board.
 */
export function slowWave(board: Board): SlowWave[] {
  const values = nominalValues(board);
  const frequency = bandCentre(board);
  const { strip, ground, laminate } = board.stackUp;
  const { nominalC } = board.temperature;
  const stateUnder = (view: RoughnessView) => surfaces(board, values, view, frequency, nominalC, true);
  const ofLine = (view: RoughnessView): number =>
    effectivePermittivity(boardLine(board, stateUnder(view), values, feedWidth(board), frequency), frequency);
  const smooth = stateUnder('smooth');
  const still = ofLine('smooth');
  const { permittivity, lossTangent, height } = smooth.slab;
  const width = Math.max(...board.columns.flatMap(({ patches }) => patches.map((patch) => patch.width))) + values.etch;
  const { effectivePermittivity: patchPermittivity } = microstripLine({
    geometry: { width, height, thickness: smooth.stripThickness, permittivity },
    frequency,
    lossTangent,
    faces: smooth.faces,
  });
  const sigma = {
    strip: conductivityAt(values.stripConductivity, nominalC, strip.foil.temperatureCoefficient),
    ground: conductivityAt(values.groundConductivity, nominalC, ground.foil.temperatureCoefficient),
  };
  return ROUGHNESS_SIDES.map((side) => {
    const patchRise = permittivityRise({
      strip: faceUnder(side, values.underside, { frequency, conductivity: sigma.strip, permittivity }),
      ground: faceUnder(side, values.ground, { frequency, conductivity: sigma.ground, permittivity }),
      height: values.height,
      share: SLOW_WAVE_SHARE.wide,
    });
    return {
      side,
      lineRise: ofLine(side) / still - 1,
      patchRise,
      resonanceShift: resonanceShift(patchRise, frequency),
      tiltShift: Math.asin(Math.max(-1, Math.min(1, tiltShift(patchRise, patchPermittivity)))),
      applied: laminate.material.permittivityKind === 'bulk',
    };
  });
}
