import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { pathToFileURL } from 'node:url';
import axe from 'axe-core';
import type { Browser, BrowserContextOptions, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { renderIndex, renderPack, styleSheet } from '../../src/render/html/index.js';
import { packDocument } from '../render/fixture-document.js';
import { hostileDocument } from '../render/hostile-document.js';
import { findBrowser, startBrowser } from './browser.js';

/** One page of each kind, in the folder of the fixture, and the index of packs. */
const kinds = [
  'pack/B/index.html',
  'pack/B/board/qb-1.html',
  'pack/B/requirement/r-gain.html',
  'pack/B/evidence.html',
  'pack/B/definitions.html',
  'index.html',
];

const executable = findBrowser();
const narrow = { javaScriptEnabled: true, viewport: { width: 320, height: 640 } } as const;

if (executable === undefined) {
  console.warn('\n*** NO BROWSER FOUND: browser tests are left out. Set CHROMIUM to the path of one. ***\n');
  describe('pages in a browser', () => {
    it('are left out: no browser is found, and none is demanded', () => {
      expect(process.env.BOARDCASE_REQUIRE_BROWSER).not.toBe('1');
    });
  });
} else {
  describe('pages in a browser, from disk', () => {
    let browser: Browser;
    let folder: string;

    const write = (path: string, text: string) => {
      const file = join(folder, path);
      mkdirSync(dirname(file), { recursive: true });
      writeFileSync(file, text);
    };

    beforeAll(async () => {
      folder = mkdtempSync(join(tmpdir(), 'boardcase-pages-'));
      for (const [path, text] of await renderPack(packDocument)) write(`pack/B/${path}`, text);
      for (const [path, text] of await renderPack(hostileDocument)) write(`hostile/B/${path}`, text);
      const { revision, title } = packDocument;
      const entry = {
        packId: 'pack',
        title,
        revision,
        date: '2026-11-16',
        status: 'released',
        summary: 'Four boards.',
      };
      write('index.html', renderIndex([{ ...entry, href: 'pack/B/index.html' }]));
      write('style.css', styleSheet());
      browser = await startBrowser(executable);
    });

    afterAll(async () => {
      await browser?.close();
      rmSync(folder, { recursive: true, force: true });
    });

    async function withPage(path: string, options: BrowserContextOptions, use: (page: Page) => Promise<void>) {
      const context = await browser.newContext({ javaScriptEnabled: false, ...options });
      const page = await context.newPage();
      try {
        await page.goto(pathToFileURL(join(folder, path)).href);
        await use(page);
      } finally {
        await context.close();
      }
    }

    it.each(kinds)('%s asks for nothing but files beside it, and says nothing on the console', async (path) => {
      const context = await browser.newContext({ javaScriptEnabled: false });
      const page = await context.newPage();
      const requests: string[] = [];
      const complaints: string[] = [];
      page.on('request', (request) => requests.push(request.url()));
      page.on('requestfailed', (request) => complaints.push(`failed: ${request.url()}`));
      page.on('console', (message) => complaints.push(message.text()));
      await page.goto(pathToFileURL(join(folder, path)).href);
      await context.close();
      expect(requests.length).toBe(2);
      for (const url of requests) expect(url.startsWith(pathToFileURL(folder).href)).toBe(true);
      expect(complaints).toEqual([]);
    });

    it.each([
      ...kinds.map((path) => [path, 'light'] as const),
      ...[kinds[0], kinds[1], kinds[5]].map((path) => [path, 'dark'] as const),
    ])('%s has nothing to object to for axe, %s', async (path, colorScheme) => {
      // The checker is a script of the test; the page itself allows and holds none.
      await withPage(path, { javaScriptEnabled: true, colorScheme, bypassCSP: true }, async (page) => {
        await page.evaluate(axe.source);
        const result = await page.evaluate('axe.run()');
        const { violations, passes } = result as axe.AxeResults;
        expect(passes.length).toBeGreaterThan(15);
        expect(
          violations.map(
            (found) =>
              `${found.id}: ${found.nodes
                .map((node) => node.html.slice(0, 120))
                .slice(0, 3)
                .join(' | ')}`,
          ),
        ).toEqual([]);
      });
    });

    it.each([...kinds, 'hostile/B/board/qb-1.html', 'hostile/B/index.html'])(
      '%s is no wider than a screen of 320 pixels',
      async (path) => {
        await withPage(path, narrow, async (page) => {
          const width = await page.evaluate('document.documentElement.scrollWidth');
          expect(width).toBe(320);
        });
      },
    );

    it('lets the keyboard reach and move every region that scrolls', async () => {
      await withPage(kinds[1], { ...narrow, bypassCSP: true }, async (page) => {
        const regions = Number(await page.evaluate("document.querySelectorAll('.scroll').length"));
        expect(regions).toBeGreaterThan(8);
        await page.keyboard.press('Tab');
        expect(await page.evaluate('document.activeElement.className')).toBe('skip');
        let reached = 0;
        let moved = 0;
        for (let i = 0; i < 200 && reached < regions; i += 1) {
          await page.keyboard.press('Tab');
          if (!(await page.evaluate("document.activeElement.classList.contains('scroll')"))) continue;
          reached += 1;
          expect(await page.evaluate('getComputedStyle(document.activeElement).outlineStyle')).toBe('solid');
          const scrollable = await page.evaluate(
            'document.activeElement.scrollWidth > document.activeElement.clientWidth + 1',
          );
          if (!scrollable) continue;
          await page.keyboard.press('ArrowRight');
          await page.waitForFunction('document.activeElement.scrollLeft > 0');
          moved += 1;
        }
        expect(reached).toBe(regions);
        expect(moved).toBeGreaterThan(8);
      });
    });

    it('runs and loads nothing that a user wrote', async () => {
      await withPage('hostile/B/board/qb-1.html', { javaScriptEnabled: true }, async (page) => {
        expect(await page.evaluate('globalThis.broken')).toBeUndefined();
        expect(await page.evaluate("document.querySelectorAll('script, img, style').length")).toBe(0);
        expect(await page.evaluate("document.querySelectorAll('main svg[role=img]').length")).toBe(9);
        expect(await page.evaluate("document.querySelector('h1').textContent")).toContain('<script>');
      });
    });

    it('prints on A4 with whole figures and the head of a table on each page', async () => {
      await withPage(kinds[1], { javaScriptEnabled: true }, async (page) => {
        await page.emulateMedia({ media: 'print', colorScheme: 'light' });
        const shown = await page.evaluate("getComputedStyle(document.querySelector('.pages')).display");
        expect(shown).toBe('none');
        const ink = await page.evaluate("getComputedStyle(document.querySelector('td a, th a')).color");
        expect(ink).toBe(await page.evaluate('getComputedStyle(document.body).color'));
        const pdf = (await page.pdf({ preferCSSPageSize: true })).toString('latin1');
        expect(pdf).toMatch(/MediaBox\s*\[0 0 59[45][.\d]* 84[12][.\d]*\]/);
      });
    });

    it('keeps all texts of pictures inside them', async () => {
      await withPage(kinds[1], { javaScriptEnabled: true, viewport: { width: 1280, height: 900 } }, async (page) => {
        const outside = await page.evaluate(`(() => {
          const found = [];
          for (const svg of document.querySelectorAll('svg[role=img]')) {
            const frame = svg.getBoundingClientRect();
            for (const text of svg.querySelectorAll('text')) {
              const box = text.getBoundingClientRect();
              if (box.width === 0) continue;
              if (box.left < frame.left - 1 || box.right > frame.right + 1 || box.top < frame.top - 2 || box.bottom > frame.bottom + 2)
                found.push(text.textContent);
            }
          }
          return found;
        })()`);
        expect(outside).toEqual([]);
      });
    });
  });
}
