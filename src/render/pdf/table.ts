import type { Cell, TableBlock } from '../../dossier/document.js';
import type { BlockContext } from './blocks.js';
import { type ColumnWish, columnWidths } from './column-widths.js';
import type { Box } from './flow.js';
import { bodyWidth, colours, page, type TypeSize, type } from './layout.js';
import { type Line, LineSetter } from './lines.js';
import { paintBareLine, paintLine } from './paint-line.js';
import type { Element, Press } from './press.js';
import { bold, inlineRuns, plain, type Run, textRuns } from './runs.js';

const padX = 4;
const padY = 3;
interface Fit {
  readonly factor: number;
  /** Words stay whole. */
  readonly whole: boolean;
  /** Part of the room that the least widths may take: broken words need room to share out, or rows grow tall. */
  readonly taken: number;
}
/** What is tried, in this order: a little smaller before words break after separators, much smaller after that. */
const fitsInOrder: readonly Fit[] = [
  { factor: 1, whole: true, taken: 1 },
  { factor: 0.93, whole: true, taken: 1 },
  { factor: 1, whole: false, taken: 0.85 },
  { factor: 0.93, whole: false, taken: 0.85 },
  { factor: 0.86, whole: false, taken: 0.85 },
  { factor: 0.79, whole: false, taken: 1 },
];
/** Figures longer than this may wrap. */
const longestFigure = 110;

interface Column {
  readonly x: number;
  readonly width: number;
  readonly numeric: boolean;
}
interface CellText {
  readonly runs: readonly Run[];
  readonly numeric: boolean;
  readonly signature?: boolean;
}
interface SetCell {
  readonly lines: readonly Line[];
  readonly numeric: boolean;
  readonly signature?: boolean;
}
/** Height of a cell to sign in, in lines of text. */
const signatureLines = 3;
/** Least width of a column to write or sign in by hand, times the hint of its width; points. */
const signatureWidth = 56;

/**
 * A table with its caption. The head stands again on every page; a row is never cut, unless it is taller than a page:
 * then it goes on, line by line, on the next page under the head.
 */
export function tableBoxes(context: BlockContext, table: TableBlock, bodyHeight: number): Box[] {
  const { press } = context;
  const count = Math.max(1, table.columns.length, ...table.rows.map((row) => row.length));
  const numericColumn = (i: number) => table.columns[i]?.numeric === true;
  const heads: CellText[] = Array.from({ length: count }, (_, i) => ({
    runs: textRuns(table.columns[i]?.title ?? '', bold),
    numeric: numericColumn(i),
  }));
  const cellOf = (cell: Cell | undefined, i: number): CellText => ({
    runs: inlineRuns(cell?.content ?? [], plain, context),
    numeric: cell?.numeric ?? numericColumn(i),
    signature: cell?.signature,
  });
  const empty: Cell[] = [{ content: ['none'] }];
  const rows = (table.rows.length === 0 ? [empty] : table.rows).map((row) =>
    Array.from({ length: count }, (_, i) => cellOf(row[i], i)),
  );

  const signed = rows.some((row) => row.some((cell) => cell.signature));
  const { columns, set } = layColumns(press, table, heads, rows);
  const element = press.element('Table', context.parent);
  const caption = captionBoxes(context, table, element);
  const setter = new LineSetter(press, set.size);
  const setRow = (cells: readonly CellText[]): SetCell[] =>
    cells.map((cell, i) => {
      const lines = setter.lines(cell.runs, columns[i].width - 2 * padX);
      const room = cell.signature ? Math.max(0, signatureLines - lines.length) : 0;
      const empty: Line = { pieces: [], width: 0 };
      return {
        lines: [...lines, ...Array.from({ length: room }, () => empty)],
        // A reason in place of a figure reads as a sentence: from the left.
        numeric: cell.numeric && (cells === heads || lines.length <= 2),
        signature: cell.signature,
      };
    });

  const painter = new RowPainter(press, columns, set);
  const head = setRow(heads);
  const headHeight = painter.height(head);
  const repeat =
    headHeight < bodyHeight / 3
      ? { height: headHeight, paint: (top: number) => painter.repeatHead(head, top) }
      : undefined;
  const room = bodyHeight - (repeat?.height ?? 0);
  const headBoxes = painter.boxes(head, bodyHeight, press.element('TR', element), () => ['TH', 'Column']);
  const bodyRows = rows.map((cells) =>
    painter
      .boxes(setRow(cells), room, press.element('TR', element), (i) =>
        table.rowHeaders && i === 0 ? ['TH', 'Row'] : ['TD', undefined],
      )
      .map((box) => ({ ...box, repeat })),
  );
  return [
    ...caption,
    ...headBoxes.map((box) => ({ ...box, keep: true })),
    // The last row is not left alone on a page, and those who sign are seen together where a page can hold them.
    ...bodyRows.flatMap((boxes, i) =>
      i === bodyRows.length - 2 || (signed && i < bodyRows.length - 2)
        ? [...boxes.slice(0, -1), { ...boxes[boxes.length - 1], keep: true }]
        : boxes,
    ),
  ];
}

function captionBoxes(context: BlockContext, table: TableBlock, element: Element): Box[] {
  const { press } = context;
  const caption = press.element('Caption', element);
  const lines = new LineSetter(press, type.label.size).lines(textRuns(table.caption, bold), bodyWidth);
  return lines.map((line, i) => ({
    before: i === 0 ? 12 : 0,
    height: type.label.leading + (i === lines.length - 1 ? 3 : 0),
    keep: true,
    paint: (top) => {
      if (i === 0) press.markPlace(table.id, top);
      paintLine(press, line, type.label, page.left, top, caption, 'Caption');
    },
  }));
}

