import { describe, expect, it } from 'vitest';
import type { Block, Chapter, Inline, TableBlock } from '../../src/dossier/document.js';
import { fieldsFor, sheetContent } from '../../src/dossier/supplier-allowed-fields.js';
import { supplierSheet } from '../../src/dossier/supplier-sheet.js';
import type { Foil, Pack, Texture } from '../../src/manifest/model.js';
import type { HeldParameter } from '../../src/manifest/procurement-model.js';
import type { RoughnessSide } from '../../src/study/results.js';
import type { AllowanceOutcome, Allowances } from '../../src/verdict/index.js';
import { askingPack } from '../manifest/procurement-fixture.js';

const words = (content: readonly Inline[]): string =>
  content
    .map((part) =>
      typeof part === 'string'
        ? part
        : 'strong' in part
          ? part.strong
          : 'code' in part
            ? part.code
            : 'text' in part
              ? part.text
              : part.status,
    )
    .join('');
const chapterOf = (chapters: readonly Chapter[], id: string): Chapter => chapters.find((c) => c.id === id)!;
const tableOf = ({ blocks }: Chapter): TableBlock => blocks.find((b): b is TableBlock => b.kind === 'table')!;
const rowsOf = (chapter: Chapter) => tableOf(chapter).rows.map((row) => row.map(({ content }) => words(content)));
const proseOf = ({ blocks }: Chapter): string =>
  blocks
    .filter((b): b is Extract<Block, { kind: 'prose' }> => b.kind === 'prose')
    .map(({ content }) => words(content))
    .join(' ');

const limited = (permitted: number): AllowanceOutcome => ({
  kind: 'limited',
  permitted,
  beyond: permitted,
  requirementId: 'r-gain',
});
const SIDES: readonly RoughnessSide[] = ['low', 'middle', 'high'];

/** One upward search for a figure of the first board. */
function searched(
  pack: Pack,
  path: string,
  parameter: HeldParameter,
  outcomes: readonly AllowanceOutcome[],
): Allowances {
  const sides = outcomes.map((outcome, i) => ({ side: SIDES[i], outcome }));
  return new Map([[pack.boards[0].id, [{ path, parameter, direction: 'up', nominal: 0, sides, sweeps: 0 }]]]);
}

const none: Allowances = new Map();
const sheetFor = (index: number, pack = askingPack(), allowances = none) =>
  supplierSheet(sheetContent(pack, pack.procurement!.recipients[index], allowances));

