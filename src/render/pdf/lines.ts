import type { Status } from '../../dossier/document.js';
import type { Face, Press } from './press.js';
import type { Run } from './runs.js';

/** A stretch of a line in one style and face. */
export interface Piece {
  readonly text: string;
  readonly face: Face;
  readonly colour: string;
  readonly target?: string;
  readonly shape?: Status;
  /** From the start of the line. */
  readonly x: number;
  readonly width: number;
}

export interface Line {
  readonly pieces: readonly Piece[];
  /** Without the space at its end. */
  readonly width: number;
}

/** Room that the shape of a status takes before its word, in units of the size of type. */
export const shapeAdvance = 1.3;

interface Segment {
  readonly run: Run;
  readonly face: Face;
  readonly text: string;
  readonly fromRight: boolean;
  readonly shape?: Status;
}
/** Unbreakable unless it is wider than the line by itself. */
interface Word {
  readonly segments: readonly Segment[];
  readonly width: number;
  /** The space after it, in its own style. */
  readonly space?: Segment;
}

const cluster = /\P{M}\p{M}*|\p{M}+/gu;
const longWord = 60;
/** Words wider than this, in units of the size of type, may break after a separator rather than widen a column. */
const wideWord = 8;
const breakAfter = /[- –/_.,:;=+]$/;
const separators = /(?<=[- –/_.,:;=+])/;

/**
 * Sets runs into lines of a width. Breaks at spaces; a word wider than the line is broken after a separator where one
 * is near its end, else between signs, so that nothing is ever cut off.
 */
export class LineSetter {
  constructor(
    private readonly press: Press,
    private readonly size: number,
  ) {}

  private segmentWidth(segment: Segment): number {
    const text = this.press.widthOf(segment.text, segment.face, this.size);
    return text + (segment.shape === undefined ? 0 : shapeAdvance * this.size);
  }

  private word(segments: readonly Segment[], space?: Segment): Word {
    return { segments, space, width: segments.reduce((sum, segment) => sum + this.wordWidth(segment), 0) };
  }

  /** A long word is broken anyway: the sum of its signs, without kerning, spares the shaping of what is left of it. */
  private wordWidth(segment: Segment): number {
    if (segment.text.length <= longWord) return this.segmentWidth(segment);
    let width = segment.shape === undefined ? 0 : shapeAdvance * this.size;
    for (const [sign] of segment.text.matchAll(cluster)) width += this.press.widthOf(sign, segment.face, this.size);
    return width;
  }

  private words(runs: readonly Run[]): Word[] {
    const words: Word[] = [];
    let segments: Segment[] = [];
    const close = (space?: Segment) => {
      if (segments.length > 0) words.push(this.word(segments, space));
      segments = [];
    };
    for (const run of runs) {
      let { shape } = run;
      for (const { text, face, fromRight } of this.press.glyphs(run.text, run.face)) {
        text.split(' ').forEach((part, index) => {
          if (index > 0) close({ run, face, text: ' ', fromRight: false });
          if (part === '') return;
          segments.push({ run, face, text: part, fromRight, shape });
          shape = undefined;
        });
      }
    }
    close();
    return this.bind(words);
  }

  /** Numbers keep their unit, and signs of relation their number. */
  private bind(words: readonly Word[]): Word[] {
    const bound: Word[] = [];
    let before = '';
    for (const word of words) {
      const text = word.segments.map((segment) => segment.text).join('');
      const last = bound.at(-1);
      if (last?.space !== undefined && belongTogether(before, text)) {
        bound[bound.length - 1] = this.word([...last.segments, last.space, ...word.segments], word.space);
      } else {
        bound.push(word);
      }
      before = text;
    }
    return bound;
  }

  private space(after: Word): number {
    return after.space === undefined ? 0 : this.segmentWidth(after.space);
  }

  /** Widths of the widest word, of the widest piece between places to break, and of all words in one line. */
  extent(runs: readonly Run[]): { readonly word: number; readonly piece: number; readonly whole: number } {
    const words = this.words(runs);
    let [word, piece, whole] = [0, 0, 0];
    for (const [i, item] of words.entries()) {
      word = Math.max(word, item.width);
      piece = Math.max(piece, this.unbroken(item));
      whole += item.width + (i < words.length - 1 ? this.space(item) : 0);
    }
    return { word, piece, whole };
  }

  /** A wide word, such as a path, may break after its separators. */
  private unbroken(word: Word): number {
    if (word.width <= wideWord * this.size) return word.width;
    const parts = word.segments.flatMap((segment) =>
      segment.text.split(separators).map((text) => this.wordWidth({ ...segment, text })),
    );
    return Math.max(wideWord * this.size, ...parts);
  }

