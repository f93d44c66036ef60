/** What a reader must know of the validity of a board's figures, each cause once. */
import type { Board } from '../manifest/model.js';
import type { ValidityFlag } from '../physics/validity.js';
import { laminateAssumptions } from './laminate.js';
import type { Confirmation } from './results.js';
import { FACE_WORDS, type FacePlace } from './surfaces.js';
import type { TaskResult } from './task.js';

/**
 * Of the board as drawn, under every view that stands behind a figure; a tolerance limit just outside a range would only
 * repeat it. What had to be left out of a texture at such a limit is said all the same.
 */
export function boardFlags(board: Board, results: readonly TaskResult[], confirmation: Confirmation): ValidityFlag[] {
  const drawn = results.filter(({ sweep }) => !sweep.id.startsWith('tolerance-'));
  const found = [
    ...laminateAssumptions(board),
    ...coverAssumptions(board),
    ...drawn.flatMap(({ flags }) => flags),
    ...(confirmation.kind === 'full wave' ? confirmation.flags : []),
    ...results.flatMap(({ flags }) => flags.filter(({ code }) => code.startsWith('texture.'))),
  ];
  const first = new Map<string, ValidityFlag>();
  for (const flag of found) if (!first.has(flag.code)) first.set(flag.code, flag);
  return mergeFaces([...first.values()]);
}

/** Flags of two faces that say the same become one that names both. */
function mergeFaces(flags: readonly ValidityFlag[]): ValidityFlag[] {
  const merged = new Map<string, { readonly flag: ValidityFlag; readonly places: FacePlace[] }>();
  for (const flag of flags) {
    const [cause, place] = flag.code.split('@') as [string, FacePlace | undefined];
    const key = JSON.stringify([cause, flag.text]);
    const known = merged.get(key);
    if (known === undefined)
      merged.set(key, { flag: { ...flag, code: cause }, places: place === undefined ? [] : [place] });
    else if (place !== undefined) known.places.push(place);
  }
  return [...merged.values()].map(({ flag, places }) =>
    places.length === 0
      ? flag
      : {
          ...flag,
          code: `${flag.code}.${places.join('+')}`,
          model: `${flag.model} (${places.map((place) => FACE_WORDS[place]).join(', ')})`,
        },
  );
}

function coverAssumptions({ stackUp: { cover } }: Board): ValidityFlag[] {
  if (!cover) return [];
  return [
    {
      code: 'line.cover-flat',
      severity: 'note',
      model: 'microstrip, section and full wave',
      text: `The cover layer (${cover.material}) is taken as flat, with its whole thickness above the laminate. One of the same amount that follows the strip raises the permittivity by about a seventh less (6.5 instead of 7.6 % for solder mask).`,
    },
  ];
}
