import type { CutChart } from '../dossier/document.js';
import { clipLine } from './clip.js';
import {
  endLabels,
  frameSpec,
  type Layer,
  labelMargin,
  limitBoxes,
  limitHatch,
  limitLabelPlaces,
  makeFrame,
  polylines,
  strokes,
  texts,
  toPixels,
  type VegaLiteSpec,
} from './frame.js';
import { alongLine, type Box, choosePlace, shorten } from './labels.js';
import { angleStep, niceStep } from './scale.js';
import type { LineStyle, Theme } from './theme.js';

/** Pattern cut: curves named at their right end, limits as steps hatched on the side that they forbid. */
export function cutSpec(chart: CutChart, theme: Theme): VegaLiteSpec {
  const xStep = angleStep(chart.xDomain[1] - chart.xDomain[0], 8);
  const yStep = niceStep(chart.yDomain[1] - chart.yDomain[0], 8);
  const frame = makeFrame({
    theme,
    height: 320,
    xType: 'linear',
    yType: 'linear',
    xDomain: chart.xDomain,
    yDomain: chart.yDomain,
    xStep,
    yStep,
    endLabels: chart.series.map((series) => ({ text: series.label })),
    flags: [],
  });
  const [x0, x1] = chart.xDomain;
  const curves = chart.series.map((series, index) => {
    const style = theme.series[index % theme.series.length];
    const pieces = clipLine(series.points, chart.xDomain, chart.yDomain);
    const last = pieces.at(-1)?.at(-1);
    return {
      layer: polylines(pieces, style),
      pixels: pieces.flatMap((piece) => alongLine(toPixels(frame, piece))),
      label: { text: series.label, at: last === undefined ? frame.height : frame.y.toPixel(last[1]), style },
    };
  });

  const limit: LineStyle = { color: theme.figure.limit, dash: [], width: 2 };
  const hatch: LineStyle = { color: theme.figure.limit, dash: [], width: 0.8 };
  const pixels = curves.flatMap((curve) => curve.pixels);
  const taken: Box[] = [];
  const masks: Layer[] = [];
  for (const mask of chart.masks) {
    const pieces = mask.pieces
      .map((piece) => ({
        from: frame.x.toPixel(Math.max(x0, piece.from)),
        to: frame.x.toPixel(Math.min(x1, piece.to)),
        level: frame.y.toPixel(piece.level),
      }))
      .filter((piece) => piece.to > piece.from && piece.level >= 0 && piece.level <= frame.height);
    if (pieces.length === 0) continue;
    const steps = pieces.flatMap((piece, i) => {
      const next = pieces[i + 1];
      const joins = next !== undefined && Math.abs(next.from - piece.to) < 0.01;
      return joins ? [[piece.to, piece.level, piece.to, next.level] as const] : [];
    });
    masks.push(
      strokes(
        frame,
        pieces.flatMap((p) => limitHatch(p.from, p.to, p.level, 'above', hatch).lines),
        hatch,
      ),
      strokes(frame, [...pieces.map((p) => [p.from, p.level, p.to, p.level] as const), ...steps], limit),
    );
    const text = shorten(mask.label, theme.chartFontSize, frame.width * 0.6);
    taken.push(...limitBoxes(pieces, 'above'));
    const place = choosePlace(limitLabelPlaces(frame, text, pieces, 'above'), taken, pixels);
    taken.push(place);
    masks.push(
      texts(frame, [{ x: place.x + labelMargin, y: place.y + place.height / 2, text }], { color: theme.figure.limit }),
    );
  }

  return frameSpec(
    frame,
    { x: chart.xTitle, y: chart.yTitle },
    [
      ...masks,
      ...curves.map((curve) => curve.layer).reverse(),
      ...endLabels(
        frame,
        curves.map((curve) => curve.label),
      ),
    ],
    { x: xStep, y: yStep },
  );
}
