import type { Accuracy, EvidenceResult, Method } from '../evidence/index.js';
import type { Board, Pack, Requirement } from '../manifest/model.js';
import type { BoardStudy, PointResult } from '../study/results.js';
import type { BoardVerdict, ProcurementResults, RequirementVerdict } from '../verdict/index.js';
import type { DocumentPage, PageKind, TitleBlock } from './document.js';
import type { PreviousData } from './previous.js';
import { CAUTION_NOTICE, COMPARED_WITH, copyNotice, DOCUMENT_TYPE, INTERNAL_MARKING } from './statements.js';

/** Everything the pages of a pack are made from. Studies and verdicts are in the order of the pack's boards. */
export interface PackInput {
  readonly pack: Pack;
  readonly studies: readonly BoardStudy[];
  readonly verdicts: readonly BoardVerdict[];
  readonly evidence: readonly EvidenceResult[];
  readonly methods: readonly Method[];
  /** How close the solvers come to what is better than they are. */
  readonly accuracy: readonly Accuracy[];
  readonly programVersion: string;
  /** Data of the revision before this one, where the pack names one. */
  readonly previous?: PreviousData;
  /** Present where the pack asks something of suppliers. */
  readonly procurement?: ProcurementResults;
}

/** One board with all that is known of it. */
export interface BoardContext {
  readonly input: PackInput;
  readonly board: Board;
  readonly study: BoardStudy;
  readonly verdict: BoardVerdict;
  /** Requirements with their verdict, in the order of the set. */
  readonly judged: readonly Judged[];
}

export interface Judged {
  readonly requirement: Requirement;
  readonly verdict: RequirementVerdict;
}

/** @throws RangeError when a board has no study or verdict, or a requirement no verdict: a fault of the program */
export function boardContexts(input: PackInput): readonly BoardContext[] {
  return input.pack.boards.map((board) => {
    const study = input.studies.find((s) => s.board.id === board.id);
    const verdict = input.verdicts.find((v) => v.boardId === board.id);
    if (study === undefined || verdict === undefined)
      throw new RangeError(`board ${board.id} was not studied and judged`);
    const judged = input.pack.requirements.requirements.map((requirement) => {
      const found = verdict.requirements.find((v) => v.requirementId === requirement.id);
      if (found === undefined) throw new RangeError(`board ${board.id} was not judged against ${requirement.id}`);
      return { requirement, verdict: found };
    });
    return { input, board, study, verdict, judged };
  });
}

export function judgedOn(context: BoardContext, requirementId: string): Judged {
  const found = context.judged.find((j) => j.requirement.id === requirementId);
  if (found === undefined) {
    throw new RangeError(`board ${context.board.id} was not judged against ${requirementId}`);
  }
  return found;
}

/** Representative points: lower edge, centre and upper edge of the band at nominal temperature; none without results. */
export interface BandPoints {
  readonly low: PointResult;
  readonly centre: PointResult;
  readonly high: PointResult;
  /** All points at nominal temperature, by frequency. */
  readonly nominal: readonly PointResult[];
}

const nearest = <T>(items: readonly T[], distance: (item: T) => number): T =>
  items.reduce((a, b) => (distance(b) < distance(a) ? b : a));

export function bandPoints({ board, study }: BoardContext): BandPoints | undefined {
  const { points } = study.nominal;
  if (points.length === 0) return undefined;
  const { temperatureC } = nearest(points, (p) => Math.abs(p.temperatureC - board.temperature.nominalC));
  const nominal = points.filter((p) => p.temperatureC === temperatureC);
  const middle = (board.band.low + board.band.high) / 2;
  return {
    low: nominal[0],
    centre: nearest(nominal, (p) => Math.abs(p.frequency - middle)),
    high: nominal[nominal.length - 1],
    nominal,
  };
}

function titleBlock({ pack }: PackInput, number: string, title: string, supplementaryTitle?: string): TitleBlock {
  return {
    legalOwner: pack.owner,
    identificationNumber: number,
    revision: pack.revision,
    dateOfIssue: pack.date,
    title,
    ...(supplementaryTitle === undefined ? {} : { supplementaryTitle }),
    documentType: DOCUMENT_TYPE,
    documentStatus: pack.status,
    creator: pack.authors.join(', '),
    approver: pack.status === 'released' ? 'on the signed copy' : 'not yet approved',
    language: 'en',
  };
}

/** Who may see the pack. */
export const markingOf = ({ marking }: Pack): string => marking ?? INTERNAL_MARKING;

/** Number of a document of the pack: that of the pack itself, or with a suffix. */
export const documentNumber = (pack: Pack, suffix?: string): string =>
  suffix === undefined ? pack.documentNumber : `${pack.documentNumber}-${suffix}`;

/** Stand on every page and in the data. */
export function noticesOf({ notice, audience }: Pack): readonly string[] {
  const copy = audience === undefined ? [] : [copyNotice(audience)];
  // The first one stands at the head of a page as well: there the reader learns that the data are invented or cut.
  const first = [...copy, ...(notice === undefined ? [] : [notice])].join(' ');
  return [...(first === '' ? [] : [first]), CAUTION_NOTICE, COMPARED_WITH];
}

/** Frame of a page: title block and the notices that stand on every page. */
export function page(
  input: PackInput,
  parts: {
    readonly id: string;
    readonly kind: PageKind;
    readonly title: string;
    readonly subtitle: string;
    /** Added to the document number of the pack. */
    readonly suffix?: string;
    readonly chapters: DocumentPage['chapters'];
  },
): DocumentPage {
  const { pack } = input;
  const { suffix, ...rest } = parts;
  const number = documentNumber(pack, suffix);
  return {
    ...rest,
    titleBlock: titleBlock(input, number, parts.title, pack.title === parts.title ? undefined : pack.title),
    marking: markingOf(pack),
    notices: noticesOf(pack),
  };
}
