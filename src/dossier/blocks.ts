import type { Block, Cell, Chapter, FigureBlock, Inline, TableBlock } from './document.js';

/** Short ways to write page data; nothing here words or rounds anything. */
export const prose = (...content: Inline[]): Block => ({ kind: 'prose', content });

export const list = (items: readonly (readonly Inline[])[], ordered = false): Block => ({
  kind: 'list',
  items,
  ordered,
});

export const caution = (title: string, ...content: (readonly Inline[])[]): Block => ({
  kind: 'caution',
  title,
  content,
});

export const facts = (id: string, ...items: (readonly [string, ...Inline[]])[]): Block => ({
  kind: 'facts',
  id,
  items: items.map(([label, ...content]) => ({ label, content })),
});

export const chapter = (id: string, title: string, ...blocks: Block[]): Chapter => ({ id, title, blocks });

export const cell = (...content: Inline[]): Cell => ({ content });
export const number = (...content: Inline[]): Cell => ({ content, numeric: true });

type Column = TableBlock['columns'][number];

/** Columns written as `title`, `#title` for numbers, with an optional relative width: `#Margin|0.8`. */
function columnOf(text: string): Column {
  const [name, width] = text.split('|');
  const numeric = name.startsWith('#');
  return {
    title: numeric ? name.slice(1) : name,
    ...(numeric ? { numeric } : {}),
    ...(width === undefined ? {} : { width: Number(width) }),
  };
}

export const DASH = '–';

/** A dash in a column of numbers stands where the numbers stand. */
const aligned = (columns: readonly Column[], rows: readonly (readonly Cell[])[]): readonly (readonly Cell[])[] =>
  rows.map((row) =>
    row.map((entry, i) =>
      columns[i]?.numeric === true && entry.content.length === 1 && entry.content[0] === DASH
        ? { ...entry, numeric: true }
        : entry,
    ),
  );

export const table = (
  id: string,
  caption: string,
  columns: readonly string[],
  rows: readonly (readonly Cell[])[],
): TableBlock => plainTable(id, caption, columns.map(columnOf), rows);

/** The same with titles that come from outside and must not be read as marks. */
export const plainTable = (
  id: string,
  caption: string,
  columns: readonly Column[],
  rows: readonly (readonly Cell[])[],
): TableBlock => ({ kind: 'table', id, caption, columns, rows: aligned(columns, rows), rowHeaders: true });

export const figureBlock = (figure: Omit<FigureBlock, 'kind'>): FigureBlock => ({ kind: 'figure', ...figure });
