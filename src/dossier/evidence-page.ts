import type { EvidenceResult } from '../evidence/index.js';
import { decimalsFor, formatNumber } from '../quantity/index.js';
import { ENGINE_ACCURACY, type EngineAccuracy, FULL_WAVE_ACCURACY, quantityOf } from '../verdict/index.js';
import { accuracyChapter } from './accuracy-chapter.js';
import { caution, cell, chapter, facts, number, prose, table } from './blocks.js';
import { cautionsChapter } from './chapter-record.js';
import { type PackInput, page } from './context.js';
import type { Block, DocumentPage } from './document.js';
import { DEFINITIONS, EVIDENCE, link } from './links.js';
import { COMPARED_WITH } from './statements.js';
import { count, scientific } from './values.js';

const HOW_KNOWN: Readonly<Record<EvidenceResult['howKnown'], string>> = {
  read: 'read: the source was seen',
  memory: 'from memory: the source was not at hand',
  'independent solution': 'independent calculation by another method; nothing was measured',
};

/** Digits that show the tolerance to two places; very small or large numbers as powers of ten. */
function sized(value: number, tolerance: number, plus = false): string {
  if (!Number.isFinite(value)) return 'no number';
  const size = Math.max(Math.abs(value), tolerance);
  if (size !== 0 && (size < 1e-4 || size >= 1e7)) return scientific(value);
  return formatNumber(value, Math.min(8, Math.max(decimalsFor(tolerance, 2), 0)), { plus });
}

const withUnit = (text: string, unit: string): string => (unit === '1' || unit === '' ? text : `${text} ${unit}`);

function checkTable(topic: string, checks: readonly EvidenceResult[], n: number): Block {
  return table(
    `checks-${n}`,
    `${topic}: ${count(checks.filter((c) => c.ok).length, 'check')} of ${checks.length} within tolerance`,
    [
      'Quantity|2',
      'Source|2.2',
      'How known|1.2',
      '#Source value',
      '#Here',
      '#Deviation',
      '#Tolerance',
      'Why this tolerance|1.6',
      'Result',
    ],
    checks.map((check) => [
      cell(check.quantity),
      cell(check.source),
      cell(HOW_KNOWN[check.howKnown]),
      number(withUnit(sized(check.expected, check.tolerance), check.unit)),
      number(withUnit(sized(check.value, check.tolerance), check.unit)),
      number(withUnit(sized(check.deviation, check.tolerance, true), check.unit)),
      number(withUnit(`±${sized(check.tolerance, check.tolerance)}`, check.unit)),
      cell(check.toleranceReason),
      cell(check.ok ? 'within tolerance' : { strong: 'outside tolerance' }),
    ]),
  );
}

const accuracyTable = (id: string, caption: string, entries: readonly EngineAccuracy[]): Block =>
  table(
    id,
    caption,
    ['Quantity|1.2', 'Figure|2', 'Ground|0.7', 'From|2.6'],
    entries.map((entry) => [
      cell(quantityOf(entry.quantity).title),
      cell(entry.statement),
      cell(entry.ground),
      cell(entry.source),
    ]),
  );

export function evidencePage(input: PackInput): DocumentPage {
  const { evidence, methods, accuracy } = input;
  const topics = [...new Set(evidence.map((e) => e.topic))];
  const failed = evidence.filter((e) => !e.ok);
  const byHow = (how: EvidenceResult['howKnown']) => evidence.filter((e) => e.howKnown === how).length;
  return page(input, {
    id: EVIDENCE,
    kind: 'evidence',
    title: 'Evidence',
    subtitle: 'Methods, their sources and ranges, and the checks run for this build',
    chapters: [
      chapter(
        'summary',
        'Summary',
        facts(
          'evidence-facts',
          ['Checks run', `${evidence.length}, ${count(failed.length, 'deviation')} outside tolerance`],
          ['Source seen', String(byHow('read'))],
          ['Source recalled from memory', String(byHow('memory'))],
          ['Independent calculations', String(byHow('independent solution'))],
        ),
        caution('What the figures are compared with', [COMPARED_WITH]),
        ...(failed.length === 0
          ? []
          : [
              caution(
                'Checks outside tolerance',
                ...failed.map((c) => [
                  { strong: `${c.topic}, ${c.quantity}: ` },
                  `${withUnit(sized(c.value, c.tolerance), c.unit)} here against ${withUnit(sized(c.expected, c.tolerance), c.unit)} in the source.`,
                ]),
              ),
            ]),
      ),
      chapter(
        'methods',
        'Methods',
        table(
          'method-table',
          'Every method of the calculation',
          ['Method|1.3', 'What it is|2.4', 'Source|1.8', 'Range|1.8'],
          methods.map((method) => [cell(method.name), cell(method.whatItIs), cell(method.source), cell(method.range)]),
        ),
      ),
      chapter(
        'checks',
        'Checks run for this build',
        ...(evidence.length === 0 ? [prose('No check was run.')] : []),
        ...topics.map((topic, i) =>
          checkTable(
            topic,
            evidence.filter((e) => e.topic === topic),
            i + 1,
          ),
        ),
      ),
      accuracyChapter(accuracy),
      chapter(
        'engine-accuracy',
        'Engine accuracy',
        prose(
          'How far each engine may be from the truth, by quantity, as it enters every uncertainty. Compared: found against independent full-wave solutions; argued: follows from compared figures. The rule that uses it stands under ',
          link('Definitions', DEFINITIONS, 'uncertainty-rule'),
          '. It holds inside the range of the engine; outside, the dossier flags it.',
        ),
        accuracyTable(
          'full-wave-accuracy-table',
          'Full wave, at the frequencies where it ran on a board',
          FULL_WAVE_ACCURACY,
        ),
        accuracyTable(
          'accuracy-table',
          'Network and line solver; widened where the full wave did not run',
          ENGINE_ACCURACY,
        ),
      ),
      cautionsChapter(),
    ],
  });
}
