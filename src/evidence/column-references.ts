/**
 * Independent full-wave solutions of two series-fed columns (mixed-potential integral equation on the grounded slab, made
 * apart from this program by others of this project's authors; not measured). Zero-thickness strip with sheet impedance
 * (smooth: (1 + j)Rs, rough: (2 + 3j)Rs, copper 5.8e7 S/m, on strip and ground), infinite slab. Reflection at the true edge
 * of the first patch, referred to the feed line. Gains are per accepted power with the reference's own power closure taken
 * off. Stated accuracy of the reference: reflection 0.02, gain 0.1 dB, tilt 0.5°, sidelobe 0.5 dB above −20 dB.
 */
export interface ColumnReference {
  readonly name: string;
  readonly permittivity: number;
  readonly lossTangent: number;
  readonly height: number;
  readonly lineWidthMm: number;
  readonly patchWidthMm: number;
  readonly patchLengthMm: number;
  readonly linkLengthsMm: readonly number[];
  /** Reflection with smooth copper from 74 to 82 GHz every half gigahertz, re and im in turn: fine enough to interpolate. */
  readonly smoothReflection: readonly number[];
  readonly rows: readonly {
    readonly copper: 'smooth' | 'rough';
    readonly fGHz: number;
    readonly s11: readonly [number, number];
    readonly directivityDbi: number;
    readonly gainDbi: number;
    readonly tiltDeg: number;
    readonly sidelobeDb: number;
  }[];
}

