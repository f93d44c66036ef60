import type {
  Board,
  Figure,
  Foil,
  InputFile,
  Laminate,
  Pack,
  Provenance,
  Requirement,
  Texture,
} from '../../src/manifest/model.js';

/** Invented boards, materials and requirements for tests of verdicts and pages. */
export function figure(path: string, value: number, spread: number, provenance: Partial<Provenance> = {}): Figure {
  return {
    value,
    minus: spread,
    plus: spread,
    path,
    provenance: { basis: 'guaranteed', document: 'NF-DS-1', revision: 'C', date: '2026-02-01', ...provenance },
  };
}

const texture = (path: string, rq: number): Texture => ({
  rq: figure(path, rq, 0.1 * rq, { basis: 'typical', method: 'optical profiler' }),
  stated: { parameter: 'Rq', value: rq },
  instrument: 'optical profiler',
  filter: 'L 80 um, S 0.8 um',
});

export function foil(id: string, rq: number): Foil {
  const at = (name: string) => `foils.yaml: ${id}.${name}`;
  return {
    id,
    maker: 'Invented Foilworks',
    name: `Foil ${id}`,
    invented: true,
    conductivity: figure(at('conductivity'), 5.6e7, 0.1e7, { basis: 'estimated', document: undefined }),
    temperatureCoefficient: 0.00393,
    treatedFace: texture(at('treated_face'), rq),
    untreatedFace: texture(at('untreated_face'), 0.25e-6),
    declared: [{ id: 'peel_strength', value: 0.8, unit: 'N/mm', document: 'FW-7', revision: '2', date: '2025-11-03' }],
  };
}

export function laminate(id: string, permittivity: number, extra: Partial<Laminate> = {}): Laminate {
  const at = (name: string) => `laminates.yaml: ${id}.${name}`;
  const provenance = { frequency: 10e9, direction: 'through-thickness', method: 'clamped stripline' } as const;
  return {
    id,
    maker: 'Invented Laminates',
    name: `Laminate ${id}`,
    invented: true,
    permittivityKind: 'bulk',
    permittivity: figure(at('permittivity'), permittivity, 0.04, provenance),
    lossTangent: figure(at('loss_tangent'), 0.0015, 0.0003, { ...provenance, basis: 'typical' }),
    declared: [{ id: 'flammability', value: 'V-0', document: 'NF-UL-1', revision: 'A', date: '2025-01-20' }],
    ...extra,
  };
}

export function board(id: string, overrides: Partial<Board> & { rq?: number; permittivity?: number } = {}): Board {
  const { rq = 0.6e-6, permittivity = 3.0, ...rest } = overrides;
  const copper = foil(rq > 1e-6 ? 'rough' : 'smooth', rq);
  const substrate = laminate(permittivity === 3.0 ? 'nf-30' : 'nf-33', permittivity);
  const at = (name: string) => `boards/${id}.yaml: ${name}`;
  const widths = [0.7e-3, 0.9e-3, 1.1e-3, 1.1e-3, 0.9e-3, 0.7e-3];
  const ys = [-2.2e-3, 0, 2.2e-3];
  return {
    id,
    title: `Board ${id}`,
    description: 'Invented board.',
    basedOn: [],
    file: `boards/${id}.yaml`,
    overrides: [],
    stackUp: {
      strip: {
        foil: copper,
        thickness: figure(at('strip.thickness'), 18e-6, 3e-6),
        finish: {
          id: 'tin',
          name: 'Immersion tin',
          invented: true,
          layers: [
            {
              material: 'tin',
              conductivity: figure('finishes.yaml: tin.conductivity', 8.7e6, 0.5e6, { basis: 'estimated' }),
              thickness: figure('finishes.yaml: tin.thickness', 1e-6, 0.2e-6),
              relativePermeability: 1,
            },
          ],
          declared: [],
        },
        outerFace: { kind: 'foil', texture: copper.untreatedFace },
        dielectricFace: { kind: 'treated', texture: copper.treatedFace },
      },
      laminate: { material: substrate, thickness: figure(at('laminate.thickness'), 127e-6, 10e-6) },
      ground: {
        foil: copper,
        thickness: figure(at('ground.thickness'), 35e-6, 5e-6),
        dielectricFace: { kind: 'treated', texture: copper.treatedFace },
      },
      below: [{ name: 'Carrier', thickness: 0.5e-3 }],
    },
    columns: ys.map((y) => ({
      y,
      x: 2e-3,
      feedLine: { width: 0.16e-3, length: 2e-3 },
      patches: widths.map((width) => ({ width, length: 1.07e-3 })),
      links: widths.slice(1).map(() => ({ width: 0.16e-3, length: 1.22e-3 })),
    })),
    pitch: 2.2e-3,
    feed: ys.map((_, i) => ({
      amplitude: i === 1 ? 1 : 0.7,
      phase: 0,
      lossDb: figure(at('feed.loss'), 0.6, 0.1, { basis: 'estimated', document: undefined }),
    })),
    referenceImpedance: 'line',
    band: { low: 76.1e9, high: 76.9e9 },
    temperature: { lowC: -40, nominalC: 25, highC: 105 },
    tolerances: { etch: figure(at('tolerances.etch'), 0, 20e-6) },
    cost: { amount: 3.4, currency: 'EUR', basis: 'invented quotation' },
    declared: [],
    ...rest,
  };
}

