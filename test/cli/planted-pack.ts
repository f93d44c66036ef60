/**
 * The demo's side radar with a marker in every text, a number of its own in every quantity and a day of its own in
 * every date, so that whatever reaches a supplier sheet can be traced to the field it came from.
 */
import { readFileSync } from 'node:fs';
import { dirname, join, posix } from 'node:path';
import { fileURLToPath } from 'node:url';
import type { z } from 'zod';
import { boardDocument } from '../../src/manifest/documents/board-document.js';
import { leaves } from '../../src/manifest/documents/fields.js';
import { finishesDocument, foilsDocument, laminatesDocument } from '../../src/manifest/documents/library-documents.js';
import { packDocument } from '../../src/manifest/documents/pack-document.js';
import { procurementDocument } from '../../src/manifest/documents/procurement-document.js';
import { requirementsDocument } from '../../src/manifest/documents/requirement-document.js';
import { reviewDocument } from '../../src/manifest/documents/review-document.js';
import { variantDocument } from '../../src/manifest/documents/variant-document.js';
import type { PackFiles } from '../../src/manifest/index.js';
import { readYaml } from '../../src/manifest/read-yaml.js';
import { bare, choose, elementOf, shapeOf, typeOf } from '../../src/manifest/schema-walk.js';
import { type Node, toData } from '../../src/manifest/tree.js';
import { splitQuantity } from '../../src/quantity/index.js';

const root = fileURLToPath(new URL('../../manifests/', import.meta.url));

/** One planted field. */
export interface Planted {
  /** `laminates: laminates[].permittivity.value`, as the list of allowed fields writes it. */
  readonly pattern: string;
  /** Id, before planting, of the board, material, recipient or requirement that the field belongs to. */
  readonly owner: string;
  readonly kind: 'text' | 'number' | 'date';
  /** Texts and dates as they would be printed; numbers as their significant digits. */
  readonly marker: string;
}

export interface PlantedPack {
  readonly files: PackFiles;
  readonly packPath: string;
  readonly planted: readonly Planted[];
  /** What a text of the demo has become. */
  readonly markerOf: (text: string) => string;
}

type Schema = z.ZodType;
interface Manifest {
  readonly path: string;
  readonly kind: string;
  readonly schema: Schema;
  readonly text: string;
}

/** The demo leaves some fields out; these are added so that they are planted as well. */
const ADDED: Readonly<Record<string, readonly (readonly [string, string])[]>> = {
  'packs/side-radar/pack.yaml': [['owner:', 'marking: Northfen eyes only\nowner:']],
  'packs/side-radar/boards/side-1.yaml': [
    [
      'outer_face: { kind: foil }',
      'outer_face: { kind: micro_etched, texture: { Rq: { value: 0.31 um, spread: 0.06 um, basis: typical, method: interferometer }, instrument: board interferometer, filter: board filter } }',
    ],
    ['finish: organic', 'finish: nickel-gold'],
    [
      'cost: {',
      'declared: [{ id: board-mass, value: 3.1, unit: g, document: BD-1, revision: A, date: 2026-03-01 }]\ncost: {',
    ],
  ],
  // The foil that is asked for states all that a texture can, and its other face is the measured one.
  'libraries/foils.yaml': [
    [
      'measured: { file: textures/kf-02-treated.csv,',
      'Rq: { value: 0.2 um, spread: 0.04 um, basis: measured, method: own interferometer }\n      Sal: { value: 1.13 um, spread: 0.2 um, basis: measured, method: own autocorrelation }\n      Sdr: { value: 9 %, spread: 20 %, basis: measured, method: own area }\n      nodules: { radius: { value: 0.071 um, spread: 0.01 um, basis: measured }, pitch: { value: 0.23 um, spread: 0.02 um, basis: measured } }\n    untreated_face:\n      measured: { file: textures/kf-02-treated.csv,',
    ],
    [
      '    untreated_face:\n      Rq: { value: 0.18 um, spread: 0.04 um, basis: typical, document: KF-DS-02, revision: D, date: 2026-01-19 }\n',
      '',
    ],
  ],
  'packs/side-radar/procurement.yaml': [
    ['sampling: { confidence: 0.95, reliability: 0.90 }', 'sampling: { plan: sampling by agreed plan }'],
    [
      '  loss_tangent: { method: "IPC-TM-650 2.5.5.13 near 77 GHz, in plane" }',
      '  loss_tangent: { method: split cylinder, specimen: bare disc }\n  foil_texture: { method: foil method, specimen: foil specimen }\n  etched_width: { method: width method, specimen: width specimen }',
    ],
  ],
};

