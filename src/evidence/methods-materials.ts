import type { Method } from './method.js';

/** Metal and its roughness. */
export const copperMethods: readonly Method[] = [
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
      'Rms slope of a profile under 0.5. Against solved random grooves the loss factor is high by up to 0.004 at slope 0.28; at slope 0.5 by 0.014 (current across) and 0.026 (along), where second order ends. Integrals to 1e-8',
  },
  {
    id: 'area-limited-perturbation',
    name: 'Perturbation held to the area ratio',
    whatItIs:
      'The perturbation’s excess loss bent so that it tends to the developed area ratio at high frequency, and to less along grooves, whose bottoms carry little. Carries the band where correlation length or Sdr is known.',
    source:
      'Own extension, compared with solved random grooves and egg boxes; its one constant, for current along grooves, is found in them',
    range:
      'Loss factor within 0.004 to slope 0.5 and 0.01 to slope 0.7 of solved grooves across and along the current, 0.03 to slope 1; steeper egg boxes are overstated by up to half of the excess. Single-valued textures only: no overhanging nodules',
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
    id: 'roughness-band',
    name: 'Roughness band',
    whatItIs:
      'Low, middle and high estimate of a face for what is known of its texture, each with loss, reactance and plane. Rq alone: gentle random texture, solved pile of balls, gradient model. With correlation length or Sdr: perturbation held to the area ratio, over spectra that share what is known. With nodules: solved stacks, between free balls and the sphere formula. Every sweep runs under all three.',
    source:
      'Own choice among the methods named here, from what independently solved surfaces of one Rq show: at two skin depths their loss factor runs from 1.1 to 2.6',
    range:
      'Estimates, not bounds: solved dense stacks of balls of two skin depths lie up to a tenth above the gradient model. Missing measurements are ranked by the mean width that they would leave over plausible outcomes',
  },
  {
    id: 'slow-wave',
    name: 'Slow wave of rough faces',
    whatItIs:
      'Slow-wave length s = X δ/2 + electrostatic plane of each face; permittivity rises by (s_strip + s_ground − δ)/h, 0.75 of it on a 50 ohm line.',
    source: 'Own derivation; compared with independent sections with solved faces',
    range:
      'First order in s/h, within 3 %. Not to be added to a design permittivity fitted on the same foil and thickness: there it is printed and not applied',
  },
  {
    id: 'electrostatic-plane',
    name: 'One plane for capacitance and inductance',
    whatItIs:
      'A rough face is referred to its electrostatic plane: the dielectric is thinner by the plane shifts, the strip thicker by the underside’s, and the depth skipped joins the face as reactance ωµ0·es.',
    source: 'Own derivation; agrees with two separate planes in sections solved for both',
    range:
      'First order in es/h: inductance to 4 digits; rise of permittivity 3.19 against 3.05 % for stacks, equal for piles of balls',
  },
];

/** Dielectrics. */
export const laminatesMethods: readonly Method[] = [
  {
    id: 'wideband-debye',
    name: 'Dispersion of the laminate',
    whatItIs:
      'Causal permittivity and loss tangent at a frequency from those at another, relaxations spread evenly over the logarithm of frequency from 1e4 to 1e14 rad/s.',
    source: 'A. R. Djordjević et al., IEEE Trans. Electromagn. Compat. 43(4), 2001',
    range:
      'Loss tangents that are nearly constant over the span crossed, each figure from its own stated frequency; a figure without one is used as it stands, and that is said. An upper corner of 1e12 rad/s would cut the loss tangent by 26 % between 10 and 77 GHz; a span that a corner touches is flagged',
  },
  {
    id: 'laminate-conditions',
    name: 'Laminate with temperature and moisture',
    whatItIs:
      'Stated coefficients applied to the stated figures, linear in temperature and in the mass share of water, before the dispersion carries them to the frequency.',
    source: 'Linear coefficients as data sheets state them',
    range: 'The span over which the coefficients were taken; a coefficient that is not stated counts as zero',
  },
  {
    id: 'in-plane-permittivity',
    name: 'In-plane permittivity',
    whatItIs:
      'The isotropic permittivity that gives a strip the effective permittivity it has on an anisotropic laminate, which is stretched by √(in-plane/through) to an isotropic one of √(in-plane × through).',
    source: 'B. T. Szentkuti, Electron. Lett. 12(25), 1976, from memory',
    range:
      'Quasi-static, exact for a strip without thickness. Models take one permittivity; the difference is an uncertainty of its own. Where no in-plane figure is stated none is allowed for, and that is said',
  },
];

/** Texture from measurements. */
export const textureMethods: readonly Method[] = [
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
