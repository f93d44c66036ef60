import { readdirSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { fillTemplate } from '../../../src/render/html/templates.js';

const folder = new URL('../../../templates/', import.meta.url);
const sources = readdirSync(folder, { recursive: true, encoding: 'utf8' })
  .filter((name) => name.endsWith('.hbs'))
  .map((name) => [name, readFileSync(new URL(name, folder), 'utf8')] as const);

describe('templates', () => {
  it('are found', () => expect(sources.length).toBeGreaterThan(10));

  it('quote every attribute', () => {
    for (const [name, source] of sources) expect(source, name).not.toMatch(/=\s*(?:\{\{|[^"\s>{}'=])[^"]*?>/);
  });

  it('print nothing unescaped but our own drawings and style', () => {
    const raw = sources.flatMap(([name, source]) =>
      (source.match(/\{\{\{[^}]*\}\}\}|\{\{&[^}]*\}\}/g) ?? []).map((use) => `${name} ${use}`),
    );
    expect(raw.sort()).toEqual(['partials/block-figure.hbs {{{svg}}}', 'supplier.hbs {{{style}}}']);
  });

  it('fail on a field that is missing', () => {
    expect(() => fillTemplate('page', { title: 'only this' })).toThrow(/not defined/);
  });
});
