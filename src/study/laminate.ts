/** The laminate of a board at a frequency and temperature, and what was assumed of it. */
import type { Board } from '../manifest/model.js';
import { laminateAt } from '../physics/material/index.js';
import type { ValidityFlag } from '../physics/validity.js';
import { equivalentPermittivity } from './in-plane.js';
import type { BoardValues } from './values.js';

export interface LaminateNow {
  /** For the columns; where the laminate is not the same in its plane, equivalent for the widest patch. */
  readonly permittivity: number;
  /** For the feed line, equivalent for its width. */
  readonly linePermittivity: number;
  readonly lossTangent: number;
  readonly flags: readonly ValidityFlag[];
}

/**
 * Permittivity and loss tangent are each carried from the frequency of their own statement by the causal dispersion of a
 * laminate of nearly constant loss tangent; one stated without a frequency is used as it stands.
 */
export function laminateNow(board: Board, values: BoardValues, frequency: number, temperatureC: number): LaminateNow {
  const { material } = board.stackUp.laminate;
  const rise = temperatureC - board.temperature.nominalC;
  const { permittivityPerShare = 0, lossTangentPerShare = 0 } = material.water ?? {};
  const permittivity =
    values.permittivity *
    (1 + values.permittivityTemperatureCoefficient * rise + permittivityPerShare * values.waterShare);
  const lossTangent =
    values.lossTangent * (1 + values.lossTangentTemperatureCoefficient * rise) +
    lossTangentPerShare * values.waterShare;
  const { frequency: permittivityAt } = material.permittivity.provenance;
  const { frequency: lossAt } = material.lossTangent.provenance;
  const carried = (tangent: number, from: number, to: number) =>
    laminateAt({ permittivity, lossTangent: tangent, frequency: from }, { frequency: to });
  const loss = lossAt === undefined ? undefined : carried(lossTangent, lossAt, frequency);
  const tangentAt = (f: number): number =>
    lossAt === undefined ? lossTangent : carried(lossTangent, lossAt, f).lossTangent;
  const through =
    permittivityAt === undefined ? undefined : carried(tangentAt(permittivityAt), permittivityAt, frequency);
  const now = through?.permittivity ?? permittivity;
  const equivalent = (width: number): number =>
    values.inPlanePermittivity === undefined
      ? now
      : now *
        (equivalentPermittivity(width, values.height, values.permittivity, values.inPlanePermittivity) /
          values.permittivity);
  return {
    permittivity: equivalent(widestPatch(board) + values.etch),
    linePermittivity: equivalent(board.columns[0].feedLine.width + values.etch),
    lossTangent: loss?.lossTangent ?? lossTangent,
    flags: [...(loss?.flags ?? []), ...(through?.flags ?? [])],
  };
}

const widestPatch = ({ columns }: Board): number =>
  Math.max(...columns.flatMap(({ patches }) => patches.map(({ width }) => width)));

/** What was assumed of the laminate because its data sheet does not say it. */
export function laminateAssumptions(board: Board): ValidityFlag[] {
  const { material } = board.stackUp.laminate;
  const note = (code: string, text: string): ValidityFlag => ({
    code: `laminate.${code}`,
    severity: 'note',
    model: 'laminate',
    text,
  });
  const without = [
    ...(material.permittivity.provenance.frequency === undefined ? ['permittivity'] : []),
    ...(material.lossTangent.provenance.frequency === undefined ? ['loss tangent'] : []),
  ];
  const list: ValidityFlag[] = [];
  if (without.length > 0)
    list.push(
      note(
        'no-frequency',
        `No frequency is stated for the ${without.join(' and the ')} of ${material.name}: used as it stands, without dispersion. From 10 to 77 GHz a loss tangent of 0.003 lowers the permittivity by 0.4 %.`,
      ),
    );
  if (material.inPlanePermittivity === undefined)
    list.push(
      note(
        'in-plane-unknown',
        `The permittivity of ${material.name} in the plane of the board is not stated: taken as equal to that through the thickness. One 10 % higher would raise the effective permittivity of a narrow line by 1.5 % and of a patch by 0.4 % (0.127 mm, permittivity 3).`,
      ),
    );
  if (material.permittivity.provenance.direction === 'in-plane')
    list.push(
      note(
        'direction',
        `The permittivity of ${material.name} was taken in the plane of the board; lines and patches store most of their field through the thickness, for which it is used here.`,
      ),
    );
  return list;
}
