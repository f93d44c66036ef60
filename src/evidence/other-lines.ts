import {
  type CoplanarGeometry,
  coplanarSection,
  type SiwLine,
  type StriplineLine,
  siwLine,
  stripline,
  thinStriplineImpedance,
} from '../physics/line/index.js';
import { ANNEALED_COPPER_CONDUCTIVITY, halfSpaceImpedance } from '../physics/material/index.js';
import { type EvidenceCheck, INDEPENDENT_SECTION, once } from './check.js';

const DB_PER_NEPER = 20 / Math.LN10;
const copper = (frequency: number) => halfSpaceImpedance(frequency, ANNEALED_COPPER_CONDUCTIVITY);

function pozarStripline(): StriplineLine {
  const wall = copper(10e9);
  return stripline({
    geometry: { width: 2.66e-3, thickness: 10e-6, heightBelow: 1.595e-3, heightAbove: 1.595e-3, permittivity: 2.2 },
    frequency: 10e9,
    lossTangent: 0.001,
    faces: { underside: wall, top: wall, edges: wall, lowerGround: wall, upperGround: wall },
  });
}

const pozar = {
  topic: 'Stripline',
  source: 'D. M. Pozar, Microwave Engineering, 4th ed., 2012, Example 3.5',
  howKnown: 'memory',
} as const;
const striplineWords = 'stripline 2.66 mm wide, 0.01 mm thick, grounds 3.2 mm apart, permittivity 2.2, 10 GHz';

const striplineChecks: readonly EvidenceCheck[] = [
  {
    ...pozar,
    id: 'stripline.thin-impedance',
    quantity: `${striplineWords}: impedance without thickness, exact mapping`,
    expected: 50,
    unit: 'Ω',
    tolerance: 0.1,
    toleranceReason: 'the width is printed to three digits',
    compute: () => thinStriplineImpedance(2.66e-3, 3.2e-3) / Math.sqrt(2.2),
  },
  {
    ...pozar,
    id: 'stripline.impedance',
    quantity: `${striplineWords}: impedance`,
    expected: 50,
    unit: 'Ω',
    tolerance: 0.6,
    toleranceReason:
      'the textbook leaves the thickness out of the impedance; a separate section with it gives 0.9 % less',
    compute: () => pozarStripline().impedance,
  },
  {
    ...pozar,
    id: 'stripline.dielectric-loss',
    quantity: `${striplineWords}: dielectric loss, loss tangent 0.001`,
    expected: 0.155,
    unit: 'Np/m',
    tolerance: 5e-4,
    toleranceReason: 'three printed decimals',
    compute: () => pozarStripline().dielectricLoss,
  },
  {
    ...pozar,
    id: 'stripline.conductor-loss',
    quantity: `${striplineWords}: conductor loss of copper`,
    expected: 0.122,
    unit: 'Np/m',
    tolerance: 0.003,
    toleranceReason: 'the textbook differentiates simpler formulas; a separate section gives 0.1197, 1.9 % less',
    compute: () => Object.values(pozarStripline().conductorLoss).reduce((a, b) => a + b, 0),
  },
  {
    ...pozar,
    id: 'stripline.loss',
    quantity: `${striplineWords}: loss`,
    expected: 2.41,
    unit: 'dB/m',
    tolerance: 0.03,
    toleranceReason: 'as its conductor part',
    compute: () => pozarStripline().gamma.re * DB_PER_NEPER,
  },
];

function exampleSiw(): SiwLine {
  const wall = copper(77e9);
  return siwLine({
    geometry: { rowDistance: 1.6e-3, viaDiameter: 0.3e-3, viaPitch: 0.5e-3, height: 127e-6, permittivity: 3 },
    lossTangent: 0.0013,
    frequency: 77e9,
    walls: { top: wall, bottom: wall, vias: wall },
  });
}

const siwWords = 'rows 1.6 mm apart, vias 0.3 mm at 0.5 mm, 127 µm of permittivity 3, 77 GHz';

const siwCheck = (
  id: string,
  quantity: string,
  expected: number,
  unit: string,
  tolerance: number,
  compute: (line: SiwLine) => number,
): EvidenceCheck => ({
  id: `siw.${id}`,
  topic: 'Substrate-integrated waveguide',
  quantity: `${quantity}; ${siwWords}`,
  source: 'field integrals of the equivalent guide, made for this project; width by F. Xu and K. Wu, T-MTT 53(1), 2005',
  howKnown: 'independent solution',
  expected,
  unit,
  tolerance,
  toleranceReason: 'half a unit of the last digit kept',
  compute: () => compute(exampleSiw()),
});

