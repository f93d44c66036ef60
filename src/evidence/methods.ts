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
    whatItIs: 'Loss factor 1 + (2/π) atan(1.4 (Rq/δ)²); no phase: reactance completed by causality, no plane shift.',
    source: 'E. O. Hammerstad and F. Bekkadal, 1975; Hammerstad and Jensen, IEEE MTT-S Digest 1980',
    range:
      '60° grooves across the current: 2 % up to Rq/δ 1.2, 5 % beyond. Saturated above Rq/δ 2.1: it then cannot rank foils',
  },
  {
    id: 'groiss',
    name: 'Roughness, Groiss',
    whatItIs: 'Loss factor 1 + exp(−(δ/2Rq)^1.6); no phase: reactance completed by causality, no plane shift.',
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
  {
    id: 'causal-reactance',
    name: 'Reactance of loss-only roughness models',
    whatItIs:
      'The least reactance that causality demands of a loss factor, in closed form for Hammerstad and by quadrature for Groiss. Any plane shift may be added to it and no loss can tell.',
    source:
      'Kramers–Kronig; H. W. Bode, Network Analysis and Feedback Amplifier Design, 1945. Closed form: own derivation',
    range:
      'As the loss factor. Refers to the plane of the currents at very high frequency, which such a model does not know; taken as the mean plane',
  },
  {
    id: 'hall',
    name: 'Roughness, Hall’s hemispheres',
    whatItIs:
      'Loss of hemispherical bosses from radius and pitch, held at 1 or above; reactance as for the sphere term.',
    source: 'S. Hall, S. G. Pytel, P. G. Huray et al., IEEE Trans. Microwave Theory Tech. 55(12), 2007',
    range:
      'Radius from 1.5 skin depths, pitch from 3 radii: 3 % low to 9 % high against solved hemispheres. No plane of its own, taken as the mean plane',
  },
  {
    id: 'huray',
    name: 'Roughness, Huray',
    whatItIs: 'Loss of balls on a flat base from radius and number per area, real form and causal form.',
    source: 'P. G. Huray, The Foundations of Signal Integrity, 2010; causal form J. E. Bracken, DesignCon 2012',
    range:
      'Radius from 2 skin depths, pitch from 4 radii: within 9 % of solved balls. Smaller balls are overstated, 4.7-fold at one skin depth and 18-fold at half. No plane of its own, taken as the mean plane; its reactance is not confirmed',
  },
  {
    id: 'cannonball',
    name: 'Roughness, cannonball stacking',
    whatItIs:
      'Huray’s formula with 14 balls of 0.06 Rz on a tile of 36 radii squared; Rz of 5.5 Rq where it is not stated.',
    source: 'L. Simonovich, 2015–2019',
    range:
      'A calibration rather than a geometry: 1.4 to 2.9 times the loss of its own pile, solved. Ceiling 8.33. No plane of its own, taken as the mean plane',
  },
  {
    id: 'small-perturbation',
    name: 'Roughness, small perturbation',
    whatItIs:
      'Complex impedance to second order in the heights from Rq and correlation length (or Sdr), isotropic, across or along grooves; mean plane, electrostatic plane of the same order.',
    source: 'Own derivation; loss as X. Gu, L. Tsang and H. Braunisch, IEEE Trans. Microwave Theory Tech. 55(3), 2007',
    range:
      'Rms slope of a profile under 0.5: loss factor within 0.0065 at slope 0.28 and 0.0105 at slope 0.5 of solved random profiles, always high; integrals to 1e-8',
  },
  {
    id: 'area-limited-perturbation',
    name: 'Perturbation held to the area ratio',
    whatItIs:
      'The perturbation’s excess loss bent so that it tends to the developed area ratio at high frequency. Carries the band where correlation length or Sdr is known.',
    source: 'Own extension, compared with independently solved random profiles and egg boxes',
    range:
      'Loss factor within 0.01 to slope 0.5, 0.03 to slope 1; steeper egg boxes are overstated by up to half of the excess. Single-valued textures only: no overhanging nodules',
  },
  {
    id: 'ball-pile',
    name: 'Roughness, solved pile of balls',
    whatItIs:
      'Interpolation in three-dimensional solutions of touching balls by Rq; the middle of the band where only Rq is known.',
    source: 'Independent three-dimensional eddy-current solutions made for this project, not measured',
    range: 'Rq/δ to 3.57, 2 to 3 % in loss; its loss factor is held at 2.14 beyond',
  },
  {
    id: 'nodule-stacks',
    name: 'Roughness, stacks of nodules',
    whatItIs:
      'The sphere formula with the exact term of a free ball and the contact found in solved stacks. Carries the band where nodules are known.',
    source:
      'Exact sphere: Landau and Lifshitz, Electrodynamics of Continuous Media, § 59; own fit to independent solutions',
    range:
      'Radius of 0.25 to 2 skin depths, pitch of 2.2 to 6 radii: excess loss within 15 %, slow-wave length within 10 % of solved stacks',
  },
  {
    id: 'slow-wave',
    name: 'Slow wave of rough faces',
    whatItIs:
      'Slow-wave length s = X δ/2 + electrostatic plane of each face; permittivity rises by (s_strip + s_ground − δ)/h, 0.75 of it on a 50 ohm line.',
    source: 'Own derivation; compared with independent sections with solved faces',
    range:
      'First order in s/h, within 3 %. Not to be added to a design permittivity fitted on the same foil and thickness',
  },
];

