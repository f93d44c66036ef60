import type { RevisionData } from './previous.js';

type Verdict = RevisionData['verdicts'][number];

/** A status, and for what only a test decides what the calculation says. */
export interface Stand {
  readonly status: string;
  readonly calculated?: string | undefined;
}

export interface Flip {
  readonly boardId: string;
  /** Absent for the overall status of the board. */
  readonly requirementId?: string;
  readonly from: Stand;
  readonly to: Stand;
}

/** A worst value that is not what it was. */
export interface Move {
  readonly before: Verdict;
  readonly now: Verdict;
  /** How the margin changed; absent where the value is text. */
  readonly change?: number;
}

export interface ListChange {
  readonly added: readonly string[];
  readonly removed: readonly string[];
  readonly changed: readonly string[];
}

/** What differs between two revisions of a pack. */
export interface Changes {
  readonly flips: readonly Flip[];
  /** Figures that moved beyond the uncertainty that either revision states. */
  readonly moved: readonly Move[];
  /** Figures that moved, but not that far. */
  readonly within: number;
  readonly unchanged: number;
  /** Verdicts on both sides without figures that can be compared: not evaluated, or the requirement is another. */
  readonly notComparable: number;
  readonly boards: ListChange;
  readonly requirements: ListChange;
  readonly inputs: ListChange;
  readonly programVersion: { readonly from: string; readonly to: string };
}

export function changesBetween(before: RevisionData, now: RevisionData): Changes {
  const requirements = listChange(
    before.requirements.map((r) => [r.id, comparable(r)]),
    now.requirements.map((r) => [r.id, comparable(r)]),
  );
  const earlier = new Map(before.verdicts.map((verdict) => [keyOf(verdict), verdict]));
  const pairs = now.verdicts.flatMap((verdict) => {
    const old = earlier.get(keyOf(verdict));
    return old === undefined ? [] : [{ before: old, now: verdict }];
  });
  const compared = pairs.map((pair) => ({
    ...pair,
    ...(requirements.changed.includes(pair.now.requirementId) ? { kind: 'not comparable' as const } : movement(pair)),
  }));
  const number = (kind: string) => compared.filter((pair) => pair.kind === kind).length;
  return {
    flips: [...overallFlips(before, now), ...pairs.flatMap(verdictFlip)],
    moved: compared.flatMap(({ kind, ...move }) => (kind === 'beyond' ? [move] : [])),
    within: number('within'),
    unchanged: number('unchanged'),
    notComparable: number('not comparable'),
    boards: listChange(
      before.boards.map((board) => [board.id, '']),
      now.boards.map((board) => [board.id, '']),
    ),
    requirements,
    inputs: listChange(
      before.inputs.map((file) => [file.path, file.sha256]),
      now.inputs.map((file) => [file.path, file.sha256]),
    ),
    programVersion: { from: before.programVersion, to: now.programVersion },
  };
}

const keyOf = ({ boardId, requirementId }: Verdict): string => JSON.stringify([boardId, requirementId]);

/** What a requirement demands; its words and its source may be put better without changing that. */
function comparable({ text: _text, source: _source, ...rest }: RevisionData['requirements'][number]): string {
  return JSON.stringify(Object.entries(rest).sort(([a], [b]) => (a < b ? -1 : 1)));
}

type Pairs = readonly (readonly [name: string, content: string])[];

function listChange(before: Pairs, now: Pairs): ListChange {
  const [old, next] = [new Map(before), new Map(now)];
  return {
    added: now.flatMap(([name]) => (old.has(name) ? [] : [name])),
    removed: before.flatMap(([name]) => (next.has(name) ? [] : [name])),
    changed: now.flatMap(([name, content]) => (old.has(name) && old.get(name) !== content ? [name] : [])),
  };
}

function overallFlips(before: RevisionData, now: RevisionData): Flip[] {
  const earlier = new Map(before.boards.map((board) => [board.id, board.overall]));
  return now.boards.flatMap(({ id, overall }) => {
    const from = earlier.get(id);
    return from === undefined || from === overall
      ? []
      : [{ boardId: id, from: { status: from }, to: { status: overall } }];
  });
}

function verdictFlip({ before, now }: { readonly before: Verdict; readonly now: Verdict }): Flip[] {
  if (before.status === now.status && before.calculated === now.calculated) return [];
  const stand = ({ status, calculated }: Verdict): Stand => ({ status, calculated });
  return [{ boardId: now.boardId, requirementId: now.requirementId, from: stand(before), to: stand(now) }];
}

type Movement =
  | { readonly kind: 'unchanged' | 'within' | 'not comparable' }
  | { readonly kind: 'beyond'; readonly change?: number };

/** Data carry 12 digits; less than this of a figure is the rounding of their last one. */
const ROUNDING = 1e-11;

/**
 * A figure has moved beyond its uncertainty when the worst value of one revision lies outside the interval that the
 * other states around its own. Margins are compared: under the same requirement they differ as the values do, and the
 * uncertainty is stated of them.
 */
function movement({ before, now }: { readonly before: Verdict; readonly now: Verdict }): Movement {
  if (before.unit !== now.unit || before.value === null || now.value === null) return { kind: 'not comparable' };
  if (typeof before.value === 'string' || typeof now.value === 'string') {
    return { kind: before.value === now.value ? 'unchanged' : 'beyond' };
  }
  const [old, next] = [marginOf(before), marginOf(now)];
  if (old === undefined || next === undefined) return { kind: 'not comparable' };
  const change = next.margin - old.margin;
  const scale = Math.max(Math.abs(before.value), Math.abs(old.margin), Math.abs(next.margin));
  if (Math.abs(change) <= ROUNDING * scale) return { kind: 'unchanged' };
  const room = change < 0 ? Math.min(old.adverse, next.favourable) : Math.min(old.favourable, next.adverse);
  return Math.abs(change) > room ? { kind: 'beyond', change } : { kind: 'within' };
}

/** Margin with its uncertainty, where both were evaluated. */
function marginOf({ margin, adverse, favourable }: Verdict) {
  return margin === null || adverse === null || favourable === null ? undefined : { margin, adverse, favourable };
}
