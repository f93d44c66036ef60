import { page } from './layout.js';
import type { Press } from './press.js';

/** A piece of a page that is never broken. Paints itself at a height; its width is that of the body. */
export interface Box {
  readonly height: number;
  /** A picture may shrink to this height where that keeps its group on the page. */
  readonly least?: number;
  /** Space over it, dropped at the top of a page. */
  readonly before?: number;
  /** Stays on one page with the box after it: headings, captions, first lines. */
  readonly keep?: boolean;
  /** Starts a page, unless it is at the top of one already. */
  readonly newPage?: boolean;
  /** Painted over it again where it is the first on a page: the head of a table. */
  readonly repeat?: { readonly height: number; readonly paint: (top: number) => void };
  readonly paint: (top: number, height: number) => void;
}

/** Height of boxes set one under another, from the top of a page or further down. */
export function stackHeight(boxes: readonly Box[], fromTop: boolean): number {
  let height = fromTop ? (boxes[0]?.repeat?.height ?? 0) : 0;
  for (const [i, box] of boxes.entries()) height += box.height + (i === 0 && fromTop ? 0 : (box.before ?? 0));
  return height;
}

/** Lays boxes down the pages. */
export class Flow {
  private y: number = page.bodyTop;

  constructor(
    private readonly press: Press,
    /** Foot of the body of each page. */
    readonly bottom: number,
  ) {}

  get bodyHeight(): number {
    return this.bottom - page.bodyTop;
  }

  private get atTop(): boolean {
    return this.y === page.bodyTop;
  }

  private breakPage(): void {
    this.press.newPage();
    this.y = page.bodyTop;
  }

  place(boxes: readonly Box[]): void {
    if (this.press.pageIndex < 0) this.breakPage();
    for (let start = 0; start < boxes.length; ) {
      let end = start + 1;
      while (end < boxes.length && boxes[end - 1].keep) end += 1;
      const group = boxes.slice(start, end);
      const excess = this.y + stackHeight(group, this.atTop) - this.bottom;
      const shrunk = group.findIndex(({ height, least }) => least !== undefined && height - least >= excess);
      const mustBreak = excess > 0 && shrunk < 0 && stackHeight(group, true) <= this.bodyHeight;
      if (!this.atTop && (group[0].newPage || mustBreak)) this.breakPage();
      else if (excess > 0 && shrunk >= 0) group[shrunk] = { ...group[shrunk], height: group[shrunk].height - excess };
      for (const box of group) this.put(box);
      start = end;
    }
  }

  private put(box: Box): void {
    if (!this.atTop && this.y + (box.before ?? 0) + box.height > this.bottom + 0.01) this.breakPage();
    if (!this.atTop) {
      this.y += box.before ?? 0;
    } else if (box.repeat !== undefined) {
      box.repeat.paint(this.y);
      this.y += box.repeat.height;
    }
    box.paint(this.y, box.height);
    this.y += box.height;
  }
}
