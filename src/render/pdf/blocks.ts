import type { Block, Inline } from '../../dossier/document.js';
import type { Box } from './flow.js';
import { bodyWidth, colours, page, type TypeSize, type } from './layout.js';
import { LineSetter } from './lines.js';
import { paintLine } from './paint-line.js';
import type { Element, Press } from './press.js';
import { bold, inlineRuns, type LinkContext, muted, plain, type Run, textRuns } from './runs.js';
import { paintStatusShape } from './status-shape.js';

export interface BlockContext extends LinkContext {
  readonly press: Press;
  readonly parent: Element;
}

export type TextBlock = Exclude<Block, { readonly kind: 'table' | 'figure' }>;

export function blockBoxes(block: TextBlock, context: BlockContext): Box[] {
  switch (block.kind) {
    case 'prose':
      return paragraph(context, inlineRuns(block.content, plain, context, true), { before: 6 });
    case 'list':
      return listBoxes(context, block.items, block.ordered === true);
    case 'facts':
      return factBoxes(context, block);
    case 'verdict':
      return verdictBoxes(context, block);
    case 'caution':
      return cautionBoxes(context, 'H3', block.title, block.content);
  }
}

interface ParagraphOptions {
  readonly before: number;
  readonly type?: TypeSize;
  readonly x?: number;
  readonly width?: number;
}

/** Lines of a text as boxes: never one line alone on a page. */
export function paragraph(context: BlockContext, runs: readonly Run[], options: ParagraphOptions): Box[] {
  const { press, parent } = context;
  const { before, type: set = type.body, x = page.left, width = bodyWidth } = options;
  const element = press.element('P', parent);
  const lines = new LineSetter(press, set.size).lines(runs, width);
  return lines.map((line, i) => ({
    before: i === 0 ? before : 0,
    height: set.leading,
    keep: keepsNext(i, lines.length),
    paint: (top) => paintLine(press, line, set, x, top, element, 'P'),
  }));
}

/** The first two lines stay together, and the last two. */
function keepsNext(index: number, count: number): boolean {
  return index < count - 1 && (index === 0 || index === count - 2);
}

function listBoxes(context: BlockContext, items: readonly (readonly Inline[])[], ordered: boolean): Box[] {
  const { press, parent } = context;
  const set = type.body;
  const setter = new LineSetter(press, set.size);
  const list = press.list(parent, ordered ? 'Decimal' : 'Disc');
  const labels = items.map((_, i) => setter.lines(textRuns(ordered ? `${i + 1}.` : '•', muted), bodyWidth)[0]);
  const indent = Math.max(12, ...labels.map((label) => label.width + 6));
  return items.flatMap((item, n): Box[] => {
    const entry = press.element('LI', list);
    const label = press.element('Lbl', entry);
    const body = press.element('LBody', entry);
    const lines = setter.lines(inlineRuns(item, plain, context, true), bodyWidth - indent);
    return lines.map((line, i) => ({
      before: i > 0 ? 0 : n === 0 ? 6 : 2.5,
      height: set.leading,
      keep: keepsNext(i, lines.length),
      paint: (top) => {
        if (i === 0) paintLine(press, labels[n], set, page.left + indent - 5 - labels[n].width, top, label, 'Lbl');
        paintLine(press, line, set, page.left + indent, top, body, 'LBody');
      },
    }));
  });
}

/** A fact of more lines than this may go on over a page. */
const unbrokenLines = 20;

