/**
 * The numbers of a board that physics needs, apart from their provenance. Where they come from: `places.ts`; their nominal
 * state: `nominal-values.ts`; what moves them: `tolerances.ts`.
 */
import type { Texture } from '../manifest/model.js';
import type { Lay } from '../physics/roughness/index.js';

/** What is known of the texture of one face, SI. Entries that are absent are not known; see physics/roughness. */
export interface FaceTexture {
  readonly rq: number;
  readonly correlationLength?: number;
  readonly developedAreaRatio?: number;
  readonly rz?: number;
  readonly lay?: Lay;
  readonly nodule?: { readonly radius: number; readonly pitch: number; readonly layers: number };
}

/** SI. One record, so that a tolerance is one changed entry. */
export interface BoardValues {
  /** As stated, at the frequency of its statement, nominal temperature, dry. */
  readonly permittivity: number;
  readonly lossTangent: number;
  readonly permittivityTemperatureCoefficient: number;
  readonly lossTangentTemperatureCoefficient: number;
  /** Share of mass; 0 as stated. */
  readonly waterShare: number;
  /** Absent: equal to `permittivity`. */
  readonly inPlanePermittivity?: number;
  readonly height: number;
  readonly stripThickness: number;
  /** Total growth of every copper outline, m. */
  readonly etch: number;
  readonly stripConductivity: number;
  readonly groundConductivity: number;
  readonly underside: FaceTexture;
  readonly outer: FaceTexture;
  readonly ground: FaceTexture;
  readonly finishConductivity: readonly number[];
  readonly finishThickness: readonly number[];
  /** Absent without a cover layer. */
  readonly cover?: { readonly permittivity: number; readonly lossTangent: number; readonly thickness: number };
  /** Given loss of each feed path, dB; 0 where it is computed from a line. */
  readonly feedLossDb: readonly number[];
}

/** A texture at its nominal figures. */
export function faceTexture({ rq, correlationLength, developedAreaRatio, rz, lay, nodule }: Texture): FaceTexture {
  return {
    rq: rq.value,
    ...(correlationLength ? { correlationLength: correlationLength.value } : {}),
    ...(developedAreaRatio ? { developedAreaRatio: developedAreaRatio.value } : {}),
    ...(rz ? { rz: rz.value } : {}),
    ...(lay ? { lay } : {}),
    ...(nodule ? { nodule: { radius: nodule.radius.value, pitch: nodule.pitch.value, layers: nodule.layers } } : {}),
  };
}
