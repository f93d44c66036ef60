/**
 * A board's layout as a circuit without values: nodes, line sections with the steps at their ends, patch edges, ports
 * and loads. Steps stand on the side of the line, never of the patch.
 */
import type { ColumnGeometry, LineSection, MacroPatch } from './engine.js';

export interface CircuitSection {
  readonly from: number;
  readonly to: number;
  readonly width: number;
  readonly length: number;
  /** Width of the metal across the step at either end, m; 0 without a step. */
  readonly stepFrom: number;
  readonly stepTo: number;
  /** Number of the patch that the section is (or is part of), over all columns; −1 for a line. */
  readonly patch: number;
}

export interface CircuitPort {
  readonly node: number;
  readonly width: number;
  readonly step: number;
}

/** The near and then the far edge of every patch, in the order of the patches. */
export interface CircuitEdge {
  readonly node: number;
  readonly patch: number;
  readonly x: number;
  readonly y: number;
  /** +1 at the large-x edge of the patch. */
  readonly sign: 1 | -1;
  readonly width: number;
  /** Width that an attached line covers, slots included, m; 0 at an open edge. */
  readonly covered: number;
}

/** A macro patch before it is known what its lines take away. */
export type MacroOutline = Omit<MacroPatch, 'lines'>;

export interface LayoutCircuit {
  readonly nodes: number;
  readonly patches: readonly MacroOutline[];
  readonly edges: readonly CircuitEdge[];
  readonly sections: readonly CircuitSection[];
  readonly ports: readonly CircuitPort[];
  readonly loads: readonly CircuitPort[];
}

/** Widths closer than this make no step, m. */
const NO_STEP = 1e-9;

/** @throws RangeError on a layout that is not physical */
export function layoutCircuit(columns: readonly ColumnGeometry[]): LayoutCircuit {
  const patches: MacroOutline[] = [];
  const edges: CircuitEdge[] = [];
  const sections: CircuitSection[] = [];
  const ports: CircuitPort[] = [];
  const loads: CircuitPort[] = [];
  let nodes = 0;
  const node = (): number => nodes++;
  const line = (from: number, to: number, piece: LineSection, stepFrom: number, stepTo: number): void => {
    const across = (w: number): number => (Math.abs(w - piece.width) < NO_STEP ? 0 : w);
    sections.push({ ...piece, from, to, stepFrom: across(stepFrom), stepTo: across(stepTo), patch: -1 });
  };

  columns.forEach((column, c) => {
    check(column);
    const { inset, sideFeed, termination, matching = [], direction = 1 } = column;
    const entry = matching.length > 0 ? matching[matching.length - 1].width : column.feedLineWidth;
    let x = column.x;
    let last = -1;
    column.patches.forEach((patch, p) => {
      const index = patches.length;
      const near = node();
      const first = p === 0;
      const end = p === column.patches.length - 1;
      const behind = end ? (termination?.width ?? 0) : column.links[p].width;
      let tap = near;
      if (first && inset) {
        tap = node();
        const wings = patch.width - entry - 2 * inset.gap;
        const plain = { stepFrom: 0, stepTo: 0, patch: index };
        sections.push({ ...plain, from: near, to: tap, width: wings, length: inset.depth });
        const far = node();
        sections.push({ ...plain, from: tap, to: far, width: patch.width, length: patch.length - inset.depth });
        last = far;
      } else {
        const far = node();
        sections.push({ ...patch, from: near, to: far, stepFrom: 0, stepTo: 0, patch: index });
        last = far;
      }
      const covered = first ? (sideFeed ? 0 : entry + 2 * (inset?.gap ?? 0)) : column.links[p - 1].width;
      const edge = { patch: index, y: column.y, width: patch.width };
      const away = x + direction * patch.length;
      edges.push({ ...edge, node: near, x, sign: direction === 1 ? -1 : 1, covered });
      edges.push({ ...edge, node: last, x: away, sign: direction, covered: behind });
      patches.push({ ...patch, column: c, patch: p, x: (x + away) / 2, y: column.y });
      x = away + direction * (column.links[p]?.length ?? 0);

      if (first && !sideFeed) ports.push(feed(column, inset ? 0 : patch.width, patch.width, tap));
      if (end) {
        if (termination) loads.push({ node: last, width: termination.width, step: patch.width });
        return;
      }
      // The next patch's near node is the next to be given out, or the one after the feed's.
      const link = column.links[p];
      const next = column.patches[p + 1].width;
      if (sideFeed?.link === p) {
        const middle = node();
        const half = { ...link, length: link.length / 2 };
        line(last, middle, half, patch.width, 0);
        line(middle, nodes, half, 0, next);
        ports.push({ node: middle, width: column.feedLineWidth, step: 0 });
      } else line(last, nodes, link, patch.width, next);
    });
  });
  return { nodes, patches, edges, sections, ports, loads };

  /** Matching sections and, inside an inset patch, the line between the slots; returns the port. */
  function feed(column: ColumnGeometry, edgeWidth: number, patchWidth: number, tap: number): CircuitPort {
    const { matching = [], inset, feedLineWidth } = column;
    const pieces = [...matching];
    if (inset) pieces.push({ width: matching[matching.length - 1]?.width ?? feedLineWidth, length: inset.depth });
    if (pieces.length === 0) return { node: tap, width: feedLineWidth, step: edgeWidth };
    let from = node();
    const first = pieces[0].width;
    const port = { node: from, width: feedLineWidth, step: Math.abs(first - feedLineWidth) < NO_STEP ? 0 : first };
    pieces.forEach((piece, i) => {
      const end = i === pieces.length - 1;
      const to = end ? tap : node();
      line(from, to, piece, 0, end ? patchWidth : pieces[i + 1].width);
      from = to;
    });
    return port;
  }
}

function check(column: ColumnGeometry): void {
  const { patches, links, inset, sideFeed, matching = [] } = column;
  if (patches.length === 0 || links.length !== patches.length - 1)
    throw new RangeError('edgeNetwork: a column needs at least one patch, and one link fewer than patches');
  if (sideFeed && !links[sideFeed.link])
    throw new RangeError(`edgeNetwork: side feed at link ${sideFeed.link} of a column with ${links.length} links`);
  if (sideFeed && (inset || matching.length > 0))
    throw new RangeError('edgeNetwork: a column fed from the side has neither inset nor matching sections');
  if (!inset) return;
  const entry = matching[matching.length - 1]?.width ?? column.feedLineWidth;
  if (!(inset.depth > 0 && inset.depth < patches[0].length))
    throw new RangeError(`edgeNetwork: inset depth ${inset.depth} m in a patch ${patches[0].length} m long`);
  if (!(inset.gap > 0 && entry + 2 * inset.gap < patches[0].width))
    throw new RangeError(
      `edgeNetwork: line and slots take ${entry + 2 * inset.gap} m of a patch ${patches[0].width} m wide`,
    );
}
