/** Said wherever the first picture of a large sheet is on show. */
export const firstWords = 'Until then a coarse picture of it as it was saved, without names.';
