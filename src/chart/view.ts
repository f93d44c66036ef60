import type { LoggerInterface, View } from 'vega';
import * as vega from 'vega';
import { compile } from 'vega-lite';
import { textWidth } from './font.js';
import type { VegaLiteSpec } from './frame.js';

interface TextItem {
  readonly fontSize?: number;
  readonly fontWeight?: string | number;
  readonly limit?: number;
}

declare module 'vega' {
  /** Exported by the package, missing from its types. */
  export const textMetrics: { width: (item: TextItem, text: unknown) => number };
}

// Without a canvas the library guesses widths about 40 % too wide; the same font file as in the PDF gives the true ones.
vega.textMetrics.width = (item, text) =>
  textWidth(String(text ?? ''), item.fontSize ?? 11, item.fontWeight === 'bold' || Number(item.fontWeight) >= 600);

/** Keeps what is said instead of printing it: a chart that makes the library complain is a fault of ours. */
class CollectingLogger implements LoggerInterface {
  readonly messages: string[] = [];
  level(value?: number): never {
    return (value === undefined ? vega.Warn : this) as never;
  }
  error(...args: readonly unknown[]): this {
    this.messages.push(args.join(' '));
    return this;
  }
  warn(...args: readonly unknown[]): this {
    return this.error(...args);
  }
  info(): this {
    return this;
  }
  debug(): this {
    return this;
  }
}

function failOn(logger: CollectingLogger): void {
  if (logger.messages.length > 0) throw new Error(`chart: ${logger.messages.join('; ')}`);
}

/** Charts stand on a page and in a PDF: the second time the compiled chart is at hand. As many as a large pack has. */
const compiledCharts = new Map<string, ReturnType<typeof vega.parse>>();
const CHARTS_KEPT = 256;

function compiledChart(spec: VegaLiteSpec, logger: CollectingLogger): ReturnType<typeof vega.parse> {
  const key = JSON.stringify(spec);
  let chart = compiledCharts.get(key);
  if (!chart) {
    const compiled = compile(spec, { logger }).spec;
    failOn(logger);
    chart = vega.parse(compiled);
    if (compiledCharts.size >= CHARTS_KEPT) compiledCharts.clear();
    compiledCharts.set(key, chart);
  }
  return chart;
}

/**
 * A view that has run and can be painted: with `toSVG`, or by any painter that reads its scenegraph.
 * The caller ends it with `finalize()`.
 *
 * @throws Error when the spec makes the library warn
 */
export async function prepareView(spec: VegaLiteSpec): Promise<View> {
  const logger = new CollectingLogger();
  const view = new vega.View(compiledChart(spec, logger), { renderer: 'none', logger });
  await view.runAsync();
  failOn(logger);
  return view;
}

export interface Picture {
  /** With margins, pixels. */
  readonly width: number;
  readonly height: number;
  /** Where the plot begins in the picture: a painter of the scenegraph starts there. */
  readonly origin: readonly [number, number];
}

/** Size of a prepared chart. The view's own origin leaves the margins out. */
export function pictureOf(view: View): Picture {
  const padding = view.padding();
  if (typeof padding === 'number') throw new Error('chart: margins are given side by side');
  const { left = 0, right = 0, top = 0, bottom = 0 } = padding as Partial<Record<string, number>>;
  const [x, y] = view.origin();
  return { width: view.width() + left + right, height: view.height() + top + bottom, origin: [x + left, y + top] };
}

// Ids of definitions count up globally: charts are written one after another, each from a fresh count.
let queue: Promise<unknown> = Promise.resolve();

/** The chart as an SVG element: the same spec gives the same bytes, whatever else is being drawn. */
export function renderSvg(spec: VegaLiteSpec): Promise<string> {
  const result = queue.then(async () => {
    const view = await prepareView(spec);
    try {
      vega.resetSVGDefIds();
      return await view.toSVG();
    } finally {
      view.finalize();
    }
  });
  queue = result.catch(() => undefined);
  return result;
}
