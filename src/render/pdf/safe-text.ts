/**
 * Text as it can be printed: every sign has a glyph or is replaced visibly, nothing is hidden.
 *
 * Line ends and tabs become spaces. Control characters, halves of surrogate pairs, invisible signs (zero width) and
 * signs that turn the direction of writing become U+FFFD: they have no picture of their own, and a reviewer must see
 * that something stands there. Variation selectors only choose between pictures and are dropped.
 */
export const replacementSign = '\uFFFD';

const spaces = /[\t\n\v\f\r\u0085\u2028\u2029]+/g;
const variationSelectors = /[\uFE00-\uFE0F]/g;
/** Control (Cc), format (Cf: directions, zero widths, soft hyphen), surrogate halves (Cs), private use, unassigned. */
const hidden = /[\p{Cc}\p{Cf}\p{Cs}\p{Co}\p{Cn}]/gu;

export function safeText(text: string): string {
  return text.replace(spaces, ' ').replace(variationSelectors, '').replace(hidden, replacementSign);
}

/** For XML: the five signs that are markup. The text must be safe already: XML forbids most control characters. */
export function escapeXml(text: string): string {
  const entities: Readonly<Record<string, string>> = {
    '&': '&amp;',
    '<': '&lt;',
    '>': '&gt;',
    '"': '&quot;',
    "'": '&apos;',
  };
  return text.replace(/[&<>"']/g, (sign) => entities[sign]);
}
