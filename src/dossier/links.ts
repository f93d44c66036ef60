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
export const OFFERS = 'offers';
/** The document of the whole pack, which is on paper only. */
export const PACK = 'pack';
export const boardPage = (boardId: string): string => `board/${slug(boardId)}`;
export const requirementPage = (requirementId: string): string => `requirement/${slug(requirementId)}`;

/** Ids have single hyphens, so that two of them around a double one are told apart. */
export const comparePage = (first: string, second: string): string => `compare/${slug(first)}--${slug(second)}`;

/** Files of a revision, below its folder. */
export const PACK_DATA = 'data/pack.json';
export const PACK_PDF = 'pdf/pack.pdf';
export const boardPdf = (boardId: string): string => `pdf/${slug(boardId)}.pdf`;
export const boardData = (boardId: string): string => `data/board-${slug(boardId)}.json`;
/** What is added to the document number of the pack for the dossier of a board. */
export const boardSuffix = (boardId: string): string => slug(boardId).toUpperCase();

/** A board in headings, tables and navigation: titles may speak of other boards by their ids. */
export const boardTitle = (board: { readonly id: string; readonly title: string }): string =>
  `${board.id}: ${board.title}`;

export const fileLink = (text: string, file: string): Inline => ({ text, file });

export const link = (text: string, page: string, anchor?: string): Inline =>
  anchor === undefined ? { text, page } : { text, page, anchor };
