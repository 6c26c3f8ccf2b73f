import type { Generated, JSONColumnType } from 'kysely';
import type { Gain, OpenQuestion } from '../../engines/colouring/open-question.ts';
import type { SearchState } from '../../schemas/search.ts';
import type { Moment, OptionalMoment } from './columns.ts';

/** Row type of longer searches for what a colouring leaves open. */
export interface SearchTable {
	id: Generated<string>;
	team_id: string;
	sheet_id: string;
	number: number;
	state: SearchState;
	question: OpenQuestion;
	/** so many times the steps of a thorough search */
	times: number;
	/** the draft it is about */
	revision: number;
	/** of what that draft asks: another revision may ask the same */
	problem_digest: string;
	step: Generated<string>;
	share: Generated<number>;
	attempts: Generated<number>;
	claim: string | null;
	heard_at: OptionalMoment;
	gain: Gain | null;
	/** what was found, where that is better than what was known */
	result: JSONColumnType<Record<string, unknown>> | null;
	/** what came of it */
	sentence: Generated<string>;
	/** the revision that carries what was found */
	stored_revision: number | null;
	created_by: string | null;
	created_at: Moment;
	updated_at: Moment;
}
