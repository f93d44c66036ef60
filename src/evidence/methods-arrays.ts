import type { Method } from './method.js';

/** The full-wave engine and how it confirms the fast one. */
export const fullWaveMethods: readonly Method[] = [
  {
    id: 'full-wave',
    name: 'Full wave of patch columns',
    whatItIs:
      'Surface currents of all metal of the board by the mixed-potential integral equation of the grounded slab, Galerkin’s method with rooftops on one uniform grid; the matrix is applied by Fourier transforms and solved by GMRES with a factorised block for each patch.',
    source:
      'J. R. Mosig and F. E. Gardiol, 1982 and 1985; K. A. Michalski and J. R. Mosig, IEEE Trans. Antennas Propag. 45(3), 1997; Y. Saad and M. H. Schultz, 1986 (GMRES)',
    range:
      'Infinite slab and infinite ground, no side walls, no vias and no transitions; one flat cover at most; one guided wave. Permittivity alike in all directions: a laminate’s in-plane value may lie several per cent above the one across it, and fields along the board see it. Unknowns, iterations, residual, grid and misfits are printed per board',
  },
  {
    id: 'full-wave-edges',
    name: 'True edges on a uniform grid',
    whatItIs:
      'Metal drawn with rooftops acts as if it ended a little inside the drawn edge; the distance is calibrated on a strip of known capacity, and edges that lie off the grid are moved by a local term.',
    source: 'Own derivation from the logarithmic capacity of a strip',
    range: 'Edges apart by two cells or more. What misfit of a dimension remains is printed',
  },
  {
    id: 'full-wave-thickness',
    name: 'Thickness and faces of the metal in the full wave',
    whatItIs:
      'The metal is a sheet. Its impedance, acting width and length stand for the thick strip: loss by face, inductance and phase of the solved cross-section, so that lines of the drawn metal have the propagation of the true ones.',
    source: 'Solved cross-sections of the same program; sheet impedance, any text on surface integral equations',
    range:
      'Right for lines and open ends; thickness at steps and slots is not resolved. Not small: 18 to 35 µm of copper on 100 µm lower line impedance by a few ohm and resonance by a few tenths of a per cent',
  },
  {
    id: 'full-wave-ports',
    name: 'Ports of the full wave',
    whatItIs:
      'A gap across each feed line; the two waves of the line’s current between gap and first patch give the S-matrix at the patch’s edge. For power and pattern the line is continued without end in place of gap and stub.',
    source: 'Matched two-wave fit; linearity for boards of many ports',
    range:
      'What the feed line itself radiates is left out of pattern and power. The balance of accepted power and its sinks is printed per board',
  },
  {
    id: 'confirmation',
    name: 'Two engines, one figure',
    whatItIs:
      'Both engines solve the nominal board at the same frequencies; the network’s figures of every sweep are moved by the difference, interpolated over frequency, and what the difference leaves open goes into the uncertainty.',
    source: 'Correction of a coarse model by a fine one, any text on surrogate models',
    range:
      'Exact at the compared frequencies and nominal values. Between and beside them it assumes that the difference moves slowly; where the full wave did not run the figures say ‘network only’ and their uncertainty is larger',
  },
];

/** Figures of the driven array, sizing, and the feed. */
export const arraysMethods: readonly Method[] = [
  {
    id: 'active-reflection',
    name: 'Active reflection, scan and isolation',
    whatItIs:
      'From the S-matrix of the board: reflection of each column with all driven, over phases that steer the beam in azimuth; worst pair between groups of columns.',
    source: 'D. M. Pozar, IEEE Trans. Antennas Propag. 42(8), 1994; change of reference after K. Kurokawa, 1965',
    range: 'Every other port ends in its reference impedance; the radar’s own ports reflect more',
  },
  {
    id: 'tapers',
    name: 'Amplitude tapers',
    whatItIs: 'Uniform, Dolph–Chebyshev and Taylor amplitudes along a column.',
    source: 'C. L. Dolph, 1946; T. T. Taylor, 1955',
    range: 'Of the array factor: element pattern, errors and coupling move the sidelobes',
  },
  {
    id: 'sizing',
    name: 'Sizing of a column',
    whatItIs:
      'From closed forms to a layout whose excitation follows the taper, with beam at broadside and matched feed, by least squares with the network; corrected once by what the full wave finds beside it.',
    source: 'Damped least squares (K. Levenberg, 1944; D. W. Marquardt, 1963); coarse model moved to the fine one',
    range: 'At one frequency and nominal values: bandwidth and tolerances are judged afterwards like any layout’s',
  },
  {
    id: 'feed-network',
    name: 'Corporate feed',
    whatItIs:
      'Dividers, quarter-wave steps and lines as a circuit with dispersion and loss by face, joined with the board’s S-matrix and with a transition’s two-port, so that every reflection comes again.',
    source: 'E. J. Wilkinson, 1960; microwave circuit texts',
    range:
      'Junctions and steps are ideal, meanders have no bends, lines do not couple; what the feed radiates is not in the pattern',
  },
];
