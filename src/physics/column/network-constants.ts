/**
 * Constants of the edge network: found by others of this project's authors by fitting independent full-wave solutions of
 * isolated patches and one-patch two-ports, and stated to hold in `range`.
 */
export interface NetworkConstants {
  readonly source: string;
  readonly stepReactance: number;
  readonly cavityWidening: number;
  readonly edgeMoment: number;
  readonly coveredMoment: number;
  readonly modeConductance: number;
  readonly openEnd: number;
  readonly coveredSusceptance: number;
  readonly range: {
    readonly electricalHeight: readonly [number, number];
    readonly permittivity: readonly [number, number];
    readonly patchWidth: readonly [number, number];
    readonly lineWidthOverHeight: readonly [number, number];
  };
}

export const NETWORK_CONSTANTS: NetworkConstants = {
  source: 'fit to independent full-wave solutions of single patches and one-patch two-ports, 71 to 83 GHz, 2026',
  /** Step reactance over that of the planar-cavity sum of higher modes. */
  stepReactance: 0.59,
  /** Weight of the patch's effective width in the cavity width: We = W + 0.4 (weff − W). */
  cavityWidening: 0.4,
  /** Magnetic moment of an edge over its effective width, before the mode sets the level. */
  edgeMoment: 0.893,
  /** Part of the attached line's effective width that it silences. */
  coveredMoment: 0.956,
  /**
   * Conductance of a patch's cavity mode over that of its macro current: from the resistance and Q of three edge-fed
   * patches on 0.1 to 0.2 mm. The same patches driven at a gap, without lines, gave 0.90 to 0.95.
   */
  modeConductance: 0.88,
  /**
   * Open-end length over that of Kirschning, Jansen and Koster. The fit on isolated patches gave 1.094; 1.115, found on
   * columns of two laminates, halves the error of column reflections and held on laminates and layouts kept apart.
   */
  openEnd: 1.115,
  /** Part of the open-end susceptance that an attached line removes, per effective width ratio. */
  coveredSusceptance: 1.249,
  range: {
    /** k0 h */
    electricalHeight: [0.16, 0.33],
    permittivity: [2.9, 3.6],
    /** m */
    patchWidth: [0.5e-3, 1.45e-3],
    /** w/h of feed line and links */
    lineWidthOverHeight: [0.6, 1.7],
  },
};
