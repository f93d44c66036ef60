/** Closed forms from which sizing starts, and which tie a patch's length to its width throughout. */

import type { ColumnGeometry } from '../column/index.js';
import { ETA0, SPEED_OF_LIGHT } from '../constants.js';
import { microstripDispersive, openEndExtension } from '../line/index.js';
import type { SizingRequest } from './request.js';

/** Where a search begins. */
export interface ColumnGuess {
  /** Effective width, less what lines silence of it, of a patch of amplitude 1, m. */
  readonly unitMoment: number;
  /** Patch length over the resonant one. */
  readonly lengthFactor: number;
  /** Link length in half waves over the place along the column, 0 to 1. */
  link(place: number): number;
}

/**
 * Guesses for a short column, closed form for its widths: the attached lines make a patch resonate a few per cent higher, and
 * steps and thickness of the slab shorten or lengthen the links, so that the best of a few is to be tried.
 */
export function firstGuesses(request: SizingRequest, amplitudes: readonly number[]): ColumnGuess[] {
  const unitMoment = startingWidth(request, amplitudes);
  return [1, 1.03, 1.06].flatMap((lengthFactor) =>
    [0.93, 1, 1.07].map((link): ColumnGuess => ({ unitMoment, lengthFactor, link: () => link })),
  );
}

/**
 * From a shorter column that is sized already: its length factor, its links by their place, and its widths over their
 * amplitudes, narrower as more patches share the match.
 */
export function guessFrom(
  request: SizingRequest,
  amplitudes: readonly number[],
  shorter: ColumnGeometry,
  itsAmplitudes: readonly number[],
): ColumnGuess {
  const { patches, links } = shorter;
  const half = halfWave(request, links[0].width);
  const mean = (values: readonly number[]): number => values.reduce((a, b) => a + b, 0) / values.length;
  const squares = (values: readonly number[]): number => values.reduce((sum, a) => sum + a * a, 0);
  const ratio = resistanceRatio(request, amplitudes);
  const itsRatio = resistanceRatio(request, itsAmplitudes);
  const widest = itsAmplitudes.indexOf(Math.max(...itsAmplitudes));
  const moment =
    (effectiveWidth(request, patches[widest].width) - silenced(request, widest, patches.length)) /
    itsAmplitudes[widest];
  return {
    unitMoment: moment * Math.sqrt((squares(itsAmplitudes) * itsRatio) / (squares(amplitudes) * ratio)),
    lengthFactor: mean(patches.map((p) => p.length / resonantLength(request, p.width))),
    link: (place) => {
      const at = Math.min(Math.max(place * links.length - 0.5, 0), links.length - 1);
      const i = Math.min(Math.floor(at), Math.max(links.length - 2, 0));
      const next = links[Math.min(i + 1, links.length - 1)];
      return (links[i].length + (at - i) * (next.length - links[i].length)) / half;
    },
  };
}

/** Width of the parallel-plate line of the same impedance and speed as a microstrip, m. */
function effectiveWidth(request: SizingRequest, width: number): number {
  const { slab, stripThickness: thickness, frequency } = request;
  const { impedance, effectivePermittivity } = microstripDispersive(
    { width, height: slab.height, thickness, permittivity: slab.permittivity },
    frequency,
  );
  return (ETA0 * slab.height) / (impedance * Math.sqrt(effectivePermittivity));
}

/** What the lines at its edges take from a patch's effective width, m: half of theirs for each; the last has one only. */
function silenced(request: SizingRequest, patch: number, patches: number): number {
  const { feedLineWidth, linkWidth = feedLineWidth } = request;
  return (effectiveWidth(request, linkWidth) * (patch === patches - 1 ? 1 : 2)) / 2;
}

/** Width, m, with which a patch radiates an amplitude: its effective width exceeds it by little that hardly changes. */
export function widthFor(
  request: SizingRequest,
  unitMoment: number,
  patch: number,
  amplitudes: readonly number[],
): number {
  const wanted = unitMoment * amplitudes[patch] + silenced(request, patch, amplitudes.length);
  const [least, greatest] = widthLimits(request);
  let width = least;
  for (let round = 0; round < 6; round++)
    width = Math.min(greatest, Math.max(least, width + wanted - effectiveWidth(request, width)));
  return width;
}