const laminates: readonly Method[] = [
  {
    id: 'wideband-debye',
    name: 'Dispersion of the laminate',
    whatItIs:
      'Causal permittivity and loss tangent at a frequency from those at another, relaxations spread evenly over the logarithm of frequency from 1e4 to 1e14 rad/s.',
    source: 'A. R. Djordjević et al., IEEE Trans. Electromagn. Compat. 43(4), 2001',
    range:
      'Loss tangents that are nearly constant over the span crossed. An upper corner of 1e12 rad/s would cut the loss tangent by 26 % between 10 and 77 GHz; a span that a corner touches is flagged',
  },
];

const texture: readonly Method[] = [
  {
    id: 'texture-parameters',
    name: 'Texture from measured heights',
    whatItIs:
      'Heights, slopes, developed area and autocorrelation length of a profile or height map after mean line or plane by least squares. Slopes by the seven-point formula; Sdr from them, with that of the grid’s triangles beside it.',
    source: 'ISO 21920-2:2021, ISO 25178-2:2021',
    range:
      'Five points per shortest wave; ten correlation lengths each way for figures of the foil and not of the spot. Standard error by length is stated',
  },
  {
    id: 'gaussian-filter',
    name: 'Gaussian filter',
    whatItIs: 'Takes off what is finer or longer than the nesting indices; half of a wave of the index passes.',
    source: 'ISO 16610-21:2011 (profile), ISO 16610-61:2015 (areal)',
    range:
      'Nesting index of five spacings or more. At ends and holes the weighting function is cut and scaled; half an index is left off at the ends',
  },
  {
    id: 'texture-conversion',
    name: 'Rq from other height parameters',
    whatItIs: 'Ra times 1.2533 (normal heights; 1.11 to 1.41 allowed for), Rz over 5.5 with 25 % on both sides.',
    source: 'Definitions of ISO 21920-2; mean range of normal heights, L. H. C. Tippett, Biometrika 17, 1925',
    range: 'Same face and filters. Rz over Rq grows with the number of features in a section: 4.4 for 45, 7.3 for 4500',
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
    id: 'solved-section',
    name: 'Microstrip, solved cross-section',
    whatItIs:
      'Impedance, effective permittivity and current of each face of a thick strip with sloping walls and a planar or conformal cover, by the method of moments on total charge.',
    source:
      'R. F. Harrington, Field Computation by Moment Methods, 1968; C. Wei et al., IEEE Trans. Microwave Theory Tech. 32(4), 1984',
    range:
      'Quasi-static; strip thicker than four skin depths. Threefold refinement moves impedance by up to 0.12 %, permittivity by 0.24 %, a face weight by 0.7 % (w/h 0.2 to 25, t/h 0.02 to 0.5, with and without cover)',
  },
  {
    id: 'full-wave-line',
    name: 'Microstrip, full wave',
    whatItIs:
      'Effective permittivity, power-current impedance, ground loss and dielectric loss of a strip without thickness, with or without a flat cover, in the spectral domain.',
    source:
      'T. Itoh and R. Mittra, IEEE Trans. Microwave Theory Tech. 22(10), 1974; T. Itoh, ibid. 28(7), 1980; R. H. Jansen, ibid. 33(10), 1985',
    range:
      'Bound mode, infinite slab; within 0.01 % of an independent program at 77 GHz on 0.1 to 0.25 mm, w/h 0.5 to 10',
  },
  {
    id: 'solved-strip',
    name: 'Microstrip, section and full wave together',
    whatItIs:
      'The thick strip’s inductance and capacitance plus what the sheet’s gain with frequency; face weights by matching the thick corner’s current to the sheet’s.',
    source: 'Own derivation; checked against independent full-wave solutions at 24 and 77 GHz',
    range:
      'Strip up to half as thick as width and height. Conductor loss within 0.6 % of full wave at w/h 1.3 to 10, 0.1 to 0.2 mm; permittivity within 0.1 % of two full-wave sheets a thickness apart. A conformal cover disperses as a flat one',
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
  {
    id: 'rectangular-guide',
    name: 'Rectangular waveguide, TE10',
    whatItIs:
      'Cut-off, phase, dielectric loss and loss of each wall with its own surface impedance, reactance included.',
    source: 'D. M. Pozar, Microwave Engineering, 4th ed., 2012, section 3.3',
    range: 'From 1.05 times the cut-off to the next mode; first order in the wall impedance',
  },
  {
    id: 'siw',
    name: 'Substrate-integrated waveguide',
    whatItIs: 'The solid-walled guide of equivalent width; loss of each foil and of the vias apart.',
    source: 'F. Xu and K. Wu, IEEE Trans. Microwave Theory Tech. 53(1), 2005; Y. Cassivi et al., IEEE MWCL 12(9), 2002',
    range:
      'Via pitch below 3 diameters, diameter below a fifth of the row distance: the two width rules then agree within 0.1 %. Leakage and launches are left out; pitch above 2 diameters leaks',
  },
  {
    id: 'stripline',
    name: 'Stripline',
    whatItIs: 'Impedance with thickness, loss by face by receding walls, off-centre strips as two halves.',
    source:
      'H. A. Wheeler, IEEE Trans. Microwave Theory Tech. 26(11), 1978, and Proc. IRE 30(9), 1942; S. B. Cohn, 1954',
    range:
      'Impedance within 0.5 % and face weights within 2 % of separate sections; heights up to 1.5 to 1, thickness to 0.2 of the spacing. No mode between the grounds',
  },
  {
    id: 'grounded-coplanar',
    name: 'Grounded coplanar line',
    whatItIs:
      'Quasi-static section with thick metal by the method of moments: impedance, permittivity and current squared on seven faces. Conformal mapping of thin metal as cross-check.',
    source:
      'R. F. Harrington, 1968; H. A. Wheeler, 1942; G. Ghione and C. U. Naldi, IEEE Trans. Microwave Theory Tech. 35(3), 1987',
    range:
      'Section below 0.1 wavelength in the dielectric, metal above four skin depths: impedance within 0.2 %, face weights within 0.5 % of separate sections. No dispersion, no leakage, side grounds held by vias. The mapping alone is 0.2 to 3.4 % high for thin metal, and 18 µm of thickness lowers impedance by 4 to 12 %',
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
    range: 'Infinite slab and ground, no cover. Coupling between columns comes out 1 to 4 dB too strong',
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

const suppliers: readonly Method[] = [
  {
    id: 'allowance',
    name: 'Allowance of one item by root finding',
    whatItIs:
      'The value of one item, moved alone, at which the first binding requirement stops meeting under each roughness model: growing steps from nominal, then a bracketed root.',
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

/** Every method in the program, grouped copper, texture, laminates, lines, columns, what is asked of suppliers. */
export const methods: readonly Method[] = [...copper, ...texture, ...laminates, ...lines, ...columns, ...suppliers];
