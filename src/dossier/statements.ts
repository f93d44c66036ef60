import type { Inline } from './document.js';

/** Sentences that every document carries. Kept in one place so that no page can say less than another. */
export const DOCUMENT_TYPE = 'Compliance dossier for design review (calculated)';

/** Who may see a page where the pack does not say. */
export const INTERNAL_MARKING = 'internal: not for suppliers';

export const NOT_MODELLED: readonly string[] = [
  'Fascia, bumper or radome in front of the antenna.',
  'Housing and neighbouring parts.',
  'Transition from the chip to the feed network, unless the feed names a measured one.',
  'Vias.',
  'Edges of the board: laminate and ground are taken as infinite, and the power of the surface wave as lost.',
];

/** Of full wave and network alike. */
export const ENGINE_LIMITS: readonly string[] = [
  'Laminate and ground are infinite: the power of the surface wave counts as lost, its return from the edges of the board is not computed.',
  'No vias, and no transition between layers: all metal of the columns lies in one plane.',
  'The full wave takes metal as a sheet. Thickness enters through the lines: each width carries the quantities that the section solver finds for the thick strip.',
  'The feed: lines up to the first patch radiate in the full wave, not in the network; the feed network itself radiates in neither.',
  'Permittivity in the plane of the laminate, where it differs, enters both engines through lines and edges, not as a property of the slab.',
];

export const COMPARED_WITH =
  'The figures are compared with calculations by other methods and with published values. No board of this build has been measured.';

/** Stands on every page of a copy: a status over fewer requirements must not pass for the whole. */
export const copyNotice = (audience: string): string =>
  `Copy for the audience “${audience}”: entries are left out, and every status stands for the requirements shown here only.`;

/** One line for the notices of every page. */
export const CAUTION_NOTICE =
  'Calculated design evidence: not a declaration of conformity, radio approval or RF-exposure assessment, and not a safety argument.';

export const CAUTIONS: readonly (readonly Inline[])[] = [
  [
    { strong: 'Calculated design evidence. ' },
    'This document is not a declaration of conformity, not a radio approval and not an assessment of RF exposure.',
  ],
  [
    { strong: 'Not a safety argument. ' },
    'Beam tilt and sidelobes can cause missed or false targets. Verify them independently on hardware.',
  ],
  [
    { strong: 'Export class not assessed. ' },
    'Whether this design or document is subject to export control was not examined.',
  ],
  [
    { strong: 'Others decide. ' },
    'Local rules, accredited laboratories and licensed practice decide what may be built, sold and operated.',
  ],
];
