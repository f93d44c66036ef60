import { type Contents, fixtureText, load, packOf } from './fixture.js';

const PATCHES = '  patches: { count: 4, length: 1.06 mm, widths: [0.70 mm, 1.00 mm], mirrored: true }\n';
const LINKS = '  links: { width: 0.15 mm, length: 1.24 mm }\n';
const BOARD = 'boards/qs-1.yaml';

export interface ArrayText {
  /** Keys of `array` beside those of the example, each a line indented by two. */
  readonly array?: string;
  /** Leaves out patches and links. */
  readonly undrawn?: boolean;
  readonly columns?: number;
  readonly amplitude?: string;
  /** In place of the example's path; keys of `feed`. */
  readonly feed?: string;
}

/** The example board with another array or feed. */
export function boardText({ array = '', undrawn = false, columns = 3, amplitude, feed }: ArrayText): string {
  const replaced: [string, string][] = [
    ['  columns: 3\n', `  columns: ${columns}\n`],
    [PATCHES + LINKS, `${undrawn ? '' : PATCHES + LINKS}${array}`],
    ['  phase: [0 deg, 0 deg, 0 deg]\n', ''],
    ['[0.7, 1, 0.7]', amplitude ?? `[${new Array(columns).fill(1).join(', ')}]`],
  ];
  let text = fixtureText(BOARD);
  for (const [from, to] of replaced) {
    if (!text.includes(from)) throw new Error(`${BOARD} does not hold ${from}`);
    text = text.replace(from, () => to);
  }
  return feed === undefined ? text : text.replace(/ {2}path:\n.*\n/, () => feed);
}

export const withArray = (change: ArrayText): Contents => ({ [BOARD]: boardText(change) });

/** The first board, and the one based on it. */
export const boardsOf = (change: ArrayText, more: Contents = {}) =>
  packOf(load({ ...withArray(change), ...more })).boards;
export const boardOf = (change: ArrayText, more: Contents = {}) => boardsOf(change, more)[0]!;
