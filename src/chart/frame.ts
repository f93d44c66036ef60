import type { TopLevelSpec } from 'vega-lite';
import type { PointSymbol } from '../dossier/document.js';
import { textWidth } from './font.js';
import { type Box, type FlagLabel, shorten, spread, stackFlags } from './labels.js';
import { decimalsOf, linearTicks, logTicks, makeScale, type Scale } from './scale.js';
import type { LineStyle, Theme } from './theme.js';

export type VegaLiteSpec = TopLevelSpec;

/** One layer of a chart. Its x, y, x2, y2 are data values on the axes of the frame. */
export type Layer = Readonly<Record<string, unknown>>;

/** Width of every chart, margins included, in pixels. */
export const chartWidth = 660;

/** Names a line, band or area in the right margin, joined to where it ends. */
export interface EndLabel {
  readonly text: string;
  /** Pixel height in the plot where the named thing ends. */
  readonly at: number;
  readonly style?: LineStyle;
  /** Ground of a band instead of a line. */
  readonly fill?: string;
  /** Symbol instead of a line, in the colour of the style. */
  readonly symbol?: PointSymbol;
  readonly bold?: boolean;
}

export interface Frame {
  readonly theme: Theme;
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly width: number;
  readonly height: number;
  readonly x: Scale;
  readonly y: Scale;
  readonly xTicks: readonly number[];
  readonly yTicks: readonly number[];
  readonly flags: readonly FlagLabel[];
}

export interface FrameInput {
  readonly theme: Theme;
  readonly height: number;
  readonly xType: 'linear' | 'log';
  readonly yType: 'linear' | 'log';
  readonly xDomain: readonly [number, number];
  readonly yDomain: readonly [number, number];
  /** Step of a linear axis; log axes choose their own ticks. */
  readonly xStep: number;
  readonly yStep: number;
  readonly endLabels: readonly { readonly text: string; readonly bold?: boolean }[];
  readonly flags: readonly { readonly text: string; readonly at: number }[];
}

const sampleWidth = 22;
const flagRow = 14;
const longestLabel = 190;
const longestFlag = 320;

/** Measures what stands around the plot and leaves it the rest of the width. */
export function makeFrame(input: FrameInput): Frame {
  const { theme, height } = input;
  const size = theme.chartFontSize;
  const yTicks = input.yType === 'log' ? logTicks(input.yDomain) : linearTicks(input.yDomain, input.yStep);
  const tickWidth = Math.max(0, ...yTicks.map((tick) => textWidth(tickText(tick, input.yType, input.yStep), size)));
  const left = Math.max(36, Math.ceil(tickWidth) + 14);
  const labelWidth = Math.max(
    0,
    ...input.endLabels.map((label) => Math.min(longestLabel, textWidth(label.text, size, label.bold))),
  );
  const right = labelWidth === 0 ? 28 : Math.ceil(labelWidth) + sampleWidth + 16;
  const width = chartWidth - left - right;
  const x = makeScale(input.xType, input.xDomain, [0, width]);
  const shown = input.flags
    .map((flag) => ({ text: shorten(flag.text, size, longestFlag), at: x.toPixel(flag.at) }))
    .filter((flag) => flag.at >= -0.5 && flag.at <= width + 0.5);
  const flags = stackFlags(shown, size, chartWidth - left - 4);
  const rows = flags.reduce((most, flag) => Math.max(most, flag.row + 1), 0);
  return {
    theme,
    left,
    right,
    top: 26 + rows * flagRow,
    width,
    height,
    x,
    y: makeScale(input.yType, input.yDomain, [height, 0]),
    xTicks: input.xType === 'log' ? logTicks(input.xDomain) : linearTicks(input.xDomain, input.xStep),
    yTicks,
    flags,
  };
}

function tickText(value: number, type: 'linear' | 'log', step: number): string {
  return type === 'log' ? String(value) : value.toFixed(decimalsOf(step));
}

/** Plot coordinates of a frame turned into data values, so that margins can be drawn with the same two scales. */
export const toData = (frame: Frame, px: number, py: number) => ({ x: frame.x.toValue(px), y: frame.y.toValue(py) });

const dashOf = (style: LineStyle) => (style.dash.length === 0 ? {} : { strokeDash: [...style.dash] });

export const toPixels = (frame: Frame, points: readonly (readonly [number, number])[]) =>
  points.map(([x, y]) => [frame.x.toPixel(x), frame.y.toPixel(y)] as const);

/** Straight strokes given in pixels of the plot. */
export function strokes(
  frame: Frame,
  lines: readonly (readonly [number, number, number, number])[],
  style: LineStyle,
): Layer {
  return {
    data: {
      values: lines.map(([x1, y1, x2, y2]) => {
        const from = toData(frame, x1, y1);
        const to = toData(frame, x2, y2);
        return { x: from.x, y: from.y, x2: to.x, y2: to.y };
      }),
    },
    mark: { type: 'rule', color: style.color, strokeWidth: style.width, ...dashOf(style) },
    encoding: { x2: { field: 'x2' }, y2: { field: 'y2' } },
  };
}