  /** Breaks a word into one that fits and the rest; the first takes at least one sign. */
  private split(word: Word, room: number): [Word, Word | undefined] {
    const head: Segment[] = [];
    let used = 0;
    let good: { readonly at: number; readonly length: number; readonly used: number } | undefined;
    let taken = 0;
    for (const [at, segment] of word.segments.entries()) {
      used += segment.shape === undefined ? 0 : shapeAdvance * this.size;
      let length = 0;
      for (const [sign] of segment.text.matchAll(cluster)) {
        const advance = this.press.widthOf(sign, segment.face, this.size);
        if (taken > 0 && used + advance > room) {
          const cut = good !== undefined && good.used > 0.35 * room ? good : { at, length, used };
          return this.cut(word, cut.at, cut.length, cut.used);
        }
        used += advance;
        taken += 1;
        length += sign.length;
        if (breakAfter.test(sign)) good = { at, length, used };
      }
      head.push(segment);
    }
    return [word, undefined];
  }

  private cut(word: Word, at: number, length: number, used: number): [Word, Word] {
    const { text, ...rest } = word.segments[at];
    const first: Segment[] = [...word.segments.slice(0, at)];
    if (length > 0) first.push({ ...rest, text: text.slice(0, length) });
    const second: Segment[] = [];
    if (length < text.length)
      second.push({ ...rest, shape: length > 0 ? undefined : rest.shape, text: text.slice(length) });
    second.push(...word.segments.slice(at + 1));
    const signs = second.reduce((sum, segment) => sum + segment.text.length, 0);
    const { space } = word;
    const tail = signs <= longWord ? this.word(second, space) : { segments: second, space, width: word.width - used };
    return [this.word(first), tail];
  }

  lines(runs: readonly Run[], room: number): Line[] {
    const lines: Line[] = [];
    let row: Word[] = [];
    let used = 0;
    const close = () => {
      lines.push(this.line(row));
      row = [];
      used = 0;
    };
    for (const whole of this.words(runs)) {
      let word: Word | undefined = whole;
      while (word !== undefined) {
        const before: number = row.length > 0 ? this.space(row[row.length - 1]) : 0;
        if (used + before + word.width <= room + 0.01) {
          row.push(word);
          used += before + word.width;
          break;
        }
        if (row.length > 0) {
          close();
          continue;
        }
        const [head, rest]: [Word, Word | undefined] = this.split(word, room);
        row.push(head);
        if (rest !== undefined) close();
        word = rest;
      }
    }
    if (row.length > 0 || lines.length === 0) close();
    return lines;
  }

  /** Words into pieces: neighbours of one style become one. */
  private line(words: readonly Word[]): Line {
    const segments = inReadingOrder(words).flatMap((word) =>
      word.space === undefined ? word.segments : [...word.segments, word.space],
    );
    const joined: Segment[] = [];
    for (const segment of segments) {
      const last = joined.at(-1);
      const sameStyle = last?.run === segment.run && last.face === segment.face && last.fromRight === segment.fromRight;
      if (last !== undefined && sameStyle && segment.shape === undefined) {
        joined[joined.length - 1] = { ...last, text: last.text + segment.text };
      } else {
        joined.push(segment);
      }
    }
    let x = 0;
    let width = 0;
    const pieces = joined.map((segment): Piece => {
      const { run, face, text, shape } = segment;
      const advance = this.segmentWidth(segment);
      const piece = { text, face, colour: run.colour, target: run.target, shape, x, width: advance };
      if (text !== ' ') width = x + this.segmentWidth({ ...segment, text: text.trimEnd() });
      x += advance;
      return piece;
    });
    return { pieces, width };
  }
}

const unit =
  /^(?:[numkMG]?(?:m|s|Hz|W|V|A|S|g|N|F|H)|[µμ]m|dB[imc]?|Np|K|ppm|deg|degC|°C?|%|Ω|ohm|min|h)(?:[/·][\p{L}°%\d]+)*[,.;:)]*$/u;
const relation = /^\(?[≤≥<>=±≈≠]$/;

function belongTogether(before: string, after: string): boolean {
  return relation.test(before) || (/\d$/.test(before) && (unit.test(after) || after.startsWith('±')));
}

/** Words of scripts written from the right stand in their order; the spaces between them stay in place. */
function inReadingOrder(words: readonly Word[]): Word[] {
  const fromRight = (word: Word) => word.segments.some((segment) => segment.fromRight);
  const ordered = [...words];
  for (let start = 0; start < ordered.length; start += 1) {
    let end = start;
    while (end < ordered.length && fromRight(ordered[end])) end += 1;
    for (let i = start; i < end; i += 1) {
      ordered[i] = { ...words[end - 1 - (i - start)], space: words[i].space };
    }
    start = Math.max(start, end - 1);
  }
  return ordered;
}
