import { textWidth } from './font.js';

/** Breaks a text into lines no wider than `limit`; a word that is too long alone is cut. */
export function wrapText(text: string, size: number, limit: number, bold = false): string[] {
  const lines: string[] = [];
  let line = '';
  for (const word of text.split(/\s+/u).filter((part) => part !== '')) {
    const joined = line === '' ? word : `${line} ${word}`;
    if (textWidth(joined, size, bold) <= limit) {
      line = joined;
      continue;
    }
    if (line !== '') lines.push(line);
    line = '';
    for (const sign of word) {
      if (line !== '' && textWidth(line + sign, size, bold) > limit) {
        lines.push(line);
        line = '';
      }
      line += sign;
    }
  }
  if (line !== '') lines.push(line);
  return lines;
}
