import type { Board, Figure } from './model.js';
import type { Answer, AskedItem, Recipient } from './procurement-model.js';

/** A figure as it would be with an offer accepted. */
export type OfferedFigure = Omit<Figure, 'path'>;

/**
 * What an answer makes of the figure it was asked for. A guaranteed range replaces spread and basis; the value is the
 * typical one, else the nominal one where it lies inside, else the middle. A typical value alone moves the value and
 * keeps the spread. Undefined where nothing was offered.
 */
export function offeredFigure(answer: Answer, item: AskedItem, asked: Figure): OfferedFigure | undefined {
  const { guaranteedLower, guaranteedUpper: upper, typical, method, notOffered } = answer;
  if (notOffered || (upper === undefined && typical === undefined)) return undefined;
  const stated = { ...(method === undefined ? {} : { method }) };
  if (upper === undefined) {
    const { minus, plus } = asked;
    return {
      value: typical!,
      minus: Math.min(minus, item.upperOnly ? typical! : minus),
      plus,
      provenance: { basis: 'typical', ...stated },
    };
  }
  // Where only the upper limit counts, the lower one stays what it was, unless the offer lies below it.
  const lower = guaranteedLower ?? Math.min(asked.value - asked.minus, upper);
  const inside = asked.value >= lower && asked.value <= upper;
  const middle = guaranteedLower === undefined ? upper : (lower + upper) / 2;
  const value = typical ?? (inside ? asked.value : middle);
  return {
    value,
    minus: Math.max(0, value - lower),
    plus: Math.max(0, upper - value),
    provenance: { basis: 'guaranteed', ...stated },
  };
}

/** A board with the figures of an answered sheet in place of those it was asked for; the same object when none is. */
export function offeredBoard(board: Board, { answers }: Recipient, items: readonly AskedItem[]): Board {
  const offers = new Map<string, { readonly answer: Answer; readonly item: AskedItem }>();
  for (const item of items) {
    const answer = answers?.rows.find((row) => row.item === item.id);
    for (const figure of item.figures)
      if (answer && figure.board === board.id) offers.set(figure.path, { answer, item });
  }
  let changed = false;
  const replaced = (value: unknown): unknown => {
    if (Array.isArray(value)) return value.map(replaced);
    if (typeof value !== 'object' || value === null) return value;
    if (isFigure(value)) {
      const offer = offers.get(value.path);
      const offered = offer && offeredFigure(offer.answer, offer.item, value);
      if (!offered) return value;
      changed = true;
      return { ...offered, path: value.path };
    }
    return Object.fromEntries(Object.entries(value).map(([key, inner]) => [key, replaced(inner)]));
  };
  const result = replaced(board) as Board;
  return changed ? result : board;
}

const isFigure = (value: object): value is Figure => 'path' in value && 'provenance' in value && 'minus' in value;
