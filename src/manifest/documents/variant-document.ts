import { variantOf } from '../variant.js';
import { boardDocument } from './board-document.js';

/** A board that inherits from another: every key optional, an empty one drops the inherited key. */
export const variantDocument = variantOf(boardDocument.required({ based_on: true }), ['id', 'title', 'based_on']);
