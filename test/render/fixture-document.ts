import type {
  Block,
  Cell,
  Chapter,
  DocumentPage,
  Inline,
  PackDocument,
  Status,
  TableBlock,
  TitleBlock,
} from '../../src/dossier/document.js';
import * as charts from './fixture-charts.js';

/** A whole pack of the invented radar "Quillback" as dossier data: every block kind, status, chart and drawing. */
const boards = [
  { id: 'qb-1', title: 'QB-1', laminate: 'Tarn 300', foil: 'SV-2', finish: 'immersion silver' },
  { id: 'qb-2', title: 'QB-2', laminate: 'Tarn 300', foil: 'SV-9', finish: 'bare copper' },
  { id: 'qb-3', title: 'QB-3', laminate: 'Mere 355', foil: 'SV-2', finish: 'nickel-gold' },
  { id: 'qb-4', title: 'QB-4', laminate: 'Fell 280', foil: 'SV-R', finish: 'immersion tin' },
] as const;

interface Requirement {
  readonly id: string;
  readonly text: string;
  readonly limit: string;
  /** Status, worst value and margin per board. */
  readonly results: readonly (readonly [Status, string, string])[];
}

const requirements: readonly Requirement[] = [
  {
    id: 'r-gain',
    text: 'Realized gain over the band',
    limit: '≥ 16.0 dBi',
    results: [
      ['meets', '16.62 dBi', '+0.62 dB'],
      ['misses', '15.31 dBi', '−0.69 dB'],
      ['misses', '14.88 dBi', '−1.12 dB'],
      ['undecided', '16.12 dBi', '+0.12 dB'],
    ],
  },
  {
    id: 'r-refl',
    text: 'Active reflection of every column',
    limit: '≤ −12.0 dB',
    results: [
      ['meets', '−14.1 dB', '+2.1 dB'],
      ['undecided', '−12.4 dB', '+0.4 dB'],
      ['misses', '−9.8 dB', '−2.2 dB'],
      ['meets', '−15.0 dB', '+3.0 dB'],
    ],
  },
  {
    id: 'r-sll-el',
    text: 'Sidelobe level, elevation cut',
    limit: '≤ −18.0 dB',
    results: [
      ['meets', '−20.3 dB', '+2.3 dB'],
      ['meets', '−19.8 dB', '+1.8 dB'],
      ['undecided', '−18.4 dB', '+0.4 dB'],
      ['meets', '−20.9 dB', '+2.9 dB'],
    ],
  },
  {
    id: 'r-sll-az',
    text: 'Sidelobe level, azimuth cut',
    limit: '≤ −14.0 dB',
    results: [
      ['meets', '−16.2 dB', '+2.2 dB'],
      ['meets', '−16.2 dB', '+2.2 dB'],
      ['meets', '−15.9 dB', '+1.9 dB'],
      ['meets', '−16.4 dB', '+2.4 dB'],
    ],
  },
  {
    id: 'r-hpbw-el',
    text: 'Half-power beamwidth, elevation cut',
    limit: '≤ 12.0°',
    results: [
      ['meets', '10.1°', '+1.9°'],
      ['meets', '10.2°', '+1.8°'],
      ['meets', '11.0°', '+1.0°'],
      ['meets', '9.9°', '+2.1°'],
    ],
  },
  {
    id: 'r-tilt',
    text: 'Beam direction over the band, elevation cut',
    limit: 'within ±2.0°',
    results: [
      ['meets', '1.3°', '+0.7°'],
      ['undecided', '1.9°', '+0.1°'],
      ['misses', '−2.8°', '−0.8°'],
      ['meets', '1.1°', '+0.9°'],
    ],
  },
  {
    id: 'r-peel',
    text: 'Peel strength of the foil after solder float',
    limit: '≥ 0.70 N/mm',
    results: [
      ['meets', '0.95 N/mm', '+0.25 N/mm'],
      ['meets', '1.40 N/mm', '+0.70 N/mm'],
      ['not evaluated', 'no document given', 'none'],
      ['misses', '0.55 N/mm', '−0.15 N/mm'],
    ],
  },
  {
    id: 'r-env',
    text: 'Gain after 1,000 temperature cycles',
    limit: 'change ≤ 0.5 dB',
    results: boards.map(() => ['open until measured', 'test', 'none'] as const),
  },
];