export interface PlacedText {
  readonly x: number;
  readonly y: number;
  readonly text: string;
}

/** Texts given in pixels of the plot; `y` is their middle. */
export function texts(
  frame: Frame,
  items: readonly PlacedText[],
  look: { readonly align?: 'left' | 'right' | 'center'; readonly bold?: boolean; readonly color?: string } = {},
): Layer {
  return {
    data: { values: items.map((item) => ({ ...toData(frame, item.x, item.y), text: item.text })) },
    mark: {
      type: 'text',
      align: look.align ?? 'left',
      baseline: 'middle',
      color: look.color ?? frame.theme.figure.ink,
      fontWeight: look.bold ? 'bold' : 'normal',
    },
    encoding: { text: { field: 'text', type: 'nominal' } },
  };
}

export function polylines(pieces: readonly (readonly (readonly [number, number])[])[], style: LineStyle): Layer {
  return {
    data: { values: pieces.flatMap((piece, index) => piece.map(([x, y]) => ({ x, y, piece: index }))) },
    mark: {
      type: 'line',
      color: style.color,
      strokeWidth: style.width,
      ...dashOf(style),
      strokeJoin: 'round',
    },
    encoding: { detail: { field: 'piece', type: 'nominal' } },
  };
}

const symbolShapes: Readonly<Record<PointSymbol, { readonly shape: string; readonly filled: boolean }>> = {
  disc: { shape: 'circle', filled: true },
  square: { shape: 'square', filled: false },
  diamond: { shape: 'diamond', filled: false },
};

/** Single values on the axes of the frame, on paper so that a curve behind does not fill an open symbol. */
export function symbols(
  points: readonly (readonly [number, number])[],
  symbol: PointSymbol,
  style: LineStyle,
  theme: Theme,
): Layer {
  const { shape, filled } = symbolShapes[symbol];
  return {
    data: { values: points.map(([x, y]) => ({ x, y })) },
    mark: {
      type: 'point',
      shape,
      size: 46,
      fill: filled ? style.color : theme.figure.paper,
      stroke: style.color,
      strokeWidth: 1.6,
      opacity: 1,
    },
  };
}

/** Labels in the right margin, each behind a stroke in the style of its line that starts where the line ends. */
export function endLabels(frame: Frame, labels: readonly EndLabel[]): Layer[] {
  const size = frame.theme.chartFontSize;
  const placed = spread(
    labels.map((label) => Math.max(0, Math.min(frame.height, label.at))),
    size + 3,
    size / 2 - 4,
    frame.height - size / 2 + 2,
  );
  const leader: LineStyle = { color: frame.theme.figure.muted, dash: [], width: 0.5 };
  const edge = frame.width;
  const layers: Layer[] = [
    strokes(
      frame,
      labels.map((label, i) => [edge, Math.max(0, Math.min(frame.height, label.at)), edge + 8, placed[i]]),
      leader,
    ),
  ];
  labels.forEach((label, i) => {
    const y = placed[i];
    const from = edge + 8;
    const to = edge + 8 + sampleWidth;
    if (label.symbol !== undefined && label.style !== undefined) {
      const at = toData(frame, (from + to) / 2, y);
      layers.push(symbols([[at.x, at.y]], label.symbol, label.style, frame.theme));
    } else if (label.style !== undefined) layers.push(strokes(frame, [[from, y, to, y]], label.style));
    if (label.fill !== undefined)
      layers.push(strokes(frame, [[from, y, to, y]], { color: label.fill, dash: [], width: 9 }));
    const text = shorten(label.text, size, longestLabel);
    layers.push(texts(frame, [{ x: to + 5, y, text }], { bold: label.bold === true }));
  });
  return layers;
}

/** Vertical marks through the plot, named above it. */
export function flagLayers(frame: Frame): Layer[] {
  if (frame.flags.length === 0) return [];
  const style: LineStyle = { color: frame.theme.figure.muted, dash: [1, 2], width: 1 };
  const height = (row: number) => -9 - row * flagRow;
  const side = (align: 'left' | 'right') =>
    frame.flags
      .filter((flag) => flag.align === align)
      .map((flag) => ({ x: flag.at + (align === 'left' ? 4 : -4), y: height(flag.row), text: flag.text }));
  const layers: Layer[] = [
    strokes(
      frame,
      frame.flags.map((flag) => [flag.at, frame.height, flag.at, height(flag.row) - 6]),
      style,
    ),
  ];
  for (const align of ['left', 'right'] as const) {
    const items = side(align);
    if (items.length > 0) layers.push(texts(frame, items, { align, color: frame.theme.figure.muted }));
  }
  return layers;
}

