/**
 * A cut moved so that it shows the corrected figures: turned by the difference in direction, stretched about its maximum by
 * the ratio of widths, its levels below the half-power points moved with the highest sidelobe. Lobes keep their order.
 */
import type { CutDifference } from './correction-model.js';
import type { Cut, CutFigures } from './results.js';

const HALF_POWER_DB = 10 * Math.log10(0.5);
/** A lobe nearer to the half-power level than this leaves no room to move levels between the two. */
const ROOM_DB = 0.5;
/** No lobe is higher than the main one. */
const HIGHEST_SIDELOBE_DB = -0.01;

/** @param gainDb change of the maximum, dB */
export function correctedCut(
  cut: Cut,
  figures: CutFigures,
  by: CutDifference,
  gainDb: number,
): { readonly cut: Cut; readonly figures: CutFigures } {
  const { angle, gainDbi } = cut;
  const stretch = Math.exp(by.width);
  const moved: CutFigures = {
    beamDirection: Math.max(-Math.PI / 2, Math.min(Math.PI / 2, figures.beamDirection + by.direction)),
    halfPowerBeamwidth: figures.halfPowerBeamwidth * stretch,
    sidelobeDb: Math.min(HIGHEST_SIDELOBE_DB, figures.sidelobeDb + by.sidelobeDb),
  };
  const peak = gainDbi.reduce((a, b) => Math.max(a, b));
  const level = levelMap(figures.sidelobeDb, moved.sidelobeDb);
  const first = angle[0];
  const step = (angle[angle.length - 1] - first) / (angle.length - 1);
  return {
    figures: moved,
    cut: {
      ...cut,
      gainDbi: angle.map((a) => {
        const from = figures.beamDirection + (a - moved.beamDirection) / stretch;
        const place = Math.max(0, Math.min(angle.length - 1, (from - first) / step));
        const below = Math.min(angle.length - 2, Math.floor(place));
        const part = place - below;
        const found = (1 - part) * gainDbi[below] + part * gainDbi[below + 1];
        return peak + gainDb + level(found - peak);
      }),
    },
  };
}

/** Levels relative to the maximum, dB; NaN for a cut without a sidelobe, whose levels stay. */
function levelMap(from: number, to: number): (level: number) => number {
  if (!Number.isFinite(to) || from === to) return (level) => level;
  const knee = Math.max(from, to) < HALF_POWER_DB - ROOM_DB ? HALF_POWER_DB : 0;
  const slope = (to - knee) / (from - knee);
  return (level) => (level >= knee ? level : level <= from ? level + to - from : knee + (level - knee) * slope);
}
