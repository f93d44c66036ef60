import { describe, expect, it } from 'vitest';
import type { FigureBlock } from '../../../src/dossier/document.js';
import { composePack } from '../../../src/dossier/index.js';
import { figureSvg } from '../../../src/render/html/figure.js';
import { blocksOf, inputOf, studies } from '../../dossier/pack-fixture.js';

const document = composePack(inputOf(studies()));
/** Every picture of a dossier and of a comparison, as the program composes them. */
const figures = document.pages
  .filter(({ id }) => id === 'board/qb-1' || id === 'compare/qb-1--qb-2')
  .flatMap((page) =>
    blocksOf(page).flatMap((block) => (block.kind === 'figure' ? [[page.id, block.id, block] as const] : [])),
  );

const textsOf = (svg: string): string[] =>
  [...svg.matchAll(/<text[^>]*>([\s\S]*?)<\/text>/g)].map(([, text]) =>
    text!
      .replace(/<[^>]+>/g, '')
      .replaceAll('&gt;', '>')
      .replaceAll('&lt;', '<')
      .replaceAll('&amp;', '&'),
  );

/** What a label may lose when its place is narrow: its end. */
const isThere = (label: string, texts: readonly string[]): boolean =>
  texts.some((text) => text === label || (text.endsWith('…') && label.startsWith(text.slice(0, -1).trim())));

function axesOf({ content }: FigureBlock): string[] {
  if ('drawing' in content) return [];
  return content.chart === 'budget' ? [`Level (${content.unit})`] : [content.xTitle, content.yTitle];
}

function labelsOf({ content }: FigureBlock): string[] {
  if ('drawing' in content) {
    if (content.drawing === 'stack-up') return content.layers.map(({ label }) => label);
    if (content.drawing === 'matrix') return [`${content.rowTitle} ↓`, `${content.columnTitle} →`, ...content.labels];
    return content.drawing === 'array' ? content.columns.map((c) => c.label) : content.faces.map((f) => f.label);
  }
  if (content.chart === 'budget') return [content.start, ...content.losses, content.end].map(({ label }) => label);
  return content.series.map(({ label }) => label);
}

describe('pictures of a pack', () => {
  it('are of every kind', () => {
    const kinds = figures.map(([, , { content }]) => ('chart' in content ? content.chart : content.drawing));
    expect(new Set(kinds)).toEqual(new Set(['stack-up', 'array', 'matrix', 'tooth', 'budget', 'cut', 'lines']));
  });

  it.each(figures)(
    '%s %s has units on its axes, its labels beside what they name, no legend, and one sentence of reading',
    async (...args) => {
      const [, , figure] = args;
      const texts = textsOf(await figureSvg(figure, 'f'));
      for (const axis of axesOf(figure)) {
        expect(axis).toMatch(/\((?:GHz|dB|dBi|dB\/cm|µm|°|1)\)/);
        expect(isThere(axis, texts), `${axis} among ${texts.join(' | ')}`).toBe(true);
      }
      const labels = labelsOf(figure);
      expect(labels.length).toBeGreaterThan(0);
      for (const label of labels) expect(isThere(label, texts), `${label} among ${texts.join(' | ')}`).toBe(true);
      // A label stands once, at its line; a legend would repeat it.
      if (!('drawing' in figure.content)) {
        for (const label of labels) expect(texts.filter((text) => text === label).length).toBeLessThanOrEqual(1);
      }
      expect(figure.title).toMatch(/^[A-Z0-9].{10,}[^.]$/);
      expect(figure.reading.replaceAll(/\d\.\d/g, '')).toMatch(/^[A-Z0-9][^.]*\.$/);
    },
  );
});
