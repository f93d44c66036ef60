/** Where the power of an excited board goes. */
import { abs2, type Complex, complex } from '../../numerics/complex.js';
import { type ComplexVector, complexVector } from '../../numerics/gmres.js';
import type { FarField, PowerBudget } from '../column/engine.js';
import { MU0 } from '../constants.js';
import type { MicrostripLine } from '../line/index.js';
import { farFieldPower } from '../pattern/radiated-power.js';
import type { BoardCurrents } from './board-currents.js';
import { boardOperator } from './board-operator.js';
import type { BoardSetup } from './board-setup.js';
import type { MeshPort } from './port-waves.js';
import { losslessMedium, type SlabMedium } from './slab-medium.js';
import { guidedPower } from './slab-wave.js';
import type { StripSheet } from './strip-sheet.js';

export interface PoweredBoard {
  readonly setup: BoardSetup;
  readonly medium: SlabMedium;
  readonly frequency: number;
  readonly current: ComplexVector;
  readonly sheets: readonly StripSheet[];
  readonly field: FarField;
  readonly source: BoardCurrents;
  readonly incident: readonly Complex[];
  readonly reflected: readonly Complex[];
  /** Waves into terminations. */
  readonly leaving: readonly Complex[];
  readonly feeds: readonly { readonly port: MeshPort; readonly line: MicrostripLine }[];
}

/**
 * Radiated and surface-wave power from the far field and the residue of the same currents through the lossless slab; loss in
 * the strip from its sheet; loss in slab and ground together from what the reactions take more than those of the lossless
 * slab, less that of the feed lines, divided as on a line as wide as the first patch.
 */
export function boardPower(b: PoweredBoard): PowerBudget {
  const sum = (waves: readonly Complex[]): number => waves.reduce((p, wave) => p + abs2(wave), 0) / 2;
  const incident = sum(b.incident);
  const strip = stripPower(b);
  const below = belowPower(b);
  return {
    incident,
    accepted: incident - sum(b.reflected),
    radiated: farFieldPower(b.field),
    surfaceWave: guidedPower(
      losslessMedium(b.medium),
      b.frequency,
      b.source.spectrum,
      Math.hypot(b.source.extent.x, b.source.extent.y),
    ),
    ...strip,
    ...below,
    load: sum(b.leaving),
  };
}

/** ½ Re Z ∫|J|² over a cell: triangles of the two edges along either axis. */
function cellSquare(x: ComplexVector, low: number, high: number): number {
  const [lr, li] = low < 0 ? [0, 0] : [x.re[low], x.im[low]];
  const [hr, hi] = high < 0 ? [0, 0] : [x.re[high], x.im[high]];
  return (lr * lr + li * li + hr * hr + hi * hi + lr * hr + li * hi) / 3;
}

function stripPower({ setup, current, sheets }: PoweredBoard): Pick<PowerBudget, 'underside' | 'top' | 'edges'> {
  const { mesh } = setup;
  const { edges, rectangle } = mesh.cells;
  const ratio = mesh.grid.dx / mesh.grid.dy;
  const power = { underside: 0, top: 0, edges: 0 };
  for (let c = 0; c < rectangle.length; c++) {
    const r = rectangle[c];
    if (mesh.rectangles[r].metal.kind === 'feed') continue;
    const { impedance, shares } = sheets[r];
    const along = cellSquare(current, edges[4 * c], edges[4 * c + 1]) * ratio;
    const across = cellSquare(current, edges[4 * c + 2], edges[4 * c + 3]) / ratio;
    const lost = (impedance.re * (along + across)) / 2;
    power.underside += lost * shares.underside;
    power.top += lost * shares.top;
    power.edges += lost * shares.edges;
  }
  return power;
}

function belowPower(b: PoweredBoard): Pick<PowerBudget, 'ground' | 'dielectric'> {
  const { setup, medium, frequency, current, feeds } = b;
  const lossless = losslessMedium(medium);
  const same =
    medium.lossTangent === 0 &&
    medium.groundImpedance.re === 0 &&
    (medium.cover ? medium.cover.lossTangent === 0 : true);
  if (same) return { ground: 0, dielectric: 0 };
  const { mesh } = setup;
  const nothing = mesh.rectangles.map(() => complex(0));
  const power = (slab: SlabMedium): number => {
    const y = complexVector(mesh.unknowns);
    boardOperator(setup, slab, frequency, nothing).apply(current, y);
    let total = 0;
    for (let u = 0; u < mesh.unknowns; u++) total += current.re[u] * y.re[u] + current.im[u] * y.im[u];
    return total / 2;
  };
  const whole = power(medium) - power(lossless);
  const onFeeds = feeds.reduce((sum, { port, line }) => sum + feedLoss(b, port, line), 0);
  const lost = Math.max(0, whole - onFeeds);
  const share = groundShare(b);
  return { ground: lost * share, dielectric: lost * (1 - share) };
}

/** Of the loss in slab and ground: that of a matched feed line; without one, of a wide line, Rs/η0h against k tan δ. */
function groundShare({ feeds, medium, frequency }: PoweredBoard): number {
  if (feeds.length > 0) {
    const { ground, dielectric } = line0(feeds);
    return ground / (ground + dielectric);
  }
  const ground = medium.groundImpedance.re / (2 * Math.PI * frequency * MU0 * medium.height);
  return ground / (ground + medium.lossTangent);
}

/** Loss per length of a matched line by ground and dielectric. */
const line0 = (feeds: PoweredBoard['feeds']): { ground: number; dielectric: number } => {
  const { line } = feeds[0];
  return {
    ground: line.seriesResistanceByFace.ground,
    dielectric: line.shuntConductance * line.impedance ** 2,
  };
};

/** Ground and dielectric loss on the cells of a feed line: R|I|²/2 of the current along, and G|V|²/2 = GZ²|I|²/2 on average. */
function feedLoss({ setup, current }: PoweredBoard, port: MeshPort, line: MicrostripLine): number {
  const { mesh } = setup;
  const { i0, i1, j0, j1 } = port.cells;
  const along = port.line.axis === 'x';
  const { ground, dielectric } = line0([{ port, line }]);
  let squares = 0;
  const [from, to] = along ? [i0, i1] : [j0, j1];
  // From the edge before its first cell to that after its last, which belong to it by half.
  for (let e = Math.max(0, from - 1); e < to; e++) {
    const share = e === from - 1 || e === to - 1 ? 0.5 : 1;
    let [re, im] = [0, 0];
    for (let n = along ? j0 : i0; n < (along ? j1 : i1); n++) {
      const u = along ? mesh.xEdge[n * mesh.nx + e] : mesh.yEdge[e * mesh.nx + n];
      if (u < 0) continue;
      re += current.re[u];
      im += current.im[u];
    }
    squares += share * (re * re + im * im);
  }
  return ((ground + dielectric) * squares * (along ? mesh.grid.dx : mesh.grid.dy)) / 2;
}
