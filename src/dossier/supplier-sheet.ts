import type { HeldParameter, Sampling } from '../manifest/procurement-model.js';
import { successRunSize } from '../numerics/success-run.js';
import { formatQuantity } from '../quantity/index.js';
import { cell, chapter, facts, list, number, prose, table } from './blocks.js';
import type { Cell, Chapter } from './document.js';
import type { SheetContent, SheetItem } from './supplier-allowed-fields.js';
import { allowanceText, basisText, limitIn, nominalIn, unitText } from './supplier-limits.js';
import { DEMONSTRATION, KIND_WORDS, PARAMETER_WORDS, SIDES, TERMS, TEXTURE_DEFINITIONS } from './supplier-words.js';
import { askText, type TextureQuantity } from './texture-asks.js';

/** A sheet ready to print: it stands alone, links nowhere and carries no mark of the pack. */
export interface SupplierSheet {
  /** Of the recipient; names the files. */
  readonly id: string;
  readonly title: string;
  readonly subtitle: string;
  readonly rfqNumber: string;
  readonly contact: string;
  readonly replyDate: string;
  /** YYYY-MM-DD */
  readonly issued: string;
  readonly notice?: string;
  readonly chapters: readonly Chapter[];
  /** The same items as a table to answer in. */
  readonly answerTable: readonly (readonly string[])[];
}

export function supplierSheet(content: SheetContent): SupplierSheet {
  const { id, kind, rfqNumber, contact, replyDate, issued } = content;
  return {
    id,
    title: `Request for quotation ${rfqNumber}: ${KIND_WORDS[kind]}`,
    subtitle: `To ${content.recipient}. Answer by ${replyDate} to ${contact.who}.`,
    rfqNumber,
    contact: contact.who,
    replyDate,
    issued,
    ...(content.invented ? { notice: DEMONSTRATION } : {}),
    chapters: [
      requestChapter(content),
      itemsChapter(content),
      ...knowledgeChapter(content),
      limitsChapter(content),
      verificationChapter(content),
      chapter('certificate', 'Certificate of conformance', prose(content.certificate)),
      chapter('terms', 'Terms and cautions', list([...TERMS, ...confidence(content)].map((line) => [line]))),
      answerChapter(content),
      wordsChapter(content),
    ],
    answerTable: answerTable(content),
  };
}

const confidence = ({ nda }: SheetContent): readonly string[] =>
  nda === undefined ? [] : [`This sheet is sent under non-disclosure agreement ${nda}.`];

function requestChapter(content: SheetContent): Chapter {
  const { rfqNumber, issued, replyDate, recipient, contact, nda, quantities, panel } = content;
  return chapter(
    'request',
    'Request',
    facts(
      'request-facts',
      ['RFQ number', rfqNumber],
      ['Date of issue', issued],
      ['To', recipient],
      ['Reply by', replyDate],
      ['Contact', contact.who],
      ['Address', contact.address],
      ...(nda === undefined ? [] : [['Non-disclosure agreement', nda] as const]),
      ['Quantities', quantities.join('; ')],
      ...(panel === undefined
        ? []
        : [['Panel', `${millimetres(panel.width)} × ${millimetres(panel.length)}`] as const]),
    ),
  );
}

const millimetres = (metres: number): string => formatQuantity(metres, 'length', { unit: 'mm', decimals: 0 });

/** What an item is called: with its layer, and its product where that is the recipient's own. */
function whatOf({ parameter, layer, product }: SheetItem, { texture }: SheetContent): string {
  const height = texture?.standard === 'areal' ? 'Sq' : 'Rq';
  const { what: plain } = PARAMETER_WORDS[parameter];
  const what = SIDES[parameter] === undefined ? plain : `${plain} (${height})`;
  return [what, ...(layer === undefined ? [] : [layer]), ...(product === undefined ? [] : [product])].join(', ');
}

function itemsChapter(content: SheetContent): Chapter {
  const { items } = content;
  return chapter(
    'items',
    'Items to hold',
    prose('Every piece delivered lies between the limits. A dash is a side without a limit.'),
    table(
      'items-table',
      'Items to hold, with nominal value and limits',
      ['Item|1.5', 'What|2', '#Nominal|0.9', '#From|0.9', '#To|0.9', 'Unit|0.6', 'Why|2.2'],
      items.map((item) => [
        cell({ code: item.id }),
        cell(whatOf(item, content)),
        number(nominalIn(item)),
        limit(item, 'lower'),
        limit(item, 'upper'),
        cell(unitText(item)),
        cell(PARAMETER_WORDS[item.parameter].why),
      ]),
    ),
  );
}