const notices = [
  'Invented demonstration data: the radar, its maker, the laminates and the foils do not exist.',
  'Calculated design evidence for design review: not a declaration of conformity, radio approval or RF-exposure assessment.',
  'Not a safety argument: tilt and sidelobes can cause missed or false targets; verify independently. Export class not assessed. Local rules, accredited laboratories and licensed practice decide.',
];

function titleBlock(title: string, number: string, supplementaryTitle?: string): TitleBlock {
  return {
    legalOwner: 'Northfen Sensing (invented)',
    identificationNumber: number,
    revision: 'B',
    dateOfIssue: '2026-11-16',
    title,
    ...(supplementaryTitle === undefined ? {} : { supplementaryTitle }),
    documentType: 'Compliance dossier for design review (calculated)',
    documentStatus: 'released for review',
    creator: 'R. Tamsin',
    approver: 'not yet approved',
    language: 'en',
  };
}

const text = (...content: Inline[]): Cell => ({ content });
const number = (...content: Inline[]): Cell => ({ content, numeric: true });
const prose = (...content: Inline[]): Block => ({ kind: 'prose', content });
const chapter = (id: string, title: string, ...blocks: Block[]): Chapter => ({ id, title, blocks });

const worstFirst: readonly Status[] = ['incomplete', 'misses', 'undecided', 'not evaluated', 'open until measured'];
const worstOf = (index: number): Status =>
  worstFirst.find((status) => requirements.some((r) => r.results[index][0] === status)) ?? 'meets';

const matrix: TableBlock = {
  kind: 'table',
  id: 'matrix',
  caption: 'Every board against every requirement: status and worst margin over band and temperature',
  columns: [
    { title: 'Requirement', width: 2.4 },
    { title: 'Limit', width: 1.2 },
    ...boards.map((board) => ({ title: board.title, width: 1.4 })),
  ],
  rowHeaders: true,
  rows: requirements.map((r) => [
    text({ text: r.text, page: `requirement/${r.id}` }),
    text(r.limit),
    ...r.results.map(([status, , margin]) => text({ status }, margin === 'none' ? '' : ` ${margin}`)),
  ]),
};

const overview: DocumentPage = {
  id: 'overview',
  kind: 'overview',
  title: 'Quillback short-range side radar: candidate boards',
  subtitle: 'Four boards against eight requirements, 76.1 GHz to 76.9 GHz, −40 °C to 105 °C',
  titleBlock: titleBlock('Quillback candidate boards', 'NF-QB-0100', 'Overview'),
  notices,
  chapters: [
    chapter(
      'result',
      'Result',
      {
        kind: 'verdict',
        status: 'undecided',
        content: [
          'QB-1 meets all seven calculated requirements; ',
          { strong: 'QB-4 is undecided on gain' },
          ' because its margin of 0.12 dB is below the expanded uncertainty of 0.45 dB.',
        ],
      },
      matrix,
      prose(
        'Margins are signed so that a positive figure is on the safe side. The worst value over the condition decides. See ',
        { text: 'definitions', page: 'definitions', anchor: 'decision-rule' },
        ' for the decision rule.',
      ),
    ),
    chapter('boards', 'Boards', {
      kind: 'table',
      id: 'differences',
      caption: 'What differs between the boards',
      columns: [
        { title: 'Board' },
        { title: 'Verdict', width: 1.4 },
        { title: 'Laminate' },
        { title: 'Foil' },
        { title: 'Finish', width: 1.3 },
        { title: 'Cost, relative', numeric: true },
      ],
      rowHeaders: true,
      rows: boards.map((board, index) => [
        text({ text: board.title, page: `board/${board.id}` }),
        text({ status: worstOf(index) }),
        text(board.laminate),
        text(board.foil),
        text(board.finish),
        number(['1.00', '0.92', '1.15', '1.31'][index]),
      ]),
    }),
    chapter(
      'limits',
      'What is not modelled',
      {
        kind: 'list',
        items: [
          ['Fascia, housing, chip transition, vias and the edge of the board.'],
          ['Layers below the ground are declared and drawn, ', { strong: 'not computed' }, '.'],
          ['Coupling between columns through the ', { code: 'surface wave' }, ' beyond the nearest neighbour.'],
        ],
      },
      {
        kind: 'caution',
        title: 'Compared with calculations only',
        content: [
          [
            'Figures are compared with other calculations and with published values. No board of this build was measured.',
          ],
          ['A verdict here never replaces the test named as verification in the requirement.'],
        ],
      },
    ),
  ],
};

