/** Edges of a board and all that couples them outside the circuit's lines, frequency by frequency. */
import { type EdgeAdmittance, edgeAdmittance, edgePlan, edgeReach } from './edge-admittance.js';
import type { ColumnProblem, MacroPatch, RadiatingEdge, Slab } from './engine.js';
import type { LayoutCircuit } from './layout-circuit.js';
import { layoutEdges } from './layout-edges.js';
import type { LineTable } from './line-table.js';
import { macroPatches } from './macro-patches.js';
import { bareSizes, conductanceFactor, scaleConductances } from './mode-conductance.js';
import type { NetworkConstants } from './network-constants.js';
import { type PatchCoupling, patchCoupling } from './patch-coupling.js';
import { patchReach, patchReaction, reactionPlan } from './patch-currents.js';
import { slabIntegrals } from './slab-integrals.js';
import { slabPotentials } from './slab-potentials.js';

/** Matrices kept per layout: a band of some twenty frequencies at three temperatures. */
const KEPT = 64;

export interface Radiation {
  readonly edges: readonly RadiatingEdge[];
  readonly coupling: PatchCoupling;
}

export interface BoardRadiation {
  readonly patches: readonly MacroPatch[];
  at(frequency: number, slab: Slab, thickness: number, lines: LineTable): Radiation;
}

export function boardRadiation(
  problem: ColumnProblem,
  circuit: LayoutCircuit,
  maximumFrequency: number,
  constants: NetworkConstants,
): BoardRadiation {
  const { height, permittivity } = problem.slab;
  const patches = macroPatches(circuit, problem, maximumFrequency, constants);
  const { sizes, which } = bareSizes(patches);
  const bareCircuit: LayoutCircuit = {
    ...circuit,
    patches: sizes,
    edges: sizes.flatMap((_, s) => {
      const p = which.indexOf(s);
      return [circuit.edges[2 * p], circuit.edges[2 * p + 1]].map((e) => ({ ...e, patch: s, covered: 0 }));
    }),
  };
  // Pulse widths depend on the geometry alone, so the plans serve every frequency.
  const edgesOf = (of: LayoutCircuit, widthOf: (width: number) => number): RadiatingEdge[] =>
    layoutEdges(of, height, constants, widthOf);
  const outlines = edgesOf(circuit, (w) => w);
  const bareOutlines = edgesOf(bareCircuit, (w) => w);
  const reach = edgeReach(outlines);
  const integrals = slabIntegrals(maximumFrequency, permittivity, height, Math.max(reach, patchReach(patches)));
  const edgePairs = edgePlan(outlines, integrals);
  const barePairs = edgePlan(bareOutlines, integrals);
  const patchPairs = reactionPlan(patches, integrals);
  const sizePairs = sizes.map((size) => reactionPlan([size], integrals));

  /** Edges and their admittances hang on frequency and slab but not on loss: sweeps over losses ask for the same again. */
  const known = new Map<string, Radiation>();

  function at(frequency: number, slab: Slab, thickness: number, lines: LineTable): Radiation {
    const key = `${frequency} ${slab.permittivity} ${slab.height} ${thickness}`;
    const found = known.get(key);
    if (found) return found;
    const potentials = slabPotentials(frequency, slab.permittivity, slab.height, integrals, reach);
    const bare: EdgeAdmittance = edgeAdmittance(edgesOf(bareCircuit, lines.effectiveWidth), barePairs, potentials);
    const factors = sizes.map((size, s) => {
      const resistance = patchReaction(sizePairs[s], potentials).re[0];
      return conductanceFactor(size, bare, s, resistance, lines, constants);
    });
    const edges = edgesOf(circuit, lines.effectiveWidth);
    const own = scaleConductances(edgeAdmittance(edges, edgePairs, potentials), (p) => factors[which[p]]);
    const made = { edges, coupling: patchCoupling(circuit.edges, own, patchReaction(patchPairs, potentials)) };
    if (known.size >= KEPT) known.clear();
    known.set(key, made);
    return made;
  }

  return { patches, at };
}
