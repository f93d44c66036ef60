import { statusShapeBox, statusShapes } from '../../chart/status-shapes.js';
import type { Block, Cell, Inline, Status, TableBlock } from '../../dossier/document.js';
import { figureSvg } from './figure.js';
import { statusClass } from './style.js';

/** What templates print. Every field is there, so that a template that asks for another one fails. */
export interface InlineView {
  /** Name of the partial that prints it. */
  readonly partial: string;
  readonly text: string;
  readonly href: string;
  readonly status: StatusView | null;
}

export interface StatusView {
  /** First word, which keeps the sign beside it, and what follows. */
  readonly lead: string;
  readonly rest: string;
  readonly className: string;
  readonly shape: string;
  readonly box: number;
}

/** Resolves links of the document, or throws where one leads nowhere. */
export interface LinkTo {
  readonly page: (page: string, anchor: string | undefined) => string;
  readonly file: (path: string) => string;
}

/** Gives an element of the page its id. */
export type TakeId = (id: string) => string;

export function statusView(status: Status): StatusView {
  const [lead, ...rest] = status.split(/(?= )/);
  return {
    lead,
    rest: rest.join(''),
    className: statusClass(status),
    shape: statusShapes[status],
    box: statusShapeBox,
  };
}

export function inlineView(part: Inline, linkTo: LinkTo): InlineView {
  const view = (partial: string, text: string, more: Partial<InlineView> = {}): InlineView => ({
    partial,
    text,
    href: '',
    status: null,
    ...more,
  });
  if (typeof part === 'string') return view('inline-text', part);
  if ('strong' in part) return view('inline-strong', part.strong);
  if ('code' in part) return view('inline-code', part.code);
  if ('status' in part) return view('inline-status', '', { status: statusView(part.status) });
  if ('file' in part) return view('inline-link', part.text, { href: linkTo.file(part.file) });
  return view('inline-link', part.text, { href: linkTo.page(part.page, part.anchor) });
}

export const inlineViews = (content: readonly Inline[], linkTo: LinkTo) =>
  content.map((part) => inlineView(part, linkTo));

/** A block ready for its partial; ids are taken in reading order. */
export async function blockView(block: Block, linkTo: LinkTo, takeId: TakeId): Promise<object> {
  const inline = (content: readonly Inline[]) => inlineViews(content, linkTo);
  const partial = `block-${block.kind}`;
  switch (block.kind) {
    case 'prose':
      return { partial, content: inline(block.content) };
    case 'list':
      return { partial, ordered: block.ordered === true, items: block.items.map(inline) };
    case 'facts':
      return {
        partial,
        id: takeId(block.id),
        items: block.items.map((item) => ({ label: item.label, content: inline(item.content) })),
      };
    case 'verdict':
      return { partial, status: statusView(block.status), content: inline(block.content) };
    case 'caution':
      return { partial, title: block.title, paragraphs: block.content.map(inline) };
    case 'table':
      return { partial, id: takeId(block.id), ...tableView(block, inline) };
    case 'figure': {
      const id = takeId(block.id);
      const { title, reading } = block;
      return { partial, id, title, reading, svg: await figureSvg(block, id) };
    }
  }
}

function tableView(table: TableBlock, inline: (content: readonly Inline[]) => readonly InlineView[]) {
  const align = (numeric: boolean | undefined) => (numeric ? 'number' : 'words');
  const cell = (entry: Cell) => ({ align: align(entry.numeric), content: inline(entry.content) });
  return {
    caption: table.caption,
    columns: table.columns.map((column, index) => ({
      title: column.title,
      align: align(column.numeric),
      room: roomFor(table.rows.map((row) => row[index])),
    })),
    named: table.rowHeaders,
    rows: table.rows.map((row) => {
      const cells = row.map(cell);
      return table.rowHeaders ? { header: cells[0] ?? null, cells: cells.slice(1) } : { header: null, cells };
    }),
    empty: table.rows.length === 0,
    span: table.columns.length,
  };
}

/** Class of a column by its longest text, so that sentences are not squeezed into towers of single words. */
function roomFor(cells: readonly (Cell | undefined)[]): string {
  const longest = Math.max(0, ...cells.map((cell) => (cell === undefined ? 0 : textLength(cell.content))));
  return longest > 60 ? 'sentence-column' : longest > 22 ? 'phrase' : '';
}

function textLength(content: readonly Inline[]): number {
  let length = 0;
  for (const part of content) {
    if (typeof part === 'string') length += part.length;
    else if ('strong' in part) length += part.strong.length;
    else if ('code' in part) length += part.code.length;
    else if ('text' in part) length += part.text.length;
    // A status stands on a line of its own.
  }
  return length;
}