const limit = (item: SheetItem, side: 'lower' | 'upper'): Cell =>
  side === 'lower' && item.upperOnly ? cell('–') : number(limitIn(item, side));

/** Where Rq alone is stated of a foil: what else to measure, with the conditions under which the figure is accepted. */
function knowledgeChapter({ items }: SheetContent): readonly Chapter[] {
  const open = items.filter(({ unstated = [] }) => unstated.length > 0);
  if (open.length === 0) return [];
  const asked = [...new Set(open.flatMap(({ unstated = [] }) => unstated))];
  const missing = (quantity: TextureQuantity) =>
    open.filter(({ unstated = [] }) => unstated.includes(quantity)).map(({ id }) => id);
  return [
    chapter(
      'texture-knowledge',
      'Figures to state beside the height',
      prose(
        'The height alone does not fix what a foil loses: foils of one height differ several times in loss. With the figures below a foil is judged by what it is, without them by the less favourable of what it may be. ',
        'State them with the answer, with spread, instrument and filters; say where one cannot be given.',
      ),
      table(
        'texture-knowledge-table',
        'Figures of texture that are not stated yet',
        ['Figure and when it is accepted|4', 'For items|1.6', 'Figure with spread|1.4', 'Instrument and filters|1.6'],
        asked.map((quantity) => [cell(askText(quantity)), cell({ code: missing(quantity).join(', ') }), BLANK, BLANK]),
      ),
    ),
  ];
}

function limitsChapter(content: SheetContent): Chapter {
  const twoSided = content.items.some(({ upperOnly }) => !upperOnly);
  return chapter(
    'limits',
    'Where the limits come from',
    prose(
      'A limit is the stated spread, or the calculated allowance where that is tighter. The allowance is the worst value of the item, moved alone, at which everything required of the finished board is still met with what else is uncertain. ',
      'It is found under a low, a middle and a high estimate of the loss of copper for what is known of its texture; the range between them is given, and the least favourable one counts. ',
      'No limit comes from a formula that ends at a ceiling. The more of a texture is stated, the nearer the estimates lie.',
    ),
    table(
      'limits-table',
      'Basis of each limit, with the calculated allowance and its spread over the estimates of rough copper',
      [
        'Item|1.5',
        'Limit asked is|1.2',
        ...(twoSided ? ['Lowest permitted, calculated|2.2'] : []),
        'Highest permitted, calculated|2.6',
      ],
      content.items.map((item) => [
        cell({ code: item.id }),
        cell(basisText(item)),
        ...(twoSided ? [cell(item.upperOnly ? '–' : allowanceText(item, 'lower', content.printAllowances))] : []),
        cell(allowanceText(item, 'upper', content.printAllowances)),
      ]),
    ),
  );
}

function definitionOf({ parameter, permittivityKind }: SheetItem, content: SheetContent): string {
  const { definition } = PARAMETER_WORDS[parameter];
  const side = SIDES[parameter];
  if (side !== undefined) {
    const { texture } = content;
    const conditions = texture
      ? `instrument: ${texture.instrument}; filter: ${texture.filter}`
      : 'instrument and filter (nesting indices) to be stated with the answer';
    return `${TEXTURE_DEFINITIONS[texture?.standard ?? 'profile']}; ${conditions}. Side: ${side}.`;
  }
  if (permittivityKind === undefined) return definition;
  const kind = permittivityKind === 'bulk' ? 'Bulk (process) value' : 'Design value, with the effect of copper texture';
  return `${kind}. ${definition}`;
}

export function sampleText(sampling: Sampling): string {
  if ('plan' in sampling) return sampling.plan;
  return `${successRunSize(sampling.confidence, sampling.reliability)} pieces of a lot, none outside`;
}

function methodOf({ parameter, verification }: SheetItem): { readonly method: string; readonly specimen: string } {
  return { ...PARAMETER_WORDS[parameter].verification, ...verification };
}

