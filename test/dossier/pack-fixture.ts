import type { Block, DocumentPage, Inline, PackDocument } from '../../src/dossier/document.js';
import type { PackInput } from '../../src/dossier/index.js';
import type { Accuracy, EvidenceResult } from '../../src/evidence/index.js';
import { methods } from '../../src/evidence/methods.js';
import type { Board, Pack } from '../../src/manifest/model.js';
import type { BoardStudy, Sweep } from '../../src/study/results.js';
import { judgePack } from '../../src/verdict/index.js';
import { board, pack } from './board-fixture.js';
import { studyOf } from './study-fixture.js';

const check = (id: string, expected: number, value: number, unit: string, tolerance: number): EvidenceResult => ({
  id,
  topic: 'Conductor',
  quantity: `Check ${id}`,
  source: 'A handbook, 1990, table 1',
  howKnown: 'memory',
  expected,
  unit,
  tolerance,
  toleranceReason: 'printed digits',
  value,
  deviation: value - expected,
  ok: Math.abs(value - expected) <= tolerance,
});

export const evidence: readonly EvidenceResult[] = [
  check('skin-depth', 0.66, 0.6601, 'µm', 0.0005),
  check('far', 1, 1.2, '1', 0.1),
  check('small', 2.4e-7, 2.41e-7, 'm', 1e-8),
];

export const accuracy: readonly Accuracy[] = [
  {
    id: 'impedance',
    figure: 'Impedance of a section',
    comparedWith: 'a refined solution',
    range: 'w/h 0.5 to 10',
    target: 0.5,
    unit: '%',
    reached: 0.21,
    cases: 10,
    met: true,
  },
  {
    id: 'gradient',
    figure: 'Gradient model',
    comparedWith: 'a finer step',
    range: 'Rq 0.1 to 2.4 µm',
    target: 1e-6,
    unit: '1',
    reached: 3.1e-13,
    cases: 12,
    met: true,
  },
  {
    id: 'perturbation',
    figure: 'Perturbation',
    comparedWith: 'random surfaces',
    range: 'rms slope to 0.5',
    target: 0.005,
    unit: '1',
    reached: 0.0105,
    cases: 6,
    met: false,
    remark: 'The fourth order is missing.',
  },
];

export function inputOf(studies: readonly BoardStudy[], extra: Partial<Pack> = {}): PackInput {
  const subject = pack(
    studies.map((study) => study.board),
    extra,
  );
  return {
    pack: subject,
    studies,
    verdicts: judgePack(studies, subject.requirements),
    evidence,
    methods,
    accuracy,
    programVersion: '0.1.0',
  };
}

/** A board with a cover layer, as a study leaves it: the feed line and its copper, and the reason for all the rest. */
export function notEvaluated(study: BoardStudy, reason = 'the board has a cover layer'): BoardStudy {
  const lineOnly = (sweep: Sweep): Sweep => ({ ...sweep, points: [] });
  return {
    ...study,
    nominal: lineOnly(study.nominal),
    sides: study.sides.map(({ side, sweep }) => ({ side, sweep: lineOnly(sweep) })),
    tolerances: study.tolerances.map((tolerance) => ({
      ...tolerance,
      low: lineOnly(tolerance.low),
      high: lineOnly(tolerance.high),
      bySide: (tolerance.bySide ?? []).map(({ side, low, high }) => ({
        side,
        low: lineOnly(low),
        high: lineOnly(high),
      })),
    })),
    flags: [],
    losslessClosure: Number.NaN,
    confirmation: { kind: 'network only', reason },
    notEvaluated: [
      {
        quantities: [
          'gain',
          'realized_gain',
          'directivity',
          'radiation_efficiency',
          'reflection',
          'active_reflection',
          'half_power_beamwidth',
          'sidelobe_level',
          'beam_direction',
          'pattern_mask',
        ],
        reason,
      },
    ],
  };
}

export const networkOnly = (subject: Board): BoardStudy => ({
  ...studyOf(subject),
  confirmation: { kind: 'network only', reason: 'the pack switched the full wave off' },
});

let made: readonly BoardStudy[] | undefined;
/** A smooth board, a rough one on another laminate, and one that cannot be evaluated. */
export function studies(): readonly BoardStudy[] {
  made ??= [
    studyOf(board('qb-1')),
    networkOnly(
      board('qb-2', {
        rq: 1.6e-6,
        permittivity: 3.3,
        basedOn: ['qb-1'],
        overrides: ['stack_up.laminate'],
        lineage: [
          {
            board: 'qb-2',
            file: 'boards/qb-2.yaml',
            overrides: [{ path: 'stack_up.laminate.material', text: 'nf-33' }],
          },
          { board: 'qb-1', file: 'boards/qb-1.yaml', overrides: [] },
        ],
      }),
    ),
    notEvaluated(studyOf(board('qb-3'))),
  ];
  return made;
}

export const blocksOf = (page: DocumentPage): readonly Block[] => page.chapters.flatMap((chapter) => chapter.blocks);
export const allBlocks = (document: PackDocument): readonly Block[] => document.pages.flatMap(blocksOf);

/** Every run of inline text of a block. */
export function inlinesOf(block: Block): readonly Inline[] {
  switch (block.kind) {
    case 'prose':
    case 'verdict':
      return block.content;
    case 'list':
      return block.items.flat();
    case 'facts':
      return block.items.flatMap((item) => item.content);
    case 'caution':
      return block.content.flat();
    case 'table':
      return block.rows.flat().flatMap((cell) => cell.content);
    case 'figure':
      return [];
  }
}

const runText = (part: Inline): string => {
  if (typeof part === 'string') return part;
  if ('strong' in part) return part.strong;
  if ('code' in part) return part.code;
  return 'status' in part ? part.status : part.text;
};

/** Text of a run; no-break spaces as plain ones, which are easier to write in tests. */
export const plain = (part: Inline): string => runText(part).replaceAll('\u00a0', ' ');

/** All text of a page as a reader meets it. */
export function textOf(page: DocumentPage): string {
  const blocks = blocksOf(page).map((block) => {
    const text = inlinesOf(block).map(plain).join('');
    if (block.kind === 'table') return [block.caption, ...block.columns.map((c) => c.title), text].join('\n');
    if (block.kind === 'figure')
      return [block.title, block.reading, block.alt, JSON.stringify(block.content)].join('\n');
    if (block.kind === 'caution') return `${block.title}\n${text}`;
    if (block.kind === 'facts') return [...block.items.map((i) => i.label), text].join('\n');
    return text;
  });
  return [page.title, page.subtitle, ...page.notices, ...page.chapters.map((c) => c.title), ...blocks].join('\n');
}

export function pageOf(document: PackDocument, id: string): DocumentPage {
  const found = document.pages.find((page) => page.id === id);
  if (found === undefined) throw new Error(`no page ${id}`);
  return found;
}
