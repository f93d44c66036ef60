import { DIMENSIONS, fromBase, unitNamed } from '../quantity/index.js';
import type { RequirementDocument, RequirementsDocument } from './documents/requirement-document.js';
import { si } from './figures.js';
import type { Requirement, RequirementSet } from './model.js';
import { REQUIREMENT_QUANTITIES } from './requirement-quantities.js';
import { declaredLimit } from './requirement-rules.js';

/** A checked requirement set as the model holds it; limits in the unit that `REQUIREMENT_QUANTITIES` names. */
export function requirementsOf(doc: RequirementsDocument, file: string): RequirementSet {
  return {
    id: doc.id,
    title: doc.title,
    file,
    invented: doc.invented,
    requirements: doc.requirements.map(requirementOf),
  };
}

function limitOf(doc: RequirementDocument): Pick<Requirement, 'limit' | 'unit'> {
  if (!doc.limit) return {};
  const direction = doc.limit.at_least === undefined ? 'at_most' : 'at_least';
  const written = doc.limit[direction]!;
  const rule = REQUIREMENT_QUANTITIES[doc.quantity].limit;
  if (rule === undefined) {
    const declared = declaredLimit(written);
    if (!declared) throw new Error(`unchecked limit of ${doc.id} reached the model`);
    return { limit: { direction, value: declared.value }, ...(declared.unit ? { unit: declared.unit } : {}) };
  }
  const base = si(written, rule.dimension);
  const unit = DIMENSIONS[rule.dimension].bareNumber ? undefined : unitNamed(rule.dimension, rule.unit);
  // Twelve digits: 29.999999999999996 deg was written as 30 deg.
  return { limit: { direction, value: unit ? Number(fromBase(base, unit).toPrecision(12)) : base } };
}

function requirementOf(doc: RequirementDocument): Requirement {
  const { band, temperature } = doc.condition ?? {};
  return {
    id: doc.id,
    text: doc.text,
    quantity: doc.quantity,
    ...(doc.cut ? { cut: doc.cut } : {}),
    ...(doc.between ? { between: [doc.between[0]!, doc.between[1]!] as const } : {}),
    ...limitOf(doc),
    ...(doc.mask
      ? {
          mask: doc.mask.map(({ from, to, level }) => ({
            from: si(from, 'angle'),
            to: si(to, 'angle'),
            levelDb: si(level, 'level'),
          })),
        }
      : {}),
    ...(doc.property ? { property: doc.property } : {}),
    ...(doc.allowed ? { allowed: doc.allowed } : {}),
    condition: {
      ...(band ? { band: { low: si(band.low, 'frequency'), high: si(band.high, 'frequency') } } : {}),
      ...(temperature
        ? { temperature: { lowC: si(temperature.low, 'temperature'), highC: si(temperature.high, 'temperature') } }
        : {}),
    },
    weight: doc.weight,
    source: doc.source,
    verification: doc.verification,
    ...(doc.test_method ? { testMethod: doc.test_method } : {}),
  };
}
