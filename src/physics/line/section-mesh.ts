import type { StripSection } from './strip-section.js';

/** Media of a section; an element of the strip touches one, an interface parts two. */
export const SLAB = 0;
export const COVER = 1;
export const AIR = 2;
export type Medium = typeof SLAB | typeof COVER | typeof AIR;

export type StripFace = 'underside' | 'edges' | 'top';

/** A straight run of elements over the half y ≥ 0; its left-hand normal points out of the strip, or from `below` to `above`. */
export interface Run {
  readonly nodes: readonly (readonly [y: number, z: number])[];
  /** What the run is part of. */
  readonly part:
    | { readonly kind: 'strip'; readonly face: StripFace; readonly medium: Medium }
    | { readonly kind: 'interface'; readonly below: Medium; readonly above: Medium };
  /** Exponent a of the density r^−a towards a corner of the strip at either end; 0: none there. */
  readonly cornerStart: number;
  readonly cornerEnd: number;
}

/** Elements of a run between two points, fine towards the ends that ask for it: node distances grow as s^GRADING. */
const GRADING = 4;

export type Point = readonly [y: number, z: number];

export function fractions(count: number, fineStart: boolean, fineEnd: boolean): number[] {
  const out: number[] = [];
  for (let i = 0; i <= count; i++) {
    const s = i / count;
    if (fineStart && fineEnd) out.push(s <= 0.5 ? (2 * s) ** GRADING / 2 : 1 - (2 - 2 * s) ** GRADING / 2);
    else if (fineEnd) out.push(1 - (1 - s) ** GRADING);
    else if (fineStart) out.push(s ** GRADING);
    else out.push(s);
  }
  return out;
}

export const between = (a: Point, b: Point, parts: readonly number[]): Point[] =>
  parts.map((f) => [a[0] + f * (b[0] - a[0]), a[1] + f * (b[1] - a[1])] as const);

/** Nodes on a line of constant z from y = from to y = to, element sizes growing from `first` by the factor `growth`. */
export function growing(from: number, to: number, z: number, first: number, growth: number): Point[] {
  const length = Math.abs(to - from);
  const count = Math.max(2, Math.ceil(Math.log(1 + (length * (growth - 1)) / first) / Math.log(growth)));
  const total = growth ** count - 1;
  return Array.from({ length: count + 1 }, (_, i) => [from + ((to - from) * (growth ** i - 1)) / total, z] as const);
}

/** How far the interfaces are followed, in units of height plus half the width: the charge beyond falls as 1/y². */
const REACH = 25;

/** @param fineness multiplies the number of elements; 1 is what the stated accuracy rests on */
export function sectionRuns(s: StripSection, fineness: number): { strip: Run[]; interfaces: Run[] } {
  return { strip: stripRuns(s, fineness), interfaces: interfaceRuns(s, fineness) };
}

function corners(s: StripSection): { bottom: number; top: number } {
  const lean = Math.atan2((s.width - (s.topWidth ?? s.width)) / 2, s.thickness);
  // Angle of the field's space at the corner; the density goes as r^(π/angle − 1).
  const exponent = (angle: number): number => Math.max(0, 1 - Math.PI / angle);
  return { bottom: exponent(1.5 * Math.PI + lean), top: exponent(1.5 * Math.PI - lean) };
}

/** Depth of a planar coat on the wall where it does not bury the strip. */
function wallContact({ cover, thickness }: StripSection): number | undefined {
  return cover?.shape === 'planar' && cover.thickness < thickness ? cover.thickness : undefined;
}

function stripRuns(s: StripSection, fineness: number): Run[] {
  const { height: h, thickness: t } = s;
  const a = s.width / 2;
  const b = (s.topWidth ?? s.width) / 2;
  const corner = corners(s);
  const n = (count: number): number => Math.max(4, Math.round(count * fineness));
  const outer: Medium = s.cover ? COVER : AIR;
  const strip = (face: StripFace, medium: Medium) => ({ kind: 'strip', face, medium }) as const;
  const contact = wallContact(s);
  const wall: Point[] = between([a, h], [b, h + t], fractions(n(16), true, true));
  const runs: Run[] = [
    {
      nodes: between([0, h], [a, h], fractions(n(20), false, true)),
      part: strip('underside', SLAB),
      cornerStart: 0,
      cornerEnd: corner.bottom,
    },
  ];
  if (contact === undefined)
    runs.push({ nodes: wall, part: strip('edges', outer), cornerStart: corner.bottom, cornerEnd: corner.top });
  else {
    const at: Point = [a + ((b - a) * contact) / t, h + contact];
    const part = fractions(n(12), true, true);
    runs.push(
      { nodes: between([a, h], at, part), part: strip('edges', COVER), cornerStart: corner.bottom, cornerEnd: 0 },
      { nodes: between(at, [b, h + t], part), part: strip('edges', AIR), cornerStart: 0, cornerEnd: corner.top },
    );
  }
  runs.push({
    nodes: between([b, h + t], [0, h + t], fractions(n(20), true, false)),
    part: strip('top', contact === undefined ? outer : AIR),
    cornerStart: corner.top,
    cornerEnd: 0,
  });
  return runs;
}

function interfaceRuns(s: StripSection, fineness: number): Run[] {
  const { height: h, thickness: t, cover } = s;
  const a = s.width / 2;
  const b = (s.topWidth ?? s.width) / 2;
  const far = REACH * (h + a);
  const growth = 1 + 0.38 / fineness;
  const run = (nodes: Point[], below: Medium, above: Medium): Run => ({
    nodes,
    part: { kind: 'interface', below, above },
    cornerStart: 0,
    cornerEnd: 0,
  });
  const atCorner = Math.min(a, t) * 5e-4;
  const surface = growing(a, far, h, atCorner, growth);
  if (!cover) return [run(surface, SLAB, AIR)];
  const runs = [run(surface, SLAB, COVER)];
  const coat = (nodes: Point[]): void => {
    runs.push(run(nodes, COVER, AIR));
  };
  const contact = wallContact(s);
  if (contact !== undefined) {
    coat(growing(a + ((b - a) * contact) / t, far, h + contact, Math.min(atCorner, contact / 10), growth));
    return runs;
  }
  const d = cover.thickness;
  // Elements of the cover face those of the strip closely where it is thin: they share their places.
  const overTop = fractions(Math.round(20 * fineness), false, true);
  if (cover.shape === 'planar') {
    // A surface closer above the top than this would need elements of its own scale and changes nothing.
    const z = h + Math.max(d, t * 1.02);
    const first = Math.min(z - h - t, t) / 3;
    coat(between([0, z], [b, z], overTop));
    coat(growing(b, far, z, first, growth));
    return runs;
  }
  const length = Math.hypot(a - b, t);
  const [ny, nz] = [t / length, (a - b) / length];
  const wallAt = (z: number): number => a + (d - nz * (z - h)) / ny;
  const [upper, lower] = [h + t + d, h + d];
  const [yu, yl] = [wallAt(upper), wallAt(lower)];
  const first = d / 6;
  coat(between([0, upper], [yu, upper], overTop));
  coat(between([yu, upper], [yl, lower], fractions(Math.round(16 * fineness), true, true)));
  coat(growing(yl, far, lower, first, growth));
  return runs;
}
