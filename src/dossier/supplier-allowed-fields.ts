/**
 * What may leave. A supplier sheet is built from the fields listed here for its kind of recipient and from fixed words;
 * nothing else of a pack reaches it, because the sheet is composed from `SheetContent` alone and only this file makes
 * one. `reads` names, by manifest and path, all that each field is made of: the test of leaks plants a marker in every
 * field of every manifest that is not named here.
 */
import { type AskedItem, type AskedWords, askedItems, askedWords } from '../manifest/index.js';
import type { Board, Pack } from '../manifest/model.js';
import type {
  HeldParameter,
  Procurement,
  Recipient,
  RecipientKind,
  Sampling,
  Verification,
} from '../manifest/procurement-model.js';
import { type Allowances, type HeldLimits, heldLimits } from '../verdict/index.js';
import { type TextureQuantity, unstated } from './texture-asks.js';

interface Rule {
  readonly kinds: readonly RecipientKind[];
  /** `manifest: path`; lists as `[]`. */
  readonly reads: readonly string[];
}

const LAMINATE: readonly RecipientKind[] = ['laminate maker'];
const FOIL: readonly RecipientKind[] = ['foil maker'];
const FABRICATOR: readonly RecipientKind[] = ['board fabricator'];
const MAKERS: readonly RecipientKind[] = [...LAMINATE, ...FOIL];
const ALL: readonly RecipientKind[] = [...MAKERS, ...FABRICATOR];

const figure = (...paths: readonly string[]): readonly string[] =>
  paths.flatMap((path) => ['value', 'spread', 'spread.minus', 'spread.plus'].map((part) => `${path}.${part}`));

const TEXTURE_KEYS = ['Rq', 'Sq', 'Ra', 'Sa', 'Rz', 'Sz'];
/** Of a measured file the height and its spread; of what else is known of a texture only whether it is stated. */
const texture = (path: string): readonly string[] => [
  ...TEXTURE_KEYS.flatMap((key) => figure(`${path}.${key}`)),
  ...['spread', 'spread.minus', 'spread.plus'].map((part) => `${path}.measured.${part}`),
];
const verified = (key: string): readonly string[] => [
  `procurement: verification.${key}.method`,
  `procurement: verification.${key}.specimen`,
];
const measured = ['standard', 'instrument', 'filter'].map((key) => `procurement: texture.${key}`);

