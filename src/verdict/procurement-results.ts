import { askedItems, offeredBoard, type Recipient } from '../manifest/index.js';
import type { Board, Pack } from '../manifest/model.js';
import type { Allowances } from './held-limits.js';
import type { BoardVerdict } from './judge.js';

/** A returned sheet put in place of what was assumed, on each board that it concerns. */
export interface Offer {
  readonly recipientId: string;
  readonly boards: readonly { readonly before: BoardVerdict; readonly after: BoardVerdict }[];
}

/** What a build calculates for the suppliers of a pack. */
export interface ProcurementResults {
  readonly allowances: Allowances;
  readonly offers: readonly Offer[];
}

/** Boards as they would be with one recipient's answers, those that change. */
export function boardsOnOffer(pack: Pack, recipient: Recipient): readonly Board[] {
  if (!pack.procurement) return [];
  const items = askedItems(recipient, pack.boards, pack.procurement);
  return pack.boards.flatMap((board) => {
    const offered = offeredBoard(board, recipient, items);
    return offered === board ? [] : [offered];
  });
}
