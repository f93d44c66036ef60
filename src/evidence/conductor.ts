import {
  ANNEALED_COPPER_CONDUCTIVITY,
  conductivityAt,
  type MetalLayer,
  platedImpedance,
  skinDepth,
  surfaceResistance,
} from '../physics/material/index.js';
import type { EvidenceCheck } from './check.js';

const TOPIC = 'Conductors and finishes';
const POZAR = 'D. M. Pozar, Microwave Engineering, 4th ed., 2012, Example 1.2';
const TEN_GHZ = 10e9;

function skin(metal: string, id: string, conductivity: number, expected: number): EvidenceCheck {
  return {
    id: `conductor.skin-depth-${id}`,
    topic: TOPIC,
    quantity: `skin depth of ${metal} at 10 GHz`,
    source: POZAR,
    howKnown: 'memory',
    expected,
    unit: 'µm',
    tolerance: 0.001,
    toleranceReason: 'three printed digits; the textbook rounds its constants, up to one unit of the last digit',
    compute: () => skinDepth(TEN_GHZ, conductivity) * 1e6,
  };
}

function hotResistance(temperature: number, expected: number): EvidenceCheck {
  return {
    id: `conductor.copper-at-${temperature}`,
    topic: TOPIC,
    quantity: `surface resistance of copper at ${temperature} °C over that at 20 °C`,
    source: 'IEC 60028:1925, coefficient 0.00393 1/K; square root of the linear law',
    howKnown: 'memory',
    expected,
    unit: '1',
    tolerance: 1e-6,
    toleranceReason: 'computed from the law to seven digits',
    compute: () =>
      surfaceResistance(77e9, conductivityAt(ANNEALED_COPPER_CONDUCTIVITY, temperature)) /
      surfaceResistance(77e9, ANNEALED_COPPER_CONDUCTIVITY),
  };
}

/** Layers given from the copper outward. */
function plated(id: string, words: string, layers: readonly MetalLayer[], expected: number): EvidenceCheck {
  return {
    id: `conductor.finish-${id}`,
    topic: TOPIC,
    quantity: `loss factor of ${words} on copper at 77 GHz`,
    source: 'layered half space solved separately for this project, not measured',
    howKnown: 'independent solution',
    expected,
    unit: '1',
    tolerance: 1e-4,
    toleranceReason: 'five digits kept; same law, other code',
    compute: () =>
      platedImpedance(77e9, ANNEALED_COPPER_CONDUCTIVITY, layers).re /
      surfaceResistance(77e9, ANNEALED_COPPER_CONDUCTIVITY),
  };
}

const layer = (conductivity: number, thickness: number): MetalLayer => ({
  conductivity,
  thickness,
  relativePermeability: 1,
});
const NICKEL_PHOSPHORUS = layer(1.7e6, 4e-6);
const GOLD = layer(4.1e7, 50e-9);

export const conductorChecks: readonly EvidenceCheck[] = [
  skin('copper (58.13 MS/m)', 'copper', 5.813e7, 0.66),
  skin('aluminium (38.16 MS/m)', 'aluminium', 3.816e7, 0.814),
  skin('gold (40.98 MS/m)', 'gold', 4.098e7, 0.786),
  skin('silver (61.73 MS/m)', 'silver', 6.173e7, 0.64),
  {
    id: 'conductor.annealed-copper',
    topic: TOPIC,
    quantity: 'conductivity of annealed copper at 20 °C, from 0.017241 Ω mm²/m',
    source: 'IEC 60028:1925, Resistance of copper',
    howKnown: 'memory',
    expected: 1e-6 / 1.7241e-8,
    unit: 'MS/m',
    tolerance: 0.0058,
    toleranceReason: 'rel. 1e-4: five printed digits of resistivity',
    compute: () => ANNEALED_COPPER_CONDUCTIVITY * 1e-6,
  },
  hotResistance(-40, 0.8741853),
  hotResistance(85, 1.120469),
  hotResistance(125, 1.18855),
  plated('nickel-gold', '4 µm nickel-phosphorus and 50 nm gold', [NICKEL_PHOSPHORUS, GOLD], 3.8168),
  plated('thin-nickel-gold', '0.1 µm nickel-phosphorus and 50 nm gold', [layer(1.7e6, 1e-7), GOLD], 1.2584),
  plated(
    'nickel-palladium-gold',
    '4 µm nickel-phosphorus, 0.1 µm palladium and 50 nm gold',
    [NICKEL_PHOSPHORUS, layer(9.5e6, 1e-7), GOLD],
    3.2186,
  ),
  plated('silver', '0.2 µm silver', [layer(6.1e7, 2e-7)], 0.97877),
];