/** One entry a field; the items to hold are fields as well. */
export const ALLOWED_FIELDS = {
  'RFQ number': { kinds: ALL, reads: ['procurement: rfq_number'] },
  'date of issue': { kinds: ALL, reads: ['pack: date'] },
  'reply date': { kinds: ALL, reads: ['procurement: reply_date'] },
  contact: { kinds: ALL, reads: ['procurement: contact.who', 'procurement: contact.address'] },
  'NDA reference': { kinds: ALL, reads: ['procurement: nda'] },
  'name of the sheet': { kinds: ALL, reads: ['procurement: recipients[].id', 'procurement: recipients[].kind'] },
  'name of the recipient': { kinds: ALL, reads: ['procurement: recipients[].name'] },
  quantities: { kinds: ALL, reads: ['procurement: quantities[]', 'procurement: recipients[].quantities[]'] },
  'panel size': {
    kinds: [...LAMINATE, ...FABRICATOR],
    reads: ['procurement: panel.width', 'procurement: panel.length'],
  },
  certificate: { kinds: ALL, reads: ['procurement: certificate'] },
  sampling: {
    kinds: ALL,
    reads: ['confidence', 'reliability', 'plan'].map((key) => `procurement: sampling.${key}`),
  },
  'things to declare': { kinds: ALL, reads: ['procurement: declare[]'] },
  'declared properties': {
    kinds: ALL,
    reads: [
      'board: declared[].id',
      'laminates: laminates[].declared[].id',
      'foils: foils[].declared[].id',
      'finishes: finishes[].declared[].id',
      'requirements: requirements[].property',
      'requirements: requirements[].allowed[]',
      'requirements: requirements[].limit.at_least',
      'requirements: requirements[].limit.at_most',
    ],
  },
  'calculated allowances': { kinds: ALL, reads: ['procurement: allowances'] },
  'demonstration data': { kinds: ALL, reads: ['requirements: invented'] },
  /** Only the recipient's own: where its name is the maker's. */
  'product name': {
    kinds: MAKERS,
    reads: [
      'laminates: laminates[].name',
      'laminates: laminates[].maker',
      'foils: foils[].name',
      'foils: foils[].maker',
    ],
  },
  'laminate-thickness': {
    kinds: LAMINATE,
    reads: [...figure('board: stack_up.laminate.thickness'), ...verified('laminate_thickness')],
  },
  permittivity: {
    kinds: LAMINATE,
    reads: [
      ...figure('laminates: laminates[].permittivity'),
      'laminates: laminates[].permittivity.kind',
      ...verified('permittivity'),
    ],
  },
  'loss-tangent': {
    kinds: LAMINATE,
    reads: [...figure('laminates: laminates[].loss_tangent'), ...verified('loss_tangent')],
  },
  'treated-face-texture': {
    kinds: FOIL,
    reads: [...texture('foils: foils[].treated_face'), ...measured, ...verified('foil_texture')],
  },
  'untreated-face-texture': {
    kinds: FOIL,
    reads: [...texture('foils: foils[].untreated_face'), ...measured, ...verified('foil_texture')],
  },
  'copper-thickness': {
    kinds: FABRICATOR,
    reads: [
      ...figure('board: stack_up.strip.thickness', 'board: stack_up.ground.thickness'),
      ...verified('copper_thickness'),
    ],
  },
  'etched-width': { kinds: FABRICATOR, reads: [...figure('board: tolerances.etch'), ...verified('etched_width')] },
  'edge-slope': { kinds: FABRICATOR, reads: [...figure('procurement: edge_slope'), ...verified('edge_slope')] },
  'finish-thickness': {
    kinds: FABRICATOR,
    reads: [
      'finishes: finishes[].layers[].material',
      ...figure('finishes: finishes[].layers[].thickness'),
      ...verified('finish_thickness'),
    ],
  },
  'outer-face-texture': {
    kinds: FABRICATOR,
    reads: [...texture('board: stack_up.strip.outer_face.texture'), ...measured, ...verified('outer_texture')],
  },
} as const satisfies Readonly<Record<string, Rule>>;

export type AllowedField = keyof typeof ALLOWED_FIELDS;

export const fieldsFor = (kind: RecipientKind): readonly AllowedField[] =>
  (Object.keys(ALLOWED_FIELDS) as AllowedField[]).filter((field) =>
    (ALLOWED_FIELDS[field].kinds as readonly RecipientKind[]).includes(kind),
  );

// ---------------------------------------------------------------- what a sheet is composed of

/** An item as the sheet may know it: no board, no path, no material of anyone else. */
export type SheetItem = Pick<
  AskedItem,
  'id' | 'parameter' | 'layer' | 'dimension' | 'unit' | 'upperOnly' | 'nominal'
> & {
  readonly limits: HeldLimits;
  readonly product?: string;
  /** Of a permittivity. */
  readonly permittivityKind?: 'bulk' | 'design';
  /** What is not stated of the texture of the recipient's own foil, in a fixed order: by it only that something is missing. */
  readonly unstated?: readonly TextureQuantity[];
  readonly verification: Verification;
};

export interface SheetContent {
  readonly kind: RecipientKind;
  readonly id: string;
  readonly recipient: string;
  readonly rfqNumber: string;
  readonly issued: string;
  readonly replyDate: string;
  readonly contact: Procurement['contact'];
  readonly nda?: string;
  readonly quantities: readonly string[];
  readonly panel?: Procurement['panel'];
  readonly certificate: string;
  readonly sampling: Sampling;
  readonly texture?: Procurement['texture'];
  readonly printAllowances: boolean;
  readonly invented: boolean;
  readonly items: readonly SheetItem[];
  readonly words: readonly AskedWords[];
}

