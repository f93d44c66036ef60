import { parseQuantity, quoted, splitQuantity } from '../quantity/index.js';
import type { RequirementDocument, RequirementsDocument } from './documents/requirement-document.js';
import { si } from './figures.js';
import type { Path, Problem } from './problem.js';
import { REQUIREMENT_QUANTITIES } from './requirement-quantities.js';
import { ascending, exactlyOneOf, type KnownIds, knownId, RuleReport } from './rules.js';
import type { Node } from './tree.js';

/** Number and unit of a limit on a declared property, which brings its own unit: `20 ppm/K`. */
export function declaredLimit(
  written: string | number,
): { readonly value: number; readonly unit?: string } | undefined {
  if (typeof written === 'number') return { value: written };
  const parts = splitQuantity(written);
  if (!parts || !Number.isFinite(Number(parts.number))) return undefined;
  return { value: Number(parts.number), ...(parts.unit === '' ? {} : { unit: parts.unit }) };
}

export function requirementRules(root: Node, doc: RequirementsDocument): readonly Problem[] {
  const report = new RuleReport(root);
  const seen = new Set<string>();
  doc.requirements.forEach((requirement, i) => {
    const path: Path = ['requirements', i];
    if (seen.has(requirement.id))
      report.at([...path, 'id'], `"${requirement.id}" a second time`, 'an id stands once in a set');
    seen.add(requirement.id);
    oneRequirement(report, path, requirement);
  });
  return report.problems;
}

/** Groups that requirements name, against those of all boards; boards without any leave such a requirement unevaluated. */
export function groupReferences(root: Node, doc: RequirementsDocument, groups: KnownIds): readonly Problem[] {
  const report = new RuleReport(root);
  if (groups.ids.size === 0) return [];
  doc.requirements.forEach(({ between = [] }, i) => {
    between.forEach((id, k) => {
      knownId(report, ['requirements', i, 'between', k], id, 'group', groups);
    });
  });
  return report.problems;
}

function oneRequirement(report: RuleReport, path: Path, r: RequirementDocument): void {
  const rule = REQUIREMENT_QUANTITIES[r.quantity];
  const unfit = (key: keyof RequirementDocument, allowed: string) => {
    if (r[key] !== undefined) report.atKey([...path, key], `${key} for ${r.quantity}`, allowed, `Remove ${key}.`);
  };
  const missing = (key: keyof RequirementDocument, allowed: string) => {
    if (r[key] === undefined) report.at([...path, key], `no key "${key}"`, allowed);
  };
  if (rule.cut) missing('cut', `${r.quantity} is of one cut: azimuth or elevation`);
  else unfit('cut', 'only quantities of the pattern have a cut');
  if (r.quantity !== 'declared') {
    unfit('property', 'only declared has a property');
    unfit('allowed', 'only declared has allowed words');
  }
  if (r.quantity === 'pattern_mask') {
    missing('mask', 'a pattern mask has pieces: mask: [{ from, to, level }]');
    unfit('limit', 'the pieces of the mask are the limit');
  } else unfit('mask', 'only pattern_mask has a mask');
  if (r.quantity !== 'isolation') unfit('between', 'only isolation is between two groups');
  else if (r.between && r.between[0] === r.between[1])
    report.at([...path, 'between', 1], `${quoted(r.between[1])} a second time`, 'two different groups');
  if (r.quantity === 'declared') declaredRules(report, path, r);
  else if (rule.limit) {
    missing('limit', `${r.quantity} has a limit: at_least or at_most`);
    limitRules(report, path, r);
  }
  maskRules(report, path, r);
  conditionRules(report, path, r);
}

function declaredRules(report: RuleReport, path: Path, r: RequirementDocument): void {
  if (r.property === undefined)
    report.at([...path, 'property'], 'no key "property"', 'declared names the property that it compares');
  if (!exactlyOneOf(report, path, r, ['limit', 'allowed']) || !r.limit) return;
  if (!exactlyOneOf(report, [...path, 'limit'], r.limit, ['at_least', 'at_most'])) return;
  const key = r.limit.at_least === undefined ? 'at_most' : 'at_least';
  if (declaredLimit(r.limit[key]!) === undefined) {
    report.at(
      [...path, 'limit', key],
      report.written([...path, 'limit', key]),
      'a number with the unit of the property',
      'For words write allowed: [...].',
    );
  }
}

function limitRules(report: RuleReport, path: Path, r: RequirementDocument): void {
  const rule = REQUIREMENT_QUANTITIES[r.quantity].limit;
  if (!r.limit || !rule) return;
  const { direction } = REQUIREMENT_QUANTITIES[r.quantity];
  const other = direction === 'at_least' ? 'at_most' : 'at_least';
  if (direction && r.limit[other] !== undefined) {
    const where: Path = [...path, 'limit', other];
    return void report.atKey(where, `${other} for ${r.quantity}`, `${r.quantity} has a limit ${direction}`);
  }
  exactlyOneOf(report, [...path, 'limit'], r.limit, ['at_least', 'at_most']);
  for (const key of ['at_least', 'at_most'] as const) {
    if (r.limit[key] === undefined) continue;
    const read = parseQuantity(r.limit[key], rule.dimension, rule.range);
    if (!read.ok) report.at([...path, 'limit', key], read.problem.found, read.problem.allowed, read.problem.fix);
  }
}

function maskRules(report: RuleReport, path: Path, r: RequirementDocument): void {
  const pieces = (r.mask ?? []).map((p, i) => ({ i, from: si(p.from, 'angle'), to: si(p.to, 'angle') }));
  for (const { i, from, to } of pieces) ascending(report, [...path, 'mask', i], from, to, ['from', 'to']);
  const ordered = [...pieces].sort((a, b) => a.from - b.from);
  ordered.slice(1).forEach((piece, k) => {
    if (piece.from < ordered[k]!.to - 1e-12 && piece.from < piece.to) {
      const where: Path = [...path, 'mask', piece.i, 'from'];
      report.at(where, report.written(where), 'pieces of a mask do not overlap');
    }
  });
}

function conditionRules(report: RuleReport, path: Path, r: RequirementDocument): void {
  const { band, temperature } = r.condition ?? {};
  const here: Path = [...path, 'condition'];
  if (band)
    ascending(report, [...here, 'band'], si(band.low, 'frequency'), si(band.high, 'frequency'), ['low', 'high'], true);
  if (temperature) {
    const [low, high] = [si(temperature.low, 'temperature'), si(temperature.high, 'temperature')];
    ascending(report, [...here, 'temperature'], low, high, ['low', 'high'], true);
  }
}
