import type { Question } from '$lib/engines/boundaries/question';
import type { RememberedAnswer } from '$lib/schemas/desk';

export const aboutWords: Record<RememberedAnswer['about'], string> = {
	layer: 'Layer',
	crs: 'Reference system',
	axes: 'Order of coordinates',
	keys: 'Keys',
	columns: 'Columns',
};

/** The field for an answer that is not among the choices. */
export const typedField: Record<Question['about'], { label: string; hint: string }> = {
	crs: {
		label: 'Another reference system',
		hint: 'An EPSG code such as EPSG:25832, or the text of a .prj file.',
	},
	keys: { label: 'Another column for the key', hint: 'Its name as it stands in the file.' },
	layer: { label: 'Another layer', hint: 'Its name as it stands in the file.' },
	axes: { label: 'Another order', hint: '' },
};
