import type { FeedDocument } from './documents/feed-document.js';
import { type MakeFigure, si } from './figures.js';
import type { FeedNetwork, FeedPath } from './model.js';
import type { Path } from './problem.js';
import { lineOf } from './resolve-array.js';
import type { Transitions } from './transitions.js';

/** Weights of every column, and its path where one is given; a network computes its own. */
export function feedOf(doc: FeedDocument, columns: number, figure: MakeFigure): readonly FeedPath[] {
  return Array.from({ length: columns }, (_, i) => {
    const path = Array.isArray(doc.path) ? doc.path[i]! : doc.path;
    const place: Path = Array.isArray(doc.path) ? ['feed', 'path', i, 'loss'] : ['feed', 'path', 'loss'];
    return {
      amplitude: doc.amplitude[i]!,
      phase: doc.phase ? si(doc.phase[i]!, 'angle') : 0,
      ...(path?.loss ? { lossDb: figure(path.loss, 'level', place) } : {}),
      ...(path?.line ? { line: lineOf(path.line) } : {}),
    };
  });
}

export function networkOf(doc: NonNullable<FeedDocument['network']>, transitions: Transitions): FeedNetwork {
  const transition = doc.transition && transitions.get(doc.transition);
  if (doc.transition && transition === undefined) throw new Error('an unread transition reached the model');
  return {
    divider: doc.divider,
    lineWidth: si(doc.line_width, 'length'),
    trunkLength: si(doc.trunk_length, 'length'),
    levelLength: si(doc.level_length, 'length'),
    ...(transition === undefined ? {} : { transition }),
  };
}
