/** A board that is its own mirror image about a line along x: the currents of one port are the image of another's. */
import { type ComplexVector, complexVector } from '../../numerics/gmres.js';
import { mirrorOf } from './blocks.js';
import type { Mesh } from './mesh.js';
import type { MeshPort } from './port-waves.js';

export interface BoardMirror {
  /** Image of every unknown, and of every port. */
  readonly unknowns: Int32Array;
  readonly ports: readonly number[];
}

export function boardMirror(mesh: Mesh, ports: readonly MeshPort[]): BoardMirror | undefined {
  // The last row of cells is spare.
  const centre = mesh.ny - 1;
  const alike = mesh.rectangles.every((r) =>
    mesh.rectangles.some(
      (m) =>
        m.i0 === r.i0 &&
        m.i1 === r.i1 &&
        m.j0 === centre - r.j1 &&
        m.j1 === centre - r.j0 &&
        m.metal.kind === r.metal.kind &&
        Math.abs(m.metal.width - r.metal.width) < 1e-9 &&
        Math.abs(m.metal.x0 - r.metal.x0) < 1e-9 &&
        Math.abs(m.metal.x1 - r.metal.x1) < 1e-9,
    ),
  );
  if (!alike) return undefined;
  const all = Array.from({ length: mesh.unknowns }, (_, u) => u);
  const unknowns = mirrorOf(mesh, all, centre);
  if (!unknowns) return undefined;
  const images = ports.map(({ gap }) => unknowns[gap.unknowns[0]]);
  const of = images.map((image) => ports.findIndex(({ gap }) => gap.unknowns.includes(image)));
  // A gap across y would drive its image with the other sign.
  if (of.includes(-1) || ports.some((p) => p.line.axis === 'y')) return undefined;
  return { unknowns, ports: of };
}

/** Image of currents: along x as they are, across turned. */
export function mirrored(x: ComplexVector, { unknowns }: BoardMirror, xCount: number): ComplexVector {
  const image = complexVector(unknowns.length);
  for (let u = 0; u < unknowns.length; u++) {
    const sign = u < xCount ? 1 : -1;
    image.re[unknowns[u]] = sign * x.re[u];
    image.im[unknowns[u]] = sign * x.im[u];
  }
  return image;
}