describe('a supplier sheet', () => {
  it('asks a laminate maker for thickness, permittivity and loss tangent, with unit, limits and one line why', () => {
    const { chapters, title, subtitle } = sheetFor(0);
    expect(title).toBe('Request for quotation NF-RFQ-7: laminate');
    expect(subtitle).toBe('To Northfen Laminates (invented). Answer by 2026-12-01 to Purchasing (role).');
    expect(rowsOf(chapterOf(chapters, 'items'))).toEqual([
      [
        'A-laminate-thickness',
        'Thickness of the dielectric, NL-30',
        '127',
        '119',
        '135',
        'µm',
        'Sets impedance and loss of every line.',
      ],
      [
        'A-permittivity',
        'Relative permittivity, NL-30',
        '3.00',
        '2.95',
        '3.05',
        '–',
        'The artwork is drawn for the nominal value; electrical lengths follow it.',
      ],
      ['A-loss-tangent', 'Loss tangent, NL-30', '0.0015', '–', '0.0019', '–', 'Dielectric loss is proportional to it.'],
    ]);
  });

  it('asks a foil maker for textures by parameter, side, instrument and filter, and says nothing of panels', () => {
    const open = sheetFor(1);
    expect(
      rowsOf(chapterOf(open.chapters, 'items')).map(([id, what, ...rest]) => [id, what, ...rest.slice(0, 4)]),
    ).toEqual([
      ['A-treated-face-texture', 'Texture of the treated face (Rq), KF-04', '0.40', '–', '0.45', 'µm'],
      ['A-untreated-face-texture', 'Texture of the untreated face (Rq), KF-04', '0.30', '–', '0.35', 'µm'],
      ['B-treated-face-texture', 'Texture of the treated face (Rq), KF-10', '1.00', '–', '1.15', 'µm'],
      // Ra 0.25 ± 0.05 µm times sqrt(π/2).
      ['B-untreated-face-texture', 'Texture of the untreated face (Rq), KF-10', '0.3133', '–', '0.4162', 'µm'],
    ]);
    const definition = rowsOf(chapterOf(open.chapters, 'verification'))[0][1];
    expect(definition).toContain(
      'Rq, root-mean-square height of the profile (ISO 21920-2), under conditions of ISO 21920-3',
    );
    expect(definition).toContain('to be stated with the answer');
    expect(definition).toContain('Side: treated face');
    expect(JSON.stringify(open)).not.toContain('anel');

    const texture = 'texture: { standard: areal, instrument: profiler 50x, filter: S 0.8 um }\nrecipients:';
    const areal = sheetFor(1, askingPack('recipients:', texture));
    expect(rowsOf(chapterOf(areal.chapters, 'items'))[0][1]).toContain('(Sq)');
    expect(rowsOf(chapterOf(areal.chapters, 'verification'))[0][1]).toMatch(
      /ISO 25178-2.*ISO 25178-3; instrument: profiler 50x; filter: S 0\.8 um/,
    );
  });

  it('asks a foil maker for what is not stated of its own foils, with the conditions under which it is accepted', () => {
    const known = rowsOf(chapterOf(sheetFor(1).chapters, 'texture-knowledge'));
    expect(known.map(([what]) => what.split(/[(;]/)[0].trim())).toEqual([
      'Developed interfacial area ratio Sdr',
      'Autocorrelation length Sal',
      'Radius, pitch and number of layers of the nodules',
      'Texture aspect ratio Str',
    ]);
    for (const [what, items] of known.slice(0, 2)) {
      expect(what).toMatch(/accepted with S-filter nesting index 0\.25 µm or less/);
      expect(what).toMatch(/lateral resolution|sampling interval/);
      expect(items).toContain('A-treated-face-texture');
    }
    // No other recipient is asked, and no figure of a design stands in it.
    for (const other of [0, 2]) expect(sheetFor(other).chapters.map(({ id }) => id)).not.toContain('texture-knowledge');
    expect(JSON.stringify(chapterOf(sheetFor(1).chapters, 'texture-knowledge'))).not.toMatch(/GHz|dB|skin depth/);
  });

  it('asks no more for what a foil maker has stated', () => {
    const pack = askingPack();
    const length = { ...pack.boards[0].stackUp.strip.foil.treatedFace.rq, value: 1e-6 };
    const stated = (texture: Texture): Texture => ({
      ...texture,
      correlationLength: length,
      developedAreaRatio: { ...length, value: 0.1 },
      nodule: { radius: length, pitch: length, layers: 1 },
      lay: 'isotropic',
    });
    const full = (foil: Foil): Foil => ({
      ...foil,
      treatedFace: stated(foil.treatedFace),
      untreatedFace: stated(foil.untreatedFace),
    });
    const boards = pack.boards.map((board) => ({
      ...board,
      stackUp: {
        ...board.stackUp,
        strip: { ...board.stackUp.strip, foil: full(board.stackUp.strip.foil) },
        ground: { ...board.stackUp.ground, foil: full(board.stackUp.ground.foil) },
      },
    }));
    expect(sheetFor(1, { ...pack, boards }).chapters.map(({ id }) => id)).not.toContain('texture-knowledge');
  });

  it('asks a fabricator for copper, etching, edges and finish, with negative limits as they are', () => {
    const rows = rowsOf(chapterOf(sheetFor(2).chapters, 'items')).map((row) => row.slice(0, 6));
    expect(rows).toEqual([
      ['A-copper-thickness', 'Finished thickness of the copper', '18', '15', '21', 'µm'],
      ['A-etched-width', 'Change of copper outlines by etching', '0', '−15', '15', 'µm'],
      ['A-finish-thickness', 'Thickness of the finish layer, Ni-P', '4', '3', '5', 'µm'],
      ['A-finish-thickness-2', 'Thickness of the finish layer, Au', '0.05', '0.03', '0.07', 'µm'],
      ['A-edge-slope', 'Slope of etched edges', '80', '65', '90', '°'],
    ]);
  });

  it('takes sample size from confidence and reliability, or cites the plan', () => {
    const sample = (...change: Parameters<typeof askingPack>) =>
      rowsOf(chapterOf(sheetFor(0, askingPack(...change)).chapters, 'verification'))[0][4];
    expect(sample()).toBe('29 pieces of a lot, none outside');
    expect(sample('confidence: 0.95, reliability: 0.9 ', 'plan: "ISO 2859-1, level II" ')).toBe('ISO 2859-1, level II');
    expect(proseOf(chapterOf(sheetFor(0).chapters, 'verification'))).toContain('n = ln(1 − C)/ln R');
  });

  it('lets the manifest name method and specimen, item by item', () => {
    const change = 'verification: { permittivity: { method: our method, specimen: our disc } }\nrecipients:';
    const rows = rowsOf(chapterOf(sheetFor(0, askingPack('recipients:', change)).chapters, 'verification'));
    expect(rows[1].slice(2, 4)).toEqual(['our method', 'our disc']);
    expect(rows[0][2]).toContain('IPC-TM-650 2.2.18.1');
  });

  it('asks for properties with what is needed, substances, and prices in words', () => {
    const rows = rowsOf(chapterOf(sheetFor(0).chapters, 'declarations')).map((row) => row.slice(0, 3));
    expect(rows).toContainEqual(['D-flammability', 'Flammability', 'V-0 or V-1']);
    expect(rows.map(([id]) => id)).toEqual([
      'D-expansion-through-thickness',
      'D-flammability',
      'S-rohs',
      'S-reach',
      'S-pfas',
      'Q-1',
    ]);
    expect(rowsOf(chapterOf(sheetFor(1).chapters, 'declarations')).at(-1)![1]).toBe('Price and lead time: two rolls');
  });

  it('says what prevails, and cautions', () => {
    const text = JSON.stringify(chapterOf(sheetFor(0).chapters, 'terms'));
    for (const said of [
      'The purchase order and the drawing prevail',
      'not reproduced',
      'RoHS, REACH, PFAS',
      'Export class was not assessed',
      'NDA-5',
    ]) {
      expect(text).toContain(said);
    }
  });

  it('has a table to answer in with the same items and numbers that programs read', () => {
    const [header, ...rows] = sheetFor(2).answerTable;
    const entry = (id: string) =>
      Object.fromEntries(header.map((name, i) => [name, rows.find((row) => row[header.indexOf('item')] === id)![i]]));
    expect(entry('A-etched-width')).toMatchObject({
      rfq: 'NF-RFQ-7',
      unit: 'um',
      nominal: '0',
      lower_limit: '-15',
      upper_limit: '15',
      guaranteed_lower: '',
    });
    expect(entry('S-pfas').what).toMatch(/^PFAS/);
    const items = rowsOf(chapterOf(sheetFor(2).chapters, 'items')).map(([id]) => id);
    expect(rows.map((row) => row[1]).slice(0, items.length)).toEqual(items);
  });
});

describe('limits on a sheet', () => {
  const pack = askingPack();
  const permittivity = pack.boards[0].stackUp.laminate.material.permittivity.path;
  const limits = (allowances: Allowances, asked = pack) => {
    const { chapters } = sheetFor(0, asked, allowances);
    return { items: rowsOf(chapterOf(chapters, 'items'))[1], basis: rowsOf(chapterOf(chapters, 'limits'))[1] };
  };

  it('stay the stated ones where the allowance reaches further, which is printed with its spread over the estimates', () => {
    const { items, basis } = limits(
      searched(pack, permittivity, 'permittivity', [limited(3.0668), limited(3.0686), limited(3.0335 + 0.02)]),
    );
    expect(items.slice(2, 5)).toEqual(['3.00', '2.95', '3.05']);
    expect(basis).toEqual(['A-permittivity', 'stated', 'not computed', '3.053 (over the estimates 3.053 to 3.068)']);
  });

  it('are the calculated ones where tighter, rounded towards nominal', () => {
    const { items, basis } = limits(
      searched(pack, permittivity, 'permittivity', [limited(3.0299), limited(3.0288), limited(3.04)]),
    );
    expect(items.slice(2, 5)).toEqual(['3.000', '2.950', '3.028']);
    expect(basis.slice(0, 2)).toEqual(['A-permittivity', 'from: stated; to: calculated']);
  });

  it('name the estimate where only one sets a limit, and never a model of the analysis', () => {
    const foilPack = askingPack();
    const { path } = foilPack.boards[0].stackUp.strip.foil.treatedFace.rq;
    const free: AllowanceOutcome = { kind: 'not limited', searchedTo: 2.5e-6 };
    const found = new Map(
      [...searched(foilPack, path, 'treated-face-texture', [free, free, limited(0.526e-6)])].map(([id, results]) => [
        id,
        results.map((result) => ({ ...result, ceiling: { model: 'hammerstad' as const, from: 0.51e-6 } })),
      ]),
    );
    const { chapters } = sheetFor(1, foilPack, found);
    expect(rowsOf(chapterOf(chapters, 'limits'))[0].at(-1)).toBe('0.52\u00a0µm (high estimate)');
    expect(JSON.stringify(chapters)).not.toContain('Hammerstad');
  });

  it('do not tell anyone outside that a board fails', () => {
    const failed: AllowanceOutcome = { kind: 'not met at nominal', requirementIds: ['r-gain'] };
    expect(limits(searched(pack, permittivity, 'permittivity', [failed, failed, failed])).basis[3]).toBe(
      'none calculated',
    );
    expect(limits(searched(pack, permittivity, 'permittivity', [failed, limited(3.2), limited(3.2)])).basis[3]).toBe(
      '3.20 (all estimates alike)',
    );
    // What the high estimate does not meet is never asked on the word of the others.
    expect(limits(searched(pack, permittivity, 'permittivity', [limited(3.2), limited(3.2), failed])).basis[3]).toBe(
      'none calculated',
    );
  });

  it('keep the room beyond a stated limit inside where the manifest says so', () => {
    const closed = askingPack('recipients:', 'allowances: kept_inside\nrecipients:');
    expect(
      limits(searched(closed, permittivity, 'permittivity', [limited(3.2), limited(3.3), limited(3.2)]), closed)
        .basis[3],
    ).toBe('not tighter than stated');
  });
});

describe('the list of allowed fields', () => {
  it('gives each kind its own items and no other’s', () => {
    const items = [
      'laminate-thickness',
      'permittivity',
      'loss-tangent',
      'treated-face-texture',
      'untreated-face-texture',
      'copper-thickness',
      'etched-width',
      'edge-slope',
      'finish-thickness',
      'outer-face-texture',
    ];
    const of = (kind: Parameters<typeof fieldsFor>[0]) => fieldsFor(kind).filter((field) => items.includes(field));
    expect(of('laminate maker')).toEqual(items.slice(0, 3));
    expect(of('foil maker')).toEqual(items.slice(3, 5));
    expect(of('board fabricator')).toEqual(items.slice(5));
    expect(fieldsFor('foil maker')).not.toContain('panel size');
    expect(fieldsFor('board fabricator')).not.toContain('product name');
  });
});
