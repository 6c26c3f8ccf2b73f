/** Said wherever the first picture of a large sheet is on show. */
export const firstWords =
	'Until then this is a coarse picture of it as it was saved, without names and hatches.';
