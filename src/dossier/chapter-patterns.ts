import type { Requirement } from '../manifest/model.js';
import { formatNumber } from '../quantity/index.js';
import type { Cut, PointResult } from '../study/results.js';
import { cell, chapter, figureBlock, number, prose, table } from './blocks.js';
import { NO_RESULTS } from './chapter-budget.js';
import { type BandPoints, type BoardContext, bandPoints } from './context.js';
import type { Block, Chapter, CutChart } from './document.js';
import { engineTag } from './network-only.js';
import { changeText, gigahertz, rounded, statedNumber, valueText } from './values.js';

const DEGREES = 180 / Math.PI;
export const FLOOR_DB = -40;

type Plane = Cut['plane'];
const CUTS: readonly {
  readonly plane: Plane;
  readonly name: string;
  readonly axes: string;
  readonly positive: string;
}[] = [
  { plane: 'elevation', name: 'Elevation', axes: 'x-z, E plane', positive: 'towards +x, away from the feed' },
  { plane: 'azimuth', name: 'Azimuth', axes: 'y-z, H plane', positive: 'towards +y' },
];

const maximumOf = (cut: Cut): number => cut.gainDbi.reduce((a, b) => Math.max(a, b), Number.NEGATIVE_INFINITY);

/** Curve relative to its own maximum, clipped at the floor of the chart; about one point per half degree. */
export function curve(cut: Cut): readonly (readonly [number, number])[] {
  const maximum = maximumOf(cut);
  const stride = Math.max(1, Math.round((cut.angle.length - 1) / 360));
  return Array.from(cut.angle, (angle, i) => [angle, cut.gainDbi[i]] as const)
    .filter((_, i) => i % stride === 0 || i === cut.angle.length - 1)
    .map(([angle, gain]) => [rounded(angle * DEGREES, 2), rounded(Math.max(gain - maximum, FLOOR_DB), 2)] as const);
}

/** Angles in degrees of the minima next to the main lobe: inside them a sidelobe limit does not apply. */
export function mainLobe(cut: Cut): readonly [number, number] {
  const level = cut.gainDbi;
  const top = level.indexOf(maximumOf(cut));
  const walk = (step: number): number => {
    let i = top;
    while (i + step >= 0 && i + step < level.length && level[i + step] <= level[i]) i += step;
    return cut.angle[i] * DEGREES;
  };
  return [walk(-1), walk(1)];
}

/** What the requirements of this cut allow, drawn relative to the maximum. */
function masks(requirements: readonly Requirement[], plane: Plane, points: BandPoints): CutChart['masks'] {
  const lobes = [points.low, points.centre, points.high].map((p) => mainLobe(p.cuts[plane]));
  const left = rounded(Math.min(...lobes.map(([l]) => l)), 1);
  const right = rounded(Math.max(...lobes.map(([, r]) => r)), 1);
  return requirements
    .filter((r) => r.cut === plane)
    .flatMap((r): CutChart['masks'] => {
      if (r.quantity === 'pattern_mask') {
        const pieces = (r.mask ?? []).map((p) => ({
          from: rounded(p.from * DEGREES, 3),
          to: rounded(p.to * DEGREES, 3),
          level: p.levelDb,
        }));
        return [{ label: `Mask ${r.id}`, pieces }];
      }
      if (r.quantity !== 'sidelobe_level' || r.limit?.direction !== 'at_most') return [];
      const level = r.limit.value;
      const pieces = [
        { from: -90, to: left, level },
        { from: right, to: 90, level },
      ].filter((piece) => piece.from < piece.to);
      return [{ label: `Limit ${r.id}: ${statedNumber(level)} dB`, pieces }];
    });
}

const angleText = (radians: number, signed: boolean): string => {
  if (!Number.isFinite(radians)) return 'not evaluated';
  return signed ? changeText(radians * DEGREES, 'deg') : valueText(radians * DEGREES, 'deg');
};
const levelText = (db: number): string => (Number.isFinite(db) ? valueText(db, 'dB') : 'none');