/** Widths of a patch, m: it is wider than the lines that enter it, and narrower than half a wave in air. */
export function widthLimits(request: SizingRequest): readonly [number, number] {
  const { frequency, feedLineWidth, linkWidth = feedLineWidth, leastWidth, greatestWidth } = request;
  const half = SPEED_OF_LIGHT / (2 * frequency);
  return [Math.max(leastWidth, 1.2 * linkWidth), Math.min(half, greatestWidth ?? half)];
}

/** Part of a patch's natural width below which a match straight to the line asks too much of it. */
const TOO_NARROW = 0.8;

/**
 * Input resistance to steer for over the line's impedance: 1 but where patches would come out so narrow that lines silence
 * most of them. Then that of patches of their natural width c/2f √(2/(εr + 1)) (textbooks), for a section to transform.
 */
export function resistanceRatio(request: SizingRequest, amplitudes: readonly number[]): number {
  const natural = (SPEED_OF_LIGHT / (2 * request.frequency)) * Math.sqrt(2 / (request.slab.permittivity + 1));
  const direct = startingWidth(request, amplitudes);
  return direct < TOO_NARROW * natural ? (direct / Math.min(natural, widthLimits(request)[1])) ** 2 : 1;
}

/** Amplitudes of a column of half as many patches, read off along those of the long one. */
export function halved(amplitudes: readonly number[]): number[] {
  const [n, m] = [amplitudes.length, Math.ceil(amplitudes.length / 2)];
  const read = Array.from({ length: m }, (_, i) => {
    const at = ((i + 0.5) * n) / m - 0.5;
    const low = Math.floor(at);
    const high = Math.min(low + 1, n - 1);
    return amplitudes[low] + (at - low) * (amplitudes[high] - amplitudes[low]);
  });
  const largest = Math.max(...read);
  return read.map((a) => a / largest);
}

/** Half a guided wave less two open ends, m: resonant length of a patch of this width. */
export function resonantLength(request: SizingRequest, width: number): number {
  const { slab, stripThickness: thickness, frequency } = request;
  const geometry = { width, height: slab.height, thickness, permittivity: slab.permittivity };
  const { effectivePermittivity } = microstripDispersive(geometry, frequency);
  const open = openEndExtension({ ...geometry, thickness: 0 }, frequency);
  return SPEED_OF_LIGHT / (2 * frequency * Math.sqrt(effectivePermittivity)) - 2 * open;
}

/** Half a guided wave on a line of this width, m. */
export function halfWave(request: SizingRequest, width: number): number {
  const { slab, stripThickness: thickness, frequency } = request;
  const { effectivePermittivity } = microstripDispersive(
    { width, height: slab.height, thickness, permittivity: slab.permittivity },
    frequency,
  );
  return SPEED_OF_LIGHT / (2 * frequency * Math.sqrt(effectivePermittivity));
}

/**
 * Width of a patch of amplitude 1, m, for which the edge resistances of all patches in parallel are the line's impedance:
 * R = 90 Ω εr²/(εr − 1) (L/W)² (textbooks after Munson 1974; good to some tens of per cent, a start only).
 */
function startingWidth(request: SizingRequest, amplitudes: readonly number[]): number {
  const { slab, stripThickness: thickness, frequency, feedLineWidth } = request;
  const { impedance } = microstripDispersive(
    { width: feedLineWidth, height: slab.height, thickness, permittivity: slab.permittivity },
    frequency,
  );
  const er = slab.permittivity;
  const squares = amplitudes.reduce((sum, a) => sum + a * a, 0);
  const length = resonantLength(request, SPEED_OF_LIGHT / (3 * frequency));
  return length * Math.sqrt((90 * er * er) / (er - 1) / (impedance * squares));
}