/** Short slanted strokes on the forbidden side of a limit between two pixel positions. */
export function limitHatch(from: number, to: number, level: number, side: 'above' | 'below', style: LineStyle) {
  const lines: [number, number, number, number][] = [];
  const rise = side === 'above' ? -6 : 6;
  for (let px = from; px < to - 0.5; px += 6) {
    const run = Math.min(6, to - px);
    lines.push([px, level, px + run, level + (rise * run) / 6]);
  }
  return { lines, style };
}

/** What the strokes and the hatch of a limit cover: names of limits stay clear of it. */
export function limitBoxes(
  pieces: readonly { readonly from: number; readonly to: number; readonly level: number }[],
  side: 'above' | 'below',
): Box[] {
  const strips = pieces.map((piece) => ({
    x: piece.from,
    y: piece.level - (side === 'above' ? 7 : 1),
    width: piece.to - piece.from,
    height: 8,
  }));
  const steps = pieces.slice(1).map((piece, i) => {
    const before = pieces[i];
    const top = Math.min(before.level, piece.level);
    return { x: piece.from - 2, y: top, width: 4, height: Math.abs(before.level - piece.level) };
  });
  return [...strips, ...steps];
}

/** Free space beside the name of a limit. */
export const labelMargin = 6;

/** Where the name of a limit may stand: on the forbidden side first, along the piece, then on the other side. */
export function limitLabelPlaces(
  frame: Frame,
  text: string,
  pieces: readonly { readonly from: number; readonly to: number; readonly level: number }[],
  side: 'above' | 'below',
): Box[] {
  const width = textWidth(text, frame.theme.chartFontSize) + 2 * labelMargin;
  const height = frame.theme.chartFontSize + 2;
  const boxes: Box[] = [];
  const clamp = (x: number) => Math.max(2, Math.min(frame.width - width - 2, x));
  for (const where of [side, side === 'above' ? 'below' : 'above'] as const) {
    for (const offset of [9, 24, 40]) {
      for (const piece of [...pieces].sort((a, b) => b.to - b.from - (a.to - a.from))) {
        const y = where === 'above' ? piece.level - offset - height : piece.level + offset;
        if (y < 0 || y + height > frame.height) continue;
        for (const x of [(piece.from + piece.to - width) / 2, piece.from, piece.to - width]) {
          boxes.push({ x: clamp(x), y, width, height });
        }
      }
    }
  }
  const first = pieces[0];
  return boxes.length > 0 ? boxes : [{ x: clamp(first.from), y: Math.max(0, first.level - 9 - height), width, height }];
}

/** The chart: frame, axes with their titles (which hold the units), then the layers in painting order. */
export function frameSpec(
  frame: Frame,
  titles: { readonly x: string; readonly y: string },
  layers: readonly Layer[],
  steps: { readonly x: number; readonly y: number; readonly noYAxis?: boolean },
): VegaLiteSpec {
  const { theme } = frame;
  const size = theme.chartFontSize;
  const axis = (scale: Scale, values: readonly number[], step: number) => ({
    values: [...values],
    format: scale.type === 'log' ? '~g' : `.${decimalsOf(step)}f`,
    labelSeparation: 8,
    labelFlush: false,
    domainColor: theme.figure.muted,
    tickColor: theme.figure.muted,
    gridColor: theme.figure.grid,
    labelColor: theme.figure.ink,
    titleColor: theme.figure.ink,
    titleFontWeight: 'normal',
    tickSize: 4,
  });
  const channel = (scale: Scale) => ({
    type: 'quantitative',
    scale: {
      type: scale.type,
      domain: [...scale.domain],
      nice: false,
      ...(scale.type === 'linear' ? { zero: false } : {}),
    },
  });
  const spec = {
    $schema: 'https://vega.github.io/schema/vega-lite/v6.json',
    background: theme.figure.paper,
    width: frame.width,
    height: frame.height,
    padding: { left: frame.left, right: frame.right, top: frame.top, bottom: 42 },
    autosize: { type: 'none' },
    config: {
      // The picture has one description of its own; its parts have none.
      aria: false,
      mark: { aria: false },
      font: theme.chartFont,
      view: { stroke: null },
      text: { fontSize: size },
      axis: { labelFontSize: size, titleFontSize: size },
    },
    encoding: {
      x: {
        field: 'x',
        ...channel(frame.x),
        axis: { ...axis(frame.x, frame.xTicks, steps.x), title: titles.x, titlePadding: 6 },
      },
      y: {
        field: 'y',
        ...channel(frame.y),
        axis: steps.noYAxis
          ? null
          : {
              ...axis(frame.y, frame.yTicks, steps.y),
              title: titles.y,
              titleAngle: 0,
              titleAlign: 'left',
              titleBaseline: 'bottom',
              titleX: -frame.left + 4,
              titleY: -frame.top + 16,
            },
      },
    },
    layer: layers,
  };
  return spec as unknown as VegaLiteSpec;
}
