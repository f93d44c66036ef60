import { describe, expect, it } from 'vitest';
import { type BuildEffects, buildPack } from '../../src/cli/build.js';
import { noProgress } from '../../src/cli/progress.js';
import { carryOut } from '../../src/cli/study-job.js';
import { inThisThread } from '../../src/cli/workers.js';
import { type RevisionSummary, sha256 } from '../../src/publish/index.js';
import { readPdf } from '../render/pdf/reading.js';
import { filesOf, smallPack } from './small-pack.js';

/** A marker in everything that can be hidden, one each, in all manifests. */
const markers = {
  author: 'Zyxauthor',
  cost: '98765.43',
  costBasis: 'Zyxcostbasis',
  description: 'Zyxdescription',
  source: 'Zyxsource',
  declared: 'zyxdeclared',
  declaredLaminate: 'zyxlaminate',
  board: 'zyx-board',
  boardTitle: 'Zyxboardtitle',
  boardFile: 'zyxfile',
  boardFoil: 'zyxfoil',
  row: 'zyx-row',
  requirement: 'r-zyx',
  requirementText: 'Zyxrequirement',
} as const;

function planted(): Record<string, string> {
  const files = smallPack({ covered: true });
  const change = (path: string, from: string | RegExp, to: string) => {
    const text = files[path]!;
    if (text.replace(from, to) === text) throw new Error(`${path} does not hold ${from}`);
    files[path] = text.replace(from, to);
  };
  change('pack.yaml', /^authors: .*$/m, `authors: [${markers.author}]`);
  change(
    'pack.yaml',
    '  - boards/qs-2.yaml\n',
    `  - boards/qs-2.yaml\n  - boards/${markers.boardFile}.yaml\nvariants: [more.csv]\n`,
  );
  change(
    'boards/qs-1.yaml',
    /^cost: .*$/m,
    `cost: { amount: ${markers.cost}, currency: EUR, basis: ${markers.costBasis} }`,
  );
  change('boards/qs-1.yaml', /^description: .*$/m, `description: ${markers.description}`);
  change('boards/qs-1.yaml', 'id: lead-time', `id: ${markers.declared}`);
  change('boards/qs-2.yaml', 'based_on: qs-1', `based_on: ${markers.board}`);
  change('boards/qs-2.yaml', /^title: .*$/m, 'title: Rough foil');
  files[`boards/${markers.boardFile}.yaml`] = [
    `id: ${markers.board}`,
    `title: ${markers.boardTitle}`,
    'based_on: qs-1',
    'stack_up:',
    `  ground: { foil: ${markers.boardFoil} }`,
    'cost: { amount: 131313.5 }',
    '',
  ].join('\n');
  files['more.csv'] = `id,title,based_on\n${markers.row},Zyxrowtitle,qs-1\nqs-4,Shown row,qs-1\n`;
  const foil = files['foils.yaml']!.split(/(?=^ {2}- id: )/m)[1]!;
  files['foils.yaml'] += foil.replace('id: kf-04', `id: ${markers.boardFoil}`);
  change('laminates.yaml', 'id: flammability', `id: ${markers.declaredLaminate}`);
  change('requirements.yaml', 'property: flammability', `property: ${markers.declaredLaminate}`);
  change('requirements.yaml', 'The laminate is declared', 'The material is declared');
  change('requirements.yaml', 'property: lead-time', `property: ${markers.declared}`);
  files['requirements.yaml'] = files['requirements.yaml']!.replaceAll(/source: .*/g, `source: ${markers.source}`)
    .replace('- id: r-line-loss', `- id: ${markers.requirement}`)
    .replace('The feed line loses', `${markers.requirementText} loses`);
  const hide = [
    'cost',
    'authors',
    'descriptions',
    'sources',
    'declared',
    `boards/${markers.board}`,
    `boards/${markers.row}`,
    `requirements/${markers.requirement}`,
  ];
  files['pack.yaml'] +=
    `\naudiences:\n  - { id: partner, marking: For the partner only, hide: [${hide.join(', ')}] }\n`;
  return files;
}

