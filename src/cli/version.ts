import { readFileSync } from 'node:fs';

/** As package.json, which lies two folders above both `src/cli` and `dist/cli`, states it. */
export const programVersion: string = JSON.parse(
  readFileSync(new URL('../../package.json', import.meta.url), 'utf8'),
).version;
