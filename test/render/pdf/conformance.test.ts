import { createHash } from 'node:crypto';
import { inflateSync } from 'node:zlib';
import { beforeAll, describe, expect, it } from 'vitest';
import { renderPdf, renderSupplierPdf } from '../../../src/render/pdf/index.js';
import { hostileDocument } from '../hostile-document.js';
import { type Dict, nameOf, type PdfObjects, pdfObjects, Ref, type Value } from './objects.js';
import { readPdf, squeeze } from './reading.js';
import { sheet, sheetCodes } from './sheet.js';
import { pageOf, pdfContext } from './words.js';

/**
 * What ISO 19005-3 (PDF/A-3) and ISO 14289-1 (PDF/UA-1) ask of a file and a program can see, as far as these files use
 * it; the clauses are named from memory. The files of programs from outside are looked at in tools.test.ts.
 */
interface Node {
  readonly type: string;
  readonly dict: Dict;
  readonly id: number;
  readonly parent?: Node;
  readonly children: Node[];
  /** Marked content and annotations that it holds, in order. */
  readonly content: ({ readonly page: number; readonly mcid: number } | { readonly annotation: number })[];
}

interface File {
  readonly name: string;
  readonly bytes: Uint8Array;
  readonly pdf: PdfObjects;
  readonly root: Node;
  readonly nodes: readonly Node[];
}

const data = new TextEncoder().encode('{"gain": 16.62}');
const attachments = [{ name: 'board.json', type: 'application/json', description: 'results (data)', data }];
const files: File[] = [];
const idOf = (value: Value | undefined): number => (value as Ref).id;

function tree(pdf: PdfObjects, ref: Ref, parent?: Node): Node {
  const dict = pdf.dict(ref);
  const node: Node = { type: nameOf(dict.S)!, dict, id: ref.id, parent, children: [], content: [] };
  for (const kid of pdf.list(dict.K)) {
    if (typeof kid === 'number') node.content.push({ page: idOf(dict.Pg), mcid: kid });
    else if (kid instanceof Ref) node.children.push(tree(pdf, kid, node));
    else if (nameOf((kid as Dict).Type) === 'OBJR') node.content.push({ annotation: idOf((kid as Dict).Obj) });
    else node.content.push({ page: idOf((kid as Dict).Pg), mcid: Number((kid as Dict).MCID) });
  }
  return node;
}
const flat = (node: Node): Node[] => [node, ...node.children.flatMap(flat)];
const ofType = (file: File, type: string) => file.nodes.filter((node) => node.type === type);
const pagesOf = ({ pdf }: File) =>
  pdf.list(pdf.dict(pdf.catalog.Pages).Kids).map((ref) => ({ id: idOf(ref), dict: pdf.dict(ref) }));
const numberTree = ({ pdf }: File): Map<number, Value> => {
  const nums = pdf.list(pdf.dict(pdf.dict(pdf.catalog.StructTreeRoot).ParentTree).Nums);
  return new Map(nums.flatMap((key, i) => (i % 2 === 0 ? [[Number(key), nums[i + 1]] as const] : [])));
};

beforeAll(async () => {
  const documents = { dossier: pageOf('board/qb-1'), overview: pageOf('overview'), hostile: hostileDocument.pages[1] };
  for (const [name, document] of Object.entries(documents)) {
    const bytes = await renderPdf(document, { ...pdfContext, attachments });
    files.push(fileOf(name, bytes));
  }
  files.push(fileOf('sheet', await renderSupplierPdf(sheet, pdfContext.date)));
});

function fileOf(name: string, bytes: Uint8Array): File {
  const pdf = pdfObjects(bytes, (packed) => inflateSync(packed));
  const [top, ...others] = pdf.list(pdf.dict(pdf.catalog.StructTreeRoot).K);
  expect(others).toEqual([]);
  const root = tree(pdf, top as Ref);
  return { name, bytes, pdf, root, nodes: flat(root) };
}
const each = (check: (file: File) => void) => () => {
  expect(files).toHaveLength(4);
  for (const file of files) check(file);
};

