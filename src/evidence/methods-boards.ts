import type { Method } from './method.js';

/** Patch columns by the fast engine, and the far field. */
export const columnsMethods: readonly Method[] = [
  {
    id: 'column-network',
    name: 'Patch columns as one nodal network',
    whatItIs:
      'Nodes at all patch edges of the board and line sections between them; radiation of each patch by the admittances of its edges, coupling between patches by the reaction of their currents through the slab; one solution per frequency. Where an edge continues into a line, the line’s part of it is silenced and its open-end susceptance reduced.',
    source:
      'Transmission-line model of patches with edge admittances (A. G. Derneryd, 1976 and 1978, and later work), with corrections found against independent full-wave solutions',
    range:
      'k0h 0.05 to 0.43, permittivity 2.2 to 4, patch width 0.3 to 1.6 mm, line w/h 0.4 to 2; how close it comes there stands in the accuracy table. Flagged outside. Infinite slab and ground, no cover, no vias; lines and steps do not radiate; loss of the dielectric counts in the lines only',
  },
  {
    id: 'slab-kernel',
    name: 'Coupling through the grounded slab',
    whatItIs:
      'Potentials of magnetic edge currents and of electric patch currents on the slab, surface wave included, as Sommerfeld integrals tabulated over distance.',
    source:
      'D. M. Pozar, IEEE Trans. Antennas Propag. 30(6), 1982; J. R. Mosig and F. E. Gardiol, 1982 and 1985; K. A. Michalski and J. R. Mosig, 1997',
    range: 'Infinite slab and ground, no cover, below the cut-off of the second surface wave',
  },
  {
    id: 'step-reactance',
    name: 'Step between line and patch',
    whatItIs:
      'Series reactance from the higher transverse modes of the patch as a planar cavity, 7 to 18 Ω per junction.',
    source: 'Planar waveguide model with effective width; factor fitted to independent full-wave solutions',
    range: 'Range of the column network',
  },
  {
    id: 'far-field',
    name: 'Far field through the slab',
    whatItIs:
      'Currents of the board seen through the slab, TE and TM by transmission-line factors; directivity by integration over the half space, cross polarisation after the third definition of Ludwig. Gain is directivity times the efficiency of the engine’s own power balance.',
    source: 'Reciprocity and stationary phase, D. M. Pozar, 1982; A. C. Ludwig, 1973; terms of IEEE Std 145-2013',
    range:
      'Infinite ground: nothing below the horizon, no edge diffraction. How field plus surface wave compare with the circuit’s power on the lossless board is printed per board',
  },
  {
    id: 'surface-wave',
    name: 'Surface wave by residue',
    whatItIs: 'Power in the TM0 mode of the slab from the residue at its pole, for all currents together.',
    source: 'D. M. Pozar, 1982; residue calculus',
    range:
      'Below the cut-off of TE1 (417 GHz at 0.127 mm and permittivity 3). Counted as lost; a finite board radiates part of it again',
  },
];

/** What is asked of suppliers. */
export const suppliersMethods: readonly Method[] = [
  {
    id: 'allowance',
    name: 'Allowance of one item by root finding',
    whatItIs:
      'The value of one item, moved alone, at which the first binding requirement stops meeting under each estimate of the roughness band: growing steps from nominal, then a bracketed root.',
    source:
      'R. P. Brent, Algorithms for Minimization without Derivatives, 1973, chapter 4; rule of combination as in the verdict',
    range:
      'Band edges and centre at the lowest, nominal and highest temperature; to 2 % of the distance from nominal. A failure that recovers within a step is not seen; items that move together are not searched',
  },
  {
    id: 'success-run',
    name: 'Sample size without failures',
    whatItIs: 'n = ln(1 − C)/ln R, rounded up: pieces of which none may fail, for confidence C and reliability R.',
    source: 'Binomial distribution; success-run formula of reliability handbooks',
    range: 'Pieces drawn at random from one population; says nothing of how far a value lies from its limit',
  },
];
