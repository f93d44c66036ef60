import { columnLength } from './column-outline.js';
import type { ArrayDocument } from './documents/array-document.js';
import type { SizedForDocument } from './documents/sizing-document.js';
import { si } from './figures.js';
import type { Board, ColumnLayout, Link, SizedFor, Taper } from './model.js';
import { expandPieces, patchCount } from './pieces.js';

export const lineOf = (doc: { readonly width: string; readonly length: string }): Link => ({
  width: si(doc.width, 'length'),
  length: si(doc.length, 'length'),
});

/** Columns (from 0) that are never driven. */
export function dummyColumns({
  dummy_columns: dummies,
  columns,
}: Pick<ArrayDocument, 'dummy_columns' | 'columns'>): readonly number[] {
  if (dummies === undefined) return [];
  if (typeof dummies !== 'number') return dummies.map((number) => number - 1);
  return Array.from({ length: columns }, (_, i) => i).filter((i) => i < dummies || i >= columns - dummies);
}

/** +1 or −1 for every column. */
function directionOf(doc: ArrayDocument, i: number): 1 | -1 {
  if (doc.direction === 'reversed') return -1;
  return doc.direction === 'alternate' && i % 2 === 1 ? -1 : 1;
}

function sideOf(side: NonNullable<ArrayDocument['side_feed']>['side'], y: number): 1 | -1 {
  if (side === 'outward') return y < 0 ? -1 : 1;
  return side === '+y' ? 1 : -1;
}

/** Columns of an array with the given patches and links: equal but for place, direction and being driven. */
export function placedColumns(doc: ArrayDocument, pieces: Pick<ColumnLayout, 'patches' | 'links'>): ColumnLayout[] {
  const pitch = si(doc.pitch, 'length');
  const stagger = doc.stagger === undefined ? 0 : si(doc.stagger, 'length');
  const dummies = dummyColumns(doc);
  const { matching, inset, termination, side_feed: sideFeed } = doc;
  return Array.from({ length: doc.columns }, (_, i): ColumnLayout => {
    const y = (i - (doc.columns - 1) / 2) * pitch;
    const direction = directionOf(doc, i);
    const offset = doc.offset_x ? si(doc.offset_x[i]!, 'length') : i % 2 === 1 ? stagger : 0;
    return {
      y,
      // Columns that run towards −x begin where the others end, so that all lie side by side.
      x: direction === 1 ? offset : offset + columnLength(pieces),
      feedLine: lineOf(doc.feed_line),
      ...pieces,
      ...(direction === 1 ? {} : { direction }),
      ...(matching === undefined ? {} : { matching: matching.map(lineOf) }),
      ...(inset === undefined ? {} : { inset: { depth: si(inset.depth, 'length'), gap: si(inset.gap, 'length') } }),
      ...(termination === undefined ? {} : { termination: { width: si(termination.width, 'length') } }),
      ...(sideFeed === undefined ? {} : { sideFeed: { link: sideFeed.link - 1, side: sideOf(sideFeed.side, y) } }),
      ...(dummies.includes(i) ? { dummy: true } : {}),
    };
  });
}

/** Columns whose dimensions are given. */
export function drawnColumns(doc: ArrayDocument): readonly ColumnLayout[] {
  if (doc.patches === undefined) throw new Error('an array without patches reached the model');
  const count = patchCount(doc.patches);
  return placedColumns(doc, {
    patches: expandPieces(doc.patches, count),
    links: doc.links === undefined ? [] : expandPieces(doc.links, count - 1),
  });
}

export function sizedForOf(doc: SizedForDocument): SizedFor {
  return {
    frequency: si(doc.frequency, 'frequency'),
    patches: doc.patches,
    taper: taperOf(doc.taper),
    leastWidth: si(doc.least_width, 'length'),
    leastGap: si(doc.least_gap, 'length'),
    grid: si(doc.grid, 'length'),
  };
}

/** A checked taper: exactly one of its names is given. */
export function taperOf(doc: SizedForDocument['taper']): Taper {
  if (doc === 'uniform') return { kind: 'uniform' };
  const { dolph_chebyshev: chebyshev, taylor, given } = doc;
  if (chebyshev !== undefined) return { kind: 'dolph-chebyshev', sidelobeDb: si(chebyshev, 'level') };
  if (taylor !== undefined) {
    return { kind: 'taylor', sidelobeDb: si(taylor.sidelobe, 'level'), nBar: taylor.n_bar };
  }
  return { kind: 'given', amplitudes: given! };
}

export const groupsOf = (doc: NonNullable<ArrayDocument['groups']>): NonNullable<Board['groups']> =>
  doc.map(({ id, columns }) => ({ id, columns: columns.map((number) => number - 1) }));

export const scanOf = ({ low, high }: NonNullable<ArrayDocument['scan']>): NonNullable<Board['scan']> => ({
  low: si(low, 'angle'),
  high: si(high, 'angle'),
});
