/**
 * Random grooves of Gaussian spectrum, solved exactly by boundary integrals apart from this program's formulas (Maxwell
 * without displacement current; no roughness model; not measured): mean loss factor of 10 to 14 profiles, each 20 skin depths and
 * 24 correlation lengths long or longer, second order of each profile's own spectrum replaced by that of the endless one. Across: the
 * magnetic field along the grooves is 1 on the metal. Along: metal and air are joined by field and flux.
 */
export interface GrooveReference {
  readonly lay: 'across' | 'along';
  readonly lengthOverRq: number;
  /** Rms slope of the profile, √2 Rq over correlation length. */
  readonly slope: number;
  readonly rqOverDelta: number;
  readonly lossFactor: number;
  /** Standard error of the mean. */
  readonly error: number;
}

type Row = readonly [rqOverDelta: number, across: number, error: number, along: number, error: number];

const SOLVED: readonly { readonly lengthOverRq: number; readonly rows: readonly Row[] }[] = [
  {
    lengthOverRq: 5,
    rows: [
      [0.1, 1.0086, 0.0001, 1.0088, 0.0001],
      [0.3, 1.0264, 0.0001, 1.0264, 0.0004],
      [0.6, 1.0349, 0.0001, 1.0334, 0.0006],
      [1, 1.0371, 0.0001, 1.0349, 0.0006],
      [2, 1.0379, 0.0001, 1.036, 0.0007],
    ],
  },
  {
    lengthOverRq: 2 * Math.SQRT2,
    rows: [
      [0.1, 1.0109, 0.0002, 1.0117, 0.0001],
      [0.3, 1.0474, 0.0009, 1.0502, 0.001],
      [0.6, 1.0831, 0.0006, 1.0801, 0.0022],
      [1, 1.1004, 0.0004, 1.0905, 0.0024],
      [2, 1.1077, 0.0004, 1.0958, 0.0026],
    ],
  },
  {
    lengthOverRq: 2,
    rows: [
      [0.1, 1.0115, 0.0002, 1.0132, 0.0001],
      [0.3, 1.0601, 0.0015, 1.0652, 0.0015],
      [0.6, 1.1223, 0.0019, 1.1225, 0.0038],
      [1, 1.1669, 0.0012, 1.1492, 0.0048],
      [2, 1.1937, 0.001, 1.1629, 0.0052],
    ],
  },
];

export const GROOVE_REFERENCES: readonly GrooveReference[] = SOLVED.flatMap(({ lengthOverRq, rows }) =>
  rows.flatMap(([rqOverDelta, across, acrossError, along, alongError]) => {
    const common = { lengthOverRq, slope: Math.SQRT2 / lengthOverRq, rqOverDelta };
    return [
      { ...common, lay: 'across' as const, lossFactor: across, error: acrossError },
      { ...common, lay: 'along' as const, lossFactor: along, error: alongError },
    ];
  }),
);
