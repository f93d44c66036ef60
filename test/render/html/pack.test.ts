import { posix } from 'node:path';
import { HtmlValidate } from 'html-validate';
import { beforeAll, describe, expect, it } from 'vitest';
import type { DocumentPage, PackDocument, Status } from '../../../src/dossier/document.js';
import { type IndexEntry, renderIndex, renderPack } from '../../../src/render/html/index.js';
import { packDocument } from '../fixture-document.js';
import { idsOf, tagsOf } from './markup.js';

let files: Map<string, string>;
beforeAll(async () => {
  files = await renderPack(packDocument);
});

const pages = () => [...files].filter(([path]) => path.endsWith('.html'));
const entry: IndexEntry = {
  packId: 'quillback-srr',
  title: 'Quillback short-range side radar',
  revision: 'B',
  date: '2026-11-16',
  status: 'released for review',
  href: 'quillback-srr/B/index.html',
  summary: 'Four boards: one undecided, three miss.',
};

const validator = new HtmlValidate({
  extends: ['html-validate:recommended'],
  rules: {
    // Titles carry the pack and its revision; a board may have a long name.
    'long-title': 'off',
  },
});

async function expectValid(html: string, name: string): Promise<void> {
  const report = await validator.validateString(html);
  const messages = report.results.flatMap((result) =>
    result.messages.map((message) => `${name}:${message.line}: ${message.ruleId}: ${message.message}`),
  );
  expect(messages).toEqual([]);
}

