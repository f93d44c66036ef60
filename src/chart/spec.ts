import type { Chart } from '../dossier/document.js';
import { budgetSpec } from './budget.js';
import { cutSpec } from './cut.js';
import type { VegaLiteSpec } from './frame.js';
import { linesSpec } from './lines.js';
import { theme as quiet, type Theme } from './theme.js';

export type { VegaLiteSpec } from './frame.js';

/** The Vega-Lite specification of a chart, laid out so that no label lies on another and nothing is cut. */
export function chartSpec(chart: Chart, theme: Theme = quiet): VegaLiteSpec {
  switch (chart.chart) {
    case 'budget':
      return budgetSpec(chart, theme);
    case 'cut':
      return cutSpec(chart, theme);
    case 'lines':
      return linesSpec(chart, theme);
  }
}
