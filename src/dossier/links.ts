import type { Inline } from './document.js';

/** Page and anchor ids are built from ids of boards and requirements, which the manifest reader holds to this form. */
const SLUG = /^[a-z0-9]+(-[a-z0-9]+)*$/;

/** @throws RangeError when an id could not be part of a page name: a fault of the program, not of the pack */
export function slug(id: string): string {
  if (!SLUG.test(id)) throw new RangeError(`id ${JSON.stringify(id)} is not lower-case letters, digits and hyphens`);
  return id;
}

export const OVERVIEW = 'overview';
export const EVIDENCE = 'evidence';
export const DEFINITIONS = 'definitions';
export const boardPage = (boardId: string): string => `board/${slug(boardId)}`;
export const requirementPage = (requirementId: string): string => `requirement/${slug(requirementId)}`;

/** A board in headings, tables and navigation: titles may speak of other boards by their ids. */
export const boardTitle = (board: { readonly id: string; readonly title: string }): string =>
  `${board.id}: ${board.title}`;

export const link = (text: string, page: string, anchor?: string): Inline =>
  anchor === undefined ? { text, page } : { text, page, anchor };
