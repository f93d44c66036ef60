import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { pathToFileURL } from 'node:url';
import axe from 'axe-core';
import type { Browser, BrowserContextOptions, Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { askingBuild } from '../cli/asking-build.js';
import { ANSWER_HEAD, PROCUREMENT } from '../manifest/procurement-fixture.js';
import { findBrowser, startBrowser } from './browser.js';

const executable = findBrowser();
const pages = ['supplier/laminate.html', 'supplier/foil.html', 'supplier/fabrication.html', 'offers.html'];

if (executable === undefined) {
  describe('supplier pages in a browser', () => {
    it('are left out: no browser is found, and none is demanded', () => {
      console.warn('\n*** NO BROWSER FOUND: browser tests are left out. Set CHROMIUM to the path of one. ***\n');
      expect(process.env.BOARDCASE_REQUIRE_BROWSER).not.toBe('1');
    });
  });
} else {
  describe('supplier pages in a browser, from disk', () => {
    let browser: Browser;
    let folder: string;

    beforeAll(async () => {
      folder = mkdtempSync(join(tmpdir(), 'boardcase-supplier-'));
      const answers = `${ANSWER_HEAD}\nA-permittivity,,2.8,3.2,3.1,another grade,,stripline,\n`;
      const { revision } = await askingBuild({ covered: true }, PROCUREMENT, answers);
      for (const path of [...pages, 'style.css']) {
        mkdirSync(dirname(join(folder, path)), { recursive: true });
        writeFileSync(join(folder, path), revision.get(path)!);
      }
      browser = await startBrowser(executable);
    });

    afterAll(async () => {
      await browser?.close();
      rmSync(folder, { recursive: true, force: true });
    });

    async function withPage(path: string, options: BrowserContextOptions, use: (page: Page) => Promise<void>) {
      const context = await browser.newContext(options);
      const page = await context.newPage();
      try {
        await page.goto(pathToFileURL(join(folder, path)).href);
        await use(page);
      } finally {
        await context.close();
      }
    }

    it.each(pages.flatMap((path) => [[path, 'light'] as const, [path, 'dark'] as const]))(
      '%s has nothing to object to for axe, %s',
      async (path, colorScheme) => {
        await withPage(path, { colorScheme, bypassCSP: true }, async (page) => {
          await page.evaluate(axe.source);
          const { violations, passes } = (await page.evaluate('axe.run()')) as axe.AxeResults;
          expect(passes.length).toBeGreaterThan(15);
          expect(violations.map(({ id, nodes }) => `${id}: ${nodes[0]?.html.slice(0, 120)}`)).toEqual([]);
        });
      },
    );

    it.each(pages)('%s is no wider than a screen of 320 pixels', async (path) => {
      await withPage(path, { viewport: { width: 320, height: 640 } }, async (page) => {
        expect(await page.evaluate('document.documentElement.scrollWidth')).toBe(320);
      });
    });

    it('a sheet asks for no other file, and says nothing on the console', async () => {
      const context = await browser.newContext();
      const page = await context.newPage();
      const requests: string[] = [];
      const complaints: string[] = [];
      page.on('request', (request) => requests.push(request.url()));
      page.on('console', (message) => complaints.push(message.text()));
      await page.goto(pathToFileURL(join(folder, pages[0])).href);
      await context.close();
      expect(requests).toHaveLength(1);
      expect(complaints).toEqual([]);
    });
  });
}
