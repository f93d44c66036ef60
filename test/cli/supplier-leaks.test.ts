import { inflateSync } from 'node:zlib';
import { describe, expect, it } from 'vitest';
import { supplierFiles } from '../../src/cli/supplier-files.js';
import { ALLOWED_FIELDS, fieldsFor, sheetContent } from '../../src/dossier/supplier-allowed-fields.js';
import { loadPack } from '../../src/manifest/index.js';
import type { Pack } from '../../src/manifest/model.js';
import type { Recipient } from '../../src/manifest/procurement-model.js';
import type { Allowances } from '../../src/verdict/index.js';
import { readPdf } from '../render/pdf/reading.js';
import { digitsOf, type Planted, plantedPack } from './planted-pack.js';

const { files, packPath, planted, markerOf } = plantedPack();

function load(): Pack {
  const loaded = loadPack(files, packPath);
  if ('problems' in loaded) throw new Error(JSON.stringify(loaded.problems.slice(0, 5), null, 1));
  return loaded.pack;
}
const pack = load();
const recipients = pack.procurement!.recipients;

/** Searches that limit every item of every board a little inside its stated spread, so that calculated limits are printed. */
const allowances: Allowances = new Map(
  pack.boards.map((board) => {
    const { laminate, strip } = board.stackUp;
    const figures = [
      [laminate.thickness, 'laminate-thickness'],
      [laminate.material.permittivity, 'permittivity'],
      [laminate.material.lossTangent, 'loss-tangent'],
      [strip.foil.treatedFace.rq, 'treated-face-texture'],
      [strip.thickness, 'copper-thickness'],
    ] as const;
    return [
      board.id,
      figures.map(([figure, parameter]) => ({
        path: figure.path,
        parameter,
        direction: 'up' as const,
        nominal: figure.value,
        sweeps: 1,
        ceiling: { model: 'hammerstad' as const, from: 0.51e-6 },
        sides: [
          { side: 'low' as const, outcome: { kind: 'not limited' as const, searchedTo: 2 * figure.value } },
          { side: 'middle' as const, outcome: { kind: 'not limited' as const, searchedTo: 2 * figure.value } },
          {
            side: 'high' as const,
            outcome: {
              kind: 'limited' as const,
              permitted: figure.value + 0.5 * figure.plus,
              beyond: figure.value + 0.51 * figure.plus,
              requirementId: pack.requirements.requirements[0].id,
            },
          },
        ],
      })),
    ];
  }),
);

interface Sheet {
  readonly recipient: Recipient;
  /** All that a reader of page, table and PDF can get at, decoded. */
  readonly parts: Readonly<Record<string, string>>;
}

/** Streams of a PDF unpacked, and its strings in either coding. */
function rawPdf(bytes: Uint8Array): string {
  const buffer = Buffer.from(bytes);
  const latin = buffer.toString('latin1');
  const streams = [...latin.matchAll(/stream\r?\n/g)].map((match) => {
    const start = match.index + match[0].length;
    const packed = buffer.subarray(start, latin.indexOf('endstream', start));
    try {
      return inflateSync(packed).toString('latin1');
    } catch {
      return packed.toString('latin1');
    }
  });
  // Text strings in UTF-16 read the same once their zero bytes are gone.
  return [latin, ...streams].join('\n').replaceAll('\0', '');
}

async function sheetOf(recipient: Recipient): Promise<Sheet> {
  const made = await supplierFiles(pack, { allowances, offers: [] }, new Date('2026-11-23T00:00:00Z'));
  const pdfBytes = made.get(`pdf/supplier-${recipient.id}.pdf`) as Uint8Array;
  const pdf = await readPdf(pdfBytes);
  expect(pdf.attachments).toEqual({});
  return {
    recipient,
    parts: {
      page: String(made.get(`supplier/${recipient.id}.html`)),
      table: String(made.get(`supplier/${recipient.id}.csv`)),
      pdf: pdf.pages.map(({ text, artifacts }) => `${text}\n${artifacts}`).join('\n'),
      outline: JSON.stringify([pdf.outline, [...pdf.places.keys()], pdf.pages.map(({ links }) => links)]),
      metadata: JSON.stringify(pdf.info),
      raw: rawPdf(pdfBytes),
    },
  };
}
const sheets = await Promise.all(recipients.map(sheetOf));

/** Names of a sheet's own things, as planted. */
function own(recipient: Recipient): { readonly boards: Set<string>; readonly materials: Set<string> } {
  const boards = pack.boards.filter(({ id }) => recipient.boards.includes(id));
  return {
    boards: new Set(boards.map(({ id }) => id)),
    materials: new Set([...recipient.materials, ...boards.map(({ stackUp }) => stackUp.strip.finish.id)]),
  };
}

/** Whether a planted field may stand on the sheet of a recipient: its field is listed, and it is of the recipient's own things. */
function allowed({ pattern, owner }: Planted, recipient: Recipient): boolean {
  const reads = fieldsFor(recipient.kind).flatMap((field): readonly string[] => ALLOWED_FIELDS[field].reads);
  if (!reads.includes(pattern)) return false;
  const [manifest, path] = pattern.split(': ');
  const { boards, materials } = own(recipient);
  if (manifest === 'board') return boards.has(markerOf(owner));
  if (['laminates', 'foils', 'finishes'].includes(manifest)) return materials.has(markerOf(owner));
  if (path.startsWith('recipients[]')) return recipient.id === markerOf(owner);
  return true;
}
const squeezed = (text: string): string => text.replace(/\s+/g, '').toLowerCase();
const numbersIn = (text: string): ReadonlySet<string> => new Set((text.match(/\d[\d.]*/g) ?? []).map(digitsOf));

