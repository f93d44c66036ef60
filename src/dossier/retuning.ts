import type { Board, ColumnLayout } from '../manifest/model.js';
import { RETUNE_LIMITS } from '../study/index.js';
import { cell, facts, number, prose, table } from './blocks.js';
import type { Block } from './document.js';
import { boardPage, link } from './links.js';
import { statedNumber, valueText } from './values.js';

/** Factor as used: always four decimals. */
export const factorText = (factor: number): string => factor.toFixed(4);
const millimetres = (metres: number): string => statedNumber(metres * 1e3, 4);

/** Each length that occurs, once, with what became of it. */
function lengthRows(drawn: readonly ColumnLayout[], columns: readonly ColumnLayout[]) {
  const rows = new Map<string, readonly [string, number, number]>();
  drawn.forEach((column, c) => {
    const add = (what: string, from: number, to: number) => rows.set(`${what} ${from}`, [what, from, to]);
    column.patches.forEach((patch, i) => {
      add('Patch', patch.length, columns[c].patches[i].length);
    });
    column.links.forEach((link, i) => {
      add('Link', link.length, columns[c].links[i].length);
    });
  });
  const all = [...rows.values()];
  return [...all.filter(([what]) => what === 'Patch'), ...all.filter(([what]) => what === 'Link')];
}

/** For page one: verdicts of a retuned layout must not pass for those of the drawing. */
export function retunedNotice({ id, retuned }: Board): readonly Block[] {
  if (retuned === undefined || 'reason' in retuned) return [];
  return [
    prose(
      { strong: 'Retuned layout. ' },
      `Every figure is of the drawn layout with its patch and link lengths multiplied by ${factorText(retuned.factor)}: see `,
      link('Board', boardPage(id), 'retuning'),
      '.',
    ),
  ];
}

/** What became of a layout that was to be retuned; nothing for a board that is studied as drawn. */
export function retuningBlocks({ retuned, columns }: Board): readonly Block[] {
  if (retuned === undefined) return [];
  if ('reason' in retuned) return [prose({ strong: 'Not retuned. ' }, `${retuned.reason}.`)];
  const { factor, drawnDb, retunedDb, drawn } = retuned;
  const { lowest, highest } = RETUNE_LIMITS;
  return [
    prose(
      { strong: 'Retuned before the study. ' },
      `Patch and link lengths of the drawing are multiplied by ${factorText(factor)}; every figure and verdict here is of the retuned layout. The factor is the one between ${lowest} and ${highest.toFixed(3)} at which the passive reflection of the worst column is least at the band centre, with the beam within half its beamwidth of broadside, with nominal copper and at nominal temperature. Widths, feed line, offsets and pitch are as drawn: this makes laminates comparable, it is not a finished layout.`,
    ),
    facts(
      'retuning',
      ['Factor of length', factorText(factor)],
      ['Passive reflection at the band centre, as drawn', valueText(drawnDb, 'dB')],
      ['The same, retuned', valueText(retunedDb, 'dB')],
    ),
    table(
      'retuned-lengths',
      'Lengths in mm before and after retuning, each that occurs',
      ['Length of', '#As drawn', '#Retuned'],
      lengthRows(drawn, columns).map(([what, from, to]) => [
        cell(what),
        number(millimetres(from)),
        number(millimetres(to)),
      ]),
    ),
  ];
}