function verificationChapter(content: SheetContent): Chapter {
  const { sampling, items } = content;
  const derivation =
    'plan' in sampling
      ? []
      : [
          prose(
            `Sample size: with confidence C = ${sampling.confidence} at least the share R = ${sampling.reliability} of all pieces conforms, when none of n pieces drawn at random fails; n = ln(1 − C)/ln R, rounded up.`,
          ),
        ];
  return chapter(
    'verification',
    'Definition and verification',
    table(
      'verification-table',
      'How each item is defined and verified',
      ['Item|1.5', 'Definition|2.2', 'Method|1.8', 'Specimen|1.7', 'Sample|1.3'],
      items.map((item) => {
        const { method, specimen } = methodOf(item);
        return [
          cell({ code: item.id }),
          cell(definitionOf(item, content)),
          cell(method),
          cell(specimen),
          cell(sampleText(sampling)),
        ];
      }),
    ),
    ...derivation,
  );
}

const BLANK: Cell = { content: [''], signature: true };

function answerChapter({ items }: SheetContent): Chapter {
  return chapter(
    'answer',
    'Answer: items to hold',
    prose(
      'Answer here or in the table (CSV) that comes with this sheet; the table is read by program. Give guaranteed limits in the unit of the item, and what is typical apart from them. ',
      'Where an item is offered differently, say so under alternative; mark what is not offered. Name the method behind each figure.',
    ),
    table(
      'answer-table',
      'To be filled in by the supplier',
      [
        'Item|1.5',
        'Unit|0.6',
        'Guaranteed from|1.1',
        'Guaranteed to|1.1',
        'Typical|0.9',
        'Alternative|1.1',
        'Not offered|0.8',
        'Method|1.3',
      ],
      items.map((item) => [
        cell({ code: item.id }),
        cell(unitText(item)),
        item.upperOnly ? cell('–') : BLANK,
        BLANK,
        BLANK,
        BLANK,
        BLANK,
        BLANK,
      ]),
    ),
  );
}

function wordsChapter({ words }: SheetContent): Chapter {
  return chapter(
    'declarations',
    'Answer: declarations, price and lead time',
    table(
      'declarations-table',
      'To be declared by the supplier, each with its document',
      ['Item|1.1', 'What|2.6', 'Needed|1.2', 'Declaration|1.8', 'Document|1.3'],
      words.map(({ id, what, needed }) => [cell({ code: id }), cell(capital(what)), cell(needed ?? '–'), BLANK, BLANK]),
    ),
  );
}

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

const ANSWER_COLUMNS = [
  'rfq',
  'item',
  'what',
  'unit',
  'nominal',
  'lower_limit',
  'upper_limit',
  'worst_permitted',
  'why',
  'definition',
  'verification',
  'sample_size',
  'guaranteed_lower',
  'guaranteed_upper',
  'typical',
  'alternative',
  'not_offered',
  'method',
  'declaration',
] as const;
type AnswerColumn = (typeof ANSWER_COLUMNS)[number];

/** Header and rows of the table to answer in. Numbers have an ASCII minus and a point, for programs. */
function answerTable(content: SheetContent): readonly (readonly string[])[] {
  const { rfqNumber, items, words, sampling, printAllowances } = content;
  const row = (entries: Partial<Record<AnswerColumn, string>>) =>
    ANSWER_COLUMNS.map((column) => (column === 'rfq' ? rfqNumber : (entries[column] ?? '')));
  const plain = (text: string) => text.replaceAll('−', '-');
  return [
    ANSWER_COLUMNS,
    ...items.map((item) => {
      const { method, specimen } = methodOf(item);
      const permitted = [
        ...(item.upperOnly ? [] : [`from: ${allowanceText(item, 'lower', printAllowances)}`]),
        `to: ${allowanceText(item, 'upper', printAllowances)}`,
      ];
      return row({
        item: item.id,
        what: whatOf(item, content),
        unit: item.unit ?? '1',
        nominal: plain(nominalIn(item)),
        ...(item.upperOnly ? {} : { lower_limit: plain(limitIn(item, 'lower')) }),
        upper_limit: plain(limitIn(item, 'upper')),
        worst_permitted: permitted.join('; '),
        why: PARAMETER_WORDS[item.parameter as HeldParameter].why,
        definition: definitionOf(item, content),
        verification: `${method}; ${specimen}`,
        sample_size: sampleText(sampling),
      });
    }),
    ...words.map(({ id, what, needed }) =>
      row({ item: id, what: needed === undefined ? capital(what) : `${capital(what)}; needed: ${needed}` }),
    ),
  ];
}