async function built(audience?: string, files = planted()) {
  let published: { summary: RevisionSummary; files: Map<string, Buffer> } | undefined;
  const effects: BuildEffects = {
    files: filesOf(files),
    openOutput: () => ({
      publishRevision(summary, written) {
        published = { summary, files: new Map([...written].map(([path, content]) => [path, Buffer.from(content)])) };
        return 'written';
      },
      readFile: () => undefined,
      close() {},
    }),
    progress: noProgress,
    workers: inThisThread(carryOut),
  };
  const outcome = await buildPack({ packPath: 'pack.yaml', programVersion: '1.0.0', audience }, effects);
  return { outcome, published };
}

/** Path → everything that can be read out of a file: for a PDF its texts, places, information and attachments too. */
async function legible(files: ReadonlyMap<string, Buffer>): Promise<Map<string, string>> {
  const texts = new Map<string, string>();
  for (const [path, content] of files) {
    if (!path.endsWith('.pdf')) texts.set(path, `${path}\n${content.toString('utf8')}`);
    else {
      const read = await readPdf(new Uint8Array(content));
      const attached = Object.values(read.attachments).map(({ content: c }) => Buffer.from(c).toString('utf8'));
      const words = JSON.stringify([read.pages, read.outline, [...read.places], read.info]);
      texts.set(path, [path, words, ...attached, content.toString('latin1')].join('\n'));
    }
  }
  return texts;
}

describe('build --audience', () => {
  it('leaves every hidden entry out of pages, PDFs, data, file names and hashes', async () => {
    const { outcome, published } = await built('partner');
    expect(outcome).toMatchObject({ kind: 'built', summary: { packId: 'quillback-small--partner' } });
    const { summary, files } = published!;
    const texts = await legible(files);
    texts.set('revision.json', JSON.stringify(summary));
    expect(texts.size).toBeGreaterThan(10);
    const hashes = Object.values(planted()).map((text) => sha256(text));
    for (const [path, text] of texts) {
      const squeezed = text.replace(/\s+/g, '').toLowerCase();
      for (const marker of [...Object.values(markers), '131313', ...hashes]) {
        expect(squeezed.includes(marker.toLowerCase()), `${marker} in ${path}`).toBe(false);
      }
    }
    expect(summary.boards.map(({ id }) => id)).toEqual(['qs-1', 'qs-2', 'qs-4']);
    // What is shown is there, with the marking of the copy and the words that it is one.
    const page = texts.get('board/qs-1.html')!;
    for (const words of ['For the partner only', 'entries are left out', 'not named in this copy'])
      expect(page).toContain(words);
  });

  it('finds every marker in the build that is not cut, so that their absence says something', async () => {
    const texts = [...(await legible((await built()).published!.files)).values()].join('\n');
    for (const marker of Object.values(markers)) expect(texts, marker).toContain(marker);
    expect(texts).toContain(sha256(planted()['pack.yaml']!));
  });

  it('gives the same copy, and the same hashes, whatever is hidden', async () => {
    const other = planted();
    other['boards/qs-1.yaml'] = other['boards/qs-1.yaml']!.replace(markers.cost, '1.11');
    other['pack.yaml'] = other['pack.yaml']!.replace(markers.author, 'Somebody else');
    const hidden = `boards/${markers.boardFile}.yaml`;
    other[hidden] = other[hidden]!.replace('amount: 131313.5', 'amount: 9');
    other['more.csv'] = other['more.csv']!.replace('Zyxrowtitle', 'Another title');
    const [one, two] = [await built('partner'), await built('partner', other)];
    expect(two.published!.summary).toEqual(one.published!.summary);
    expect([...two.published!.files]).toEqual([...one.published!.files]);
  });

  it('names the audiences where there is none of the name', async () => {
    const { outcome, published } = await built('partnre');
    expect(published).toBeUndefined();
    expect(outcome).toMatchObject({ kind: 'bad input', problems: [{ fix: 'Did you mean partner?' }] });
  });
});
