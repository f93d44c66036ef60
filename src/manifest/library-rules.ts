import type { z } from 'zod';
import { uniqueDeclared } from './board-rules.js';
import type { finishesDocument, foilsDocument, laminatesDocument } from './documents/library-documents.js';
import type { Problem } from './problem.js';
import { RuleReport } from './rules.js';
import { textureRules } from './texture-rules.js';
import type { Node } from './tree.js';

export function laminateRules(root: Node, doc: z.infer<typeof laminatesDocument>): readonly Problem[] {
  const report = new RuleReport(root);
  doc.laminates.forEach(({ permittivity, water, declared }, i) => {
    const path = ['laminates', i, 'permittivity'];
    if (permittivity.kind === 'design' && !permittivity.fitted_on) {
      const allowed = 'a design value names the foil and the thickness on which it was fitted';
      report.at(
        [...path, 'fitted_on'],
        'no key "fitted_on"',
        allowed,
        'Write fitted_on: { foil: ..., thickness: ... }.',
      );
    }
    if (permittivity.kind === 'bulk' && permittivity.fitted_on) {
      report.atKey(
        [...path, 'fitted_on'],
        'fitted_on with kind bulk',
        'a bulk value is that of the dielectric alone',
        'Write kind: design, or remove fitted_on.',
      );
    }
    if (water && water.permittivity_per_share === undefined && water.loss_tangent_per_share === undefined) {
      report.at(
        ['laminates', i, 'water'],
        'water that changes nothing',
        'permittivity_per_share, loss_tangent_per_share or both are needed',
      );
    }
    uniqueDeclared(report, declared ?? [], ['laminates', i]);
  });
  return report.problems;
}

export function foilRules(root: Node, doc: z.infer<typeof foilsDocument>): readonly Problem[] {
  const report = new RuleReport(root);
  doc.foils.forEach((foil, i) => {
    textureRules(report, ['foils', i, 'treated_face'], foil.treated_face);
    textureRules(report, ['foils', i, 'untreated_face'], foil.untreated_face);
    uniqueDeclared(report, foil.declared ?? [], ['foils', i]);
  });
  return report.problems;
}

export function finishRules(root: Node, doc: z.infer<typeof finishesDocument>): readonly Problem[] {
  const report = new RuleReport(root);
  doc.finishes.forEach((finish, i) => {
    uniqueDeclared(report, finish.declared ?? [], ['finishes', i]);
  });
  return report.problems;
}
