/** Power of the excited patches in the guided wave of the slab, from the spectrum at the TM0 pole: a check on the circuit. */
import type { ExcitedEdges } from './engine.js';
import { patchReach } from './patch-currents.js';
import { boardSpectrum } from './patch-field.js';
import { slabSpectrum } from './slab-spectrum.js';

/** Power in the TM0 wave of the slab, W: −(R/16πω) ∫ |kx J̃x(kp, φ)|² dφ with R the residue of G_q at the pole. */
export function guidedWavePower({ currents }: ExcitedEdges): number {
  const { patches } = currents;
  const { omega, kp, residueQ } = slabSpectrum(currents.frequency, currents.slab.permittivity, currents.slab.height);
  const steps = 4 * Math.ceil((16 + 2 * kp * patchReach(patches)) / 4);
  const current = new Float64Array(2);
  let sum = 0;
  for (let step = 0; step < steps; step++) {
    const phi = (2 * Math.PI * (step + 0.5)) / steps;
    const kx = kp * Math.cos(phi);
    boardSpectrum(currents, kx, kp * Math.sin(phi), current);
    sum += kx * kx * (current[0] * current[0] + current[1] * current[1]);
  }
  return (-residueQ / (16 * Math.PI * omega)) * sum * ((2 * Math.PI) / steps);
}
