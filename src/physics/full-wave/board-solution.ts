/** One frequency of a board: currents for a gap driven at every port, and from them scattering and excited fields. */
import { add, type Complex, complex, div, mul, scale, sqrt, sub } from '../../numerics/complex.js';
import { complexMatrix, factorise, solveInPlace } from '../../numerics/complex-lu.js';
import { type ComplexVector, complexVector, gmres, type LinearMap } from '../../numerics/gmres.js';
import type { ColumnConditions, ColumnSolution, ExcitedArray } from '../column/engine.js';
import { type MicrostripLine, solvedMicrostrip } from '../line/index.js';
import { boardCurrents } from './board-currents.js';
import { mirrored } from './board-mirror.js';
import { boardOperator } from './board-operator.js';
import { boardPower } from './board-power.js';
import { type BoardSetup, mediumOf } from './board-setup.js';
import { reciprocal, renormalisation } from './port-scattering.js';
import { fitWaves, type LineWaves } from './port-waves.js';
import type { FullWaveProblem, FullWaveSettings } from './problem.js';
import { fullWaveFlags } from './range.js';
import { sheetField } from './sheet-field.js';
import { losslessMedium } from './slab-medium.js';
import { solvedStrip, stripSheet, wholeSeries } from './strip-sheet.js';

/** Of the residual; the scattering of a board of three columns then lies within 5e-4 of that at 1e-6. */
export const TOLERANCE = 5e-4;
const MOST_ITERATIONS = 200;

