import type { Texture } from '../manifest/model.js';
import type { Narrowing } from '../physics/roughness/index.js';

export type TextureQuantity = Narrowing['quantity'];

/**
 * What to ask of whoever measures a copper face, in the words of a request for quotation: which parameter, and under which
 * conditions the figure is accepted. Fixed words that know no design; dossier and supplier sheet print the same.
 *
 * The conditions are our own choice, argued from the skin depth of copper between 60 and 81 GHz (0.23 to 0.27 µm): finer
 * features cost little and must not be mixed in, those of about that size decide the loss and must not be filtered out.
 */
const ASKS: Readonly<Record<TextureQuantity, { readonly what: string; readonly accepted: string }>> = {
  'correlation-length': {
    what: 'Autocorrelation length Sal (ISO 25178-2, fall to 0.2)',
    accepted:
      'accepted with S-filter nesting index 0.25 µm or less, L-filter nesting index 25 µm or more, sampling interval 0.1 µm or less, mean and spread over five places or more',
  },
  'area-ratio': {
    what: 'Developed interfacial area ratio Sdr (ISO 25178-2)',
    accepted:
      'accepted with S-filter nesting index 0.25 µm or less and lateral resolution of the instrument 0.2 µm or finer, both stated; Sdr grows with every finer filter and is nothing without them',
  },
  nodules: {
    what: 'Radius, pitch and number of layers of the nodules',
    accepted:
      'accepted from electron micrographs of the face and of a polished section, resolution 20 nm or finer, mean and spread over a hundred nodules or more',
  },
  lay: {
    what: 'Texture aspect ratio Str (ISO 25178-2) with the direction of the texture to the web',
    accepted:
      'accepted with the filters of Sal; under 0.5 the texture has a direction and the web is to be marked on the foil',
  },
};

const ORDER: readonly TextureQuantity[] = ['area-ratio', 'correlation-length', 'nodules', 'lay'];

/** One line of a request. */
export const askText = (quantity: TextureQuantity): string => `${ASKS[quantity].what}; ${ASKS[quantity].accepted}.`;

export const askName = (quantity: TextureQuantity): string => ASKS[quantity].what;

/** What is not stated of a texture, in a fixed order that tells nothing of a design. */
export function unstated({ correlationLength, developedAreaRatio, nodule, lay }: Texture): readonly TextureQuantity[] {
  const known: Readonly<Record<TextureQuantity, boolean>> = {
    'area-ratio': developedAreaRatio !== undefined,
    'correlation-length': correlationLength !== undefined,
    nodules: nodule !== undefined,
    lay: lay !== undefined,
  };
  return ORDER.filter((quantity) => !known[quantity]);
}
