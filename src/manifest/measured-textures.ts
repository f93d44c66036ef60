import type { TextureConditions } from '../physics/texture/index.js';
import { formatQuantity, quoted } from '../quantity/index.js';
import { HIGHEST_ROUGHNESS, type MeasuredDocument, type TextureDocument } from './documents/texture-document.js';
import { type EvaluatedTexture, evaluatedTexture, type Measurements } from './evaluated-texture.js';
import { si } from './figures.js';
import type { Reader } from './open-files.js';
import { dotted, type Path } from './problem.js';
import { readTextureFile, type TextureFile } from './texture-files/index.js';
import { filtersAscend } from './texture-rules.js';
import { type Node, nodeAt, problemAt } from './tree.js';

/** Steepest area ratio that copper is believed to have. */
const LARGEST_SDR = 20;
const FEWEST_POINTS = 16;

const length = (metres: number): string => formatQuantity(metres, 'length');
const percent = (x: number): string => `${(100 * x).toPrecision(2)} %`;

/** Reads and evaluates the measured files that textures name, each once however many boards inherit it. */
export class MeasuredTextures {
  private readonly byDocument = new Map<MeasuredDocument, EvaluatedTexture>();
  private readonly bySetting = new Map<string, EvaluatedTexture | undefined>();

  constructor(private readonly reader: Reader) {}

  get all(): Measurements {
    return this.byDocument;
  }

  /** Takes a texture at a path of a manifest; the problems met go to the reader. */
  read(root: Node, path: Path, texture: TextureDocument | undefined): void {
    const doc = texture?.measured;
    const where: Path = [...path, 'measured', 'file'];
    const node = nodeAt(root, where);
    if (doc === undefined || node === undefined || !filtersAscend(doc)) return;
    // An inherited reference is relative to the file that it stands in.
    const opened = this.reader.openBytes({ path: node.mark.source.path, root }, where);
    if (opened === undefined) return;
    const conditions = conditionsOf(doc);
    const key = JSON.stringify([opened.path, conditions]);
    if (!this.bySetting.has(key)) this.bySetting.set(key, this.evaluate(opened, conditions, node, where));
    const evaluated = this.bySetting.get(key);
    if (evaluated) this.byDocument.set(doc, evaluated);
  }

  private evaluate(
    { path, bytes, sha256 }: Opened,
    conditions: TextureConditions,
    node: Node,
    where: Path,
  ): EvaluatedTexture | undefined {
    const read = readTextureFile(path, bytes);
    if ('problems' in read) {
      this.reader.problems.push(...read.problems);
      return undefined;
    }
    const name = node.kind === 'scalar' ? quoted(node.text) : quoted(path);
    const problem = (found: string, allowed: string, fix?: string): undefined => {
      this.reader.problems.push(problemAt(node.mark, dotted(where), found, allowed, fix));
      return undefined;
    };
    let evaluated: EvaluatedTexture;
    try {
      evaluated = evaluatedTexture(read.file, conditions, { file: path, sha256 });
    } catch (error) {
      if (!(error instanceof RangeError)) throw error;
      return problem(name, `with the filters stated, ${error.message}`, shorterFilter(read.file, conditions));
    }
    const { rq, developedAreaRatio } = evaluated;
    if (!(rq > 0)) return problem(`${name}, a flat surface`, 'a measured face has heights that differ');
    if (rq > HIGHEST_ROUGHNESS || (developedAreaRatio ?? 0) > LARGEST_SDR) {
      const found = `${name} with Rq ${length(rq)}${developedAreaRatio === undefined ? '' : ` and Sdr ${percent(developedAreaRatio)}`}`;
      return problem(
        found,
        `the roughness of a copper face is at most ${length(HIGHEST_ROUGHNESS)}, its area ratio at most ${percent(LARGEST_SDR)}`,
        'Are the units of heights and spacing right?',
      );
    }
    return evaluated;
  }
}

interface Opened {
  readonly path: string;
  readonly bytes: Uint8Array;
  readonly sha256: string;
}

function conditionsOf({ short_nesting_index: short, long_nesting_index: long }: MeasuredDocument): TextureConditions {
  return {
    ...(short === undefined ? {} : { shortFilter: si(short, 'length') }),
    ...(long === undefined ? {} : { longFilter: si(long, 'length') }),
  };
}

/** Filters cut half of the longest index off at either end: what the longest may be. */
function shorterFilter({ heights }: TextureFile, conditions: TextureConditions): string | undefined {
  const { longFilter, shortFilter } = conditions;
  const longest = Math.max(longFilter ?? 0, shortFilter ?? 0);
  const room =
    heights.kind === 'profile'
      ? (heights.profile.heights.length - FEWEST_POINTS) * heights.profile.spacing
      : Math.min(
          (heights.map.columns - FEWEST_POINTS) * heights.map.spacingX,
          (heights.map.rows - FEWEST_POINTS) * heights.map.spacingY,
        );
  return longest > room && room > 0 ? `State nesting indices below ${length(room)}.` : undefined;
}