describe('pages of a pack', () => {
  it('lie at the path of their id, with one style sheet', () => {
    expect([...files.keys()]).toEqual([
      'index.html',
      ...['qb-1', 'qb-2', 'qb-3', 'qb-4'].map((id) => `board/${id}.html`),
      ...['gain', 'refl', 'sll-el', 'sll-az', 'hpbw-el', 'tilt', 'peel', 'env'].map((id) => `requirement/r-${id}.html`),
      'evidence.html',
      'definitions.html',
      'style.css',
    ]);
  });

  it('are valid HTML', async () => {
    for (const [path, html] of pages()) await expectValid(html, path);
  });

  it('carry the marking at head and foot, escaped', async () => {
    const marked = packDocument.pages.map((page) => ({ ...page, marking: 'internal: A & B' }));
    for (const [path, html] of await renderPack({ ...packDocument, pages: marked })) {
      if (path.endsWith('.html')) expect(html.match(/internal: A &amp; B/g), path).toHaveLength(2);
    }
    for (const [, html] of pages()) expect(html).not.toContain('class="marking"');
  });

  it('link to files of the revision by their relative path, and to nothing above it', async () => {
    const withLink = (file: string) => ({
      ...packDocument,
      pages: packDocument.pages.map((page) => ({
        ...page,
        chapters: [
          ...page.chapters,
          { id: 'added', title: 'Added', blocks: [{ kind: 'prose' as const, content: [{ text: 'PDF', file }] }] },
        ],
      })),
    });
    const made = await renderPack(withLink('pdf/pack.pdf'));
    expect(made.get('index.html')).toContain('<a href="pdf/pack.pdf">PDF</a>');
    expect(made.get('board/qb-1.html')).toContain('<a href="../pdf/pack.pdf">PDF</a>');
    for (const file of ['../secret.pdf', '/etc/passwd', 'javascript:alert(1)', 'pdf//x.pdf'])
      await expect(renderPack(withLink(file))).rejects.toThrow(/not a safe link/);
  });

  it('are the same bytes twice', async () => {
    expect([...(await renderPack(packDocument))]).toEqual([...files]);
  });

  it('link only to files and ids that exist, with relative links', () => {
    for (const [path, html] of pages()) {
      const links = tagsOf(html).flatMap(({ name, attributes }) => {
        expect(attributes, path).not.toHaveProperty('src');
        return name === 'a' || name === 'link' ? [attributes.href] : [];
      });
      expect(links.length).toBeGreaterThan(10);
      for (const link of links) {
        expect(link, path).not.toMatch(/^(?:[a-z][a-z0-9+.-]*:|\/)/i);
        const [file, fragment] = link.split('#');
        const target = file === '' ? path : posix.join(posix.dirname(path), file);
        // The build writes a PDF for each dossier beside the pages.
        if (/^pdf\/qb-\d\.pdf$/.test(target) && path.startsWith('board/')) continue;
        expect(files.has(target), `${path} -> ${link}`).toBe(true);
        if (fragment !== undefined) expect(idsOf(files.get(target)!), `${path} -> ${link}`).toContain(fragment);
      }
    }
  });

  it('use no id twice, and refer only to ids they have', () => {
    for (const [path, html] of pages()) {
      const ids = idsOf(html);
      expect(new Set(ids).size, path).toBe(ids.length);
      for (const { attributes } of tagsOf(html)) {
        for (const id of attributes['aria-labelledby']?.split(' ') ?? []) expect(ids, path).toContain(id);
      }
    }
  });

  it('hold no script, no handler, no inline style and nothing from outside', () => {
    for (const [path, html] of pages()) {
      for (const { name, attributes } of tagsOf(html)) {
        expect(['script', 'style', 'iframe', 'object', 'img', 'base', 'form', 'image', 'use'], path).not.toContain(
          name,
        );
        expect(
          Object.keys(attributes).filter((key) => /^on|^style$/.test(key)),
          path,
        ).toEqual([]);
      }
    }
    expect(files.get('style.css')).not.toMatch(/url\(|@import|@font-face/);
  });

  it('carry title, revision, status, title block, notices and kind', () => {
    for (const page of packDocument.pages) {
      const html = files.get(page.id === 'overview' ? 'index.html' : `${page.id}.html`)!;
      expect(html).toContain(`<h1>${page.title}</h1>`);
      expect(html).toContain('Revision B, released for review');
      expect(html).toContain('<dt>Identification number</dt><dd>NF-QB-');
      for (const notice of page.notices) expect(html).toContain(`<li>${notice}</li>`);
      expect(html.match(/aria-current="page"/g)).toHaveLength(1);
      for (const chapter of page.chapters) expect(html).toContain(`${chapter.title}</h2>`);
    }
  });

  it('write each status as word and shape, no two shapes alike', () => {
    const html = files.get('definitions.html')!;
    const shapes = new Map(
      [
        ...html.matchAll(
          /<span class="status [^"]*"><span class="lead"><svg[^>]*><path fill-rule="evenodd" d="([^"]*)"\/><\/svg> ([^<]*)<\/span>([^<]*)</g,
        ),
      ].map(([, shape, lead, rest]) => [lead + rest, shape]),
    );
    const words: readonly Status[] = [
      'meets',
      'undecided',
      'misses',
      'not evaluated',
      'open until measured',
      'incomplete',
    ];
    expect([...shapes.keys()]).toEqual(words);
    expect(new Set(shapes.values()).size).toBe(words.length);
  });

  it('mark up tables with caption, scopes and a region that scrolls by keyboard', () => {
    const html = files.get('index.html')!;
    const table = html.slice(html.indexOf('id="matrix"'), html.indexOf('</table>'));
    expect(table).toContain('tabindex="0"');
    expect(table).toContain('<caption id="matrix__caption">Every board against every requirement');
    expect(table.match(/scope="col"/g)).toHaveLength(6);
    expect(table.match(/scope="row"/g)).toHaveLength(8);
    expect(table.match(/<td /g)).toHaveLength(8 * 5);
  });

  it('give every figure a picture with title and description', () => {
    const figures = packDocument.pages[1].chapters.flatMap((c) => c.blocks.filter((b) => b.kind === 'figure'));
    const html = files.get('board/qb-1.html')!;
    expect(html.match(/<svg[^>]*role="img"/g)).toHaveLength(figures.length);
    for (const figure of figures) {
      expect(html).toContain(`<title id="${figure.id}__title">${figure.title}</title>`);
      expect(html).toContain(`<desc id="${figure.id}__desc">${figure.alt}</desc>`);
      expect(html).toContain(figure.reading);
    }
  });
});

describe('faults that stop the build', () => {
  const [first, ...others] = packDocument.pages;
  const withPages = (pages: readonly DocumentPage[]): PackDocument => ({ ...packDocument, pages });
  const withProse = (page: string, anchor?: string): PackDocument =>
    withPages([
      {
        ...first,
        chapters: [{ id: 'x', title: 'x', blocks: [{ kind: 'prose', content: [{ text: 'there', page, anchor }] }] }],
      },
      ...others.filter((other) => other.kind === 'evidence'),
    ]);

  it.each([
    ['a page id that leaves the folder', withPages([{ ...first, id: '../x' }])],
    ['a page id with a blank', withPages([{ ...first, id: 'board/a b' }])],
    ['a page id with markup', withPages([{ ...first, id: 'board/"><b>' }])],
    ['a page id three deep', withPages([{ ...first, id: 'board/a/b' }])],
    ['a chapter id with markup', withPages([{ ...first, chapters: [{ id: '"x', title: 'x', blocks: [] }] }])],
  ])('%s', async (_, document) => {
    await expect(renderPack(document)).rejects.toThrow(/safe/);
  });

  it('two pages at one path, where case does not count', async () => {
    const pages = [
      { ...first, id: 'board/QB-1' },
      { ...first, id: 'board/qb-1' },
    ];
    await expect(renderPack(withPages(pages))).rejects.toThrow(/two pages/);
  });

  it('a link to a page or a place that is not there', async () => {
    await expect(renderPack(withProse('board/none'))).rejects.toThrow(/board\/none leads nowhere/);
    await expect(renderPack(withProse('evidence', 'nothing'))).rejects.toThrow(/evidence#nothing leads nowhere/);
    await expect(renderPack(withProse('evidence', 'methods'))).resolves.toBeDefined();
  });
});

describe('index of packs', () => {
  it('lists every revision under its pack and is valid', async () => {
    const html = renderIndex([
      entry,
      { ...entry, revision: 'A', href: 'quillback-srr/A/index.html' },
      { ...entry, packId: 'other', title: 'Other', documentNumber: 'O-1', marking: 'internal: not for suppliers' },
    ]);
    await expectValid(html, 'index');
    expect(html.match(/<h2 /g)).toHaveLength(2);
    expect(html).toContain('<a href="quillback-srr/A/index.html">Revision A</a>');
    expect(html).toContain('2026-11-16, released for review, O-1');
    expect(html.match(/internal: not for suppliers/g)).toHaveLength(1);
    await expectValid(renderIndex([]), 'empty index');
  });

  it('refuses a link that leads elsewhere', () => {
    for (const href of ['https://invalid.example/', 'javascript:x', '../x.html', '/x', 'a//b', '']) {
      expect(() => renderIndex([{ ...entry, href }])).toThrow(/not a safe link/);
    }
  });
});