describe('what may leave', () => {
  it('plants markers all over the manifests', () => {
    expect(planted.filter(({ kind }) => kind === 'text').length).toBeGreaterThan(250);
    expect(planted.filter(({ kind }) => kind === 'number').length).toBeGreaterThan(100);
    expect(planted.filter(({ kind }) => kind === 'date').length).toBeGreaterThan(40);
    const manifests = new Set(planted.map(({ pattern }) => pattern.split(':')[0]));
    expect([...manifests].sort()).toEqual(
      [
        'answers',
        'board',
        'file',
        'finishes',
        'foils',
        'laminates',
        'pack',
        'procurement',
        'profile',
        'requirements',
        'review',
      ].sort(),
    );
    expect(recipients.map(({ kind }) => kind).sort()).toEqual(['board fabricator', 'foil maker', 'laminate maker']);
  });

  describe.each(sheets.map((sheet) => [sheet.recipient.kind, sheet] as const))('sheet of a %s', (_, sheet) => {
    const { recipient, parts } = sheet;
    const permitted = planted.filter((field) => allowed(field, recipient));
    const mayStand = new Set(permitted.map(({ marker }) => marker));
    const forbidden = planted.filter(({ marker }) => !mayStand.has(marker));

    it.each(Object.keys(parts))('holds no field beyond the allowed ones: %s', (part) => {
      const [text, numbers] = [squeezed(parts[part]), numbersIn(part === 'raw' ? '' : parts[part])];
      const found = forbidden.filter(({ kind, marker }) =>
        kind === 'number' ? numbers.has(marker) : text.includes(marker.toLowerCase()),
      );
      expect(found.map(({ pattern, owner, marker }) => `${pattern} of ${owner}: ${marker}`)).toEqual([]);
      expect(forbidden.length).toBeGreaterThan(250);
    });

    it('holds the allowed ones, so that the search can be trusted', () => {
      const must = [
        'procurement: rfq_number',
        'procurement: reply_date',
        'procurement: contact.address',
        'procurement: certificate',
        'procurement: declare[]',
      ];
      for (const part of ['page', 'pdf']) {
        const text = squeezed(parts[part]);
        for (const { pattern, marker } of permitted) {
          if (must.includes(pattern)) expect(text, `${part}, ${pattern}`).toContain(marker.toLowerCase());
        }
      }
      for (const part of ['page', 'pdf', 'table']) {
        const numbers = numbersIn(parts[part]);
        const nominal = permitted.filter(({ kind, pattern }) => kind === 'number' && pattern.endsWith('.value'));
        expect(nominal.length).toBeGreaterThan(0);
        expect(nominal.filter(({ marker }) => numbers.has(marker)).length, part).toBeGreaterThan(0);
      }
      expect(parts.metadata).toContain(pack.procurement!.rfqNumber);
      expect(parts.raw).toContain(pack.procurement!.rfqNumber);
    });

    it('links nowhere, attaches nothing and names no file', () => {
      expect(parts.page).not.toMatch(/(?:href|src)="(?!#main")/);
      expect(parts.page).not.toMatch(/https?:|\.html|\.pdf|\.yaml|url\(/i);
      expect(parts.pdf).not.toMatch(/https?:|\.html|\.pdf|\.yaml/i);
      expect(parts.raw).not.toMatch(/\/URI|\/EmbeddedFile|\/Launch|\/GoToR/);
      expect(parts.page).not.toContain('internal');
    });
  });

  it('puts nothing of one recipient onto the sheet of another', () => {
    for (const { recipient, parts } of sheets) {
      const all = squeezed(Object.values(parts).join('\n'));
      for (const other of recipients.filter(({ id }) => id !== recipient.id)) {
        const { materials } = other;
        const makers = pack.boards.flatMap(({ stackUp: { laminate, strip, ground } }) =>
          [laminate.material, strip.foil, ground.foil]
            .filter(({ id }) => materials.includes(id))
            .flatMap(({ id, name, maker }) => [id, name, maker]),
        );
        for (const word of [other.id, other.name, ...materials, ...makers]) {
          expect(all, `${word} of ${other.kind} on the sheet of ${recipient.kind}`).not.toContain(squeezed(word));
        }
      }
    }
  });

  it('prints a product only to its own maker', () => {
    const [laminate] = recipients.filter(({ kind }) => kind === 'laminate maker');
    const names = (recipient: Recipient) =>
      sheetContent(pack, recipient, allowances).items.map(({ product }) => product);
    expect(names(laminate).every((name) => name !== undefined)).toBe(true);
    expect(names({ ...laminate, name: 'Another maker' }).every((name) => name === undefined)).toBe(true);
  });

  it('lists fields that exist: each path is planted or left out by the demo', () => {
    const patterns = new Set(planted.map(({ pattern }) => pattern));
    const unknown = Object.values(ALLOWED_FIELDS)
      .flatMap(({ reads }): readonly string[] => reads)
      .filter((path) => !patterns.has(path));
    // Enumerations and truth values carry no marker; alternatives to what the demo says are not in it.
    const without =
      /recipients\[\]\.kind|measured\.spread|allowances$|invented|permittivity\.kind|texture\.standard|sampling\.|specimen|method|spread\.(minus|plus)|\.(Rq|Sq|Ra|Sa|Rz|Sz)\.|declared\[\]\.id|panel|tolerances\.etch\.value|limit\.at_most/;
    expect(unknown.filter((path) => !without.test(path))).toEqual([]);
  });
});
