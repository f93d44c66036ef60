import type { HeldParameter, RecipientKind, Verification } from '../manifest/procurement-model.js';

/**
 * The fixed words of supplier sheets. They name standards and say what matters in general; nothing in here knows a
 * design, so that no sentence can give one away.
 */
interface ParameterWords {
  readonly what: string;
  readonly why: string;
  readonly definition: string;
  /** Cited, never reproduced; the manifest may name others. */
  readonly verification: Required<Verification>;
}

/** Method numbers as the lists of IPC-TM-650 and ISO have them (from memory); the issue in force is for the order to say. */
export const PARAMETER_WORDS: Readonly<Record<HeldParameter, ParameterWords>> = {
  'laminate-thickness': {
    what: 'Thickness of the dielectric',
    why: 'Sets impedance and loss of every line.',
    definition: 'Between the mean planes of the copper faces, after lamination; copper and texture not included.',
    verification: {
      method: 'IPC-TM-650 2.2.18.1, cross-section',
      specimen: 'coupons from two opposite corners and the middle of a panel',
    },
  },
  permittivity: {
    what: 'Relative permittivity',
    why: 'The artwork is drawn for the nominal value; electrical lengths follow it.',
    definition:
      'Of the dielectric at the frequency and in the direction of the method, 23 °C, as conditioned by the method.',
    verification: {
      method: 'IPC-TM-650 2.5.5.5, or a resonator method named with the answer',
      specimen: 'laminate with the copper etched off',
    },
  },
  'loss-tangent': {
    what: 'Loss tangent',
    why: 'Dielectric loss is proportional to it.',
    definition:
      'Of the dielectric at the frequency and in the direction of the method, 23 °C, as conditioned by the method.',
    verification: {
      method: 'IPC-TM-650 2.5.5.13, or a resonator method named with the answer',
      specimen: 'laminate with the copper etched off',
    },
  },
  'treated-face-texture': {
    what: 'Texture of the treated face',
    why: 'Rough copper loses more and slows the wave.',
    definition: '',
    verification: {
      method: 'IPC-TM-650 2.2.17 (stylus) or 2.2.22 (non-contact)',
      specimen: 'foil as delivered, across and along the web',
    },
  },
  'untreated-face-texture': {
    what: 'Texture of the untreated face',
    why: 'Rough copper loses more.',
    definition: '',
    verification: {
      method: 'IPC-TM-650 2.2.17 (stylus) or 2.2.22 (non-contact)',
      specimen: 'foil as delivered, across and along the web',
    },
  },
  'copper-thickness': {
    what: 'Finished thickness of the copper',
    why: 'Sets impedance and the shape of etched edges.',
    definition: 'Foil and plating together after all etching, between mean planes; finish not included.',
    verification: { method: 'IPC-TM-650 2.1.1, microsection', specimen: 'coupon on each panel' },
  },
  'etched-width': {
    what: 'Change of copper outlines by etching',
    why: 'Every outline moves with it, in width and in length.',
    definition: 'Finished width at the foot of the edges less width in the artwork, both edges together.',
    verification: { method: 'IPC-TM-650 2.2.2, optical', specimen: 'line coupons along and across each panel' },
  },
  'edge-slope': {
    what: 'Slope of etched edges',
    why: 'The width holds at the foot; the slope decides the width at the top.',
    definition: 'Angle between laminate and edge, 90° upright, mean of both edges.',
    verification: { method: 'IPC-TM-650 2.1.1, microsection', specimen: 'line coupons along and across each panel' },
  },
  'finish-thickness': {
    what: 'Thickness of the finish layer',
    why: 'Current flows in the finish as well as in the copper.',
    definition: 'Of this layer alone, on top of the copper.',
    verification: {
      method: 'ISO 3497, X-ray fluorescence',
      specimen: 'pad on each panel, size stated with the answer',
    },
  },
  'outer-face-texture': {
    what: 'Texture of the outer face of the copper',
    why: 'Rough copper loses more.',
    definition: '',
    verification: {
      method: 'IPC-TM-650 2.2.22 (non-contact)',
      specimen: 'copper area on each panel, before the finish',
    },
  },
};

export const SIDES: Readonly<Partial<Record<HeldParameter, string>>> = {
  'treated-face-texture': 'treated face, towards the laminate unless the order says otherwise',
  'untreated-face-texture': 'untreated face',
  'outer-face-texture': 'face away from the laminate',
};

/** What is asked, for headings. */
export const KIND_WORDS: Readonly<Record<RecipientKind, string>> = {
  'laminate maker': 'laminate',
  'foil maker': 'copper foil',
  'board fabricator': 'board fabrication',
};

export const TEXTURE_DEFINITIONS = {
  profile: 'Rq, root-mean-square height of the profile (ISO 21920-2), under conditions of ISO 21920-3',
  areal: 'Sq, root-mean-square height of the surface (ISO 25178-2), under conditions of ISO 25178-3',
} as const;

export const DEMONSTRATION = 'Demonstration data: request, sender and recipient are invented.';

export const TERMS: readonly string[] = [
  'The purchase order and the drawing prevail over this sheet. This sheet is a request for quotation and no order.',
  'Limits come from calculation and from stated spreads, not from measurement of finished boards. They are no promise that a board made within them works.',
  'Standards are cited by number, not reproduced. Where no issue is named, the one in force on the day of the order applies.',
  'Substance rules (RoHS, REACH, PFAS) are fields to declare. They were not assessed here.',
  'Export class was not assessed. Local rules, accredited laboratories and licensed practice decide.',
];
