import type { LinesChart } from '../dossier/document.js';
import { clipLine } from './clip.js';
import {
  type EndLabel,
  endLabels,
  flagLayers,
  frameSpec,
  type Layer,
  labelMargin,
  limitBoxes,
  limitHatch,
  limitLabelPlaces,
  makeFrame,
  polylines,
  strokes,
  symbols,
  texts,
  toPixels,
  type VegaLiteSpec,
} from './frame.js';
import { alongLine, type Box, choosePlace, shorten } from './labels.js';
import { fitDomain, niceStep } from './scale.js';
import type { LineStyle, Theme } from './theme.js';

/** Lines over a common axis, with a shaded band between its edges, limits and vertical marks. */
export function linesSpec(chart: LinesChart, theme: Theme): VegaLiteSpec {
  const xType = chart.xScale ?? 'linear';
  const yType = chart.yScale ?? 'linear';
  const [xDomain, yDomain] = domains(chart, xType, yType);
  const fine = niceStep(xDomain[1] - xDomain[0], 8);
  const xStep = chart.xWhole ? Math.max(1, fine) : fine;
  const yStep = niceStep(yDomain[1] - yDomain[0], 7);
  const named = [
    ...chart.series.map((series) => ({ text: series.label, bold: series.emphasis === true })),
    ...(chart.band === undefined ? [] : [{ text: chart.band.label }]),
  ];
  const frame = makeFrame({
    theme,
    height: 300,
    xType,
    yType,
    xDomain,
    yDomain,
    xStep,
    yStep,
    endLabels: named,
    flags: (chart.marks ?? []).map((mark) => ({ text: mark.label, at: mark.at })),
  });

  const emphasised = chart.series.some((series) => series.emphasis);
  // The emphasised line alone is then solid.
  const styles = emphasised ? theme.series.slice(1) : theme.series;
  let next = 0;
  const ends: EndLabel[] = [];
  const pixels: (readonly [number, number])[] = [];
  const curves = chart.series.map((series) => {
    const style = series.emphasis ? theme.emphasis : styles[next++ % styles.length];
    const { plain, stuck } = splitCurve(series, xDomain, yDomain);
    const dotted: LineStyle = { ...style, dash: theme.saturated };
    const last = [...plain, ...stuck].at(-1)?.at(-1);
    ends.push({
      text: series.label,
      at: last === undefined ? frame.height : frame.y.toPixel(last[1]),
      style: stuck.length > 0 && plain.length === 0 ? dotted : style,
      bold: series.emphasis === true,
      ...(series.symbol === undefined ? {} : { symbol: series.symbol }),
    });
    for (const piece of [...plain, ...stuck]) pixels.push(...alongLine(toPixels(frame, piece)));
    if (series.symbol !== undefined) {
      const shown = series.points.filter(([x, y]) => within(x, xDomain) && within(y, yDomain));
      return { layers: [symbols(shown, series.symbol, style, theme)], emphasis: true };
    }
    return {
      layers: [
        ...(plain.length === 0 && stuck.length > 0 ? [] : [polylines(plain, style)]),
        ...(stuck.length === 0 ? [] : [polylines(stuck, dotted)]),
      ],
      emphasis: series.emphasis === true,
    };
  });
  const band = chart.band === undefined ? [] : bandLayer(chart.band.points, xDomain, yDomain, theme);
  if (chart.band !== undefined) {
    const last = chart.band.points.filter(([x]) => x >= xDomain[0] && x <= xDomain[1]).at(-1);
    const middle =
      last === undefined ? yDomain[0] : yType === 'log' ? Math.sqrt(last[1] * last[2]) : (last[1] + last[2]) / 2;
    ends.push({ text: chart.band.label, at: frame.y.toPixel(middle), fill: theme.figure.band });
  }

  const limit: LineStyle = { color: theme.figure.limit, dash: [], width: 2 };
  const hatch: LineStyle = { color: theme.figure.limit, dash: [], width: 0.8 };
  const taken: Box[] = [];
  const limits: Layer[] = [];
  for (const entry of chart.limits ?? []) {
    const piece = {
      from: frame.x.toPixel(Math.max(xDomain[0], entry.from ?? xDomain[0])),
      to: frame.x.toPixel(Math.min(xDomain[1], entry.to ?? xDomain[1])),
      level: frame.y.toPixel(entry.level),
    };
    if (!(piece.to > piece.from) || !(piece.level >= 0 && piece.level <= frame.height)) continue;
    const side = entry.forbidden ?? 'above';
    if (entry.forbidden !== undefined)
      limits.push(strokes(frame, limitHatch(piece.from, piece.to, piece.level, side, hatch).lines, hatch));
    limits.push(strokes(frame, [[piece.from, piece.level, piece.to, piece.level]], limit));
    const text = shorten(entry.label, theme.chartFontSize, frame.width * 0.6);
    taken.push(...limitBoxes([piece], side));
    const place = choosePlace(limitLabelPlaces(frame, text, [piece], side), taken, pixels);
    taken.push(place);
    limits.push(
      texts(frame, [{ x: place.x + labelMargin, y: place.y + place.height / 2, text }], { color: theme.figure.limit }),
    );
  }

  return frameSpec(
    frame,
    { x: chart.xTitle, y: chart.yTitle },
    [
      ...band,
      ...flagLayers(frame),
      ...limits,
      ...curves.filter((curve) => !curve.emphasis).flatMap((curve) => curve.layers),
      ...curves.filter((curve) => curve.emphasis).flatMap((curve) => curve.layers),
      ...endLabels(frame, ends),
    ],
    { x: xStep, y: yStep },
  );
}

