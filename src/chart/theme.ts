import type { Status } from '../dossier/document.js';

/**
 * The one palette of the pages, charts, drawings and PDF: ink on paper with one accent. Text colours reach a contrast
 * of at least 4.5 on the paper that they stand on (WCAG 2.2, 1.4.3), lines that carry meaning at least 3 (1.4.11).
 */
export interface LineStyle {
  readonly color: string;
  /** Pixels on and off; empty is solid. Lines differ by dash even where colours repeat. */
  readonly dash: readonly number[];
  readonly width: number;
}

export interface Colours {
  readonly paper: string;
  /** Ground of table heads, cautions and facts. */
  readonly wash: string;
  readonly ink: string;
  /** Secondary text. */
  readonly muted: string;
  /** Hairlines of tables and axes. */
  readonly rule: string;
  readonly accent: string;
  readonly status: Readonly<Record<Status, string>>;
}

export interface Theme {
  readonly light: Colours;
  readonly dark: Colours;
  /** Figures stand on light paper in both schemes and in print. */
  readonly figure: {
    readonly paper: string;
    readonly ink: string;
    readonly muted: string;
    readonly grid: string;
    readonly accent: string;
    readonly band: string;
    readonly limit: string;
    readonly copper: string;
    readonly dielectric: string;
    readonly cover: string;
    readonly below: string;
  };
  /** In the order in which series take them; past the end they repeat. */
  readonly series: readonly LineStyle[];
  readonly emphasis: LineStyle;
  /** Dots are kept for the part of a curve where its model is saturated; no series has them. */
  readonly saturated: readonly number[];
  /** First name is the font whose advance widths charts are laid out with. */
  readonly chartFont: string;
  readonly chartFontSize: number;
}

export const theme: Theme = {
  light: {
    paper: '#fdfcf9',
    wash: '#f3f1ea',
    ink: '#1c2126',
    muted: '#545b62',
    rule: '#c9c5ba',
    accent: '#8a4216',
    status: {
      meets: '#23613d',
      undecided: '#7a5200',
      misses: '#9c1f2e',
      'not evaluated': '#545b62',
      'open until measured': '#2a4f86',
      incomplete: '#6a3d78',
    },
  },
  dark: {
    paper: '#16191c',
    wash: '#20252a',
    ink: '#e6e3db',
    muted: '#a9aeb3',
    rule: '#444b52',
    accent: '#e3a071',
    status: {
      meets: '#86c9a0',
      undecided: '#dfb559',
      misses: '#f0959c',
      'not evaluated': '#a9aeb3',
      'open until measured': '#96b8ea',
      incomplete: '#cda6da',
    },
  },
  figure: {
    paper: '#fdfcf9',
    ink: '#1c2126',
    muted: '#545b62',
    grid: '#e4e0d5',
    accent: '#8a4216',
    band: '#ead6c6',
    limit: '#5a5f66',
    copper: '#c98a5b',
    dielectric: '#ece7d6',
    cover: '#dbe3dc',
    below: '#e3e1dc',
  },
  series: [
    { color: '#1c2126', dash: [], width: 1.5 },
    { color: '#8a4216', dash: [7, 3], width: 1.5 },
    { color: '#48708c', dash: [10, 2], width: 1.6 },
    { color: '#545b62', dash: [8, 3, 2, 3], width: 1.4 },
    { color: '#b06a36', dash: [4, 2], width: 1.4 },
    { color: '#2f5570', dash: [10, 3, 2, 3, 2, 3], width: 1.4 },
    { color: '#6b6f74', dash: [12, 4], width: 1.3 },
    { color: '#76797d', dash: [3, 2, 3, 5], width: 1.5 },
    { color: '#1c2126', dash: [14, 3, 2, 3], width: 1.3 },
    { color: '#8a4216', dash: [3, 3, 9, 3], width: 1.3 },
    { color: '#48708c', dash: [16, 5], width: 1.3 },
    { color: '#545b62', dash: [5, 2, 1, 2, 1, 2], width: 1.3 },
  ],
  saturated: [1.5, 4],
  emphasis: { color: '#8a4216', dash: [], width: 2.2 },
  chartFont: "'DejaVu Sans', Verdana, 'Bitstream Vera Sans', sans-serif",
  chartFontSize: 11,
};