export function solveBoard(
  setup: BoardSetup,
  problem: FullWaveProblem,
  conditions: ColumnConditions,
  settings: FullWaveSettings,
  inverseAt: (frequency: number) => LinearMap,
): ColumnSolution {
  const { frequency, faces, slab = problem.slab, stripThickness = problem.stripThickness } = conditions;
  const { mesh, ports } = setup;
  const medium = mediumOf(problem, slab, faces.ground);
  const strips = new Map<number, ReturnType<typeof solvedStrip>>();
  const stripOf = (width: number) => {
    let found = strips.get(width);
    if (!found) {
      found = solvedStrip(problem, slab, stripThickness, width, frequency);
      strips.set(width, found);
    }
    return found;
  };
  const sheets = mesh.rectangles.map(({ metal }, r) =>
    stripSheet(stripOf(metal.width), faces, frequency, setup.squares[r]),
  );
  const impedances = sheets.map((s) => s.impedance);
  const operator = boardOperator(setup, medium, frequency, impedances);
  const precondition = inverseAt(frequency);
  const lines = ports.map(({ line, rectangle }) => {
    const strip = stripOf(line.width);
    const solved = solvedMicrostrip({
      geometry: strip.section,
      frequency,
      lossTangent: slab.lossTangent,
      ...(problem.cover && { coverLossTangent: problem.cover.lossTangent }),
      faces,
      solution: strip,
    });
    const drawn = scale(impedances[rectangle], setup.squares[rectangle]);
    return { ...solved, ...drawnLine(solved, sub(drawn, wholeSeries(strip, faces, frequency))) };
  });

  let [iterations, residual] = [0, 0];
  const currents: ComplexVector[] = [];
  ports.forEach(({ gap }, k) => {
    const image = setup.mirror?.ports[k] ?? k;
    if (image < k && setup.mirror) {
      currents.push(mirrored(currents[image], setup.mirror, mesh.xCount));
      return;
    }
    const b = complexVector(mesh.unknowns);
    for (const u of gap.unknowns) b.re[u] = 1;
    const x = complexVector(mesh.unknowns);
    const tolerance = settings.tolerance ?? TOLERANCE;
    const found = gmres(operator.apply, precondition, b, x, tolerance, MOST_ITERATIONS);
    iterations = Math.max(iterations, found.iterations);
    residual = Math.max(residual, found.residual);
    currents.push(x);
  });
  // Waves in √W peak: column k of each matrix belongs to gap k.
  const n = ports.length;
  const root = lines.map((l) => Math.sqrt(l.characteristic.re));
  const forward = complexMatrix(n);
  const backward = complexMatrix(n);
  ports.forEach((port, p) => {
    currents.forEach((x, k) => {
      const { forward: a, backward: b } = fitWaves(port, lines[p].gamma, x);
      forward.re[p * n + k] = a.re * root[p];
      forward.im[p * n + k] = a.im * root[p];
      backward.re[p * n + k] = b.re * root[p];
      backward.im[p * n + k] = b.im * root[p];
    });
  });
  const lu = factorise({ n, re: forward.re.slice(), im: forward.im.slice() });
  /** Gap voltages that send the given waves on the lines. */
  function gapsFor(waves: readonly Complex[]): ComplexVector {
    const v = { re: Float64Array.from(waves, (a) => a.re), im: Float64Array.from(waves, (a) => a.im) };
    solveInPlace(lu, v.re, v.im);
    return v;
  }
  const driven = setup.driven;
  const leavingFor = (gaps: ComplexVector): Complex[] =>
    ports.map((_, p) => {
      let sum = complex(0);
      for (let k = 0; k < n; k++)
        sum = add(sum, mul(complex(backward.re[p * n + k], backward.im[p * n + k]), complex(gaps.re[k], gaps.im[k])));
      return sum;
    });
  const unit = (k: number, size: number): Complex[] => Array.from({ length: size }, (_, i) => complex(i === k ? 1 : 0));
  /** On the lines themselves, driven ports only: terminations send nothing back. */
  const read = Array.from({ length: driven }, (_, k) => leavingFor(gapsFor(unit(k, n))).slice(0, driven));
  const { mean: onLines, disagreement } = reciprocal(read);
  const references = lines
    .slice(0, driven)
    .map((l) => (problem.referenceImpedance === 'line' ? l.impedance : problem.referenceImpedance));
  const change = renormalisation(
    onLines,
    lines.slice(0, driven).map((l) => (problem.referenceImpedance === 'line' ? l.impedance : l.characteristic.re)),
    references,
  );

  function excite(incident: readonly Complex[]): ExcitedArray {
    if (incident.length !== driven) throw new RangeError(`excite: ${incident.length} waves for ${driven} columns`);
    const waves = change.lineWaves(incident);
    const all = [...waves, ...ports.slice(driven).map(() => complex(0))];
    const gaps = gapsFor(all);
    const x = complexVector(mesh.unknowns);
    currents.forEach((c, k) => {
      for (let u = 0; u < mesh.unknowns; u++) {
        x.re[u] += gaps.re[k] * c.re[u] - gaps.im[k] * c.im[u];
        x.im[u] += gaps.re[k] * c.im[u] + gaps.im[k] * c.re[u];
      }
    });
    const leaving = leavingFor(gaps);
    const feeds = ports.map((port, p) => {
      const waves: LineWaves = {
        forward: scale(all[p], 1 / root[p]),
        backward: scale(leaving[p], 1 / root[p]),
        misfit: 0,
      };
      return { port, waves, gamma: lines[p].gamma };
    });
    const source = boardCurrents(mesh, x, feeds);
    const field = sheetField(losslessMedium(medium), frequency, source);
    const reflected = change.leaving(incident);
    return {
      power: boardPower({
        setup,
        medium,
        frequency,
        current: x,
        sheets,
        field,
        source,
        incident,
        reflected,
        leaving: leaving.slice(driven),
        feeds: ports.map((port, p) => ({ port, line: lines[p] })),
      }),
      reflected,
      field,
      patchCurrents: patchCurrents(setup, x),
    };
  }

  return {
    frequency,
    scattering: change.scattering,
    referenceImpedance: references,
    flags: fullWaveFlags(problem, slab, stripThickness, frequency, residual, disagreement),
    effort: {
      unknowns: mesh.unknowns,
      iterations,
      residual,
      cellLength: mesh.grid.dx,
      cellWidth: mesh.grid.dy,
      misfitLength: setup.misfit.length,
      misfitWidth: setup.misfit.width,
    },
    excite,
  };
}

/** γ and Zc of a line whose metal has more series impedance per length than was solved for: γ² = Z'Y', Zc = Z'/γ. */
function drawnLine(
  { gamma, characteristic }: MicrostripLine,
  more: Complex,
): { gamma: Complex; characteristic: Complex } {
  const series = add(mul(gamma, characteristic), more);
  const wave = sqrt(mul(series, div(gamma, characteristic)));
  return { gamma: wave, characteristic: div(series, wave) };
}

/** ∫ Jx dS over each patch, A m. */
function patchCurrents({ mesh }: BoardSetup, x: ComplexVector): Complex[][] {
  const found: Complex[][] = [];
  for (const { metal, i0, i1, j0, j1 } of mesh.rectangles) {
    if (metal.kind !== 'patch') continue;
    while (found.length <= metal.column) found.push([]);
    const list = found[metal.column];
    while (list.length <= metal.patch) list.push(complex(0));
    let [re, im] = [0, 0];
    for (let j = j0; j < j1; j++)
      for (let i = i0; i + 1 < i1; i++) {
        const u = mesh.xEdge[j * mesh.nx + i];
        re += x.re[u];
        im += x.im[u];
      }
    list[metal.patch] = add(list[metal.patch], complex(re * mesh.grid.dx, im * mesh.grid.dx));
  }
  return found;
}
