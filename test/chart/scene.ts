import type { View } from 'vega';
import { pictureOf } from '../../src/chart/view.js';

export interface SceneText {
  readonly text: string;
  readonly x1: number;
  readonly y1: number;
  readonly x2: number;
  readonly y2: number;
}

interface Item {
  readonly text?: unknown;
  readonly x?: number;
  readonly y?: number;
  readonly opacity?: number;
  readonly bounds: { readonly x1: number; readonly y1: number; readonly x2: number; readonly y2: number };
  readonly items?: readonly Mark[];
}
interface Mark {
  readonly marktype: string;
  readonly items: readonly Item[];
}

/** Every visible text of a chart with its box in the coordinates of the picture. */
export function sceneTexts(view: View): SceneText[] {
  const found: SceneText[] = [];
  const visit = (mark: Mark, dx: number, dy: number) => {
    for (const item of mark.items) {
      if (mark.marktype === 'group') {
        for (const child of item.items ?? []) visit(child, dx + (item.x ?? 0), dy + (item.y ?? 0));
      } else if (mark.marktype === 'text' && item.text && item.opacity !== 0) {
        const { x1, y1, x2, y2 } = item.bounds;
        found.push({ text: String(item.text), x1: x1 + dx, y1: y1 + dy, x2: x2 + dx, y2: y2 + dy });
      }
    }
  };
  const [dx, dy] = pictureOf(view).origin;
  visit((view.scenegraph() as unknown as { readonly root: Mark }).root, dx, dy);
  return found;
}