/** The largest size of type at which no word breaks, or at which words break only after separators. */
function layColumns(
  press: Press,
  table: TableBlock,
  heads: readonly CellText[],
  rows: readonly (readonly CellText[])[],
): { readonly columns: Column[]; readonly set: TypeSize } {
  const setter = new LineSetter(press, 1);
  const measured = heads.map((head, i) => {
    let [words, pieces] = [0, 0];
    const wholes: number[] = [];
    for (const cell of [head, ...rows.map((row) => row[i])]) {
      const { word, piece, whole } = setter.extent(cell.runs);
      const unbroken = cell.numeric && cell !== head && whole * type.table.size <= longestFigure;
      words = Math.max(words, unbroken ? whole : word);
      pieces = Math.max(pieces, unbroken ? whole : piece);
      wholes.push(whole);
    }
    if (rows.some((row) => row[i].signature)) {
      words = Math.max(words, (signatureWidth * (table.columns[i]?.width ?? 1)) / type.table.size);
      pieces = words;
      wholes.push(words);
    }
    return { words, pieces, wholes };
  });
  const wishes = ({ factor, whole }: Fit): ColumnWish[] =>
    measured.map(({ words, pieces, wholes }, i) => {
      const points = (width: number) => width * type.table.size * factor + 2 * padX + 0.5;
      return {
        least: points(whole ? words : pieces),
        cells: wholes.map(points),
        hint: Math.max(0.1, table.columns[i]?.width ?? 1),
      };
    });
  const fits = (fit: Fit) => wishes(fit).reduce((sum, wish) => sum + wish.least, 0) <= fit.taken * bodyWidth;
  const chosen = fitsInOrder.find(fits) ?? fitsInOrder[fitsInOrder.length - 1];
  let x: number = page.left;
  const columns = columnWidths(wishes(chosen), bodyWidth).map((width, i) => {
    const column = { x, width, numeric: table.columns[i]?.numeric === true };
    x += width;
    return column;
  });
  const { size, leading } = type.table;
  return { columns, set: { size: size * chosen.factor, leading: leading * chosen.factor } };
}

class RowPainter {
  constructor(
    private readonly press: Press,
    private readonly columns: readonly Column[],
    private readonly set: TypeSize,
  ) {}

  height(cells: readonly SetCell[]): number {
    return Math.max(...cells.map((cell) => cell.lines.length)) * this.set.leading + 2 * padY;
  }

  private left(i: number, cell: SetCell, line: Line): number {
    const { x, width } = this.columns[i];
    return cell.numeric ? x + width - padX - line.width : x + padX;
  }

  private rule(top: number, colour: string, width: number): void {
    const { doc } = this.press;
    doc.moveTo(page.left, top).lineTo(page.right, top).lineWidth(width).undash().stroke(colour);
  }

  private signingLines(cells: readonly SetCell[], y: number): void {
    const { doc } = this.press;
    for (const [i, cell] of cells.entries()) {
      if (!cell.signature) continue;
      const { x, width } = this.columns[i];
      doc
        .moveTo(x + padX, y)
        .lineTo(x + width - padX, y)
        .lineWidth(0.5)
        .undash()
        .stroke(colours.muted);
    }
  }

  private headGround(top: number, height: number): void {
    this.press.doc.rect(page.left, top, bodyWidth, height).fill(colours.wash);
    this.rule(top + height, colours.muted, 0.5);
  }

  repeatHead(cells: readonly SetCell[], top: number): void {
    this.press.artifact('Pagination', () => {
      this.headGround(top, this.height(cells));
      for (const [i, cell] of cells.entries()) {
        for (const [n, line] of cell.lines.entries()) {
          paintBareLine(this.press, line, this.set, this.left(i, cell, line), top + padY + n * this.set.leading);
        }
      }
    });
  }

  /** One box per row; one per line where the row is taller than the room. */
  boxes(
    cells: readonly SetCell[],
    room: number,
    row: Element,
    kind: (column: number) => readonly ['TH', 'Column' | 'Row'] | readonly ['TD', undefined],
  ): Box[] {
    const { press, set } = this;
    const elements = cells.map((_, i) => {
      const [tag, scope] = kind(i);
      return press.element(tag, row, scope === undefined ? {} : { scope });
    });
    const lines = Math.max(...cells.map((cell) => cell.lines.length));
    const perBox = this.height(cells) <= room ? lines : 1;
    const boxes: Box[] = [];
    for (let start = 0; start < lines; start += perBox) {
      const end = Math.min(lines, start + perBox);
      const [above, below] = [start === 0 ? padY : 0, end === lines ? padY : 0];
      const height = (end - start) * set.leading + above + below;
      boxes.push({
        height,
        keep: start === 0 && end < lines,
        paint: (top) => {
          press.artifact('Layout', () => {
            if (kind(0)[1] === 'Column') this.press.doc.rect(page.left, top, bodyWidth, height).fill(colours.wash);
            if (end === lines) this.rule(top + height, kind(0)[1] === 'Column' ? colours.muted : colours.rule, 0.5);
            if (end === lines) this.signingLines(cells, top + height - below - 2);
          });
          for (const [i, cell] of cells.entries()) {
            for (const [n, line] of cell.lines.slice(start, end).entries()) {
              if (line.pieces.length === 0) continue;
              const y = top + above + n * set.leading;
              paintLine(press, line, set, this.left(i, cell, line), y, elements[i], kind(i)[0]);
            }
          }
        },
      });
    }
    return boxes;
  }
}