const dossiers: readonly DocumentPage[] = boards.map((board, index) => ({
  id: `board/${board.id}`,
  kind: 'dossier' as const,
  title: `Board ${board.title}`,
  subtitle: `${board.laminate}, foil ${board.foil}, ${board.finish}`,
  titleBlock: titleBlock(`Quillback board ${board.title}`, `NF-QB-010${index + 1}`, 'Dossier of one board'),
  notices,
  chapters: [
    chapter(
      'verdict',
      'Verdict',
      {
        kind: 'verdict',
        status: index === 2 ? 'incomplete' : worstOf(index),
        content: [
          'Worst margin on ',
          { strong: 'realized gain' },
          `: ${requirements[0].results[index][2]} at 76.1 GHz and 105 °C.`,
        ],
      },
      {
        kind: 'table',
        id: 'requirements',
        caption: 'Requirements, worst margin first',
        columns: [
          { title: 'Requirement', width: 2.2 },
          { title: 'Status', width: 1.5 },
          { title: 'Limit' },
          { title: 'Worst value', numeric: true },
          { title: 'Margin', numeric: true },
          { title: 'Uncertainty', numeric: true },
          { title: 'Where' },
        ],
        rowHeaders: true,
        rows: requirements.map((r) => [
          text({ text: r.text, page: `requirement/${r.id}` }),
          text({ status: r.results[index][0] }),
          text(r.limit),
          number(r.results[index][1]),
          number(r.results[index][2]),
          number('±0.45'),
          text('76.1 GHz, 105 °C'),
        ]),
      },
      {
        kind: 'facts',
        id: 'conditions',
        items: [
          { label: 'Operating band', content: ['76.1 GHz to 76.9 GHz'] },
          { label: 'Temperature', content: ['−40 °C to 105 °C, nominal 25 °C'] },
          { label: 'Reference plane of gain', content: ['Input of the feed network; feed loss in, mismatch out'] },
          { label: 'Reference impedance', content: ['As declared: ', { code: '100 ohm' }, ' at the column ports'] },
        ],
      },
    ),
    chapter(
      'stack-up',
      'Stack-up and array',
      {
        kind: 'figure',
        id: 'fig-stack-up',
        title: 'Stack-up, to scale in thickness',
        reading: 'The field lives in 127 µm of laminate between two coppers of 18 µm.',
        alt: 'Section through the board: copper 18 µm, laminate 127 µm, ground copper 18 µm, prepreg 100 µm, core 800 µm shown broken.',
        content: charts.stackUp,
      },
      {
        kind: 'figure',
        id: 'fig-array',
        title: 'Array of five columns, to scale',
        reading: 'Five columns of ten patches each, fed from the left, with a pitch of 2.15 mm.',
        alt: 'Plan of five columns of ten patches with tapered widths, axes x and y, polarisation along x.',
        content: charts.array,
      },
    ),
    chapter(
      'gain',
      'Gain budget',
      {
        kind: 'figure',
        id: 'fig-budget',
        title: 'From directivity to realized gain at 76.5 GHz and 25 °C',
        reading: 'The feed takes the most, 1.35 dB; roughness costs 0.47 dB.',
        alt: 'Waterfall from a directivity of 20.62 dBi through ten losses down to a realized gain of 16.99 dBi.',
        content: charts.budget,
      },
      prose(
        'Gain is directivity times the efficiency of the circuit. Roughness is the ',
        { strong: 'extra over smooth copper' },
        '.',
      ),
    ),
    chapter(
      'patterns',
      'Patterns',
      {
        kind: 'figure',
        id: 'fig-elevation',
        title: 'Elevation cut over the band',
        reading: 'The beam moves by 2.5° over the band; the highest sidelobe is −20.3 dB.',
        alt: 'Three pattern cuts at 76.1, 76.5 and 76.9 GHz with the sidelobe limit of −18 dB outside ±14°.',
        content: charts.elevationCut,
      },
      {
        kind: 'figure',
        id: 'fig-azimuth',
        title: 'Azimuth cut at 76.5 GHz',
        reading: 'The cut stays below the mask everywhere.',
        alt: 'Pattern cut at 76.5 GHz with a mask in four pieces.',
        content: charts.azimuthCut,
      },
    ),
    chapter(
      'match-and-lines',
      'Match, lines and copper',
      {
        kind: 'figure',
        id: 'fig-match',
        title: 'Active reflection of every column',
        reading: 'All columns stay below −14 dB between the band edges.',
        alt: 'Reflection of five columns from 75.5 to 77.9 GHz with a limit of −12 dB in the band.',
        content: charts.match,
      },
      {
        kind: 'figure',
        id: 'fig-line-loss',
        title: 'Loss of the feed line',
        reading: 'The nominal model gives 1.07 dB/cm at 76 GHz.',
        alt: 'Line loss of smooth copper and three roughness models from 10 to 100 GHz.',
        content: charts.lineLoss,
      },
      {
        kind: 'figure',
        id: 'fig-loss-factor',
        title: 'Loss factor against roughness at 76.5 GHz',
        reading: 'At the foil of this board the models lie between 1.7 and 1.9.',
        alt: 'Loss factor of three models over Rq from 0.05 to 2 µm, with the spread shaded and three foils marked.',
        content: charts.lossFactor,
      },
      {
        kind: 'figure',
        id: 'fig-tooth',
        title: 'The tooth of each copper face to scale, beside the skin depth',
        reading: 'The roughest face has an Rq of 0.42 µm, 1.8 times the skin depth of 0.238 µm.',
        alt: 'Sections through two copper faces at one scale, each with bars for skin depth, Rq and Rz.',
        content: charts.tooth,
      },
    ),
    chapter('inputs', 'Inputs', {
      kind: 'table',
      id: 'inputs',
      caption: 'Figures that are typical, estimated or used outside their frequency, first',
      columns: [
        { title: 'Figure', width: 1.4 },
        { title: 'Value', numeric: true },
        { title: 'Basis' },
        { title: 'Method', width: 1.6 },
        { title: 'Document', width: 2 },
      ],
      rowHeaders: true,
      rows: Array.from({ length: 28 }, (_, i) => [
        text(`Material figure ${i + 1}`),
        number(`${(2.8 + 0.03 * i).toFixed(2)} ± 0.05`),
        text(['estimated', 'typical', 'measured', 'guaranteed'][Math.floor(i / 7)]),
        text('Split cylinder, 10 GHz, in plane'),
        text('Fellside Laminates (invented), data sheet TN-300, revision 4, 2026-02-11'),
      ]),
    }),
  ],
}));

