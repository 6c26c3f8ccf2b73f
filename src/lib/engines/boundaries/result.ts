import type { BorderList } from '../borders/border-list.ts';
import type { Coverage } from '../geometry/coverage.ts';
import type { Cell } from './attribute-table.ts';
import type { Finding } from './finding.ts';
import type { Found, Question } from './question.ts';
import type { RefusalCode } from './refusal.ts';

export interface SourceNote {
	format: string;
	layer: string | null;
	crs: string;
	encoding: string;
	/** features in the file, those without area included */
	features: number;
	toleranceMetres: number;
}

/** What became of a boundary file. Attribute rows stand in the order of the regions. */
export type BoundariesResult =
	| {
			status: 'accepted';
			coverage: Coverage;
			borders: BorderList;
			attributes: { columns: string[]; rows: Cell[][] };
			findings: Finding[];
			source: SourceNote;
			/** what was recognised, with the other layers and columns that could have been taken */
			found: Found;
	  }
	| {
			status: 'refused';
			code: RefusalCode;
			message: string;
			findings: Finding[];
			/** when an answer would let the file be read */
			question: Question | null;
	  }
	| { status: 'cancelled' };
