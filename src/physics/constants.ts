/** SI constants (exact or CODATA 2018). */
export const SPEED_OF_LIGHT = 299792458; // m/s, exact
export const MU0 = 1.25663706212e-6; // H/m, CODATA 2018
export const EPS0 = 1 / (MU0 * SPEED_OF_LIGHT * SPEED_OF_LIGHT); // F/m
export const ETA0 = MU0 * SPEED_OF_LIGHT; // ohm
