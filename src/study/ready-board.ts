/** A board as it is to be studied: what its manifest leaves to be worked out is worked out once, before anything else. */
import type { Analysis, Board } from '../manifest/model.js';
import { retuneBoard } from './retune.js';
import { sizeBoard } from './size-board.js';

export const asksToBeReadied = ({ retune, sizedFor }: Board): boolean => retune !== undefined || sizedFor !== undefined;

export const readyBoard = (board: Board, analysis: Analysis): Board =>
  retuneBoard(sizeBoard(board, analysis), analysis);
