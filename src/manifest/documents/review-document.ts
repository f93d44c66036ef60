import { z } from 'zod';
import { date, id, revision, text } from './fields.js';

const decision = z
  .strictObject({
    board: id('Id of the chosen board, or none.'),
    statement: text('The decision in words.'),
    reason: text('Why.'),
    date: date('Day of the decision.'),
    by: text('Who decided; a role may stand for a name.'),
  })
  .describe('The decision of the review. Left out as long as there is none.');

const openPoint = z
  .strictObject({
    id: id('Name of the point.'),
    text: text('What is open.'),
    owner: text('Who sees to it; a role may stand for a name.'),
    due: date('Day by which it is to be settled.'),
    status: z.enum(['open', 'in_work', 'closed']).describe('Where it stands.'),
  })
  .describe('One open point.');

const concession = z
  .strictObject({
    number: text('Number of the concession.'),
    board: id('Board it is for.'),
    requirement: id('Requirement that the board misses. The status stays misses.'),
    text: text('What is conceded, and under which condition.'),
    approver: text('Who granted it; a role may stand for a name.'),
    granted: date('Day on which it was granted.'),
    expiry: date('Last day on which it holds.'),
  })
  .describe('One concession.');

const approval = z
  .strictObject({
    role: text('Role of the signatory.'),
    name: text('Name of the signatory, where it is to be printed.').optional(),
    organisation: text('Organisation of the signatory.'),
    date: date('Day of a signature already given; left out where it is still to be signed.').optional(),
    attests: text('What the signature attests.'),
  })
  .describe('One signature.');

const change = z
  .strictObject({
    revision: revision('Revision, in quotes when it is a number.'),
    date: date('Date of issue of that revision.'),
    author: text('Who wrote it; a role may stand for a name.'),
    change: text('What changed.'),
  })
  .describe('One revision.');

/** What people decided about a pack, beside what was calculated. */
export const reviewDocument = z
  .strictObject({
    decision: decision.optional(),
    open_points: z.array(openPoint).max(200).describe('What is still open.').optional(),
    concessions: z
      .array(concession)
      .max(200)
      .describe('Concessions for requirements that a board misses. None changes a verdict.')
      .optional(),
    approvals: z.array(approval).max(30).describe('Who signs the pack, in the order of the signing table.').optional(),
    revisions: z
      .array(change)
      .min(1)
      .max(200)
      .describe('Table of revisions, oldest first; the last is the revision of the pack.')
      .optional(),
  })
  .describe('Review of a pack: decision, open points, concessions, approvals and revisions.');

export type ReviewDocument = z.infer<typeof reviewDocument>;
