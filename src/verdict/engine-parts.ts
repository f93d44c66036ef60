/** Parts of the uncertainty that the engines have: the accuracy of the one that a figure rests on, and what carrying it leaves open. */
import type { Requirement } from '../manifest/model.js';
import type { BoardStudy } from '../study/results.js';
import type { Spread } from './accuracy-spread.js';
import { DIRECTION_ERROR, engineAccuracyOf, UNCONFIRMED_FACTOR } from './engine-accuracy.js';
import { directionRemains, remainsOf } from './engine-remains.js';
import { fullWaveAccuracyOf } from './full-wave-accuracy.js';
import { lineOutside } from './line-range.js';
import { limitOf } from './quantities.js';
import type { UncertaintyPart } from './uncertainty-part.js';
import type { WorstValue } from './worst.js';

/** Which engine's accuracy a figure has, and how much of it counts. */
function accuracyFor({ confirmation }: BoardStudy, { quantity }: Requirement) {
  const network = { accuracy: engineAccuracyOf(quantity), factor: 1, label: 'Engine accuracy', words: '' };
  // Lines are solved by themselves, whatever the columns are solved by.
  if (quantity === 'line_loss') return network;
  const confirmed = confirmation.kind === 'full wave' ? fullWaveAccuracyOf(quantity) : undefined;
  if (confirmed) return { accuracy: confirmed, factor: 1, label: 'Engine accuracy, full wave', words: 'full wave: ' };
  return {
    ...network,
    factor: UNCONFIRMED_FACTOR,
    label: 'Engine accuracy, network only',
    words: `network only, so ${UNCONFIRMED_FACTOR} times the accuracy found on other boards: `,
  };
}

/** Engine accuracy at the least favourable value over the estimates (adverse) and at the most favourable (favourable). */
export function engineLevel(
  study: BoardStudy,
  requirement: Requirement,
  lowest: WorstValue,
  highest: WorstValue,
): UncertaintyPart {
  const { accuracy, factor, label, words } = accuracyFor(study, requirement);
  const lowestPiece = Math.min(...(requirement.mask ?? []).map((piece) => piece.levelDb));
  const outside = requirement.quantity === 'line_loss' ? lineOutside(study.board) : [];
  const spread = (worst: WorstValue): Spread => {
    const { up, down } = accuracy.spread(requirement.quantity === 'pattern_mask' ? lowestPiece : worst.value, {
      reflection: Math.sqrt(Math.max(0, 1 - worst.mismatch)),
      outside: outside.length > 0,
    });
    return { up: factor * up, down: factor * down };
  };
  return {
    id: 'engine',
    kind: 'engine',
    label,
    detail: `${words}${accuracy.statement} (${accuracy.source})${outside.length === 0 ? '' : `; outside here: ${outside.join('; ')}`}`,
    ...sidesOf(requirement, spread(lowest), spread(highest)),
  };
}

/** What a correction by the full wave leaves open between the frequencies where it ran, and in other states. */
export function carriedOver(
  { confirmation, board }: BoardStudy,
  requirement: Requirement,
  lowest: WorstValue,
  highest: WorstValue,
): UncertaintyPart[] {
  if (confirmation.kind !== 'full wave' || !confirmation.correction) return [];
  const { correction, carriedFrom, points } = confirmation;
  const spread = (worst: WorstValue) => remainsOf(correction, board, requirement, worst);
  const [against, forIt] = [spread(lowest), spread(highest)];
  if (!against || !forIt) return [];
  const from = carriedFrom === undefined ? 'nominal state' : carriedFrom;
  return [
    {
      id: 'engines',
      kind: 'engine',
      label: 'Full wave to network',
      detail: `what the engines differ by is known at ${points.length} frequencies (${from}) and carried to all others and to every state; how it varies between them`,
      ...sidesOf(requirement, against, forIt),
    },
  ];
}

function sidesOf(requirement: Requirement, against: Spread, forIt: Spread) {
  const rising = limitOf(requirement).direction === 'at_most';
  return { adverse: rising ? against.up : against.down, favourable: rising ? forIt.down : forIt.up };
}

/**
 * @param worst  where the pattern is compared
 * @param effect of moving it by an angle (rad) both ways
 */
export function directionPart(
  { confirmation }: BoardStudy,
  { cut = 'elevation' }: Requirement,
  worst: readonly WorstValue[],
  effect: (shift: number) => { readonly adverse: number; readonly favourable: number },
): UncertaintyPart {
  const correction = confirmation.kind === 'full wave' ? confirmation.correction : undefined;
  const shift = correction
    ? Math.hypot(
        DIRECTION_ERROR,
        Math.max(...worst.map(({ where }) => directionRemains(correction, cut, where.frequency))),
      )
    : UNCONFIRMED_FACTOR * DIRECTION_ERROR;
  const { adverse, favourable } = effect(shift);
  return {
    id: 'engine-direction',
    kind: 'engine',
    label: 'Engine accuracy, direction',
    detail: `pattern moved by ±${((shift * 180) / Math.PI).toFixed(2)} deg against the mask (accuracy of the beam direction)`,
    adverse: Math.max(0, adverse),
    favourable: Math.max(0, favourable),
  };
}
