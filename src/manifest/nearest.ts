/** Edit distance with transpositions of neighbours (optimal string alignment); case costs half a step. */
function distance(a: string, b: string): number {
  const rows: number[][] = [Array.from({ length: b.length + 1 }, (_, j) => j)];
  for (let i = 1; i <= a.length; i++) {
    const row = [i];
    for (let j = 1; j <= b.length; j++) {
      const same = a[i - 1] === b[j - 1] ? 0 : a[i - 1]!.toLowerCase() === b[j - 1]!.toLowerCase() ? 0.5 : 1;
      let best = Math.min(rows[i - 1]![j]! + 1, row[j - 1]! + 1, rows[i - 1]![j - 1]! + same);
      if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1])
        best = Math.min(best, rows[i - 2]![j - 2]! + 1);
      row.push(best);
    }
    rows.push(row);
  }
  return rows[a.length]![b.length]!;
}

/** The allowed word most like the one found, when it is like enough to be what was meant. First of equals. */
export function nearest(found: string, allowed: Iterable<string>): string | undefined {
  const plain = found.slice(0, 80).replace(/[\s-]+/g, '_');
  let best: { word: string; steps: number } | undefined;
  for (const word of allowed) {
    const steps = distance(plain, word.replaceAll('-', '_'));
    if (best === undefined || steps < best.steps) best = { word, steps };
  }
  const tolerable = Math.max(1, Math.floor(plain.length * 0.4));
  return best && best.steps <= tolerable ? best.word : undefined;
}