export const COLUMN_REFERENCES: readonly ColumnReference[] = [
  {
    name: 'eight uniform patches on 127 µm, permittivity 3.0',
    permittivity: 3.0,
    lossTangent: 0.0015,
    height: 0.000127,
    lineWidthMm: 0.15,
    patchWidthMm: 0.99507,
    patchLengthMm: 1.06086,
    linkLengthsMm: [1.23822, 1.27927, 1.23822, 1.23822, 1.27927, 1.23822, 1.23822],
    smoothReflection: [
      -0.77939, 0.47929, -0.70148, 0.57554, -0.60823, 0.65307, -0.49834, 0.71198, -0.36959, 0.74753, -0.22172, 0.74822,
      -0.063845,
      // biome-ignore lint/suspicious/noApproximativeNumericConstant: a computed reflection that happens to lie near ln 2
      0.69315,
      0.065159, 0.55779, 0.075297, 0.37059, -0.042079, 0.30754, -0.035322, 0.40347, 0.14312, 0.39406, 0.28452, 0.1888,
      0.23367, -0.095684, -0.0067434, -0.27115, -0.28612, -0.23034, -0.43869, -0.018163,
    ],
    rows: [
      {
        copper: 'smooth',
        fGHz: 76,
        s11: [-0.36959, 0.74753],
        directivityDbi: 15.61,
        gainDbi: 13.977,
        tiltDeg: 0.5,
        sidelobeDb: -10.53,
      },
      {
        copper: 'smooth',
        fGHz: 77,
        // biome-ignore lint/suspicious/noApproximativeNumericConstant: a computed reflection that happens to lie near ln 2
        s11: [-0.063845, 0.69315],
        directivityDbi: 15.89,
        gainDbi: 14.625,
        tiltDeg: 1.0,
        sidelobeDb: -10.727,
      },
      {
        copper: 'smooth',
        fGHz: 78,
        s11: [0.075297, 0.37059],
        directivityDbi: 16.21,
        gainDbi: 15.096,
        tiltDeg: 2.0,
        sidelobeDb: -10.977,
      },
      {
        copper: 'smooth',
        fGHz: 79,
        s11: [-0.035322, 0.40347],
        directivityDbi: 15.873,
        gainDbi: 14.56,
        tiltDeg: 5.0,
        sidelobeDb: -7.2603,
      },
      {
        copper: 'smooth',
        fGHz: 80,
        s11: [0.28452, 0.1888],
        directivityDbi: 15.488,
        gainDbi: 14.098,
        tiltDeg: 7.0,
        sidelobeDb: -3.764,
      },
      {
        copper: 'rough',
        fGHz: 76,
        s11: [-0.31229, 0.72885],
        directivityDbi: 15.594,
        gainDbi: 13.302,
        tiltDeg: 0.5,
        sidelobeDb: -10.43,
      },
      {
        copper: 'rough',
        fGHz: 77,
        s11: [-0.02745, 0.63194],
        directivityDbi: 15.906,
        gainDbi: 14.074,
        tiltDeg: 1.0,
        sidelobeDb: -10.672,
      },
      {
        copper: 'rough',
        fGHz: 78,
        s11: [0.026825, 0.34293],
        directivityDbi: 16.194,
        gainDbi: 14.501,
        tiltDeg: 2.5,
        sidelobeDb: -10.589,
      },
      {
        copper: 'rough',
        fGHz: 79,
        s11: [0.029339, 0.39074],
        directivityDbi: 15.88,
        gainDbi: 13.924,
        tiltDeg: 5.5,
        sidelobeDb: -6.5311,
      },
      {
        copper: 'rough',
        fGHz: 80,
        s11: [0.23966, 0.080923],
        directivityDbi: 15.505,
        gainDbi: 13.516,
        tiltDeg: 7.0,
        sidelobeDb: -3.9201,
      },
    ],
  },
  {
    name: 'eight uniform patches on 100 µm, permittivity 3.16',
    permittivity: 3.16,
    lossTangent: 0.0025,
    height: 0.0001,
    lineWidthMm: 0.13,
    patchWidthMm: 1.04549,
    patchLengthMm: 1.04095,
    linkLengthsMm: [1.21498, 1.21498, 1.21498, 1.21498, 1.21498, 1.25526, 1.21498],
    smoothReflection: [
      -0.69255, 0.59849, -0.61278, 0.66393, -0.51971, 0.71624, -0.41068, 0.75245, -0.28335, 0.7647, -0.1399, 0.73726,
      -0.00052397, 0.64556, 0.067701, 0.48552, 0.01097, 0.38001, 0.024192, 0.41195, 0.17265, 0.34348, 0.23751, 0.10525,
      0.090621, -0.13576, -0.18048, -0.18817, -0.37208, -0.031466, -0.35786, 0.19465, -0.15046, 0.30547,
    ],
    rows: [
      {
        copper: 'smooth',
        fGHz: 76,
        s11: [-0.28335, 0.7647],
        directivityDbi: 15.28,
        gainDbi: 13.394,
        tiltDeg: 1.0,
        sidelobeDb: -10.198,
      },
      {
        copper: 'smooth',
        fGHz: 77,
        s11: [-0.00052397, 0.64556],
        directivityDbi: 15.75,
        gainDbi: 14.102,
        tiltDeg: 1.5,
        sidelobeDb: -10.541,
      },
      {
        copper: 'smooth',
        fGHz: 78,
        s11: [0.01097, 0.38001],
        directivityDbi: 16.062,
        gainDbi: 14.486,
        tiltDeg: 3.5,
        sidelobeDb: -9.7459,
      },
      {
        copper: 'smooth',
        fGHz: 79,
        s11: [0.17265, 0.34348],
        directivityDbi: 15.613,
        gainDbi: 13.857,
        tiltDeg: 6.5,
        sidelobeDb: -5.0155,
      },
      {
        copper: 'smooth',
        fGHz: 80,
        s11: [0.090621, -0.13576],
        directivityDbi: 15.229,
        gainDbi: 13.507,
        tiltDeg: 7.5,
        sidelobeDb: -3.6367,
      },
      {
        copper: 'rough',
        fGHz: 77,
        s11: [0.016326, 0.56607],
        directivityDbi: 15.79,
        gainDbi: 13.487,
        tiltDeg: 2.0,
        sidelobeDb: -10.402,
      },
      {
        copper: 'rough',
        fGHz: 78,
        s11: [0.0052938, 0.38674],
        directivityDbi: 15.988,
        gainDbi: 13.672,
        tiltDeg: 4.0,
        sidelobeDb: -8.6893,
      },
      {
        copper: 'rough',
        fGHz: 79,
        s11: [0.17682, 0.23071],
        directivityDbi: 15.544,
        gainDbi: 13.094,
        tiltDeg: 7.0,
        sidelobeDb: -4.8967,
      },
    ],
  },
];
