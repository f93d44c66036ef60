import type { BudgetChart } from '../dossier/document.js';
import { textWidth } from './font.js';
import { chartWidth, type Frame, frameSpec, type Layer, strokes, texts, toData, type VegaLiteSpec } from './frame.js';
import { shorten } from './labels.js';
import { decimalsOf, fitDomain, linearTicks, makeScale, niceStep, printNumber } from './scale.js';
import type { LineStyle, Theme } from './theme.js';

const rowHeight = 22;

/**
 * Gain budget as a waterfall read from top to bottom. The axis does not start at zero, so levels are points and only
 * losses, whose length counts, are bars.
 *
 * @throws Error when the losses do not lead from the first level to the last within the rounding of the figures
 */
export function budgetSpec(chart: BudgetChart, theme: Theme): VegaLiteSpec {
  const figures = [chart.start.level, chart.end.level, ...chart.losses.map((loss) => loss.change)];
  const decimals = Math.min(6, Math.max(...figures.map((value) => decimalsOf(Math.abs(value)))));
  const levels = [chart.start.level];
  for (const loss of chart.losses) levels.push(levels[levels.length - 1] + loss.change);
  const reached = levels[levels.length - 1];
  if (!(Math.abs(reached - chart.end.level) <= 0.5 * 10 ** -decimals * (chart.losses.length + 2))) {
    throw new Error(`gain budget: losses lead to ${reached}, the last level is ${chart.end.level}`);
  }

  const size = theme.chartFontSize;
  const names = [chart.start.label, ...chart.losses.map((loss) => loss.label), chart.end.label];
  const shown = names.map((name) => shorten(name, size, 200));
  const left = Math.ceil(Math.max(...shown.map((name) => textWidth(name, size, true)))) + 18;
  const right = 84;
  const width = chartWidth - left - right;
  const height = names.length * rowHeight + 6;
  const domain = fitDomain([...levels, chart.end.level], 'linear');
  const step = niceStep(domain[1] - domain[0], 8);
  const frame: Frame = {
    theme,
    left,
    right,
    top: 14,
    width,
    height,
    x: makeScale('linear', domain, [0, width]),
    y: makeScale('linear', [0, height], [height, 0]),
    xTicks: linearTicks(domain, step),
    yTicks: [],
    flags: [],
  };
  const printed = Math.min(2, Math.max(1, decimals));
  const centre = (row: number) => row * rowHeight + rowHeight / 2 + 3;
  const px = (level: number) => frame.x.toPixel(level);
  const plain: LineStyle = { color: theme.figure.muted, dash: [], width: 0.6 };

  const bars: Layer = {
    data: {
      values: chart.losses.map((loss, i) => {
        const from = toData(frame, px(levels[i]), centre(i + 1) - 7);
        const to = toData(frame, px(levels[i + 1]), centre(i + 1) + 7);
        return { x: from.x, x2: to.x, y: from.y, y2: to.y, gain: loss.change > 0 };
      }),
    },
    mark: { type: 'rect', fill: theme.figure.band, stroke: theme.figure.accent, strokeWidth: 1 },
    encoding: { x2: { field: 'x2' }, y2: { field: 'y2' } },
  };
  const last = names.length - 1;
  const points: Layer = {
    data: {
      values: [toData(frame, px(chart.start.level), centre(0)), toData(frame, px(chart.end.level), centre(last))],
    },
    mark: { type: 'point', shape: 'diamond', filled: true, size: 90, opacity: 1, color: theme.figure.ink },
  };
  const joints = levels.map(
    (level, row) =>
      [px(level), centre(row) + (row === 0 ? 0 : 7), px(level), centre(row + 1) - (row === last - 1 ? 0 : 7)] as const,
  );
  const rightOf = (row: number) => (row === 0 ? px(levels[0]) : px(Math.max(levels[row - 1], levels[row])));
  const end = px(chart.end.level);
  return frameSpec(
    frame,
    { x: `Level (${chart.unit})`, y: '' },
    [
      strokes(frame, [[0, 0, 0, height]], { ...plain, width: 1 }),
      strokes(frame, joints, plain),
      bars,
      points,
      texts(
        frame,
        chart.losses.map((loss, i) => ({
          x: rightOf(i + 1) + 7,
          y: centre(i + 1),
          text: `${printNumber(loss.change, printed, true)} dB`,
        })),
      ),
      texts(
        frame,
        [
          {
            x: px(chart.start.level) + 10,
            y: centre(0),
            text: `${printNumber(chart.start.level, printed)} ${chart.unit}`,
          },
          { x: end + 10, y: centre(last), text: `${printNumber(chart.end.level, printed)} ${chart.unit}` },
        ],
        { bold: true },
      ),
      texts(
        frame,
        shown.slice(1, -1).map((text, i) => ({ x: -8, y: centre(i + 1), text })),
        { align: 'right' },
      ),
      texts(
        frame,
        [
          { x: -8, y: centre(0), text: shown[0] },
          { x: -8, y: centre(last), text: shown[last] },
        ],
        { align: 'right', bold: true },
      ),
    ],
    { x: step, y: 1, noYAxis: true },
  );
}
