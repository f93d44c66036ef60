import type { QuantityName, Requirement, RequirementSet } from '../manifest/model.js';
import type { BoardStudy } from '../study/results.js';
import { type BoardStatus, overallOf } from './board-status.js';
import { decide, type RequirementStatus } from './decision.js';
import { judgeDeclared } from './declared.js';
import { limitOf, marginOf, quantityOf } from './quantities.js';
import { type SideWorst, uncertaintyOf } from './uncertainty.js';
import type { UncertaintyPart } from './uncertainty-part.js';
import { type Place, worstValue } from './worst.js';

export interface RequirementVerdict {
  readonly requirementId: string;
  readonly quantity: QuantityName;
  /** Unit of value, limit, margin and uncertainty; for declared properties as declared. */
  readonly unit: string;
  readonly weight: Requirement['weight'];
  readonly verification: Requirement['verification'];
  readonly status: RequirementStatus;
  /** What the calculation alone would say, where the status is `open until measured`. */
  readonly calculated?: 'meets' | 'undecided' | 'misses' | 'not evaluated';
  /** Worst value over the condition; text for declared text. */
  readonly value?: number | string;
  readonly where?: Place;
  /** Which part of the board declares a declared property. */
  readonly part?: string;
  readonly limit?: { readonly direction: 'at_least' | 'at_most'; readonly value: number };
  /** Distance to the limit, positive inside. */
  readonly margin?: number;
  readonly parts: readonly UncertaintyPart[];
  /** Worst value under each estimate of the roughness band. */
  readonly sides: readonly SideWorst[];
  /**
   * How far the margin may be smaller, and larger, all parts together; 0 for declared properties. One of them may be negative
   * where a named roughness model puts the nominal margin outside the band.
   */
  readonly adverse?: number;
  readonly favourable?: number;
  /** Why it is not evaluated. */
  readonly reason?: string;
}

export interface BoardVerdict {
  readonly boardId: string;
  readonly overall: BoardStatus;
  /** One sentence: why the board stands so. */
  readonly reason: string;
  /** In the order of the requirement set. */
  readonly requirements: readonly RequirementVerdict[];
}

type Calculated = Omit<RequirementVerdict, 'requirementId' | 'quantity' | 'weight' | 'verification' | 'status'> & {
  readonly status: 'meets' | 'undecided' | 'misses' | 'not evaluated';
};

const NO_NUMBERS = { parts: [], sides: [] } as const;

function calculate(study: BoardStudy, requirement: Requirement): Calculated {
  const { unit } = quantityOf(requirement.quantity);
  const refused = study.notEvaluated.filter((entry) => entry.quantities.includes(requirement.quantity));
  if (refused.length > 0) {
    return { ...NO_NUMBERS, unit, status: 'not evaluated', reason: refused.map((entry) => entry.reason).join('; ') };
  }
  if (requirement.quantity === 'declared') {
    const { unit: declaredUnit = '', ...verdict } = judgeDeclared(requirement, study.board);
    const sure = verdict.margin === undefined ? {} : { adverse: 0, favourable: 0 };
    return { ...NO_NUMBERS, ...verdict, ...sure, unit: declaredUnit, limit: requirement.limit };
  }
  const limit = limitOf(requirement);
  const nominal = worstValue(study.nominal, requirement, study.board);
  if ('notEvaluated' in nominal) {
    return { ...NO_NUMBERS, unit, limit, status: 'not evaluated', reason: nominal.notEvaluated };
  }
  const margin = marginOf(limit, nominal.value);
  const found = { unit, limit, value: nominal.value, where: nominal.where, margin };
  const uncertainty = uncertaintyOf(study, requirement, nominal);
  if ('notEvaluated' in uncertainty) {
    return { ...NO_NUMBERS, ...found, status: 'not evaluated', reason: uncertainty.notEvaluated };
  }
  const { parts, sides, lower, upper } = uncertainty;
  return {
    ...found,
    parts,
    sides,
    adverse: margin - lower,
    favourable: upper - margin,
    status: decide({ lower, upper }),
  };
}

/** Judges one requirement on one board. What only a test decides stays open, with the calculated figures beside it. */
export function judgeRequirement(study: BoardStudy, requirement: Requirement): RequirementVerdict {
  const { status, ...rest } = calculate(study, requirement);
  const { id: requirementId, quantity, weight, verification } = requirement;
  const head = { requirementId, quantity, weight, verification };
  if (verification === 'test') return { ...head, ...rest, status: 'open until measured', calculated: status };
  return { ...head, ...rest, status };
}

export function judgeBoard(study: BoardStudy, set: RequirementSet): BoardVerdict {
  const requirements = set.requirements.map((requirement) => judgeRequirement(study, requirement));
  return { boardId: study.board.id, ...overallOf(requirements), requirements };
}

/** Verdicts in the order of the studies. */
export const judgePack = (studies: readonly BoardStudy[], set: RequirementSet): readonly BoardVerdict[] =>
  studies.map((study) => judgeBoard(study, set));
