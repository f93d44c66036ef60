import type { Board, Figure, Foil, Laminate } from '../../src/manifest/model.js';

/** A figure as a manifest would yield it; its path names it, so that two figures of one path move together. */
export function figure(path: string, value: number, spread = 0): Figure {
  return { value, minus: spread, plus: spread, provenance: { basis: 'estimated' }, path };
}

const laminate: Laminate = {
  id: 'test-30',
  maker: 'Invented Laminates',
  name: 'Test 30',
  invented: true,
  permittivityKind: 'bulk',
  permittivity: figure('laminate.permittivity', 3.0, 0.04),
  lossTangent: figure('laminate.loss_tangent', 0.0015, 0.0003),
  declared: [],
};

export function foil(rq: number): Foil {
  const texture = (path: string, value: number) => ({
    rq: figure(path, value, value * 0.2),
    stated: { parameter: 'Rq' as const, value },
  });
  return {
    id: 'test-foil',
    maker: 'Invented Foils',
    name: 'Test foil',
    invented: true,
    conductivity: figure('foil.conductivity', 5.8e7),
    temperatureCoefficient: 0.00393,
    treatedFace: texture('foil.treated', rq),
    untreatedFace: texture('foil.untreated', 0.3e-6),
    declared: [],
  };
}

export interface BoardOptions {
  readonly columns?: number;
  readonly patches?: number;
  readonly rq?: number;
  readonly kind?: 'bulk' | 'design';
  readonly band?: { low: number; high: number };
}

/** Uniform columns near resonance at 77 GHz on 127 µm of permittivity 3. */
export function fixtureBoard(options: BoardOptions = {}): Board {
  const { columns = 2, patches = 4, rq = 0.4e-6, kind = 'bulk', band = { low: 76e9, high: 77e9 } } = options;
  const copper = foil(rq);
  const pitch = 2.1e-3;
  return {
    id: 'test-board',
    title: 'Test board',
    basedOn: [],
    file: 'boards/test-board.yaml',
    overrides: [],
    stackUp: {
      strip: {
        foil: copper,
        thickness: figure('board.strip', 18e-6, 4e-6),
        finish: { id: 'bare', name: 'bare copper', invented: true, layers: [], declared: [] },
        outerFace: { kind: 'foil', texture: copper.untreatedFace },
        dielectricFace: { kind: 'treated', texture: copper.treatedFace },
      },
      laminate: {
        material: { ...laminate, permittivityKind: kind },
        thickness: figure('board.thickness', 127e-6, 6e-6),
      },
      ground: {
        foil: copper,
        thickness: figure('board.ground', 18e-6),
        dielectricFace: { kind: 'treated', texture: copper.treatedFace },
      },
      below: [],
    },
    columns: Array.from({ length: columns }, (_, c) => ({
      x: 0,
      y: (c - (columns - 1) / 2) * pitch,
      feedLine: { width: 0.15e-3, length: 1e-3 },
      patches: Array.from({ length: patches }, () => ({ width: 0.995e-3, length: 1.061e-3 })),
      links: Array.from({ length: patches - 1 }, () => ({ width: 0.15e-3, length: 1.245e-3 })),
    })),
    pitch,
    feed: Array.from({ length: columns }, () => ({
      amplitude: 1,
      phase: 0,
      lossDb: figure('board.feed_loss', 0.8, 0.2),
    })),
    referenceImpedance: 'line',
    band,
    temperature: { lowC: -40, nominalC: 25, highC: 85 },
    tolerances: { etch: figure('board.etch', 0, 15e-6) },
    declared: [],
  };
}
