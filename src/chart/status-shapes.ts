import type { Status } from '../dossier/document.js';

/**
 * Shape of each status, beside its word: told apart without colour, on pages and in PDF alike. SVG path data in a box
 * of 12 by 12, filled by the even-odd rule.
 */
export const statusShapeBox = 12;

export const statusShapes: Readonly<Record<Status, string>> = {
  /** Check mark. */
  meets: 'M0.8 6.4 L2.6 4.6 L4.8 6.8 L9.8 1.6 L11.5 3.3 L4.8 10.3 Z',
  /** Diamond, half filled. */
  undecided: 'M6 0.4 L11.6 6 L6 11.6 L0.4 6 Z M6 2.7 L9.3 6 L6 9.3 Z',
  /** Cross. */
  misses: 'M1 2.7 L2.7 1 L6 4.3 L9.3 1 L11 2.7 L7.7 6 L11 9.3 L9.3 11 L6 7.7 L2.7 11 L1 9.3 L4.3 6 Z',
  /** Bar. */
  'not evaluated': 'M0.8 4.8 H11.2 V7.2 H0.8 Z',
  /** Ring. */
  'open until measured':
    'M11.2 6 A5.2 5.2 0 1 1 0.8 6 A5.2 5.2 0 1 1 11.2 6 Z M9.1 6 A3.1 3.1 0 1 1 2.9 6 A3.1 3.1 0 1 1 9.1 6 Z',
  /** Square without one quarter. */
  incomplete: 'M1.2 1.2 H10.8 V6 H6 V10.8 H1.2 Z',
};