function reading(points: BandPoints, plane: Plane): string {
  const { low, centre, high } = points;
  const directions = [low, centre, high].map((p) => p[plane].beamDirection);
  return `At ${gigahertz(centre.frequency)} the half-power beamwidth is ${angleText(centre[plane].halfPowerBeamwidth, false)} and the highest sidelobe ${levelText(centre[plane].sidelobeDb)}; from the lower to the upper band edge the beam goes from ${angleText(directions[0], true)} to ${angleText(directions[2], true)}.`;
}

function cutFigure(context: BoardContext, points: BandPoints, cut: (typeof CUTS)[number]): Block {
  const drawn = masks(
    context.judged.map((j) => j.requirement),
    cut.plane,
    points,
  );
  const chosen = [...new Map([points.low, points.centre, points.high].map((p) => [p.frequency, p])).values()];
  return figureBlock({
    id: `cut-${cut.plane}`,
    title: `${cut.name} cut (${cut.axes}) at the band edges and centre, nominal temperature${engineTag(context.study)}`,
    reading: reading(points, cut.plane),
    alt: `Level over angle from −90° to 90°, relative to the maximum of each curve, at ${chosen.map((p) => gigahertz(p.frequency)).join(', ')}${drawn.length === 0 ? '; no requirement limits this cut' : `; drawn in: ${drawn.map((m) => m.label).join(', ')}`}.`,
    content: {
      chart: 'cut',
      xTitle: `Angle from broadside (°), positive ${cut.positive}`,
      yTitle: 'Level relative to the maximum (dB)',
      xDomain: [-90, 90],
      yDomain: [FLOOR_DB, 0],
      series: chosen.map((p) => ({ label: gigahertz(p.frequency), points: curve(p.cuts[cut.plane]) })),
      masks: drawn,
    },
  });
}

const figuresOfCut = (point: PointResult, plane: Plane) => [
  number(angleText(point[plane].beamDirection, true)),
  number(angleText(point[plane].halfPowerBeamwidth, false)),
  number(levelText(point[plane].sidelobeDb)),
];

function beamTables({ nominal, low, high }: BandPoints, tag: string): readonly Block[] {
  const step = nominal.length > 1 ? (high.frequency - low.frequency) / (nominal.length - 1) : 0;
  const over = `over frequency at nominal temperature, in steps of ${formatNumber(step / 1e6, 0)} MHz${tag}`;
  return [
    table(
      'gain-table',
      `Directivity and gain ${over}`,
      ['Frequency', '#Directivity', '#Gain', '#Realized gain', '#Radiation efficiency'],
      nominal.map((p) => [
        cell(gigahertz(p.frequency)),
        number(valueText(10 * Math.log10(p.directivity), 'dBi')),
        number(valueText(10 * Math.log10(p.gain), 'dBi')),
        number(valueText(10 * Math.log10(p.realizedGain), 'dBi')),
        number(valueText(p.radiationEfficiency, '1')),
      ]),
    ),
    ...CUTS.map(({ plane, name }) =>
      table(
        `${plane}-table`,
        `${name} cut ${over}`,
        ['Frequency', '#Beam direction', '#Half-power beamwidth', '#Sidelobe level'],
        nominal.map((p) => [cell(gigahertz(p.frequency)), ...figuresOfCut(p, plane)]),
      ),
    ),
  ];
}

export function patternsChapter(context: BoardContext): Chapter {
  const points = bandPoints(context);
  if (points === undefined) return chapter('patterns', 'Patterns', prose(NO_RESULTS));
  return chapter(
    'patterns',
    'Patterns',
    ...CUTS.map((cut) => cutFigure(context, points, cut)),
    ...beamTables(points, engineTag(context.study)),
    prose(
      'Each curve is relative to its own maximum. A sidelobe limit is drawn outside the main lobe only, that is beyond the minima next to it over the three frequencies.',
    ),
  );
}