const requirementPages: readonly DocumentPage[] = requirements.map((r) => ({
  id: `requirement/${r.id}`,
  kind: 'requirement' as const,
  title: r.text,
  subtitle: `Requirement ${r.id.toUpperCase()}: ${r.limit}`,
  titleBlock: titleBlock(r.text, 'NF-QB-0200', 'One requirement across all boards'),
  notices,
  chapters: [
    chapter(
      'across-boards',
      'Across the boards',
      {
        kind: 'facts',
        id: 'terms',
        items: [
          { label: 'Limit', content: [r.limit] },
          { label: 'Condition', content: ['76.1 GHz to 76.9 GHz, −40 °C to 105 °C'] },
          { label: 'Binding', content: ['yes'] },
          { label: 'Source', content: ['System specification NF-QB-0001 (invented), clause 5.2'] },
        ],
      },
      {
        kind: 'table',
        id: 'boards',
        caption: 'Worst margin first',
        columns: [
          { title: 'Board' },
          { title: 'Status' },
          { title: 'Worst value', numeric: true },
          { title: 'Margin', numeric: true },
        ],
        rowHeaders: true,
        rows: boards.map((board, index) => [
          text({ text: board.title, page: `board/${board.id}`, anchor: 'verdict' }),
          text({ status: r.results[index][0] }),
          number(r.results[index][1]),
          number(r.results[index][2]),
        ]),
      },
    ),
  ],
}));

