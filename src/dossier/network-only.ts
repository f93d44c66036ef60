import type { Requirement } from '../manifest/model.js';
import type { BoardStudy } from '../study/results.js';
import { quantityOf } from '../verdict/index.js';
import { caution } from './blocks.js';
import type { BoardContext } from './context.js';
import type { Block } from './document.js';
import { boardPage, link } from './links.js';

export const NETWORK_ONLY = 'network only';

const unconfirmed = ({ confirmation, nominal }: BoardStudy): boolean =>
  confirmation.kind === 'network only' && nominal.points.length > 0;

/** For titles of figures and tables of columns that no full wave stands behind: `, network only`. */
export const engineTag = (study: BoardStudy): string => (unconfirmed(study) ? `, ${NETWORK_ONLY}` : '');

/** The same beside a value that was judged: figures of the line and declared properties rest on no column engine. */
export function judgedTag(study: BoardStudy, { quantity }: Requirement): string {
  const ofColumns = quantity !== 'declared' && quantityOf(quantity).onLine === undefined;
  return ofColumns && unconfirmed(study) ? ` ${NETWORK_ONLY}` : '';
}

/** For page one. */
export function networkOnlyCaution({ board, study }: BoardContext): readonly Block[] {
  const { confirmation } = study;
  if (confirmation.kind !== 'network only' || !unconfirmed(study)) return [];
  return [
    caution('Network only: no full wave stands behind the figures of the columns', [
      `Reason: ${confirmation.reason}. Every figure marked “${NETWORK_ONLY}” rests on the fast engine alone, and its uncertainty is larger by what that engine may be off: see `,
      link('Two engines', boardPage(board.id), 'engines'),
      '.',
    ]),
  ];
}
