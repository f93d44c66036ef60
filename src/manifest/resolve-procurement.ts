import type { ProcurementDocument } from './documents/procurement-document.js';
import { figureOf, si } from './figures.js';
import type {
  HeldParameter,
  HeldRange,
  Procurement,
  RecipientKind,
  Sampling,
  Verification,
} from './procurement-model.js';

const KINDS = {
  laminate_maker: 'laminate maker',
  foil_maker: 'foil maker',
  board_fabricator: 'board fabricator',
} as const satisfies Readonly<Record<string, RecipientKind>>;

const PARAMETERS: Readonly<Record<keyof NonNullable<ProcurementDocument['verification']>, readonly HeldParameter[]>> = {
  laminate_thickness: ['laminate-thickness'],
  permittivity: ['permittivity'],
  loss_tangent: ['loss-tangent'],
  foil_texture: ['treated-face-texture', 'untreated-face-texture'],
  copper_thickness: ['copper-thickness'],
  etched_width: ['etched-width'],
  edge_slope: ['edge-slope'],
  finish_thickness: ['finish-thickness'],
  outer_texture: ['outer-face-texture'],
};

/** A checked procurement document as the model holds it, answers not yet read. */
export function procurementOf(doc: ProcurementDocument, file: string): Procurement {
  const verification: Partial<Record<HeldParameter, Verification>> = {};
  for (const [key, parameters] of Object.entries(PARAMETERS)) {
    const entry = doc.verification?.[key as keyof typeof PARAMETERS];
    if (entry) for (const parameter of parameters) verification[parameter] = given(entry);
  }
  return {
    file,
    rfqNumber: doc.rfq_number,
    replyDate: doc.reply_date,
    contact: doc.contact,
    ...(doc.nda === undefined ? {} : { nda: doc.nda }),
    panel: { width: si(doc.panel.width, 'length'), length: si(doc.panel.length, 'length') },
    certificate: doc.certificate,
    sampling: doc.sampling as Sampling,
    printAllowances: doc.allowances !== 'kept_inside',
    ...(doc.texture ? { texture: doc.texture } : {}),
    ...(doc.edge_slope ? { edgeSlope: slopeOf(doc.edge_slope, file) } : {}),
    verification,
    declare: doc.declare ?? [],
    recipients: doc.recipients.map(({ id, kind, name, boards, materials, quantities }) => ({
      id,
      kind: KINDS[kind],
      name,
      boards,
      materials: materials ?? [],
      quantities: quantities ?? doc.quantities,
    })),
  };
}

const given = ({
  method,
  specimen,
}: {
  readonly method?: string | undefined;
  readonly specimen?: string | undefined;
}): Verification => ({
  ...(method === undefined ? {} : { method }),
  ...(specimen === undefined ? {} : { specimen }),
});

function slopeOf(doc: NonNullable<ProcurementDocument['edge_slope']>, file: string): HeldRange {
  const { value, minus, plus } = figureOf(doc, 'angle', `${file}: edge_slope`);
  return { nominal: value, lower: value - minus, upper: value + plus };
}
