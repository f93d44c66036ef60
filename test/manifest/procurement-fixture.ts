import type { Pack } from '../../src/manifest/model.js';
import { type Contents, fixtureText, load, packOf } from './fixture.js';

/** A procurement file for the small pack: its laminate maker, its foil maker and a fabricator. */
export const PROCUREMENT = `# invented
rfq_number: NF-RFQ-7
reply_date: 2026-12-01
contact: { who: Purchasing (role), address: 1 Test Lane }
nda: NDA-5
quantities: [10 panels]
panel: { width: 457 mm, length: 610 mm }
certificate: Measured values with each lot.
sampling: { confidence: 0.95, reliability: 0.9 }
edge_slope: { value: 80 deg, spread: { minus: 15 deg, plus: 10 deg }, basis: estimated }
recipients:
  - id: laminate
    kind: laminate_maker
    name: Northfen Laminates (invented)
    boards: [qs-1, qs-2]
    materials: [nl-30]
  - id: foil
    kind: foil_maker
    name: Kettle Foils (invented)
    boards: [qs-1, qs-2]
    materials: [kf-04, kf-10]
    quantities: [two rolls]
  - id: fabrication
    kind: board_fabricator
    name: Stourbeck Circuits
    boards: [qs-1, qs-2]
`;

export const ANSWER_HEAD =
  'item,unit,guaranteed_lower,guaranteed_upper,typical,alternative,not_offered,method,declaration';

/** The files of the pack with that procurement, a passage of it or of the answers changed. */
export function asking(from = '', to = '', answers?: string): Contents {
  if (!PROCUREMENT.includes(from)) throw new Error(`the procurement does not hold ${from}`);
  const text = PROCUREMENT.replace(from, () => to);
  const answered = text.replace('materials: [nl-30]', 'materials: [nl-30]\n    answers: laminate.csv');
  return {
    'pack.yaml': fixtureText('pack.yaml').replace('requirements:', 'procurement: procurement.yaml\nrequirements:'),
    'procurement.yaml': answers === undefined ? text : answered,
    ...(answers === undefined ? {} : { 'laminate.csv': answers }),
  };
}

export const askingPack = (from = '', to = '', answers?: string): Pack => packOf(load(asking(from, to, answers)));