describe('the claims of a file', () => {
  it(
    'are PDF/A-3a and PDF/UA-1, and the property outside of the list is described',
    each(({ pdf }) => {
      const packet = pdf.stream(pdf.catalog.Metadata).toString('utf8');
      expect(packet).toMatch(/^<\?xpacket begin="\uFEFF" id="W5M0MpCehiHzreSzNTczkc9d"\?>/);
      expect(packet).toContain('<pdfaid:part>3</pdfaid:part>');
      expect(packet).toContain('<pdfaid:conformance>A</pdfaid:conformance>');
      expect(packet).toContain('<pdfuaid:part>1</pdfuaid:part>');
      expect(packet).toContain('<pdfaSchema:namespaceURI>http://www.aiim.org/pdfua/ns/id/</pdfaSchema:namespaceURI>');
      expect(packet).toContain('<pdfaProperty:name>part</pdfaProperty:name>');
      expect(pdf.dict(pdf.catalog.Metadata).Filter).toBeUndefined();
    }),
  );

  it(
    'have a colour of output: one profile of three components that says of itself that it is RGB for a display',
    each(({ pdf }) => {
      const intents = pdf.list(pdf.catalog.OutputIntents).map(pdf.dict);
      expect(intents.map((intent) => nameOf(intent.S))).toEqual(['GTS_PDFA1']);
      expect(pdf.dict(intents[0].DestOutputProfile).N).toBe(3);
      const profile = pdf.stream(intents[0].DestOutputProfile);
      expect(profile.readUInt32BE(0)).toBe(profile.length);
      // ISO 15076-1, 7.2: class at 12, colour space at 16, signature at 36.
      expect([12, 16, 36].map((at) => profile.subarray(at, at + 4).toString())).toEqual(['mntr', 'RGB ', 'acsp']);
    }),
  );

  it(
    'are said on the last page, with what is missing and what is attached',
    each(({ root }) => expect(root.children.at(-1)!.children.map((node) => node.type)).toEqual(['P'])),
  );

  it('are said in words', async () => {
    for (const { name, bytes } of files) {
      const text = squeeze((await readPdf(bytes)).pages.at(-1)!.text);
      expect(text).toContain('builttoPDF/A-3a(ISO19005-3)andPDF/UA-1(ISO14289-1);notcertified;missing:');
      if (name === 'sheet') expect(text).not.toContain('Attached');
      else expect(text).toContain('Attached:board.json(results(data)).');
    }
  });

  it(
    'name what is missing truly: no language of passages, no formulas, no numbering of names and values',
    each((file) => {
      for (const { dict } of file.nodes) expect(dict.Lang).toBeUndefined();
      expect(ofType(file, 'Formula')).toEqual([]);
      const numbered = ofType(file, 'L').filter(({ dict }) => dict.A !== undefined);
      expect(numbered.length).toBeLessThan(ofType(file, 'L').length);
    }),
  );
});

describe('a supplier sheet', () => {
  it('repeats the head of a table on each page, and prints every row once and whole', async () => {
    const { pages } = await readPdf(files[3].bytes);
    const withRows = pages.filter(({ text }) => /N-\d/.test(text));
    expect(withRows.length).toBeGreaterThan(2);
    for (const [i, { artifacts }] of withRows.entries()) {
      const repeated = squeeze(artifacts).includes('ItemNominalvalueReason');
      expect(repeated).toBe(i > 0);
    }
    const rows = pages.flatMap(({ text }) => squeeze(text).match(/N-\d+µmThetexture[^.]*takes\./g) ?? []);
    const words = 'Thetextureofthefoildecideshowmuchofthewavethecoppertakes.';
    expect(rows).toEqual(sheetCodes.map((code, i) => `${code}${18 + i}µm${words}`));
  });
});