/** The one way from a pack to a sheet. */
export function sheetContent(pack: Pack, recipient: Recipient, allowances: Allowances): SheetContent {
  const { procurement, boards, requirements, date } = pack;
  if (!procurement) throw new RangeError(`pack ${pack.id} asks nothing of suppliers`);
  const { kind, id, name, quantities } = recipient;
  const allowed = new Set<string>(fieldsFor(kind));
  const { rfqNumber, replyDate, contact, nda, panel, certificate, sampling, printAllowances } = procurement;
  const items = askedItems(recipient, boards, procurement).filter(({ parameter }) => allowed.has(parameter));
  const textured = items.some(({ parameter }) => parameter.endsWith('texture'));
  return {
    kind,
    id,
    recipient: name,
    rfqNumber,
    issued: date,
    replyDate,
    contact: { who: contact.who, address: contact.address },
    ...(nda === undefined ? {} : { nda }),
    quantities,
    ...(allowed.has('panel size') ? { panel: { width: panel.width, length: panel.length } } : {}),
    certificate,
    sampling,
    ...(textured && procurement.texture ? { texture: procurement.texture } : {}),
    printAllowances,
    invented: requirements.invented,
    items: items.map((item) => sheetItem(item, recipient, boards, procurement, allowances)),
    words: askedWords(recipient, boards, requirements.requirements, procurement),
  };
}

function sheetItem(
  item: AskedItem,
  recipient: Recipient,
  boards: readonly Board[],
  { verification }: Procurement,
  allowances: Allowances,
): SheetItem {
  const { id, parameter, layer, dimension, unit, upperOnly, nominal } = item;
  const product = recipient.kind === 'board fabricator' ? undefined : ownProduct(item, recipient, boards);
  return {
    id,
    parameter,
    ...(layer === undefined ? {} : { layer }),
    dimension,
    ...(unit === undefined ? {} : { unit }),
    upperOnly,
    nominal,
    limits: heldLimits(item, allowances),
    ...(product === undefined ? {} : { product }),
    ...(parameter === 'permittivity' ? { permittivityKind: permittivityKind(item, boards) } : {}),
    ...(product === undefined ? {} : ownTexture(item, recipient, boards)),
    verification: verification[parameter as HeldParameter] ?? {},
  };
}

const made = (boards: readonly Board[]) =>
  boards.flatMap(({ stackUp: { laminate, strip, ground } }) => [laminate.material, strip.foil, ground.foil]);

/** Name of the product where the recipient makes it; another maker's is nobody else's business. */
function ownProduct(item: AskedItem, { name }: Recipient, boards: readonly Board[]): string | undefined {
  const material = made(boards).find(({ id }) => id === item.material);
  return material?.maker === name ? material.name : undefined;
}

/** Of the recipient's own foil alone; no other kind of recipient is asked. */
function ownTexture(
  { material, parameter }: AskedItem,
  { name, kind }: Recipient,
  boards: readonly Board[],
): Pick<SheetItem, 'unstated'> {
  if (kind !== 'foil maker') return {};
  const foil = boards
    .flatMap(({ stackUp: { strip, ground } }) => [strip.foil, ground.foil])
    .find(({ id, maker }) => id === material && maker === name);
  if (foil === undefined) return {};
  if (parameter === 'treated-face-texture') return { unstated: unstated(foil.treatedFace) };
  if (parameter === 'untreated-face-texture') return { unstated: unstated(foil.untreatedFace) };
  return {};
}

function permittivityKind(item: AskedItem, boards: readonly Board[]): 'bulk' | 'design' | undefined {
  return boards.find(({ stackUp }) => stackUp.laminate.material.id === item.material)?.stackUp.laminate.material
    .permittivityKind;
}
