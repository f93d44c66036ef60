/** One method that figures of a dossier rest on, for the evidence page. */
export interface Method {
  readonly id: string;
  readonly name: string;
  /** What it yields, in a sentence. */
  readonly whatItIs: string;
  readonly source: string;
  /** Where it holds, and how far off it is known to be there. */
  readonly range: string;
}

const copper: readonly Method[] = [
  {
    id: 'copper-temperature',
    name: 'Conductivity with temperature',
    whatItIs: 'Resistance of the metal rises linearly about 20 °C.',
    source: 'IEC 60028:1925 for annealed copper, 0.00393 1/K',
    range: '−50 to 150 °C, within 1 % of resistance; pure metals',
  },
  {
    id: 'skin-effect',
    name: 'Surface impedance of smooth metal',
    whatItIs: 'Complex impedance of a plane conductor, half space or sheet.',
    source: 'D. M. Pozar, Microwave Engineering, 4th ed., 2012, chapter 1',
    range: 'Good conductor, normal skin effect; the anomalous one adds 0.3 % to copper at 77 GHz',
  },
  {
    id: 'finish-layers',
    name: 'Finish layers by impedance recursion',
    whatItIs: 'Each plated layer transforms the impedance below it as a short lossy line, from the copper outward.',
    source: 'Transmission-line analogy of plane waves in layers, any text',
    range:
      'Flat layers without interdiffusion; conductivity and permeability as stated. On rough faces the texture of an equal half space is laid over the flat result, an approximation of our own',
  },
  {
    id: 'hammerstad',
    name: 'Roughness, Hammerstad',
    whatItIs: 'Loss factor 1 + (2/π) atan(1.4 (Rq/δ)²); no phase: reactance completed as X = K, no plane shift.',
    source: 'E. O. Hammerstad and F. Bekkadal, 1975; Hammerstad and Jensen, IEEE MTT-S Digest 1980',
    range:
      '60° grooves across the current: 2 % up to Rq/δ 1.2, 5 % beyond. Saturated above Rq/δ 2.1: it then cannot rank foils',
  },
  {
    id: 'groiss',
    name: 'Roughness, Groiss',
    whatItIs: 'Loss factor 1 + exp(−(δ/2Rq)^1.6); no phase: reactance completed as X = K, no plane shift.',
    source: 'S. Groiss et al., IEEE Trans. Magn. 32(3), 1996, pp. 894–897',
    range: 'Rq/δ above 0.3; within 9 % of solved piles of touching balls. Saturated above Rq/δ 2.04',
  },
  {
    id: 'gradient',
    name: 'Roughness, gradient model',
    whatItIs:
      'Complex impedance of a conductivity that rises through the profile as the distribution of heights, with magnetic and electrostatic plane; the wave equation is solved to 1e-6.',
    source: 'G. Gold and K. Helmreich, IMS 2015; IEEE Trans. Microwave Theory Tech. 65(10), 2017',
    range:
      'Texture much finer than the skin depth, current along it. Upper side of the band: 1.1 to 1.36 times the loss of solved compact shapes at Rq/δ 1, 1.4 to 2 times at 2. Its plane shift stems from the tail of the normal distribution',
  },
];

