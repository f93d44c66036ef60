import { parseTouchstone, TouchstoneError, transitionOf } from '../physics/feed/index.js';
import { formatQuantity, quoted } from '../quantity/index.js';
import type { FeedDocument } from './documents/feed-document.js';
import { LARGEST_FILE } from './files.js';
import type { Transition } from './model.js';
import type { Reader } from './open-files.js';
import { dotted, type Path, type Problem } from './problem.js';
import { type Node, nodeAt, problemAt } from './tree.js';

export type TransitionDocument = NonNullable<NonNullable<FeedDocument['network']>['transition']>;
export type Transitions = ReadonlyMap<TransitionDocument, Transition>;

interface Band {
  readonly low: number;
  readonly high: number;
}

const WHERE: Path = ['feed', 'network', 'transition', 'file'];
/** What a network analyser's own error may add to the power of a passive part. */
const PASSIVE = 1.05;
/** A band edge and a point of a file that are one decimal number may differ in the last bits. */
const ROUNDING = 1e-9;
/** Points beyond the band that interpolation inside it may want, at either end. */
const BEYOND = 4;

const frequency = (hertz: number): string => formatQuantity(hertz, 'frequency');

/** Reads the two-port files that feed networks name; the problems met go to the reader. */
export class TransitionFiles {
  private readonly byDocument = new Map<TransitionDocument, Transition>();

  constructor(private readonly reader: Reader) {}

  get all(): Transitions {
    return this.byDocument;
  }

  /** @param band of the board, which the data must cover: nothing is continued beyond them */
  read(root: Node, doc: TransitionDocument | undefined, band: Band): void {
    const node = nodeAt(root, WHERE);
    if (doc === undefined || node === undefined) return;
    const problem = (found: string, allowed: string, fix?: string): void => {
      this.reader.problems.push(problemAt(node.mark, dotted(WHERE), `${quoted(doc.file)}, ${found}`, allowed, fix));
    };
    if (!/\.s2p$/i.test(doc.file)) return void problem('another kind of file', 'a Touchstone file of a two-port, .s2p');
    // An inherited reference is relative to the file that it stands in.
    const opened = this.reader.openBytes({ path: node.mark.source.path, root }, WHERE);
    if (opened === undefined) return;
    if (opened.bytes.length > LARGEST_FILE)
      return void problem(`${opened.bytes.length} bytes`, `a Touchstone file here has at most ${LARGEST_FILE} bytes`);
    const read = twoPort(opened.path, opened.bytes);
    if ('problem' in read) return void this.reader.problems.push(read.problem);
    const { points } = read.transition;
    const [first, last] = [points[0]!.frequency, points.at(-1)!.frequency];
    if (first > band.low * (1 + ROUNDING) || last < band.high * (1 - ROUNDING))
      return void problem(
        `data from ${frequency(first)} to ${frequency(last)}`,
        `the data cover the band of the board, ${frequency(band.low)} to ${frequency(band.high)}`,
      );
    const active = points.find(({ s }) => largestGain(s) > PASSIVE);
    if (active)
      return void problem(
        `a gain of power of ${largestGain(active.s).toPrecision(3)} at ${frequency(active.frequency)}`,
        'a transition is passive',
        'Is the format in its option line, RI, MA or DB, right?',
      );
    this.byDocument.set(doc, within(read.transition, band));
  }
}

function twoPort(file: string, bytes: Uint8Array): { readonly transition: Transition } | { readonly problem: Problem } {
  try {
    // Comments may be in any encoding; the data are ASCII.
    const table = parseTouchstone(new TextDecoder('utf-8').decode(bytes), 2);
    return { transition: { file, ...transitionOf(table) } };
  } catch (error) {
    if (!(error instanceof TouchstoneError)) throw error;
    const [found, ...allowed] = error.message.replace(/^found /, '').split('; ');
    return {
      problem: {
        file,
        line: error.line,
        column: 1,
        path: '',
        found: found!,
        allowed: allowed.join('; ') || 'a Touchstone file of version 1 with the data of a two-port',
      },
    };
  }
}

/** Largest ratio of the power that leaves both ports to the power that enters: the square of S's largest singular value. */
function largestGain(s: Transition['points'][number]['s']): number {
  const [[a, b], [c, d], [e, f], [g, h]] = s as [Pair, Pair, Pair, Pair];
  const power = s.reduce((sum, [re, im]) => sum + re * re + im * im, 0);
  // |S11 S22 − S21 S12|²
  const determinant = (a * g - b * h - c * e + d * f) ** 2 + (a * h + b * g - c * f - d * e) ** 2;
  return (power + Math.sqrt(Math.max(0, power * power - 4 * determinant))) / 2;
}
type Pair = readonly [number, number];

/** A model holds what the band needs of a long file: every task of a study carries it. */
function within({ points, ...rest }: Transition, { low, high }: Band): Transition {
  const after = points.findIndex(({ frequency: f }) => f >= low);
  const before = points.findLastIndex(({ frequency: f }) => f <= high);
  return { ...rest, points: points.slice(Math.max(0, after - BEYOND), before + 1 + BEYOND) };
}
