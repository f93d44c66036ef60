import { performance } from 'node:perf_hooks';
import { accuracyTable } from '../../src/evidence/index.js';
import {
  type ColumnEngine,
  type ColumnGeometry,
  type ColumnProblem,
  edgeNetwork,
} from '../../src/physics/column/index.js';
import { fullWave } from '../../src/physics/full-wave/index.js';
import { crossSection, solvedMicrostrip, spectralLine, stillStrip, stripAt } from '../../src/physics/line/index.js';
import { halfSpaceImpedance } from '../../src/physics/material/index.js';
import { gradient, roughnessBand, roughnessEstimates } from '../../src/physics/roughness/index.js';

const feed = { width: 320e-6, height: 127e-6, thickness: 18e-6, permittivity: 3 };
const covered = { ...feed, cover: { shape: 'planar', thickness: 25e-6, permittivity: 3.5 } } as const;
const copper = halfSpaceImpedance(77e9, 5.8e7);
const faces = { underside: copper, top: copper, edges: copper, ground: copper };
const conditions = { frequency: 77e9, conductivity: 5.8e7, permittivity: 3 };
const still = stillStrip(feed);

/** Each with the milliseconds that it should stay under, where a target is set. */
const SOLVERS: readonly (readonly [name: string, run: () => unknown, target?: number])[] = [
  ['cross-section with loss weights', () => crossSection(feed), 20],
  ['cross-section under a planar cover', () => crossSection(covered)],
  ['full-wave line without thickness', () => spectralLine(feed, 77e9), 200],
  [
    'section and full wave with losses, from nothing',
    () => solvedMicrostrip({ geometry: feed, frequency: 77e9, lossTangent: 0.0015, faces }),
    200,
  ],
  ['the same at a further frequency', () => stripAt(still, 78e9)],
  ['gradient model, Rq 0.4 µm', () => gradient(0.4e-6, 0.238e-6), 1],
  ['gradient model, Rq 2.4 µm', () => gradient(2.4e-6, 0.238e-6), 1],
  ['roughness estimates from Rq', () => roughnessEstimates({ rq: 0.4e-6 }, conditions)],
  ['roughness band with what would narrow it', () => roughnessBand({ rq: 0.4e-6 }, conditions)],
];

const column = (y: number): ColumnGeometry => ({
  x: 0,
  y,
  feedLineWidth: 0.15e-3,
  patches: Array.from({ length: 8 }, () => ({ width: 0.965e-3, length: 1.061e-3 })),
  links: Array.from({ length: 7 }, () => ({ width: 0.15e-3, length: 1.258e-3 })),
});
const board = (columns: number): ColumnProblem => ({
  slab: { permittivity: 3, lossTangent: 0.0015, height: 127e-6 },
  stripThickness: 18e-6,
  columns: Array.from({ length: columns }, (_, c) => column(c * 2.2e-3)),
  referenceImpedance: 'line',
});

/** Column engines: set-up, the first frequency, and a further one, each once. */
const ENGINES: readonly (readonly [name: string, prepare: () => ColumnEngine, target?: number])[] = [
  ['network, a column of eight patches', () => edgeNetwork(board(1), 80e9), 2],
  ['network, ten columns of eight patches', () => edgeNetwork(board(10), 80e9), 50],
  ['full wave, a column of eight patches', () => fullWave(board(1), { low: 76e9, high: 80e9 }), 300],
  ['full wave, three columns of eight patches', () => fullWave(board(3), { low: 76e9, high: 80e9 })],
  ['full wave, ten columns of eight patches', () => fullWave(board(10), { low: 76e9, high: 80e9 }), 40000],
];

function measureEngines() {
  return ENGINES.map(([name, prepare, targetMilliseconds]) => {
    const laps: number[] = [];
    let since = performance.now();
    const lap = (): void => {
      const now = performance.now();
      laps.push(Math.round(10 * (now - since)) / 10);
      since = now;
    };
    const engine = prepare();
    lap();
    for (const frequency of [77e9, 78e9]) {
      engine.solve({ frequency, faces });
      lap();
    }
    const [setUp, first, further] = laps;
    return { name, setUp, first, further, ...(targetMilliseconds === undefined ? {} : { targetMilliseconds }) };
  });
}

/** Milliseconds a call: median of batches after warming up; and the accuracy table, once, from nothing. */
export function measureSolvers() {
  const start = performance.now();
  accuracyTable();
  const table = performance.now() - start;
  return {
    solvers: SOLVERS.map(([name, run, targetMilliseconds]) => ({
      name,
      milliseconds: Number(median(run).toFixed(3)),
      ...(targetMilliseconds === undefined ? {} : { targetMilliseconds }),
    })),
    columnEngines: measureEngines(),
    accuracyTableMilliseconds: Math.round(table),
  };
}

function median(run: () => unknown): number {
  for (let i = 0; i < 20; i++) run();
  const batches = Array.from({ length: 9 }, () => {
    const start = performance.now();
    for (let i = 0; i < 5; i++) run();
    return (performance.now() - start) / 5;
  });
  return batches.sort((a, b) => a - b)[4]!;
}
