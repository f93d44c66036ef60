import type { ColumnLayout } from '../manifest/model.js';
import type { ArrayDrawing } from './document.js';
import { rounded } from './values.js';

type DrawnColumn = ArrayDrawing['columns'][number];
type Rectangle = DrawnColumn['rectangles'][number];

const mm = (metres: number): number => rounded(metres * 1e3, 4);

/** Length of line drawn beyond the last patch of a column that ends in a load, m. */
const STUB = 1e-3;

/** A piece along the column: from `s` (0 at the first patch's near edge, growing away from the feed), m. */
interface Piece {
  readonly kind: Rectangle['kind'];
  readonly s: number;
  readonly length: number;
  readonly width: number;
  /** Off the centre line, m. */
  readonly off?: number;
  readonly patch?: number;
}

function piecesOf(column: ColumnLayout): readonly Piece[] {
  const { patches, links, matching = [], inset, termination, sideFeed, feedLine } = column;
  const pieces: Piece[] = [];
  if (sideFeed === undefined) {
    let s = 0;
    for (const { width, length } of [...matching].reverse()) {
      s -= length;
      pieces.push({ kind: 'line', s, length, width });
    }
    pieces.push({ kind: 'line', s: s - feedLine.length, length: feedLine.length, width: feedLine.width });
  }
  let s = 0;
  patches.forEach(({ width, length }, i) => {
    pieces.push({ kind: 'patch', s, length, width, patch: i });
    s += length;
    const link = links[i];
    if (link !== undefined) {
      pieces.push({ kind: 'line', s, length: link.length, width: link.width });
      s += link.length;
    }
  });
  if (inset !== undefined) {
    const entering = matching.at(-1)?.width ?? feedLine.width;
    for (const side of [-1, 1]) {
      const off = (side * (entering + inset.gap)) / 2;
      pieces.push({ kind: 'slot', s: 0, length: inset.depth, width: inset.gap, off });
    }
  }
  if (termination !== undefined) pieces.push({ kind: 'line', s, length: STUB, width: termination.width });
  return pieces;
}

/** Rectangle of the line that enters a link from the side. */
function sideLine(column: ColumnLayout): { readonly s: number; readonly rectangle: Rectangle } | undefined {
  const { sideFeed, patches, links, feedLine } = column;
  if (sideFeed === undefined) return undefined;
  const before = patches.slice(0, sideFeed.link + 1).reduce((sum, patch) => sum + patch.length, 0);
  const joined = links.slice(0, sideFeed.link).reduce((sum, link) => sum + link.length, 0);
  const s = before + joined + links[sideFeed.link].length / 2;
  const edge = links[sideFeed.link].width / 2;
  const low = sideFeed.side === 1 ? column.y + edge : column.y - edge - feedLine.length;
  return {
    s,
    rectangle: {
      kind: 'line',
      x: mm(column.x + (column.direction ?? 1) * s - feedLine.width / 2),
      y: mm(low),
      length: mm(feedLine.width),
      width: mm(feedLine.length),
    },
  };
}

/** A column to scale, mm: x and y of a rectangle are its lower corner. `amplitudes` are shares of the board's largest. */
export function drawnColumn(column: ColumnLayout, index: number, amplitudes?: readonly number[]): DrawnColumn {
  const { x, y, direction = 1, sideFeed, feedLine } = column;
  const pieces = piecesOf(column);
  const rectangles = pieces.map(({ kind, s, length, width, off = 0, patch }): Rectangle => {
    const share = patch === undefined ? undefined : amplitudes?.[patch];
    return {
      kind,
      x: mm(direction === 1 ? x + s : x - s - length),
      y: mm(y + off - width / 2),
      length: mm(length),
      width: mm(width),
      ...(share === undefined ? {} : { amplitude: { share: rounded(share, 3), text: share.toFixed(2) } }),
    };
  });
  const side = sideLine(column);
  const nearEnd = Math.min(...pieces.map(({ s }) => s));
  const farEnd = Math.max(...pieces.map(({ s, length }) => s + length));
  const terminated = column.dummy === true ? { terminated: true } : {};
  return {
    label: `Column ${index + 1}${column.dummy === true ? ', dummy' : ''}`,
    rectangles: side === undefined ? rectangles : [side.rectangle, ...rectangles],
    feed:
      side === undefined || sideFeed === undefined
        ? { x: mm(x + direction * nearEnd), y: mm(y), towards: direction === 1 ? '+x' : '-x', ...terminated }
        : {
            x: mm(x + direction * side.s),
            y: mm(y + sideFeed.side * feedLine.length),
            towards: sideFeed.side === 1 ? '-y' : '+y',
            ...terminated,
          },
    ...(column.termination === undefined ? {} : { load: { x: mm(x + direction * farEnd), y: mm(y) } }),
  };
}
