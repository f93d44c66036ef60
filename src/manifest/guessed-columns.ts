import { SPEED_OF_LIGHT } from '../physics/constants.js';
import { microstripDispersive, openEndExtension } from '../physics/line/index.js';
import type { ArrayDocument } from './documents/array-document.js';
import { si } from './figures.js';
import type { ColumnLayout, SizedFor, StackUp } from './model.js';
import { placedColumns } from './resolve-array.js';

/**
 * Columns to stand in a model until the study has sized them: patches of equal width, half a guided wave long less their
 * open ends, and links of half a guided wave of the feed line's width, so that neighbours are in phase.
 *
 * Closed forms: width c/2f √(2/(εr+1)) (C. A. Balanis, Antenna Theory, the patch as a transmission line), lengths by the
 * dispersive permittivity and the open-end length of the line solver. No figure of a dossier rests on them.
 */
export function guessedColumns(doc: ArrayDocument, sizedFor: SizedFor, stackUp: StackUp): readonly ColumnLayout[] {
  const { frequency, patches, leastWidth, grid } = sizedFor;
  const permittivity = stackUp.laminate.material.permittivity.value;
  const height = stackUp.laminate.thickness.value;
  const line = (width: number) => ({ width, height, thickness: stackUp.strip.thickness.value, permittivity });
  const halfWave = (width: number) =>
    SPEED_OF_LIGHT / (2 * frequency * Math.sqrt(microstripDispersive(line(width), frequency).effectivePermittivity));
  const onGrid = (length: number) => Math.round(length / grid) * grid;
  const patchWidth = onGrid((SPEED_OF_LIGHT / (2 * frequency)) * Math.sqrt(2 / (permittivity + 1)));
  const linkWidth = Math.max(leastWidth, si(doc.feed_line.width, 'length'));
  const patch = {
    width: patchWidth,
    length: onGrid(halfWave(patchWidth) - 2 * openEndExtension(line(patchWidth), frequency)),
  };
  const link = { width: linkWidth, length: onGrid(halfWave(linkWidth)) };
  return placedColumns(doc, {
    patches: new Array<typeof patch>(patches).fill(patch),
    links: new Array<typeof link>(patches - 1).fill(link),
  });
}
