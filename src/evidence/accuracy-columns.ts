import { type AccuracyClaim, deviationsOf } from './accuracy-claim.js';
import { columnEngineChecks } from './column.js';

const COLUMNS = 'independent full-wave solutions of two columns';
const EIGHT = 'eight patches on 127 µm and on 100 µm, smooth and rough copper, 76 to 80 GHz';

const column = (
  id: string,
  figure: string,
  target: number,
  unit: string,
  match: RegExp,
  remark = 'The target is what the uncertainty of a verdict allows for, and the accuracy of the reference.',
): AccuracyClaim => ({
  id: `column-${id}`,
  figure: `Patch columns, network: ${figure}`,
  comparedWith: COLUMNS,
  range: EIGHT,
  target,
  unit,
  remark,
  deviations: () => deviationsOf(columnEngineChecks, match, 'unit'),
});

export const columnAccuracy: readonly AccuracyClaim[] = [
  {
    id: 'patch-resonance',
    figure: 'Patch columns, network: resonance of an edge-fed patch',
    comparedWith: 'independent full-wave solutions of single patches',
    range: '0.1, 0.127 and 0.2 mm, permittivity 3 to 3.55, 78 to 80 GHz',
    target: 0.3,
    unit: '%',
    remark: 'The references are known to 0.2 %.',
    deviations: () => deviationsOf(columnEngineChecks, /^column\.patch-resonance-/, 'percent'),
  },
  column('reflection', 'complex reflection, rms over the band', 0.1, '1', /^column\.reflection-/),
  column('directivity', 'directivity, rms', 0.25, 'dB', /^column\.directivity-/),
  column(
    'gain',
    'gain where reflection is below −5 dB, mean',
    0.4,
    'dB',
    /^column\.gain-/,
    'Always low. The target is what the uncertainty of a verdict allows for, and the accuracy of the reference.',
  ),
  column('tilt', 'beam direction, rms', 0.55, '°', /^column\.tilt-/),
  column('sidelobe', 'elevation sidelobe level, rms', 1.1, 'dB', /^column\.sidelobe-/),
];
