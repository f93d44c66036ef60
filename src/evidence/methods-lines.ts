import type { Method } from './method.js';

/** Microstrip and the other lines of radar boards. */
export const linesMethods: readonly Method[] = [
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
      'The thick strip’s inductance and capacitance plus what the sheet’s gain with frequency; face weights by matching the thick corner’s current to the sheet’s. All figures of lines rest on it, bare or under a cover layer.',
    source: 'Own derivation; checked against independent full-wave solutions at 24 and 77 GHz',
    range:
      'Strip up to half as thick as width and height, w/h 0.2 to 25, permittivity to 12, flagged beyond; up to 0.25 mm at 77 GHz compared. Conductor loss within 0.6 % of full wave at w/h 1.3 to 10, 0.1 to 0.2 mm; permittivity within 0.1 % of two full-wave sheets a thickness apart. A conformal cover disperses as a flat one',
  },
  {
    id: 'sheet-strip',
    name: 'Microstrip without thickness as a sheet',
    whatItIs:
      'Series impedance of a strip that is a sheet of given impedance: its current crowds into the edges until that impedance stops it.',
    source: 'Own derivation; constant from strips solved numerically',
    range:
      'Within 0.4 % of a strip solved directly where the sheet impedance is 0.05 % of ωµ0 times the width, 1.5 % at 0.2 %. For comparisons; boards have thickness. Solutions on a grid of few cells across the strip find a fifth to a quarter less',
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
