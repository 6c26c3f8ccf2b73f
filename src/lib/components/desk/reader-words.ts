import type { Reader } from '$lib/engines/palettes/palette';

/** How each reader is named: in a switch, in full, and in a sentence about what they see. */
export const readerWords: Record<Reader, { short: string; long: string; seen: string }> = {
	typical: {
		short: 'typical',
		long: 'Typical colour vision',
		seen: 'as a typical reader sees it',
	},
	protan: {
		short: 'protan',
		long: 'Protan: red is seen weakly or not at all',
		seen: 'as a protan reader sees it',
	},
	deutan: {
		short: 'deutan',
		long: 'Deutan: green is seen weakly or not at all',
		seen: 'as a deutan reader sees it',
	},
	tritan: {
		short: 'tritan',
		long: 'Tritan: blue is seen weakly or not at all',
		seen: 'as a tritan reader sees it',
	},
	grey: {
		short: 'grey print',
		long: 'Printed or copied in grey',
		seen: 'as it looks in grey print',
	},
};
