/**
 * Independent full-wave solutions of edge-fed patches, of one patch between two lines and of two columns side by side
 * (mixed-potential integral equation on the grounded slab, made apart from this program by others of this project's authors;
 * not measured). Zero-thickness strip, infinite slab. Stated accuracy: resonance 0.2 %, edge resistance 3 % (6 % on 200 µm),
 * reflection 0.02 (0.03 on 200 µm), coupling 0.2 dB above −45 dB.
 */

/** Edge-fed patch: f0, R and Q of Z = R/(1 + jQ(f/f0 − f0/f)) + jX at the patch's edge. */
export interface PatchReference {
  readonly name: string;
  readonly permittivity: number;
  readonly lossTangent: number;
  readonly height: number;
  readonly length: number;
  readonly width: number;
  readonly lineWidth: number;
  readonly fits: readonly {
    readonly copper: 'none' | 'smooth';
    readonly f0GHz: number;
    readonly ohm: number;
    readonly q: number;
  }[];
}

export const PATCH_REFERENCES: readonly PatchReference[] = [
  {
    name: '1.25 mm wide on 127 µm, permittivity 3.0',
    permittivity: 3.0,
    lossTangent: 0.0015,
    height: 0.000127,
    length: 0.001013,
    width: 0.00125,
    lineWidth: 0.00017241,
    fits: [
      { copper: 'none', f0GHz: 78.529, ohm: 294.41, q: 24.769 },
      { copper: 'smooth', f0GHz: 78.444, ohm: 271.92, q: 22.878 },
    ],
  },
  {
    name: '0.50 mm wide on 100 µm, permittivity 3.16',
    permittivity: 3.16,
    lossTangent: 0.0025,
    height: 0.0001,
    length: 0.001055,
    width: 0.0005,
    lineWidth: 0.00016216,
    fits: [
      { copper: 'none', f0GHz: 79.548, ohm: 1424.3, q: 72.797 },
      { copper: 'smooth', f0GHz: 79.432, ohm: 1043.0, q: 53.234 },
    ],
  },
  {
    name: '1.10 mm wide on 200 µm, permittivity 3.55',
    permittivity: 3.55,
    lossTangent: 0.005,
    height: 0.0002,
    length: 0.000875,
    width: 0.0011,
    lineWidth: 0.00015172,
    fits: [
      { copper: 'none', f0GHz: 79.777, ohm: 273.93, q: 15.367 },
      { copper: 'smooth', f0GHz: 79.71, ohm: 250.32, q: 14.041 },
    ],
  },
];

/** One patch with a line of the same width at either edge, no loss; S at the patch's edges, referred to the line. */
export interface UnitReference {
  readonly permittivity: number;
  readonly height: number;
  readonly lineWidth: number;
  readonly width: number;
  readonly length: number;
  /** [GHz, Re S11, Im S11, |S21|] */
  readonly rows: readonly (readonly [number, number, number, number])[];
}

export const UNIT_REFERENCES: readonly UnitReference[] = [
  {
    permittivity: 3.0,
    height: 0.000127,
    lineWidth: 0.00015,
    width: 0.0011007,
    length: 0.00104,
    rows: [
      [70, -0.3055, 0.50043, 0.7716],
      [74, -0.14896, 0.39672, 0.85291],
      [78, -0.055006, 0.20032, 0.91321],
      [82, -0.093104, -0.031422, 0.924],
    ],
  },
  {
    permittivity: 3.16,
    height: 0.0001,
    lineWidth: 0.00013,
    width: 0.0010455,
    length: 0.00104,
    rows: [
      [70, -0.29448, 0.5137, 0.77012],
      [74, -0.11925, 0.38004, 0.86853],
      [78, -0.041273, 0.13053, 0.93135],
      [82, -0.14652, -0.12424, 0.91879],
    ],
  },
  {
    permittivity: 3.55,
    height: 0.0002,
    lineWidth: 0.00016,
    width: 0.00072338,
    length: 0.001,
    rows: [
      [70, -0.14988, 0.2875, 0.92586],
      [74, -0.067797, 0.18053, 0.95472],
      [78, -0.035887, 0.044483, 0.96804],
      [82, -0.06297, -0.093277, 0.9634],
    ],
  },
];

/** Two columns alike side by side, smooth copper. */
export const TWO_COLUMNS = {
  name: 'two columns of eight patches 0.55 wavelengths apart on 127 µm, permittivity 3.0, smooth copper',
  permittivity: 3.0,
  lossTangent: 0.0015,
  height: 0.000127,
  lineWidthMm: 0.15,
  patchWidthMm: 0.96522,
  patchLengthMm: 1.06086,
  linkLengthsMm: [1.25829, 1.25829, 1.25829, 1.25829, 1.25829, 1.25829, 1.19882],
  pitchMm: 2.1196,
  /** [GHz, Re S11, Im S11, Re S21, Im S21] */
  rows: [
    [76.0, -0.35791, 0.76877, 0.0056377, -0.012393],
    [76.5, -0.21116, 0.77264, -0.00075267, -0.017629],
    [77.0, -0.050236, 0.72604, -0.013117, -0.019594],
    [77.5, 0.096703, 0.60155, -0.030546, -0.0093561],
    [78.0, 0.14825, 0.39712, -0.033763, 0.023839],
    [78.5, 0.025514, 0.25733, 0.011194, 0.04296],
    [79.0, -0.058345, 0.34265, 0.037443, -0.0036368],
    [79.5, 0.08614, 0.40792, 0.0031633, -0.034002],
    [80.0, 0.26997, 0.26049, -0.033467, -0.018797],
  ],
} as const;
