import type { PackDocument } from '../../src/dossier/document.js';
import { packDocument } from './fixture-document.js';

/** What someone could write into a manifest to break out of a page, a drawing or a template. */
export const hostileText =
  '<script>globalThis.broken=1</script><img src="https://invalid.example/x" onerror="globalThis.broken=1">' +
  '"\'`=&amp;&#x3c;]]>--><!--{{x}}{{{x}}}\u2028\u2029\u0000\u0007\u202e\u05d0\u05d1</td></table></svg></style>';

/** Our own words in the document: everything else may have been written by a user. */
const ours = new Set([
  'id',
  'kind',
  'page',
  'anchor',
  'status',
  'chart',
  'drawing',
  'material',
  'packId',
  'xScale',
  'yScale',
  'language',
  'forbidden',
  'towards',
  'symbol',
]);

function poison(value: unknown, key: string): unknown {
  if (typeof value === 'string') return ours.has(key) ? value : value + hostileText;
  if (Array.isArray(value)) return value.map((entry) => poison(entry, key));
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(Object.entries(value).map(([name, entry]) => [name, poison(entry, name)]));
}

/** The fixture with hostile text behind every string that could be a user's. */
export const hostileDocument = poison(packDocument, '') as PackDocument;
