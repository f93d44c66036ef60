import type { BoardStudy } from '../study/results.js';
import type { BoardVerdict } from './judge.js';

/** Full-wave frequencies that a board gets beyond its first ones. */
const MOST = 2;
/** Nearer to a compared frequency than this share, another says nothing new. */
const APART = 1e-3;

/**
 * Frequencies, of those with a worst value, at which the full wave may decide: the margin is smaller than the uncertainty and the
 * full wave has not been run there. Binding requirements first, then in the order of the set. Empty for a board without it.
 */
export function furtherFrequencies({ confirmation }: BoardStudy, verdict: BoardVerdict): number[] {
  if (confirmation.kind !== 'full wave') return [];
  const known = confirmation.points.map(({ frequency }) => frequency);
  const near = verdict.requirements.filter(
    ({ quantity, status, calculated }) => quantity !== 'line_loss' && (calculated ?? status) === 'undecided',
  );
  const ordered = [...near.filter((r) => r.weight === 'binding'), ...near.filter((r) => r.weight !== 'binding')];
  const found: number[] = [];
  for (const { where } of ordered) {
    if (where === undefined || found.length === MOST) continue;
    const taken = [...known, ...found].some((f) => Math.abs(f - where.frequency) < APART * f);
    if (!taken) found.push(where.frequency);
  }
  return found.sort((a, b) => a - b);
}
