import { createRequire } from 'node:module';
import type { Font } from 'fontkit';
import * as fontkit from 'fontkit';

/** Font files that charts are laid out with; the PDF embeds the same ones, so that text fits where it was measured. */
const require = createRequire(import.meta.url);
export const regularFontPath: string = require.resolve('dejavu-fonts-ttf/ttf/DejaVuSans.ttf');
export const boldFontPath: string = require.resolve('dejavu-fonts-ttf/ttf/DejaVuSans-Bold.ttf');

interface Face {
  readonly font: Font;
  /** Advance per code point, in font units. */
  readonly advances: Map<number, number>;
}

const faces = new Map<string, Face>();

function face(path: string): Face {
  let found = faces.get(path);
  if (found === undefined) {
    const font = fontkit.openSync(path);
    if (font.type !== 'TTF') throw new Error(`not a single font: ${path}`);
    found = { font, advances: new Map() };
    faces.set(path, found);
  }
  return found;
}

/** Width of a line of text set in DejaVu Sans, without kerning, in the unit of `size`. */
export function textWidth(text: string, size: number, bold = false): number {
  const { font, advances } = face(bold ? boldFontPath : regularFontPath);
  let units = 0;
  for (const sign of text) {
    const code = sign.codePointAt(0)!;
    let advance = advances.get(code);
    if (advance === undefined) {
      advance = font.glyphForCodePoint(code).advanceWidth;
      advances.set(code, advance);
    }
    units += advance;
  }
  return (units / font.unitsPerEm) * size;
}
