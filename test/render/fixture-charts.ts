import type {
  ArrayDrawing,
  BudgetChart,
  CutChart,
  LinesChart,
  StackUpDrawing,
  ToothDrawing,
} from '../../src/dossier/document.js';

/** Plausible curves for a page to be drawn with: closed forms of an array factor, no engine. */
const round = (value: number, digits: number) => Number(value.toFixed(digits));

function arrayFactorDb(angleDeg: number, elements: number, spacing: number, tiltDeg: number, edge: number): number {
  const u = Math.sin((angleDeg * Math.PI) / 180) - Math.sin((tiltDeg * Math.PI) / 180);
  let re = 0;
  let im = 0;
  let sum = 0;
  for (let n = 0; n < elements; n += 1) {
    const t = (2 * n) / (elements - 1) - 1;
    const weight = edge + (1 - edge) * Math.cos((Math.PI * t) / 2) ** 2;
    const phase = 2 * Math.PI * spacing * n * u;
    re += weight * Math.cos(phase);
    im += weight * Math.sin(phase);
    sum += weight;
  }
  const element = Math.max(0.02, Math.cos((angleDeg * Math.PI) / 180));
  return round(Math.max(-45, 20 * Math.log10((Math.hypot(re, im) / sum) * element)), 2);
}

const angles = Array.from({ length: 361 }, (_, i) => i / 2 - 90);
const cutPoints = (elements: number, spacing: number, tilt: number, edge: number) =>
  angles.map((angle) => [angle, arrayFactorDb(angle, elements, spacing, tilt, edge)] as const);

export const budget: BudgetChart = {
  chart: 'budget',
  unit: 'dBi',
  start: { label: 'Directivity', level: 20.62 },
  losses: [
    { label: 'Strip underside', change: -0.31 },
    { label: 'Strip top', change: -0.12 },
    { label: 'Strip edges', change: -0.08 },
    { label: 'Ground', change: -0.22 },
    { label: 'Roughness', change: -0.47 },
    { label: 'Finish', change: -0.09 },
    { label: 'Dielectric', change: -0.58 },
    { label: 'Surface wave', change: -0.26 },
    { label: 'Feed', change: -1.35 },
    { label: 'Mismatch', change: -0.15 },
  ],
  end: { label: 'Realized gain', level: 16.99 },
};

export const elevationCut: CutChart = {
  chart: 'cut',
  xTitle: 'Elevation angle (degrees)',
  yTitle: 'Relative level (dB)',
  xDomain: [-90, 90],
  yDomain: [-40, 5],
  series: [
    { label: '76.1 GHz', points: cutPoints(10, 0.66, -1.2, 0.3) },
    { label: '76.5 GHz', points: cutPoints(10, 0.665, 0, 0.3) },
    { label: '76.9 GHz', points: cutPoints(10, 0.67, 1.3, 0.3) },
  ],
  masks: [
    {
      label: 'Sidelobes not above −18 dB (R-SLL-EL)',
      pieces: [
        { from: -90, to: -14, level: -18 },
        { from: 14, to: 90, level: -18 },
      ],
    },
  ],
};

export const azimuthCut: CutChart = {
  chart: 'cut',
  xTitle: 'Azimuth angle (degrees)',
  yTitle: 'Relative level (dB)',
  xDomain: [-90, 90],
  yDomain: [-40, 5],
  series: [{ label: '76.5 GHz', points: cutPoints(5, 0.55, 0, 0.55) }],
  masks: [
    {
      label: 'Mask by pieces (R-MASK-AZ)',
      pieces: [
        { from: -90, to: -60, level: -20 },
        { from: -60, to: -35, level: -14 },
        { from: 35, to: 60, level: -14 },
        { from: 60, to: 90, level: -20 },
      ],
    },
  ],
};

const bandGhz = Array.from({ length: 61 }, (_, i) => round(75.5 + i * 0.04, 2));
const reflection = (ghz: number, centre: number, depth: number) => {
  const x = ((ghz - centre) / 0.55) ** 2;
  return round(-depth + (depth - 5) * (x / (1 + x)), 2);
};

export const match: LinesChart = {
  chart: 'lines',
  xTitle: 'Frequency (GHz)',
  yTitle: 'Reflection (dB)',
  xDomain: [75.5, 77.9],
  yDomain: [-30, 0],
  series: [1, 2, 3, 4, 5].map((column) => ({
    label: `Column ${column}`,
    emphasis: column === 3,
    points: bandGhz.map((f) => [f, reflection(f, 76.45 + 0.02 * column, 19 + Math.abs(column - 3) * 1.6)] as const),
  })),
  limits: [{ label: 'Limit −12 dB', level: -12, from: 76.1, to: 76.9, forbidden: 'above' }],
  marks: [
    { label: 'Band edge 76.1', at: 76.1 },
    { label: 'Band edge 76.9', at: 76.9 },
  ],
};

const widerGhz = Array.from({ length: 46 }, (_, i) => 10 + 2 * i);
export const lineLoss: LinesChart = {
  chart: 'lines',
  xTitle: 'Frequency (GHz)',
  yTitle: 'Line loss (dB/cm)',
  series: [
    { label: 'Smooth copper', points: widerGhz.map((f) => [f, round(0.055 * Math.sqrt(f) + 0.0021 * f, 4)] as const) },
    { label: 'Hammerstad', points: widerGhz.map((f) => [f, round(0.09 * Math.sqrt(f) + 0.0021 * f, 4)] as const) },
    { label: 'Groiss', points: widerGhz.map((f) => [f, round(0.095 * Math.sqrt(f) + 0.0021 * f, 4)] as const) },
    {
      label: 'Gradient (nominal)',
      emphasis: true,
      points: widerGhz.map((f) => [f, round(0.104 * Math.sqrt(f) + 0.0021 * f, 4)] as const),
    },
  ],
  limits: [{ label: 'Limit 1.2 dB/cm', level: 1.2, forbidden: 'above' }],
};