const within = (value: number, [low, high]: readonly [number, number]): boolean => value >= low && value <= high;

/** The part of a curve whose model still tells something, and the part from its ceiling on. */
function splitCurve(
  { points, saturatedFrom }: LinesChart['series'][number],
  [x0, x1]: readonly [number, number],
  yDomain: readonly [number, number],
) {
  if (saturatedFrom === undefined || saturatedFrom > x1)
    return { plain: clipLine(points, [x0, x1], yDomain), stuck: [] };
  const stuck = clipLine(points, [Math.max(x0, saturatedFrom), x1], yDomain);
  return { plain: saturatedFrom <= x0 ? [] : clipLine(points, [x0, saturatedFrom], yDomain), stuck };
}

function domains(chart: LinesChart, xType: 'linear' | 'log', yType: 'linear' | 'log') {
  const xs = chart.series.flatMap((series) => series.points.map(([x]) => x));
  const xDomain = chart.xDomain ?? plainDomain([...xs, ...(chart.marks ?? []).map((mark) => mark.at)], xType);
  const within = ([x]: readonly [number, ...number[]]) => x >= xDomain[0] && x <= xDomain[1];
  const ys = [
    ...chart.series.flatMap((series) => series.points.filter(within).map(([, y]) => y)),
    ...(chart.band?.points ?? []).filter(within).flatMap(([, low, high]) => [low, high]),
    ...(chart.limits ?? []).map((entry) => entry.level),
  ];
  return [xDomain, chart.yDomain ?? fitDomain(ys, yType)] as const;
}

/** The range of the data itself: an axis of frequency or roughness is not widened. */
function plainDomain(values: readonly number[], type: 'linear' | 'log'): readonly [number, number] {
  const finite = values.filter((value) => Number.isFinite(value) && (type === 'linear' || value > 0));
  const low = Math.min(...finite);
  const high = Math.max(...finite);
  return high > low ? [low, high] : fitDomain(finite, type);
}

function bandLayer(
  points: readonly (readonly [number, number, number])[],
  [x0, x1]: readonly [number, number],
  [y0, y1]: readonly [number, number],
  theme: Theme,
): Layer[] {
  const clamp = (y: number) => Math.max(y0, Math.min(y1, y));
  const shown = points.filter(([x, low, high]) => x >= x0 && x <= x1 && Number.isFinite(low) && Number.isFinite(high));
  // A pale ground alone would not stand out from the paper: its edges are drawn.
  const edge: LineStyle = { color: theme.figure.accent, dash: [], width: 0.6 };
  const edges = [1, 2].flatMap((side) =>
    clipLine(
      shown.map((p) => [p[0], p[side]] as const),
      [x0, x1],
      [y0, y1],
    ),
  );
  return [
    {
      data: { values: shown.map(([x, low, high]) => ({ x, y: clamp(low), y2: clamp(high) })) },
      mark: { type: 'area', color: theme.figure.band, opacity: 1, line: false },
      encoding: { y2: { field: 'y2' } },
    },
    ...(edges.length === 0 ? [] : [polylines(edges, edge)]),
  ];
}
