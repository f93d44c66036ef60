import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { start, startFiles } from '../../src/cli/command-start.js';
import { runCommandLine } from '../../src/cli/program.js';
import { loadPack } from '../../src/manifest/index.js';
import { packFilesUnder } from '../../src/publish/index.js';
import { readTree, temporaryFolder, writeTree } from '../publish/temporary-folder.js';

function listening() {
  const [out, err]: [string[], string[]] = [[], []];
  const io = { out: (text: string) => void out.push(text), err: (text: string) => void err.push(text), env: {} };
  return { io, said: { out: () => out.join('\n'), err: () => err.join('\n') } };
}

describe('boardcase start', () => {
  it('writes a pack that builds at once, every board calculated, the retuned one too', async () => {
    const folder = join(temporaryFolder(), 'new', 'pack');
    const { io, said } = listening();
    expect(await runCommandLine(['start', folder], io)).toBe(0);
    expect(said.out()).toContain(join(folder, 'pack.yaml'));
    // The full wave takes seconds a board and has tests of its own.
    const pack = readTree(folder)['pack.yaml']!;
    expect(pack).toContain('\nanalysis:\n');
    writeTree(folder, { 'pack.yaml': pack.replace('\nanalysis:\n', '\nanalysis:\n  full_wave: off\n') });
    const code = await runCommandLine(['build', join(folder, 'pack.yaml'), '--out', join(folder, 'out')], io);
    expect([code, said.err()]).toEqual([0, '']);
    expect(said.out()).toMatch(/first-pack revision 1, 3 boards: first \w+, second \w+, third \w+/);
    const pages = readTree(join(folder, 'out', 'first-pack', '1'));
    const third = pages['board/third.html']!;
    expect(third).toMatch(/Factor of length[\s\S]{0,200}0\.9\d\d\d/);
    expect(third).not.toContain('Nothing was computed');
    for (const [path, text] of Object.entries(pages)) {
      if (path.endsWith('.html')) expect(text, path).toContain('Invented data');
    }
    const copy = await runCommandLine(
      ['build', join(folder, 'pack.yaml'), '--out', join(folder, 'out'), '--audience', 'partner'],
      io,
    );
    expect([copy, said.err()]).toEqual([0, '']);
  });

  it('names in the first line of every manifest a schema that lies there, and comments every file', () => {
    const files = startFiles();
    for (const [path, text] of files) {
      if (!path.endsWith('.yaml')) continue;
      const schema = /^# yaml-language-server: \$schema=(\S+)\n/.exec(text)?.[1];
      const folder = path.includes('/') ? path.slice(0, path.lastIndexOf('/') + 1) : '';
      expect([...files.keys()], path).toContain(new URL(schema ?? '', `file:///${folder}`).pathname.slice(1));
      expect(text.split('\n').filter((line) => /(?:^|\s)# /.test(line)).length, path).toBeGreaterThan(1);
    }
    expect([...files.keys()].filter((path) => path.startsWith('schema/')).length).toBeGreaterThanOrEqual(6);
  });

  it('marks everything as invented', () => {
    const folder = temporaryFolder();
    start(folder, listening().io);
    const loaded = loadPack(packFilesUnder(folder), 'pack.yaml');
    if ('problems' in loaded) throw new Error(JSON.stringify(loaded.problems));
    const { boards, requirements, notice } = loaded.pack;
    expect(notice).toMatch(/invented/i);
    expect(requirements.invented).toBe(true);
    for (const { stackUp } of boards) {
      for (const { invented } of [
        stackUp.strip.foil,
        stackUp.strip.finish,
        stackUp.laminate.material,
        stackUp.ground.foil,
      ]) {
        expect(invented).toBe(true);
      }
    }
  });

  it('refuses a folder that holds anything, and a file, and changes nothing', async () => {
    const folder = temporaryFolder();
    writeTree(folder, { 'kept/.hidden': 'x', file: 'y' });
    for (const [place, words] of [
      [join(folder, 'kept'), /not empty \(it holds \.hidden\)/],
      [join(folder, 'file'), /file/],
    ] as const) {
      const { io, said } = listening();
      expect(await runCommandLine(['start', place], io)).toBe(2);
      expect(said.err()).toMatch(words);
    }
    expect(readTree(folder)).toEqual({ 'kept/.hidden': 'x', file: 'y' });
  });
});
