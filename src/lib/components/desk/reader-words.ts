import type { Reader } from '$lib/engines/palettes/palette';

/** How each reader is named, in a switch and in a sentence. */
export const readerWords: Record<Reader, { short: string; long: string }> = {
	typical: { short: 'typical', long: 'Typical colour vision' },
	protan: { short: 'protan', long: 'Protan: red is missing or weak' },
	deutan: { short: 'deutan', long: 'Deutan: green is missing or weak' },
	tritan: { short: 'tritan', long: 'Tritan: blue is missing or weak' },
	grey: { short: 'grey print', long: 'Printed or copied in grey' },
};
