import { quoted } from '../quantity/index.js';
import { hiddenBy, hiddenFiles, packFor } from './audience.js';
import type { PackDocument } from './documents/pack-document.js';
import type { Audience, Pack } from './model.js';
import { nearest } from './nearest.js';
import type { Problem } from './problem.js';
import { type KnownIds, knownId, RuleReport } from './rules.js';
import type { Node } from './tree.js';

type Audiences = NonNullable<PackDocument['audiences']>;

/** What an audience hides must be there, something must be left, and nothing that is shown may name what is hidden. */
export function audienceRules(root: Node, audiences: Audiences, pack: Pack): readonly Problem[] {
  const report = new RuleReport(root);
  const kinds = {
    boards: known(pack.boards.map(({ id }) => id)),
    requirements: known(pack.requirements.requirements.map(({ id }) => id)),
    declared: known(declaredIds(pack)),
  };
  const seen = new Set<string>();
  audiences.forEach((audience, a) => {
    const { id, hide } = audience;
    if (seen.has(id)) report.at(['audiences', a, 'id'], `${quoted(id)} a second time`, 'an audience is named once');
    seen.add(id);
    hide.forEach((entry, i) => {
      const [kind, name] = entry.split('/') as [string, string | undefined];
      if (name === undefined) return;
      const singular = { boards: 'board', requirements: 'requirement', declared: 'declared property' }[kind] ?? kind;
      knownId(report, ['audiences', a, 'hide', i], name, singular, kinds[kind as keyof typeof kinds]);
    });
  });
  if (report.problems.length > 0) return report.problems;
  audiences.forEach((audience, a) => {
    leftRules(report, audience, a, pack);
  });
  return report.problems;
}

const known = (ids: readonly string[]): KnownIds => ({ ids: new Set(ids), complete: true });

function declaredIds({ boards }: Pack): string[] {
  return boards.flatMap(({ declared, stackUp: { strip, laminate, ground } }) =>
    [declared, strip.foil.declared, strip.finish.declared, laminate.material.declared, ground.foil.declared]
      .flat()
      .map(({ id }) => id),
  );
}

function leftRules(report: RuleReport, audience: Audience, a: number, pack: Pack): void {
  const copy = packFor(pack, audience);
  if (copy.boards.length === 0 || copy.requirements.requirements.length === 0) {
    const what = copy.boards.length === 0 ? 'board' : 'requirement';
    report.at(['audiences', a, 'hide'], `every ${what}`, `a copy holds at least one ${what}`);
    return;
  }
  const words = hiddenWords(pack, audience);
  const met = new Set<string>();
  walk(copy, '', (text, place) => {
    for (const { word, kind, pattern } of words) {
      if (met.has(`${place} ${word}`) || !pattern.test(text)) continue;
      met.add(`${place} ${word}`);
      report.at(
        ['audiences', a, 'hide'],
        `${kind} ${quoted(word)} hidden, and named in ${place}`,
        `nothing shown to ${audience.id} names what is hidden from it`,
        'Change that text, or hide it as well.',
      );
    }
  });
}

interface HiddenWord {
  readonly word: string;
  readonly kind: string;
  readonly pattern: RegExp;
}

/** Names that must not occur: hidden boards with their titles and files, hidden requirements, hidden authors. */
function hiddenWords(pack: Pack, audience: Audience): readonly HiddenWord[] {
  const hidden = hiddenBy(audience);
  const boards = pack.boards.filter(({ id }) => hidden.board(id));
  const of = (kind: string, words: readonly string[]) =>
    words.map((word) => {
      const literal = word.replace(/[.*+?^${}()|[\]\\]/g, '\\$&');
      return { word, kind, pattern: new RegExp(`(?<![\\p{L}\\p{N}-])${literal}(?![\\p{L}\\p{N}-])`, 'iu') };
    });
  return [
    ...of(
      'the board',
      boards.flatMap(({ id, title }) => [id, title]),
    ),
    ...of('the file', [...hiddenFiles(pack, hidden)]),
    ...of(
      'the requirement',
      pack.requirements.requirements.filter(hidden.requirement).map(({ id }) => id),
    ),
    ...of('the author', hidden.has('authors') ? pack.authors : []),
  ];
}

/** Every text of plain data with its place, written as `boards[side-3].title`. */
function walk(data: unknown, place: string, meet: (text: string, place: string) => void): void {
  if (typeof data === 'string') meet(data, place);
  else if (Array.isArray(data)) {
    data.forEach((item, i) => {
      const name = typeof item?.id === 'string' ? item.id : String(i);
      walk(item, `${place}[${name}]`, meet);
    });
  } else if (data !== null && typeof data === 'object') {
    for (const [key, value] of Object.entries(data)) walk(value, place === '' ? key : `${place}.${key}`, meet);
  }
}

/** The audience of a name, or what is wrong with the name. */
export function audienceOf(pack: Pack, packPath: string, name: string): Audience | Problem {
  const { audiences = [] } = pack;
  const found = audiences.find(({ id }) => id === name);
  if (found) return found;
  const ids = audiences.map(({ id }) => id);
  const close = nearest(name, ids);
  return {
    file: packPath,
    line: 1,
    column: 1,
    path: 'audiences',
    found: `no audience ${quoted(name)}`,
    allowed: ids.length === 0 ? 'the pack names no audience' : `the audiences of the pack are: ${ids.join(', ')}`,
    ...(close === undefined ? {} : { fix: `Did you mean ${close}?` }),
  };
}