const perCm = (x: number): number => (x * DB_PER_NEPER) / 100;

const siwChecks: readonly EvidenceCheck[] = [
  siwCheck('width', 'equivalent width', 1.4112, 'mm', 5e-5, (s) => s.equivalentWidth * 1e3),
  siwCheck('cutoff', 'cut-off', 61.324, 'GHz', 5e-4, (s) => s.cutoff * 1e-9),
  siwCheck('beta', 'phase constant', 1690.4, '1/m', 0.05, (s) => s.beta),
  siwCheck('dielectric-loss', 'dielectric loss, loss tangent 0.0013', 0.26096, 'dB/cm', 5e-6, (s) =>
    perCm(s.dielectricLoss),
  ),
  siwCheck('foil-loss', 'loss of both foils, smooth copper', 0.37643, 'dB/cm', 5e-6, (s) =>
    perCm(s.conductorLoss.top + s.conductorLoss.bottom),
  ),
  siwCheck('via-loss', 'loss of the vias, smooth copper', 0.042974, 'dB/cm', 5e-7, (s) => perCm(s.conductorLoss.vias)),
  {
    ...siwCheck(
      'width-cassivi',
      'equivalent width by the other rule',
      1.4105,
      'mm',
      5e-5,
      (s) => s.equivalentWidths.cassivi * 1e3,
    ),
    source: 'Y. Cassivi et al., IEEE Microwave Wireless Compon. Lett. 12(9), 2002; value computed separately',
    howKnown: 'memory',
  },
];

/** Copper of 18 µm on 127 µm, permittivity 3, in µm. */
const coplanar = (width: number, gap: number): CoplanarGeometry => ({
  width: width * 1e-6,
  gap: gap * 1e-6,
  height: 127e-6,
  thickness: 18e-6,
  permittivity: 3,
});

function coplanarChecks(width: number, gap: number, impedance: number, permittivity: number, total: number) {
  const words = `strip ${width} µm, slots ${gap} µm, 18 µm thick on 127 µm of permittivity 3`;
  const common = {
    topic: 'Grounded coplanar line',
    source: INDEPENDENT_SECTION,
    howKnown: 'independent solution',
  } as const;
  const section = once(() => coplanarSection(coplanar(width, gap)));
  const checks: EvidenceCheck[] = [
    {
      ...common,
      id: `coplanar.impedance-${width}-${gap}`,
      quantity: `static impedance, ${words}`,
      expected: impedance,
      unit: 'Ω',
      tolerance: 0.002 * impedance,
      toleranceReason: '0.2 %: mesh of the section',
      compute: () => section().impedance,
    },
    {
      ...common,
      id: `coplanar.permittivity-${width}-${gap}`,
      quantity: `static effective permittivity, ${words}`,
      expected: permittivity,
      unit: '1',
      tolerance: 0.002 * permittivity,
      toleranceReason: '0.2 %: mesh of the section',
      compute: () => section().effectivePermittivity,
    },
    {
      ...common,
      id: `coplanar.weights-${width}-${gap}`,
      quantity: `face weights together, ${words}`,
      expected: total,
      unit: '1/m',
      tolerance: 0.005 * total,
      toleranceReason: '0.5 %: corners of the reference, which carries even charges',
      compute: () => Object.values(section().weights).reduce((a, b) => a + b, 0),
    },
  ];
  return checks;
}

/** With the side grounds far away a microstrip is left, of which independent sections are known. */
const coplanarLimit: EvidenceCheck = {
  id: 'coplanar.microstrip-limit',
  topic: 'Grounded coplanar line',
  quantity: 'static impedance with the side grounds 5 mm away, strip 320 µm, 18 µm thick on 127 µm of permittivity 3',
  source: INDEPENDENT_SECTION,
  howKnown: 'independent solution',
  expected: 48.205,
  unit: 'Ω',
  tolerance: 0.1,
  toleranceReason: '0.2 %: few elements over so wide a slot',
  compute: () => coplanarSection(coplanar(320, 5000)).impedance,
};

export const otherLineChecks: readonly EvidenceCheck[] = [
  ...striplineChecks,
  ...siwChecks,
  ...coplanarChecks(200, 100, 56.818, 2.1121, 5127),
  ...coplanarChecks(250, 150, 53.106, 2.2195, 4094),
  ...coplanarChecks(300, 300, 49.596, 2.332, 3475),
  coplanarLimit,
];