/** Names and what they are: two columns, the names not wider than a third of the body. */
function factBoxes(context: BlockContext, block: Extract<Block, { kind: 'facts' }>): Box[] {
  const { press, parent } = context;
  const set = type.body;
  const setter = new LineSetter(press, set.size);
  const list = press.element('L', parent);
  const names = block.items.map((item) => textRuns(item.label, muted));
  const column = Math.min(bodyWidth / 3, Math.max(0, ...names.map((runs) => setter.extent(runs).whole)) + 2) + 14;
  return block.items.flatMap((item, n): Box[] => {
    const entry = press.element('LI', list);
    const label = press.element('Lbl', entry);
    const body = press.element('LBody', entry);
    const left = setter.lines(names[n], column - 14);
    const right = setter.lines(inlineRuns(item.content, plain, context), bodyWidth - column);
    const count = Math.max(left.length, right.length);
    return Array.from({ length: count }, (_, i) => ({
      before: i > 0 ? 0 : n === 0 ? 8 : 2.5,
      height: set.leading,
      keep: count <= unbrokenLines ? i < count - 1 : keepsNext(i, count),
      paint: (top: number) => {
        if (n === 0 && i === 0) press.markPlace(block.id, top);
        if (i < left.length) paintLine(press, left[i], set, page.left, top, label, 'Lbl');
        if (i < right.length) paintLine(press, right[i], set, page.left + column, top, body, 'LBody');
      },
    }));
  });
}

const padding = 7;
const bar = 3;

/** Lines on a coloured ground with a bar at the left; the ground may go on over a page. */
function panel(press: Press, barColour: string, rows: readonly Omit<Box, 'before'>[], before: number): Box[] {
  const ground = (top: number, height: number) =>
    press.artifact('Layout', () => {
      press.doc.rect(page.left, top, bodyWidth, height).fill(colours.wash);
      press.doc.rect(page.left, top, bar, height).fill(barColour);
    });
  return rows.map((row, i) => {
    const above = i === 0 ? padding : 0;
    const height = above + row.height + (i === rows.length - 1 ? padding : 0);
    return {
      ...row,
      before: i === 0 ? before : 0,
      height,
      paint: (top) => {
        ground(top, height);
        row.paint(top + above, row.height);
      },
    };
  });
}

function verdictBoxes(context: BlockContext, block: Extract<Block, { kind: 'verdict' }>): Box[] {
  const { press, parent } = context;
  const element = press.element('P', parent);
  const colour = colours.status[block.status];
  const left = page.left + bar + 10;
  const width = page.right - left - 10;
  const shape = type.chapter.size * 0.85;
  const word = new LineSetter(press, type.chapter.size).lines(
    textRuns(block.status, { face: 'bold', colour }),
    width,
  )[0];
  const lines = new LineSetter(press, type.lead.size).lines(inlineRuns(block.content, plain, context, true), width);
  const rows = [
    {
      height: type.chapter.leading,
      keep: true,
      paint: (top: number) => {
        const y = top + (type.chapter.leading - shape) / 2;
        press.artifact('Layout', () => paintStatusShape(press.doc, block.status, left, y, shape));
        paintLine(press, word, type.chapter, left + shape + 6, top, element, 'P');
      },
    },
    ...lines.map((line, i) => ({
      height: type.lead.leading,
      keep: keepsNext(i, lines.length),
      paint: (top: number) => paintLine(press, line, type.lead, left, top, element, 'P'),
    })),
  ];
  return panel(press, colour, rows, 8);
}

export function cautionBoxes(
  context: BlockContext,
  level: 'H2' | 'H3',
  title: string,
  content: readonly (readonly Inline[])[],
): Box[] {
  const { press, parent } = context;
  const left = page.left + bar + 10;
  const width = page.right - left - 10;
  const heading = press.element(level, parent);
  const set = type.body;
  const setter = new LineSetter(press, set.size);
  const rows: Omit<Box, 'before'>[] = new LineSetter(press, type.label.size)
    .lines(textRuns(title, bold), width)
    .map((line) => ({
      height: type.label.leading + 1,
      keep: true,
      paint: (top) => paintLine(press, line, type.label, left, top, heading, level),
    }));
  for (const [n, item] of content.entries()) {
    const element = press.element('P', parent);
    const lines = setter.lines(inlineRuns(item, plain, context, true), width);
    const gap = n === 0 ? 0 : 2.5;
    for (const [i, line] of lines.entries()) {
      const shift = i === 0 ? gap : 0;
      rows.push({
        height: set.leading + shift,
        keep: keepsNext(i, lines.length),
        paint: (top) => paintLine(press, line, set, left, top + shift, element, 'P'),
      });
    }
  }
  return panel(press, colours.accent, rows, 9);
}
