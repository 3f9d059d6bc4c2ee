// What other features may use of the catalogue.
export { currentBook } from './book';
export { importCatalogue } from './import';
export { findFamily, findVariant } from './queries';