function manifests(): readonly Manifest[] {
  const manifest = (path: string, kind: string, schema: Schema): Manifest => {
    let text = readFileSync(join(root, path), 'utf8');
    for (const [from, to] of ADDED[path] ?? []) {
      if (!text.includes(from)) throw new Error(`${path} does not hold ${from}`);
      text = text.replace(from, () => to);
    }
    return { path, kind, schema, text };
  };
  const pack = 'packs/side-radar';
  return [
    manifest(`${pack}/pack.yaml`, 'pack', packDocument),
    manifest(`${pack}/review.yaml`, 'review', reviewDocument),
    manifest(`${pack}/procurement.yaml`, 'procurement', procurementDocument),
    manifest(`${pack}/requirements.yaml`, 'requirements', requirementsDocument),
    manifest(`${pack}/boards/side-1.yaml`, 'board', boardDocument),
    ...[2, 3, 4, 5, 6, 7].map((n) => manifest(`${pack}/boards/side-${n}.yaml`, 'board', variantDocument)),
    manifest('libraries/laminates.yaml', 'laminates', laminatesDocument),
    manifest('libraries/foils.yaml', 'foils', foilsDocument),
    manifest('libraries/finishes.yaml', 'finishes', finishesDocument),
  ];
}

/** Keys under which a name is that of something else. */
const isId = (value: string): boolean => /^[a-z0-9]+(?:-[a-z0-9]+)*$/.test(value);

class Planter {
  readonly planted: Planted[] = [];
  private readonly texts = new Map<string, string>();
  private readonly days: readonly string[];
  private count = 0;

  constructor(all: string) {
    this.days = [...new Set(all.match(/\b\d{4}-\d\d-\d\d\b/g) ?? [])].sort();
  }

  /** The same text gets the same marker everywhere, so that references still lead where they led. */
  text(value: string): string {
    const known = this.texts.get(value);
    if (known !== undefined) return known;
    const number = String(this.texts.size + 1).padStart(3, '0');
    const marker = isId(value) ? `zq${number}z` : `Zq${number}Z`;
    this.texts.set(value, marker);
    return marker;
  }

  /** In the order of the days they stand for. */
  day(value: string): string {
    const at = this.days.indexOf(value);
    return `${2050 + at}-0${1 + (at % 9)}-1${at % 10}`;
  }

  /** Five digits that no other number has; the size hardly changes. */
  number(written: string): string {
    const value = Number(written);
    if (value === 0) return written;
    for (;;) {
      this.count += 1;
      const planted = String(Number((value * (1 + this.count * 1.3e-4)).toPrecision(5)));
      if (digitsOf(planted).length >= 4) return planted;
    }
  }
}

export const digitsOf = (number: string): string => number.replace(/\D/g, '').replace(/^0+|0+$/g, '');

export function plantedPack(): PlantedPack {
  const all = manifests();
  const planter = new Planter(all.map(({ text }) => text).join('\n'));
  const rename = (path: string) => posix.join(dirname(path), `${planter.text(path)}${posix.extname(path)}`);
  const files = new Map<string, string>();
  for (const { path, kind, schema, text } of all) {
    const read = readYaml(path, new TextEncoder().encode(text));
    if ('problems' in read) throw new Error(JSON.stringify(read.problems));
    const file = idOf(read.root) ?? path;
    const plantReference = (name: string) => posix.relative(dirname(path), rename(posix.join(dirname(path), name)));
    const data = plant(schema, read.root, { kind, path: '', owner: file, planter, plantReference });
    files.set(rename(path), JSON.stringify(data, null, 1));
  }
  const answered = 'packs/side-radar/answers/laminate.csv';
  files.set(rename(answered), plantedAnswers(planter));
  const profile = 'libraries/textures/kf-02-treated.csv';
  files.set(rename(profile), plantedProfile(readFileSync(join(root, profile), 'utf8'), planter));
  for (const path of files.keys()) {
    const marker = posix.basename(path, posix.extname(path));
    planter.planted.push({ pattern: 'file: name', owner: path, kind: 'text', marker });
  }
  const packPath = rename('packs/side-radar/pack.yaml');
  return {
    packPath,
    planted: planter.planted,
    markerOf: (text) => planter.text(text),
    files: { read: (path) => (files.has(path) ? new TextEncoder().encode(files.get(path)) : undefined) },
  };
}

