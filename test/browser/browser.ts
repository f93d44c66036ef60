import { existsSync } from 'node:fs';
import { type Browser, chromium } from 'playwright-core';

/** Where a browser may be; `CHROMIUM` names the one to take instead. */
const places = process.env.CHROMIUM ? [process.env.CHROMIUM] : ['/usr/bin/chromium', '/usr/bin/chromium-browser'];

/**
 * Path of the browser, or undefined where there is none: then the tests say aloud that they are left out.
 *
 * @throws Error when BOARDCASE_REQUIRE_BROWSER=1 demands one
 */
export function findBrowser(): string | undefined {
  const found = places.find((place) => existsSync(place));
  if (found === undefined && process.env.BOARDCASE_REQUIRE_BROWSER === '1') {
    throw new Error('BOARDCASE_REQUIRE_BROWSER=1, but no browser is found; set CHROMIUM to its path');
  }
  return found;
}

export const startBrowser = (executablePath: string): Promise<Browser> =>
  chromium.launch({
    executablePath,
    args: [
      '--headless',
      '--no-sandbox',
      '--disable-gpu',
      '--disable-quic',
      '--no-first-run',
      '--disable-background-networking',
      '--disable-component-update',
      '--disable-sync',
    ],
  });
