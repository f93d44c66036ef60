/** What a board keeps for all frequencies: its metal on the grid, ports, blocks, and prepared reactions. */
import { SPEED_OF_LIGHT } from '../constants.js';
import { microstripLine } from '../line/index.js';
import { type Block, cutBlocks } from './blocks.js';
import { type BoardMirror, boardMirror } from './board-mirror.js';
import { edgeTrims, NATURAL_EDGE } from './edge-trim.js';
import { chooseGrid, drawnColumns } from './grid.js';
import { drawMesh, type Mesh } from './mesh.js';
import { outlineOf } from './outline.js';
import { type MeshPort, meshPort } from './port-waves.js';
import type { FullWaveProblem, FullWaveSettings } from './problem.js';
import { reactionProduct } from './reaction-product.js';
import type { SlabMedium } from './slab-medium.js';
import { type PreparedReactions, prepareReactions } from './slab-reactions.js';
import { drawnSquares } from './strip-sheet.js';

export interface BoardSetup {
  readonly mesh: Mesh;
  readonly ports: readonly MeshPort[];
  readonly driven: number;
  /** Largest distance of a true edge from where the grid would have it, along and across, m; before trims. */
  readonly misfit: { readonly length: number; readonly width: number };
  readonly mirror?: BoardMirror;
  readonly blocks: readonly Block[];
  readonly reactions: PreparedReactions;
  readonly product: ReturnType<typeof reactionProduct>;
  /** Of each rectangle: ∫J²/(∫J)² of its drawn current, 1/m. */
  readonly squares: readonly number[];
}

/** By default; boards of few columns may take a finer grid along that draws them better, a single column one across too. */
const CELLS = { perPatch: 17, perLine: 2, perLineOfOne: 3, fewColumns: 3 };
/** Cells by which the blocks of the preconditioner reach into each other. */
const OVERLAP = 4;
/** Slab heights from gap and patch within which a feed line's current is not its wave's alone. */
const CLEAR = 2.5;
/**
 * Guided wavelengths of feed line that are read, and of stub behind the gap. Gap and stub also excite the board through space:
 * between 0.6 and 2.1 wavelengths that moves the reflection of columns by 0.01, the edge resistance of a lone narrow patch by 10 %
 * and the coupling of neighbours 30 dB down by 1 dB. Over two wavelengths it averages out best; beside each other long feed lines
 * couple themselves, so that boards have shorter ones. Both lengths were chosen among those tried as agreeing best with independent
 * solutions, which are driven in the same way.
 */
const READ = { oneColumn: 2.1, columns: 1.3 };
const STUB = 0.3;

export function setUpBoard(
  problem: FullWaveProblem,
  band: { readonly low: number; readonly high: number },
  settings: FullWaveSettings,
): BoardSetup {
  const { columns, slab } = problem;
  const zero = { re: 0, im: 0 };
  const feedLine = microstripLine({
    geometry: {
      width: columns[0].feedLineWidth,
      height: slab.height,
      thickness: 0,
      permittivity: slab.permittivity,
    },
    frequency: Math.sqrt(band.low * band.high),
    lossTangent: 0,
    faces: { underside: zero, top: zero, edges: zero, ground: zero },
  });
  const wavelength = SPEED_OF_LIGHT / (Math.sqrt(band.low * band.high) * Math.sqrt(feedLine.effectivePermittivity));
  const clear = CLEAR * slab.height;
  const feed = {
    run: 2 * clear + (columns.length === 1 ? READ.oneColumn : READ.columns) * wavelength,
    stub: STUB * wavelength,
  };
  const grid = chooseGrid(
    columns,
    outlineOf(columns, feed).rectangles,
    settings.cellsPerPatch ?? CELLS.perPatch,
    settings.cellsPerLine ?? (columns.length === 1 ? CELLS.perLineOfOne : CELLS.perLine),
    settings.cellsPerPatch || columns.length > CELLS.fewColumns ? 1.12 : 1.6,
    problem.stripThickness,
  );
  const outline = outlineOf(drawnColumns(columns, grid), feed);
  const layers = { ...slab, ...(problem.cover && { cover: problem.cover }) };
  const mesh = drawMesh(outline.rectangles, grid, edgeTrims(layers, problem.stripThickness));
  const ports = outline.ports.map((line) => meshPort(mesh, line, clear));
  return {
    mesh,
    ports,
    mirror: boardMirror(mesh, ports),
    misfit: misfitOf(mesh),
    driven: outline.ports.filter((p) => !p.terminated).length,
    blocks: cutBlocks(mesh, OVERLAP),
    reactions: prepareReactions({ dx: grid.dx, dy: grid.dy, nx: mesh.nx, ny: mesh.ny }, band, mediumOf(problem, slab)),
    product: reactionProduct(mesh),
    squares: mesh.rectangles.map(({ metal, i0, i1, j0, j1, trims }) => {
      const acrossX = metal.kind === 'feed' && Math.abs(metal.y1 - metal.y0 - metal.width) > 1e-9;
      return acrossX
        ? drawnSquares(i1 - i0, grid.dx, slab.height, [trims.x0, trims.x1])
        : drawnSquares(j1 - j0, grid.dy, slab.height, [trims.y0, trims.y1]);
    }),
  };
}

function misfitOf({ rectangles, grid }: Mesh): { length: number; width: number } {
  let [length, width] = [0, 0];
  for (const { metal, inwards } of rectangles) {
    if (metal.kind === 'patch')
      for (const end of [inwards.x0, inwards.x1]) length = Math.max(length, Math.abs(end - NATURAL_EDGE) * grid.dx);
    if (metal.kind !== 'feed')
      for (const side of [inwards.y0, inwards.y1]) width = Math.max(width, Math.abs(side - NATURAL_EDGE) * grid.dy);
  }
  return { length, width };
}

export const mediumOf = (
  problem: FullWaveProblem,
  slab: FullWaveProblem['slab'],
  groundImpedance: SlabMedium['groundImpedance'] = { re: 0, im: 0 },
): SlabMedium => ({
  permittivity: slab.permittivity,
  lossTangent: slab.lossTangent,
  height: slab.height,
  groundImpedance,
  ...(problem.cover && { cover: problem.cover }),
});
