import type { Finding } from './finding.ts';
import type { Question } from './question.ts';

/** Codes by which a file is refused; see the API description. */
export type RefusalCode =
	| 'crs-missing'
	| 'axes-swapped'
	| 'file-truncated'
	| 'not-json'
	| 'not-geojson'
	| 'file-damaged'
	| 'empty-file'
	| 'bad-coordinate'
	| 'too-large-unpacked'
	| 'zip-damaged'
	| 'bad-arc'
	| 'layer-needed'
	| 'duplicate-keys'
	| 'no-areas'
	| 'unsupported-format';

/** Ends the reading of a file from any depth; `readBoundaries` turns it into a refused result. */
export class Refusal extends Error {
	constructor(
		readonly code: RefusalCode,
		message: string,
		readonly findings: Finding[] = [],
		/** when an answer would let the file be read */
		readonly question: Question | null = null,
	) {
		super(message);
	}
}

/** Ends the reading because the caller asked for it. */
export class Cancelled extends Error {}
