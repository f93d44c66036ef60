import { drawing } from '../../chart/drawing.js';
import { chartSpec } from '../../chart/spec.js';
import { shapesToSvg, svgPicture } from '../../chart/svg.js';
import { renderSvg } from '../../chart/view.js';
import type { FigureBlock } from '../../dossier/document.js';

/** The picture of a figure as inline SVG whose ids start with the id of the figure on its page. */
export async function figureSvg(figure: FigureBlock, id: string): Promise<string> {
  const words = { title: figure.title, desc: figure.alt };
  if ('drawing' in figure.content) return shapesToSvg(drawing(figure.content, words), id);
  return embedChart(await renderSvg(chartSpec(figure.content)), id, words);
}

/** Takes the drawing out of the library's own root element, which has no words, and puts it into ours. */
function embedChart(svg: string, id: string, words: { readonly title: string; readonly desc: string }): string {
  const root = /^<svg [^>]*width="([\d.]+)" height="([\d.]+)"[^>]*>([\s\S]*)<\/svg>$/.exec(svg);
  if (root === null) throw new Error('chart: unexpected root element');
  const [, width, height, inner] = root;
  // Two pictures on one page must not share an id. Charts are built without definitions; text cannot hold a bare `<`.
  if (/<[^<>]*\sid="/.test(inner)) throw new Error('chart: holds definitions');
  return svgPicture(id, { width: Number(width), height: Number(height) }, words, inner);
}