/** Stands twice on its page: renderers must cope with an id and a caption that repeat. */
const checks: TableBlock = {
  kind: 'table',
  id: 'checks',
  caption: 'Checks run in this build',
  columns: [
    { title: 'Check', width: 2 },
    { title: 'Published', numeric: true },
    { title: 'Calculated', numeric: true },
    { title: 'Allowed', numeric: true },
    { title: 'Result' },
  ],
  rowHeaders: true,
  rows: [
    [
      text('Wall loss of a filled guide'),
      number('0.050 Np/m'),
      number('0.0503 Np/m'),
      number('±0.0005'),
      text({ status: 'meets' }),
    ],
    [text('Loss factor at Rq = δ'), number('1.72'), number('1.719'), number('±0.005'), text({ status: 'meets' })],
  ],
};

const evidence: DocumentPage = {
  id: 'evidence',
  kind: 'evidence',
  title: 'Evidence',
  subtitle: 'Every method, its source and range, and the checks run in this build',
  titleBlock: titleBlock('Quillback evidence', 'NF-QB-0300'),
  notices,
  chapters: [
    chapter('methods', 'Methods', {
      kind: 'table',
      id: 'methods',
      caption: 'Methods with source and range',
      columns: [
        { title: 'Method', width: 1.2 },
        { title: 'Source', width: 2 },
        { title: 'Range', width: 1.6 },
      ],
      rowHeaders: true,
      rows: [
        [text('Loss factor, Groiss'), text('S. Groiss et al., IEEE Trans. Magn. 32(3), 1996'), text('Rq/δ from 0.3')],
        [text('Microstrip'), text('E. Hammerstad, Ø. Jensen, IEEE MTT-S, 1980'), text('w/h 0.01 to 100, εr to 128')],
      ],
    }),
    chapter('checks', 'Checks against published values', checks, checks),
  ],
};

const definitions: DocumentPage = {
  id: 'definitions',
  kind: 'definitions',
  title: 'Definitions',
  subtitle: 'What the words and figures of this pack mean',
  titleBlock: titleBlock('Quillback definitions', 'NF-QB-0400'),
  notices,
  chapters: [
    chapter('terms', 'Terms', {
      kind: 'facts',
      id: 'glossary',
      items: [
        { label: 'Gain', content: ['At the input of the feed network; feed loss in, mismatch out (IEEE Std 145).'] },
        {
          label: 'Sidelobe level',
          content: ['Highest lobe other than the main one, relative to the maximum of the cut.'],
        },
      ],
    }),
    chapter('decision-rule', 'Decision rule', prose('Every status of a verdict, in words and shape:'), {
      kind: 'list',
      ordered: true,
      items: (['meets', 'undecided', 'misses', 'not evaluated', 'open until measured', 'incomplete'] as const).map(
        (status) => [{ status }, ': as defined in the requirement set.'],
      ),
    }),
  ],
};

export const packDocument: PackDocument = {
  packId: 'quillback-srr',
  revision: 'B',
  title: 'Quillback short-range side radar',
  pages: [overview, ...dossiers, ...requirementPages, evidence, definitions],
};
