import { formatNumber } from '../quantity/index.js';

/** The few words of number that reasons need; tables and pages are worded by the dossier. */
function short(value: number, most: number): string {
  let decimals = 0;
  while (decimals < most && Number(value.toFixed(decimals)) !== Number(value.toFixed(most))) decimals++;
  return formatNumber(value, decimals);
}

export const gigahertzText = (hertz: number): string => `${short(hertz / 1e9, 4)} GHz`;
export const gigahertzRange = (low: number, high: number): string =>
  `${short(low / 1e9, 4)} to ${short(high / 1e9, 4)} GHz`;
export const celsiusText = (degrees: number): string => `${short(degrees, 1)} °C`;
export const celsiusRange = (low: number, high: number): string => `${short(low, 1)} to ${short(high, 1)} °C`;
