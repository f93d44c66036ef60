/**
 * A pack as one audience may see it. The copy is made from the model before anything is calculated, of fields named one
 * by one: what is hidden is not there to be printed, hashed or judged, and a field added to the model later stays out
 * until it is named here.
 */
import type {
  Audience,
  Board,
  Concession,
  DeclaredProperty,
  InputFile,
  MeasuredTexture,
  Pack,
  Requirement,
  Review,
} from './model.js';

/** Ids have single hyphens only, so that no pack can have the name of another one's copy. */
export const copyId = (packId: string, audience: string): string => `${packId}--${audience}`;

const NOT_NAMED = 'not named in this copy';
const NOT_GIVEN = 'not given in this copy';

/** Answers whether an entry is hidden. */
interface Hidden {
  readonly has: (entry: string) => boolean;
  readonly board: (board: string) => boolean;
  readonly declared: (property: string) => boolean;
  readonly requirement: (requirement: Pick<Requirement, 'id' | 'property'>) => boolean;
}

export function hiddenBy({ hide }: Audience): Hidden {
  const set = new Set(hide);
  const declared = (property: string) => set.has('declared') || set.has(`declared/${property}`);
  return {
    has: (entry) => set.has(entry),
    board: (id) => set.has(`boards/${id}`),
    declared,
    // A requirement on a hidden property would say what the property is, or read as not evaluated.
    requirement: ({ id, property }) => set.has(`requirements/${id}`) || (property !== undefined && declared(property)),
  };
}

export function packFor(pack: Pack, audience: Audience): Pack {
  const hidden = hiddenBy(audience);
  const boards = pack.boards.filter(({ id }) => !hidden.board(id)).map((board) => boardFor(pack, board, hidden));
  const { requirements } = pack;
  const shown = requirements.requirements.filter((requirement) => !hidden.requirement(requirement));
  const marking = audience.marking ?? pack.marking;
  const review = pack.review === undefined || hidden.has('review') ? undefined : reviewFor(pack.review, shown, hidden);
  return {
    id: copyId(pack.id, audience.id),
    title: pack.title,
    documentNumber: pack.documentNumber,
    revision: pack.revision,
    date: pack.date,
    status: pack.status,
    authors: hidden.has('authors') ? [NOT_NAMED] : pack.authors,
    owner: pack.owner,
    ...(pack.notice === undefined ? {} : { notice: pack.notice }),
    ...(marking === undefined ? {} : { marking }),
    ...(review === undefined ? {} : { review }),
    audience: audience.id,
    boards,
    requirements: {
      id: requirements.id,
      title: requirements.title,
      file: requirements.file,
      invented: requirements.invented,
      requirements: hidden.has('sources') ? shown.map((r) => ({ ...r, source: NOT_GIVEN })) : shown,
    },
    analysis: pack.analysis,
    inputs: inputsFor(pack, boards, review),
  };
}

function boardFor(pack: Pack, board: Board, hidden: Hidden): Board {
  const { cost, description, declared, stackUp, lineage = [], basedOn } = board;
  const cut = lineage.findIndex((link) => hidden.board(link.board));
  const firstHidden = basedOn.findIndex(hidden.board);
  const declaredOf = (list: readonly DeclaredProperty[]) => list.filter(({ id }) => !hidden.declared(id));
  const part = <P extends { readonly declared: readonly DeclaredProperty[] }>(item: P): P => ({
    ...item,
    declared: declaredOf(item.declared),
  });
  const { cost: _cost, description: _description, lineage: _lineage, ...rest } = board;
  const shown: Board = {
    ...rest,
    ...(cost === undefined || hidden.has('cost') ? {} : { cost }),
    ...(description === undefined || hidden.has('descriptions') ? {} : { description }),
    // What a board overrides of a hidden one would say what the hidden one is.
    basedOn: firstHidden < 0 ? basedOn : basedOn.slice(0, firstHidden),
    overrides: firstHidden === 0 ? [] : board.overrides,
    lineage: cut < 0 ? lineage : lineage.slice(0, cut - 1),
    declared: declaredOf(declared),
    stackUp: {
      ...stackUp,
      strip: { ...stackUp.strip, foil: part(stackUp.strip.foil), finish: part(stackUp.strip.finish) },
      laminate: { ...stackUp.laminate, material: part(stackUp.laminate.material) },
      ground: { ...stackUp.ground, foil: part(stackUp.ground.foil) },
    },
  };
  return withoutFiles(shown, hiddenFiles(pack, hidden));
}

/** Files that hold hidden boards only. */
export function hiddenFiles({ boards }: Pack, hidden: Pick<Hidden, 'board'>): ReadonlySet<string> {
  const shown = new Set(boards.filter(({ id }) => !hidden.board(id)).map(({ file }) => file));
  return new Set(boards.map(({ file }) => file).filter((file) => !shown.has(file)));
}

/** An inherited figure says in which file it stands; where that is hidden, only that it is inherited. No hash of a file goes along. */
function withoutFiles<T>(data: T, files: ReadonlySet<string>): T {
  const text = JSON.stringify(data, (key, value: unknown) => {
    // Like the hashes of inputs: a file of heights may carry notes that are for nobody else.
    if (key === 'sha256') return NOT_GIVEN;
    if (key !== 'path' || typeof value !== 'string') return value;
    const end = value.indexOf(': ');
    return end > 0 && files.has(value.slice(0, end)) ? `inherited${value.slice(end)}` : value;
  });
  return JSON.parse(text) as T;
}

/** Persons follow `authors`; what concerns a hidden board or requirement goes with it. */
function reviewFor(review: Review, shown: readonly Requirement[], hidden: Hidden): Review {
  const person = (name: string) => (hidden.has('authors') ? NOT_NAMED : name);
  const visible = ({ board, requirement }: Concession) =>
    !hidden.board(board) && shown.some(({ id }) => id === requirement);
  const { decision } = review;
  const keepsDecision = decision !== undefined && !(decision.board !== undefined && hidden.board(decision.board));
  return {
    file: review.file,
    ...(keepsDecision ? { decision: { ...decision, by: person(decision.by) } } : {}),
    openPoints: review.openPoints.map((point) => ({ ...point, owner: person(point.owner) })),
    concessions: review.concessions.filter(visible).map((c) => ({ ...c, approver: person(c.approver) })),
    approvals: review.approvals.map(({ name, ...rest }) =>
      name === undefined || hidden.has('authors') ? rest : { ...rest, name },
    ),
    revisions: review.revisions.map((entry) => ({ ...entry, author: person(entry.author) })),
  };
}

/** Files that something shown was read from. Without hashes: one over a file with hidden entries would confirm a guess at them. */
function inputsFor(pack: Pack, boards: readonly Board[], review: Review | undefined): readonly InputFile[] {
  const files = new Set([pack.requirements.file, ...(review === undefined ? [] : [review.file])]);
  for (const board of boards) files.add(board.file);
  JSON.stringify(boards, (key, value: unknown) => {
    if (key === 'path' && typeof value === 'string' && value.includes(': ')) files.add(value.split(': ')[0]!);
    if (key === 'measured') files.add((value as MeasuredTexture).file);
    return value;
  });
  return pack.inputs.filter(({ path }) => files.has(path)).map(({ path }) => ({ path, sha256: NOT_GIVEN }));
}
