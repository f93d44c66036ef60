import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import type { PackFiles } from '../../src/manifest/index.js';
import { filesUnder, realDisk } from '../../src/publish/index.js';

const folder = fileURLToPath(new URL('../manifest/fixtures/quillback-small', import.meta.url));

export interface Wish {
  /** With a cover layer no field is computed, so that a build takes no time. */
  readonly covered: boolean;
  /** Ids of the requirements that stay. */
  readonly requirements?: readonly string[];
  /** Off unless the test is about it: it takes seconds a board. */
  readonly fullWave?: true;
}

/** The small pack of the manifest tests, path → text, made quicker. */
export function smallPack({ covered, requirements, fullWave }: Wish): Record<string, string> {
  const files = Object.fromEntries(
    filesUnder(realDisk, folder).map((path) => [path, readFileSync(join(folder, path), 'utf8')]),
  );
  const change = (path: string, from: string | RegExp, to: string) => {
    const changed = files[path].replace(from, to);
    if (changed === files[path]) throw new Error(`${path} does not hold ${from}`);
    files[path] = changed;
  };
  change('pack.yaml', 'frequency_step: 100 MHz', 'frequency_step: 400 MHz');
  if (!fullWave) change('pack.yaml', 'analysis:\n', 'analysis:\n  full_wave: off\n');
  if (covered) {
    const figure = (value: string) => `{ value: ${value}, spread: 0, basis: estimated }`;
    change(
      'boards/qs-1.yaml',
      'stack_up:\n',
      `stack_up:\n  cover:\n    material: solder mask\n    permittivity: ${figure('3.5')}\n` +
        `    loss_tangent: ${figure('0.02')}\n    thickness: { value: 25 um, spread: 5 um, basis: estimated }\n`,
    );
  } else {
    change('pack.yaml', '  - boards/qs-2.yaml\n', '');
  }
  if (requirements) {
    const [head, ...items] = files['requirements.yaml'].split(/(?=^ {2}- id: )/m);
    const kept = items.filter((item) => requirements.some((id) => item.startsWith(`  - id: ${id}\n`)));
    if (kept.length !== requirements.length) throw new Error(`not all of ${requirements} are requirements`);
    files['requirements.yaml'] = [head, ...kept].join('');
  }
  return files;
}

export function filesOf(files: Readonly<Record<string, string>>): PackFiles {
  return { read: (path) => (path in files ? Buffer.from(files[path]) : undefined) };
}
