import { theme } from '../../chart/theme.js';

/** The page and its type, in points (1/72 inch); y counts from the top. */
export const page = { width: 595.28, height: 841.89, left: 51, right: 544.28, headerTop: 28, bodyTop: 58 } as const;
export const bodyWidth = page.right - page.left;

export const colours = theme.light;

/** Size of type and distance between baselines. */
export interface TypeSize {
  readonly size: number;
  readonly leading: number;
}
export const type = {
  title: { size: 20, leading: 25 },
  chapter: { size: 13.5, leading: 18 },
  lead: { size: 10.5, leading: 15 },
  body: { size: 9, leading: 13 },
  label: { size: 9, leading: 12.5 },
  table: { size: 8, leading: 10.8 },
  small: { size: 7.5, leading: 10 },
  furniture: { size: 6.6, leading: 8.6 },
} as const satisfies Readonly<Record<string, TypeSize>>;

/** Baseline below the top of a line: DejaVu rises 0.76 of its size above the baseline in capitals and figures. */
export function baseline({ size, leading }: TypeSize): number {
  return (leading + 0.73 * size) / 2;
}