describe('the catalog', () => {
  it(
    'has language, mark, title to show and places',
    each(({ pdf }) => {
      expect(pdf.catalog.Lang).toBe('en');
      expect(pdf.dict(pdf.catalog.MarkInfo).Marked).toBe(true);
      expect(pdf.dict(pdf.catalog.ViewerPreferences).DisplayDocTitle).toBe(true);
      for (const key of ['AcroForm', 'OpenAction', 'AA', 'OCProperties']) expect(pdf.catalog[key]).toBeUndefined();
    }),
  );

  it(
    'lists the attachment as data of the document, with its checksum; a supplier sheet has none',
    each(({ name, pdf }) => {
      if (name === 'sheet') {
        expect(pdf.catalog.AF).toBeUndefined();
        expect(pdf.dict(pdf.catalog.Names).EmbeddedFiles).toBeUndefined();
        return;
      }
      const [specification, ...others] = pdf.list(pdf.catalog.AF).map(pdf.dict);
      expect(others).toEqual([]);
      expect(nameOf(specification.AFRelationship)).toBe('Data');
      expect([specification.F, specification.UF, specification.Desc]).toEqual([
        'board.json',
        'board.json',
        'results (data)',
      ]);
      const file = pdf.dict(specification.EF).F;
      expect(nameOf(pdf.dict(file).Subtype)).toBe('application/json');
      expect(pdf.stream(file)).toEqual(Buffer.from(data));
      expect(pdf.dict(pdf.dict(file).Params)).toMatchObject({
        CheckSum: createHash('md5').update(data).digest().toString('latin1'),
        Size: data.length,
        CreationDate: 'D:20261116000000Z',
        ModDate: 'D:20261116000000Z',
      });
    }),
  );

  it(
    'lists nothing that runs or leads out',
    each(({ pdf }) => {
      const kinds = pdf.dicts.map((dict) => nameOf(dict.S)).filter((kind) => kind !== undefined);
      for (const kind of ['JavaScript', 'Launch', 'URI', 'GoToR', 'SubmitForm']) expect(kinds).not.toContain(kind);
    }),
  );
});

describe('the structure', () => {
  it(
    'has standard types only, under parents that may hold them',
    each((file) => {
      const grouping = ['Document', 'Sect', 'Div'];
      const parents: Readonly<Record<string, readonly string[]>> = {
        Sect: ['Document'],
        Div: grouping,
        H1: grouping,
        H2: grouping,
        H3: grouping,
        P: grouping,
        Figure: grouping,
        TOC: grouping,
        TOCI: ['TOC'],
        Reference: ['TOCI'],
        L: grouping,
        LI: ['L'],
        Lbl: ['LI'],
        LBody: ['LI'],
        Table: grouping,
        TR: ['Table'],
        TH: ['TR'],
        TD: ['TR'],
        Caption: ['Table', 'Div'],
        Link: ['P', 'LBody', 'Reference', 'TD', 'TH'],
      };
      expect(file.root.type).toBe('Document');
      for (const { type, parent } of file.nodes.slice(1)) expect(parents[type], type).toContain(parent!.type);
    }),
  );

  it(
    'leads from each parent to its children and back',
    each((file) => {
      for (const { dict, parent } of file.nodes.slice(1)) expect(idOf(dict.P)).toBe(parent!.id);
    }),
  );

  it(
    'owns every piece of marked content once, and the way back names the owner',
    each((file) => {
      const back = numberTree(file);
      const owned = new Map<string, number>();
      for (const node of file.nodes) {
        for (const item of node.content) {
          if (!('mcid' in item)) continue;
          const key = `${item.page}/${item.mcid}`;
          expect(owned.has(key)).toBe(false);
          owned.set(key, node.id);
        }
      }
      let marks = 0;
      for (const { id, dict } of pagesOf(file)) {
        const entries = file.pdf.list(back.get(Number(dict.StructParents)));
        entries.forEach((entry, mcid) => {
          expect(owned.get(`${id}/${mcid}`)).toBe(idOf(entry));
        });
        marks += entries.length;
      }
      expect(owned.size).toBe(marks);
      expect(marks).toBeGreaterThan(10);
    }),
  );

  it(
    'gives figures words and bounds, heads of tables a scope, and lists with bullets or numbers their numbering',
    each((file) => {
      for (const { dict } of ofType(file, 'Figure')) {
        expect(String(dict.Alt).length).toBeGreaterThan(10);
        expect(file.pdf.list((dict.A as Dict).BBox)).toHaveLength(4);
      }
      for (const { dict } of ofType(file, 'TH')) expect(nameOf((dict.A as Dict).Scope)).toMatch(/^(Column|Row)$/);
      for (const { dict } of ofType(file, 'L').filter(({ dict }) => dict.A !== undefined)) {
        expect(nameOf((dict.A as Dict).O)).toBe('List');
        expect(nameOf((dict.A as Dict).ListNumbering)).toMatch(/^(Disc|Decimal)$/);
      }
    }),
  );

  it(
    'has tables whose rows have one number of cells',
    each((file) => {
      for (const table of ofType(file, 'Table')) {
        const rows = table.children.filter((node) => node.type === 'TR');
        expect(rows.length).toBeGreaterThan(1);
        expect(new Set(rows.map((row) => row.children.length)).size).toBe(1);
      }
    }),
  );

  it(
    'holds each link beside its words, and the annotation has words, prints, and leads to a place that exists',
    each((file) => {
      const { pdf } = file;
      const back = numberTree(file);
      const places = new Set(names(pdf, pdf.dict(pdf.catalog.Names).Dests));
      const annotations = pagesOf(file).flatMap(({ dict }) => pdf.list(dict.Annots).map(idOf));
      const held = ofType(file, 'Link').map((link) => {
        expect(link.content.map((item) => Object.keys(item)[0])).toEqual(['page', 'annotation']);
        return { link, id: (link.content[1] as { readonly annotation: number }).annotation };
      });
      expect(held.map(({ id }) => id).sort()).toEqual([...annotations].sort());
      for (const { link, id } of held) {
        const annotation = pdf.dict(new Ref(id));
        expect(nameOf(annotation.Subtype)).toBe('Link');
        expect(String(annotation.Contents).length).toBeGreaterThan(0);
        expect(Number(annotation.F) & 4).toBe(4);
        expect(idOf(back.get(Number(annotation.StructParent)))).toBe(link.id);
        expect(places).toContain(pdf.dict(annotation.A).D);
      }
      for (const { dict } of pagesOf(file)) {
        if (dict.Annots !== undefined) expect(nameOf(dict.Tabs)).toBe('S');
      }
    }),
  );
});

