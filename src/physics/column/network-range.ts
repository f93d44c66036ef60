/** Says where a layout lies outside the range in which the network's constants were compared with full wave. */
import { SPEED_OF_LIGHT } from '../constants.js';
import type { ValidityFlag } from '../validity.js';
import type { ColumnGeometry, ColumnProblem } from './engine.js';
import type { NetworkConstants } from './network-constants.js';

const MODEL = 'edge network of the patch columns';

/** Terminated columns are not among them: patches between two lines were compared. */
const LAYOUTS: readonly { readonly name: string; readonly has: (column: ColumnGeometry) => boolean }[] = [
  { name: 'columns that run towards −x', has: (c) => c.direction === -1 },
  { name: 'matching sections', has: (c) => (c.matching?.length ?? 0) > 0 },
  { name: 'an inset feed', has: (c) => c.inset !== undefined },
  { name: 'a feed from the side', has: (c) => c.sideFeed !== undefined },
];

export function networkFlags(problem: ColumnProblem, frequency: number, constants: NetworkConstants): ValidityFlag[] {
  const { range } = constants;
  const { slab, columns } = problem;
  const flags: ValidityFlag[] = [];
  const check = (code: string, what: string, values: readonly number[], limits: readonly [number, number]): void => {
    const low = Math.min(...values);
    const high = Math.max(...values);
    if (low >= limits[0] * (1 - 1e-9) && high <= limits[1] * (1 + 1e-9)) return;
    const found = low === high ? low.toPrecision(3) : `${low.toPrecision(3)} to ${high.toPrecision(3)}`;
    flags.push({
      code,
      severity: 'outside',
      model: MODEL,
      text: `${what} is ${found}; the constants of the network were compared with full wave from ${limits[0]} to ${limits[1]}. Reflection, beam direction and gain may err by more than stated.`,
    });
  };
  const electrical = (2 * Math.PI * frequency * slab.height) / SPEED_OF_LIGHT;
  check('column.k0h', 'Electrical height k0h of the laminate', [electrical], range.electricalHeight);
  check('column.permittivity', 'Permittivity of the laminate', [slab.permittivity], range.permittivity);
  const widths = columns.flatMap((c) => c.patches.map((p) => p.width * 1e3));
  check('column.patch-width', 'Patch width in mm', widths, [range.patchWidth[0] * 1e3, range.patchWidth[1] * 1e3]);
  const lines = columns.flatMap((c) => [c.feedLineWidth, ...c.links.map((l) => l.width)]).map((w) => w / slab.height);
  check('column.line-width', 'Line width over laminate height', lines, range.lineWidthOverHeight);
  const kinds = LAYOUTS.filter(({ has }) => columns.some(has)).map(({ name }) => name);
  if (kinds.length > 0)
    flags.push({
      code: 'column.layout',
      severity: 'outside',
      model: MODEL,
      text: `The layout has ${kinds.join(', ')}: the network was not compared with full wave there. Reflection, beam direction and gain may err by more than stated.`,
    });
  return flags;
}
