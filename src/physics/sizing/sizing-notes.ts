/** Says in words which limits bound a sized column and which of its goals it misses. */
import type { ColumnGeometry } from '../column/index.js';
import { type SizingRequest, withLinks } from './request.js';
import { widthLimits } from './starting-layout.js';

const GOAL_REFLECTION_DB = -15;
const GOAL_BEAM = (0.5 * Math.PI) / 180;
/** dB by which the highest lobe may exceed a level asked for. */
const LEVEL_MARGIN = 1.5;

/** Limits that bind, and sections that were added. */
export function limitNotes(request: SizingRequest, geometry: ColumnGeometry): string[] {
  const { grid } = request;
  const notes: string[] = [];
  const numbers = (found: boolean[]): string => found.flatMap((hit, i) => (hit ? [`${i + 1}`] : [])).join(', ');
  const [least, greatest] = widthLimits(withLinks(request));
  const narrow = geometry.patches.map((p) => p.width <= least + grid);
  const wide = geometry.patches.map((p) => p.width >= greatest - grid);
  if (narrow.includes(true))
    notes.push(`Patch ${numbers(narrow)} is as narrow as it may be, ${mm(least)}, and radiates more than asked for.`);
  if (wide.includes(true))
    notes.push(`Patch ${numbers(wide)} is as wide as it may be, ${mm(greatest)}, and radiates less than asked for.`);
  const close = geometry.links.map((l) => l.length < request.leastGap);
  if (close.includes(true))
    notes.push(`Link ${numbers(close)} is shorter than the least gap of ${mm(request.leastGap)}.`);
  for (const { width, length } of geometry.matching ?? [])
    notes.push(`A section ${mm(width)} wide and ${mm(length)} long before the first patch makes the match.`);
  return notes;
}

/** What an engine says of a sized column at its frequency, as far as there are goals for it. */
export interface SizedFigures {
  /** At the port, referred to the feed line. */
  readonly reflection: { readonly re: number; readonly im: number };
  /** rad */
  readonly beamDirection: number;
  /** Highest sidelobe in the plane of the column, dB. */
  readonly sidelobeDb: number;
}

/** Largest of reflection, beam direction and excess of the sidelobes, each over its goal: all are met up to 1. */
export function shortfall({ taper }: Pick<SizingRequest, 'taper'>, figures: SizedFigures): number {
  const { reflection, beamDirection, sidelobeDb } = figures;
  return Math.max(
    Math.hypot(reflection.re, reflection.im) / 10 ** (GOAL_REFLECTION_DB / 20),
    Math.abs(beamDirection) / GOAL_BEAM,
    'sidelobeDb' in taper ? (sidelobeDb + taper.sidelobeDb) / LEVEL_MARGIN : 0,
  );
}

/**
 * Goals that are missed.
 *
 * @param engine whose figures these are, in words; the network where left out
 */
export function goalNotes(
  { taper }: Pick<SizingRequest, 'taper'>,
  figures: SizedFigures,
  engine = 'network',
): string[] {
  const { reflection, beamDirection, sidelobeDb } = figures;
  const notes: string[] = [];
  const by = `by the ${engine}`;
  const db = 20 * Math.log10(Math.hypot(reflection.re, reflection.im));
  if (db > GOAL_REFLECTION_DB)
    notes.push(`Reflection is ${db.toFixed(1)} dB ${by}; the goal is ${GOAL_REFLECTION_DB} dB.`);
  if (Math.abs(beamDirection) > GOAL_BEAM)
    notes.push(
      `The beam points ${((beamDirection * 180) / Math.PI).toFixed(1)}° off broadside ${by}; the goal is 0.5°.`,
    );
  if ('sidelobeDb' in taper && sidelobeDb > LEVEL_MARGIN - taper.sidelobeDb)
    notes.push(`The highest sidelobe is ${sidelobeDb.toFixed(1)} dB ${by}; asked for are −${taper.sidelobeDb} dB.`);
  return notes;
}

const mm = (length: number): string => `${(length * 1e3).toFixed(3)} mm`;