const lines: readonly Method[] = [
  {
    id: 'microstrip-static',
    name: 'Microstrip, static',
    whatItIs: 'Impedance and effective permittivity of a strip with thickness.',
    source: 'E. Hammerstad and Ø. Jensen, IEEE MTT-S Digest 1980, pp. 407–409',
    range:
      'w/h 0.01 to 100, permittivity up to 128; 0.2 % in permittivity, 0.1 % in impedance against independent sections',
  },
  {
    id: 'microstrip-dispersion',
    name: 'Microstrip, dispersion',
    whatItIs: 'Effective permittivity and power-current impedance at a frequency.',
    source: 'M. Kirschning and R. H. Jansen, Electron. Lett. 18(6), 1982; R. H. Jansen and M. Kirschning, AEÜ 37, 1983',
    range:
      'w/h 0.1 to 10, permittivity 1 to 18, height to 0.1 wavelength. At 77 GHz −0.57 to +0.13 % in permittivity, −0.53 to +0.16 % in impedance; biased low on narrow lines',
  },
  {
    id: 'impedance-hammerstad-jensen',
    name: 'Impedance dispersion, cross-check',
    whatItIs:
      'Static impedance times sqrt(e0/ef) (ef − 1)/(e0 − 1): a second opinion on the line impedance, not used in figures.',
    source: 'E. Hammerstad and Ø. Jensen, IEEE MTT-S Digest 1980',
    range: '1.5 to 3 % above the power-current impedance at 77 GHz on 0.1 to 0.2 mm',
  },
  {
    id: 'wheeler',
    name: 'Current shares of the faces',
    whatItIs: 'Series resistance of each face by receding its wall alone: underside, top, edges, ground.',
    source: 'H. A. Wheeler, Proc. IRE 30(9), 1942, on the line of Hammerstad and Jensen',
    range: 'Strip thicker than four skin depths, quasi-static: total 1 % high, shares within 0.4 points',
  },
  {
    id: 'current-crowding',
    name: 'Crowding of the currents with frequency',
    whatItIs: 'Ground weight and the split between underside and top carried to the frequency in the spectral domain.',
    source: 'Own derivation; checked against independent full-wave solutions at 24 and 77 GHz',
    range:
      '0.1 to 0.2 mm, w/h 1.3 to 10: ground loss within 0.5 % (2 % at w/h 10), whole conductor loss within 0.7 % (3 % low at w/h 10). The strip’s total is scaled as the impedance, within 1 %',
  },
  {
    id: 'dielectric-filling',
    name: 'Dielectric loss',
    whatItIs: 'Loss tangent times the share of the capacitance in the substrate, with the dispersive permittivity.',
    source: 'M. V. Schneider, Bell Syst. Tech. J. 48(5), 1969',
    range: '1.5 to 4 % below full wave at 77 GHz',
  },
  {
    id: 'open-end',
    name: 'Open end of a microstrip',
    whatItIs: 'Length by which an open end appears longer, with the effective permittivity at the frequency.',
    source: 'M. Kirschning, R. H. Jansen and N. H. L. Koster, Electron. Lett. 17(3), 1981',
    range: 'w/h 0.01 to 100, permittivity to 50, 2.5 % quasi-static; full wave lies 0 to 8 % above it at 77 GHz',
  },

  {
    id: 'thick-end',
    name: 'Open end of thick metal',
    whatItIs:
      'Thickness adds the same capacitance per length of edge to the end of a wide line as to its side; of the side it is known from the cross-section.',
    source: 'Own argument on the line of Hammerstad and Jensen; the engine is otherwise compared at zero thickness',
    range:
      'Widths of several heights. Lowers patch resonance by 0.4 % for 18 µm and 0.6 % for 35 µm on 0.127 mm; not compared with a solution of thick patches',
  },
];

const columns: readonly Method[] = [
  {
    id: 'column-network',
    name: 'Patch columns as one nodal network',
    whatItIs:
      'Nodes at all patch edges of the board, line sections between them, self and mutual admittances of all edges; one solution per frequency. Where an edge continues into a line, the line’s part of it is silenced and its open-end susceptance reduced.',
    source:
      'Transmission-line model of patches with edge admittances (A. G. Derneryd, 1976 and 1978, and later work), with five corrections found against independent full-wave solutions',
    range:
      'k0h 0.16 to 0.33, permittivity 2.9 to 3.6, patch width 0.5 to 1.45 mm, line w/h 0.6 to 1.7. There: resonance within 0.3 %, reflection |ΔS11| 0.02 to 0.12, tilt 0.2 to 0.6°, sidelobes 0.3 to 0.7 dB (uniform) or 1.7 to 1.9 dB (tapered). Constants provisional; flagged outside',
  },
  {
    id: 'slab-kernel',
    name: 'Edge coupling through the grounded slab',
    whatItIs:
      'Potentials of magnetic line currents on the slab, surface wave included, as Sommerfeld integrals tabulated over distance; admittance of every pair of edges by line integrals.',
    source:
      'D. M. Pozar, IEEE Trans. Antennas Propag. 30(6), 1982; J. R. Mosig and F. E. Gardiol, 1982 and 1985; K. A. Michalski and J. R. Mosig, 1997',
    range: 'Infinite slab and ground, no cover. Coupling between columns comes out 1.6 to 2.8 dB too strong',
  },
  {
    id: 'step-reactance',
    name: 'Step between line and patch',
    whatItIs:
      'Series reactance from the higher transverse modes of the patch as a planar cavity, 7 to 18 Ω per junction.',
    source: 'Planar waveguide model with effective width; factor 0.59 fitted to independent full-wave solutions',
    range: 'Range of the column network',
  },
  {
    id: 'far-field',
    name: 'Far field of the edges',
    whatItIs:
      'Magnetic edge currents seen through the slab, TE and TM by transmission-line factors; directivity by integration over the half space. Gain is directivity times the efficiency of the circuit.',
    source: 'Reciprocity and stationary phase, D. M. Pozar, 1982; terms of IEEE Std 145-2013',
    range:
      'Infinite ground: nothing below the horizon, no edge diffraction. Field plus surface wave equals the circuit’s power within 1 % on lossless boards, printed per board',
  },
  {
    id: 'surface-wave',
    name: 'Surface wave by residue',
    whatItIs: 'Power in the TM0 mode of the slab from the residue at its pole, for the edges together.',
    source: 'D. M. Pozar, 1982; residue calculus',
    range:
      'Below the cut-off of TE1 (417 GHz at 0.127 mm and permittivity 3). Counted as lost; a finite board radiates part of it again',
  },
];

/** Every method in the program, grouped copper, lines, columns. */
export const methods: readonly Method[] = [...copper, ...lines, ...columns];