const heights = Array.from({ length: 41 }, (_, i) => round(0.05 * 10 ** (i / 25), 4));
const hammerstad = (rq: number) => 1 + (2 / Math.PI) * Math.atan(1.4 * (rq / 0.239) ** 2);
const groiss = (rq: number) => 1 + Math.exp(-((0.239 / (2 * rq)) ** 1.6));
export const lossFactor: LinesChart = {
  chart: 'lines',
  xTitle: 'Rq of the treated face (µm)',
  yTitle: 'Loss factor K (1)',
  xScale: 'log',
  series: [
    {
      label: 'Hammerstad (dotted: saturated)',
      saturatedFrom: 0.51,
      points: heights.map((rq) => [rq, round(hammerstad(rq), 4)] as const),
    },
    { label: 'Groiss', points: heights.map((rq) => [rq, round(groiss(rq), 4)] as const) },
    { label: 'Gradient', emphasis: true, points: heights.map((rq) => [rq, round(1 + 2.1 * rq ** 0.9, 4)] as const) },
  ],
  band: {
    label: 'Spread over models',
    points: heights.map((rq) => {
      const all = [hammerstad(rq), groiss(rq), 1 + 2.1 * rq ** 0.9];
      return [rq, round(Math.min(...all), 4), round(Math.max(...all), 4)] as const;
    }),
  },
  marks: [
    { label: 'Foil SV-R, rolled', at: 0.25 },
    { label: 'Foil SV-2, very low profile', at: 0.4 },
    { label: 'Foil SV-9, standard', at: 0.85 },
  ],
};

export const tooth: ToothDrawing = {
  drawing: 'tooth',
  widthUm: 12,
  faces: [
    {
      label: 'Strip, dielectric face',
      note: 'Sketch from stated figures, not a measurement: Gaussian profile of this Rq',
      above: 'laminate',
      skinDepthUm: 0.238,
      rqUm: 0.42,
      rz: { um: 2.31, assumed: true },
      profile: { intervalUm: 0.1, heightsUm: Array.from({ length: 121 }, (_, i) => round(0.6 * Math.sin(i / 5), 3)) },
    },
    {
      label: 'Ground, dielectric face',
      note: 'Sketch from stated figures, not a measurement: one layer of balls on a flat base',
      above: 'laminate',
      skinDepthUm: 0.238,
      rqUm: 0.3,
      rz: { um: 1.2, assumed: false },
      profile: { intervalUm: 12, heightsUm: [-0.2, -0.2] },
      nodules: { radiusUm: 0.3, centres: Array.from({ length: 12 }, (_, i) => [0.5 + i, 0.1] as const) },
    },
  ],
};

export const stackUp: StackUpDrawing = {
  drawing: 'stack-up',
  layers: [
    {
      label: 'Copper, patches and lines',
      detail: 'foil SV-2, 18 µm, immersion silver 0.2 µm',
      thicknessUm: 18,
      material: 'copper-strip',
      computed: true,
    },
    {
      label: 'Laminate Tarn 300',
      detail: '127 µm between mean planes, εr 3.00 ± 0.05, tan δ 0.0013',
      thicknessUm: 127,
      material: 'dielectric',
      computed: true,
    },
    {
      label: 'Copper, ground',
      detail: 'foil SV-2, 18 µm, as laminated',
      thicknessUm: 18,
      material: 'copper-ground',
      computed: true,
    },
    {
      label: 'Prepreg Holm 4',
      detail: '100 µm, declared and drawn, not computed',
      thicknessUm: 100,
      material: 'below',
      computed: false,
    },
    {
      label: 'Core Holm 4',
      detail: '800 µm, declared and drawn, not computed',
      thicknessUm: 800,
      material: 'below',
      computed: false,
    },
  ],
};

const patchX = Array.from({ length: 10 }, (_, i) => round(1.0 + 2.42 * i, 3));
const patchWidths = [0.55, 0.8, 1.05, 1.25, 1.35, 1.35, 1.25, 1.05, 0.8, 0.55];
export const array: ArrayDrawing = {
  drawing: 'array',
  columns: [1, 2, 3, 4, 5].map((column) => {
    const centre = round((column - 3) * 2.15, 3);
    return {
      label: `Column ${column}`,
      feed: { x: -1, y: centre, towards: '+x' as const },
      rectangles: [
        { kind: 'line' as const, x: -1, y: round(centre - 0.1, 3), length: 2, width: 0.2 },
        ...patchX.flatMap((x, i) => [
          { kind: 'patch' as const, x, y: round(centre - patchWidths[i] / 2, 3), length: 1.12, width: patchWidths[i] },
          ...(i < patchX.length - 1
            ? [{ kind: 'line' as const, x: round(x + 1.12, 3), y: round(centre - 0.1, 3), length: 1.3, width: 0.2 }]
            : []),
        ]),
      ],
    };
  }),
  extent: { x: [-1, 23.9], y: [-5, 5] },
  axisNotes: {
    x: 'x, along the columns, away from the feed',
    y: 'y, across the columns',
    tilt: 'positive tilt: beam towards +x',
    polarisation: 'electric field along x',
    cuts: 'elevation cut: x–z plane; azimuth cut: y–z plane',
  },
};
