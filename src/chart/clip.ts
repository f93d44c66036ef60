type Point = readonly [number, number];

/**
 * Pieces of a line inside a rectangle, cut at its edges. Charts are cut in data, not by the painter: pages then hold no
 * clip definitions whose ids could meet, and the PDF needs none. Points that are not finite break the line.
 */
export function clipLine(
  points: readonly Point[],
  [x0, x1]: readonly [number, number],
  [y0, y1]: readonly [number, number],
): Point[][] {
  const pieces: Point[][] = [];
  let piece: Point[] = [];
  const end = () => {
    if (piece.length > 1) pieces.push(piece);
    piece = [];
  };
  for (let i = 1; i < points.length; i += 1) {
    const cut = clipSegment(points[i - 1], points[i], x0, x1, y0, y1);
    if (cut === undefined) {
      end();
      continue;
    }
    const last = piece.at(-1);
    if (last === undefined || last[0] !== cut[0][0] || last[1] !== cut[0][1]) {
      end();
      piece.push(cut[0]);
    }
    piece.push(cut[1]);
  }
  end();
  return pieces;
}

/** Liang and Barsky 1984: parameters of entry and exit against the four edges. */
function clipSegment(
  a: Point,
  b: Point,
  x0: number,
  x1: number,
  y0: number,
  y1: number,
): readonly [Point, Point] | undefined {
  if (![...a, ...b].every(Number.isFinite)) return undefined;
  const dx = b[0] - a[0];
  const dy = b[1] - a[1];
  let enter = 0;
  let leave = 1;
  const edges: readonly Point[] = [
    [-dx, a[0] - x0],
    [dx, x1 - a[0]],
    [-dy, a[1] - y0],
    [dy, y1 - a[1]],
  ];
  for (const [p, q] of edges) {
    if (p === 0 && q < 0) return undefined;
    if (p < 0) enter = Math.max(enter, q / p);
    if (p > 0) leave = Math.min(leave, q / p);
  }
  if (enter > leave) return undefined;
  const at = (t: number): Point => (t === 0 ? a : t === 1 ? b : [a[0] + t * dx, a[1] + t * dy]);
  return [at(enter), at(leave)];
}
