import { arrowHead, type Drawing, hatchLines, type Shape, type Stroke } from './shapes.js';
import { theme } from './theme.js';

const entities: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

// Not allowed in XML, and of no use on a page: shown as the replacement character. Line ends and tabs stay.
// biome-ignore lint/suspicious/noControlCharactersInRegex: control characters are what is sought
const unprintable = /[\u0000-\u0008\u000b\u000c\u000e-\u001f\u007f-\u009f\ufffe\uffff]|\p{Surrogate}/gu;

/** Text for element content and for quoted attributes, in HTML and SVG alike. */
export function escapeMarkup(text: string): string {
  return printable(text).replace(/[&<>"']/g, (sign) => entities[sign]);
}

/** Plain data with every sign that a page cannot print replaced, in all its strings. */
export function printable<T>(data: T): T {
  if (typeof data === 'string') return data.replace(unprintable, '\ufffd') as T;
  if (Array.isArray(data)) return data.map(printable) as T;
  if (typeof data !== 'object' || data === null) return data;
  return Object.fromEntries(Object.entries(data).map(([key, value]) => [key, printable(value)])) as T;
}

const n = (value: number) => String(Number(value.toFixed(2)));
const pair = ([x, y]: readonly [number, number]) => `${n(x)},${n(y)}`;

/** An SVG picture with its words; ids start with `id`, which must be unique on the page and made of our own signs. */
export function svgPicture(
  id: string,
  size: { readonly width: number; readonly height: number },
  words: { readonly title: string; readonly desc: string },
  inner: string,
): string {
  const { width, height } = size;
  return (
    `<svg xmlns="http://www.w3.org/2000/svg" role="img" aria-labelledby="${id}__title ${id}__desc"` +
    ` width="${n(width)}" height="${n(height)}" viewBox="0 0 ${n(width)} ${n(height)}">` +
    `<title id="${id}__title">${escapeMarkup(words.title)}</title>` +
    `<desc id="${id}__desc">${escapeMarkup(words.desc)}</desc>${inner}</svg>`
  );
}

/** The display list as SVG. */
export function shapesToSvg(drawing: Drawing, id: string): string {
  return svgPicture(id, drawing, drawing, drawing.shapes.map(shapeToSvg).join(''));
}

function strokeAttributes(stroke: Stroke | undefined): string {
  if (stroke === undefined) return '';
  const dash = stroke.dash === undefined ? '' : ` stroke-dasharray="${stroke.dash.map(n).join(' ')}"`;
  return ` stroke="${stroke.color}" stroke-width="${n(stroke.width)}"${dash}`;
}

function shapeToSvg(shape: Shape): string {
  switch (shape.shape) {
    case 'rect': {
      const box = `x="${n(shape.x)}" y="${n(shape.y)}" width="${n(shape.width)}" height="${n(shape.height)}"`;
      const lines = hatchLines(shape);
      const path = lines.map((line) => `M${pair(line.from)}L${pair(line.to)}`).join('');
      const hatch = path === '' ? '' : `<path fill="none" d="${path}"${strokeAttributes(lines[0].stroke)}/>`;
      return `<rect ${box} fill="${shape.fill ?? 'none'}"${strokeAttributes(shape.stroke)}/>${hatch}`;
    }
    case 'line':
      return `<path fill="none" d="M${pair(shape.from)}L${pair(shape.to)}"${strokeAttributes(shape.stroke)}/>`;
    case 'polyline': {
      const name = shape.closed ? 'polygon' : 'polyline';
      const points = shape.points.map(pair).join(' ');
      return `<${name} points="${points}" fill="${shape.fill ?? 'none'}"${strokeAttributes(shape.stroke)}/>`;
    }
    case 'arrow': {
      const heads = [arrowHead(shape.from, shape.to, shape.head)];
      if (shape.both) heads.push(arrowHead(shape.to, shape.from, shape.head));
      const line = `<path fill="none" d="M${pair(shape.from)}L${pair(shape.to)}"${strokeAttributes(shape.stroke)}/>`;
      return (
        line +
        heads.map((head) => `<polygon points="${head.map(pair).join(' ')}" fill="${shape.stroke.color}"/>`).join('')
      );
    }
    case 'text': {
      const anchor = shape.anchor === 'start' ? '' : ` text-anchor="${shape.anchor}"`;
      const weight = shape.bold ? ' font-weight="bold"' : '';
      const turn = shape.rotate ? ` transform="rotate(${n(shape.rotate)} ${n(shape.x)} ${n(shape.y)})"` : '';
      return (
        `<text x="${n(shape.x)}" y="${n(shape.y)}" font-family="${theme.chartFont}" font-size="${n(shape.size)}"` +
        ` fill="${shape.color}"${anchor}${weight}${turn}>${escapeMarkup(shape.text)}</text>`
      );
    }
  }
}