const ANSWER_HEAD = 'item,unit,guaranteed_lower,guaranteed_upper,typical,alternative,not_offered,method,declaration';

/** What came back is for nobody's sheet. */
function plantedAnswers(planter: Planter): string {
  const note = (marker: string, kind: 'text' | 'number') =>
    planter.planted.push({
      pattern: 'answers: any',
      owner: 'laminate',
      kind,
      marker: kind === 'number' ? digitsOf(marker) : marker,
    });
  const number = (written: string) => {
    const planted = planter.number(written);
    note(planted, 'number');
    return planted;
  };
  const text = (written: string) => {
    const planted = planter.text(written);
    note(planted, 'text');
    return planted;
  };
  return [
    ANSWER_HEAD,
    `A-permittivity,,${number('2.9')},${number('3.1')},${number('3.04')},${text('answered alternative')},,${text('answered method')},`,
    `Q-1,,,,,,,,${text('answered price')}`,
    `S-pfas,,,,,,,,${text('answered declaration')}`,
    '',
  ].join('\n');
}

/** What a file of heights says of itself is for nobody's sheet; its heights are too many to be told apart by their digits. */
function plantedProfile(text: string, planter: Planter): string {
  return text.replace(/^(instrument|note),"?(.*?)"?$/gm, (_, key: string, value: string) => {
    const marker = planter.text(value);
    planter.planted.push({ pattern: `profile: ${key}`, owner: 'kf-02', kind: 'text', marker });
    return `${key},${marker}`;
  });
}

const idOf = (node: Node): string | undefined => {
  const id = node.kind === 'map' ? node.entries.get('id')?.value : undefined;
  return id?.kind === 'scalar' ? id.text : undefined;
};

interface Place {
  readonly kind: string;
  readonly path: string;
  readonly owner: string;
  readonly planter: Planter;
  readonly plantReference: (name: string) => string;
}

function plant(schema: Schema, node: Node, place: Place): unknown {
  const plain = choose(schema, node);
  const leaf = leaves.get(plain);
  if (!leaf && node.kind === 'map') {
    const shape = shapeOf(plain)!;
    // A declared property has an id and belongs to what declares it.
    const owner = (place.path.endsWith('declared[]') ? undefined : idOf(node)) ?? place.owner;
    return Object.fromEntries(
      [...node.entries].map(([key, { value }]) => {
        const path = place.path === '' ? key : `${place.path}.${key}`;
        return [key, plant(shape[key]!, value, { ...place, path, owner })];
      }),
    );
  }
  if (!leaf && node.kind === 'list') {
    return node.items.map((item) => plant(elementOf(plain)!, item, { ...place, path: `${place.path}[]` }));
  }
  if (node.kind !== 'scalar') return toData(node);
  return plantScalar(plain, node.value, node.text, place);
}

function plantScalar(schema: Schema, value: unknown, text: string, place: Place): unknown {
  const { planter } = place;
  const leaf = leaves.get(schema);
  const note = (kind: Planted['kind'], marker: string) => {
    // Zero stays zero and marks nothing.
    if (marker !== '')
      planter.planted.push({ pattern: `${place.kind}: ${place.path}`, owner: place.owner, kind, marker });
  };
  if (leaf?.kind === 'date') {
    const day = planter.day(text);
    note('date', day);
    return day;
  }
  if (leaf?.kind === 'words' && leaf.allowed === 'a path relative to this file') return place.plantReference(text);
  const limit = place.path.includes('.limit.');
  if (leaf?.kind === 'words' && typeof value === 'string' && !limit) {
    // Words of the program, such as "none" for no board, keep their meaning.
    if (text === 'none') return text;
    const marker = planter.text(text);
    if (!schema.safeParse(marker).success) throw new Error(`cannot plant ${place.path}: ${text}`);
    note('text', marker);
    return marker;
  }
  const type = typeOf(bare(schema));
  if (
    limit ||
    leaf?.kind === 'quantity' ||
    leaf?.kind === 'spread' ||
    (typeof value === 'string' && type === 'string')
  ) {
    const parts = splitQuantity(text);
    if (!parts) return value;
    const planted = planter.number(parts.number);
    note('number', digitsOf(planted));
    return typeof value === 'number' ? Number(planted) : `${planted} ${parts.unit}`;
  }
  if (typeof value === 'number' && !Number.isInteger(value)) {
    const planted = planter.number(text);
    note('number', digitsOf(planted));
    return Number(planted);
  }
  return value;
}