const names = (pdf: PdfObjects, node: Value | undefined): string[] => {
  const dict = pdf.dict(node);
  const own = pdf.list(dict.Names).filter((_, i) => i % 2 === 0) as string[];
  return [...own, ...pdf.list(dict.Kids).flatMap((kid) => names(pdf, kid))];
};

describe('pages and fonts', () => {
  it(
    'nest graphics states no deeper than 28 (ISO 19005-3, 6.1.13) and close what they open',
    each((file) => {
      for (const { dict } of pagesOf(file)) {
        let [depth, deepest, marks] = [0, 0, 0];
        for (const [operator] of file.pdf
          .stream(dict.Contents)
          .toString('latin1')
          .matchAll(/^q$|^Q$|B[MD]C$|^EMC$/gm)) {
          if (operator === 'q') depth += 1;
          else if (operator === 'Q') depth -= 1;
          else marks += operator === 'EMC' ? -1 : 1;
          deepest = Math.max(deepest, depth);
          // Neither artifacts inside of content nor content inside of content.
          expect(marks).toBeLessThanOrEqual(1);
        }
        expect([depth, marks]).toEqual([0, 0]);
        expect(deepest).toBeLessThanOrEqual(28);
      }
    }),
  );

  it(
    'embed every font with its way back to text and its map of glyphs',
    each(({ pdf }) => {
      const fonts = pdf.dicts.filter((dict) => nameOf(dict.Type) === 'Font' && nameOf(dict.Subtype) === 'Type0');
      expect(fonts.length).toBeGreaterThan(0);
      for (const font of fonts) {
        expect(pdf.stream(font.ToUnicode).toString('latin1')).not.toMatch(/<(0000|feff|fffe)>\s*\]/i);
        const [descendant] = pdf.list(font.DescendantFonts).map(pdf.dict);
        expect(nameOf(descendant.CIDToGIDMap)).toBe('Identity');
        expect(pdf.stream(pdf.dict(descendant.FontDescriptor).FontFile2).length).toBeGreaterThan(1000);
      }
    }),
  );
});
