export { type IndexEntry, renderIndex } from './index-page.js';
export { renderPack } from './pack.js';
export { styleSheet } from './style.js';
export { renderSupplierPage } from './supplier-page.js';