export function requirement(id: string, extra: Partial<Requirement> & Pick<Requirement, 'quantity'>): Requirement {
  return {
    id,
    text: `Requirement ${id}.`,
    condition: {},
    weight: 'binding',
    source: 'Invented radar specification, section 4',
    verification: 'calculation',
    ...extra,
  };
}

const DEG = Math.PI / 180;

export const requirements: readonly Requirement[] = [
  requirement('r-gain', { quantity: 'realized_gain', limit: { direction: 'at_least', value: 13.5 } }),
  requirement('r-match', { quantity: 'reflection', limit: { direction: 'at_most', value: -12 } }),
  requirement('r-active', { quantity: 'active_reflection', limit: { direction: 'at_most', value: -10 } }),
  requirement('r-sidelobe', {
    quantity: 'sidelobe_level',
    cut: 'elevation',
    limit: { direction: 'at_most', value: -12 },
  }),
  requirement('r-beamwidth', {
    quantity: 'half_power_beamwidth',
    cut: 'elevation',
    limit: { direction: 'at_most', value: 22 },
  }),
  requirement('r-tilt', { quantity: 'beam_direction', cut: 'elevation', limit: { direction: 'at_most', value: 3 } }),
  requirement('r-mask', {
    quantity: 'pattern_mask',
    cut: 'azimuth',
    mask: [
      { from: -90 * DEG, to: -50 * DEG, levelDb: -8 },
      { from: 50 * DEG, to: 90 * DEG, levelDb: -8 },
    ],
  }),
  requirement('r-line', {
    quantity: 'line_loss',
    limit: { direction: 'at_most', value: 0.9 },
    weight: 'target',
    condition: { temperature: { lowC: 25, highC: 85 } },
  }),
  requirement('r-efficiency', {
    quantity: 'radiation_efficiency',
    limit: { direction: 'at_least', value: 0.6 },
    verification: 'test',
    testMethod: 'Gain comparison in an anechoic chamber',
  }),
  requirement('r-flame', { quantity: 'declared', property: 'flammability', allowed: ['V-0'] }),
  requirement('r-peel', {
    quantity: 'declared',
    property: 'peel_strength',
    limit: { direction: 'at_least', value: 0.7 },
  }),
];

const input = (path: string): InputFile => ({ path, sha256: path.length.toString(16).padStart(64, 'a') });

export function pack(boards: readonly Board[], extra: Partial<Pack> = {}): Pack {
  return {
    id: 'side-radar',
    title: 'Side radar antenna boards',
    documentNumber: 'QB-0001',
    revision: 'A',
    date: '2026-03-02',
    status: 'for review',
    authors: ['A. Author'],
    owner: 'Northfen Sensing (invented)',
    notice: 'All names and figures of this pack are invented.',
    boards,
    requirements: {
      id: 'rs',
      title: 'Side radar requirements',
      file: 'requirements.yaml',
      invented: true,
      requirements,
    },
    analysis: { roughnessModel: 'band', frequencyStep: 0.2e9 },
    inputs: ['foils.yaml', 'laminates.yaml', 'requirements.yaml', ...boards.map((b) => b.file)].sort().map(input),
    ...extra,
  };
}
