import { createHash } from 'node:crypto';
import { canonicalJson } from '../../engines/editions/index.ts';
import type { TerritoryGround } from '../../engines/territories/problem-of-draft.ts';
import type { TerritoryDraft, Wishes } from '../../engines/territories/territory-draft.ts';

/** Digests of everything a proposal is computed from, kept apart so that it can be told what changed. */
export interface DataParts {
	/** id of the boundary set, which never changes */
	boundaries: string;
	/** territories, assignment, locks and links; not names, people or addresses */
	territories: string;
	/** of each measure that the wishes name, by id */
	measures: Record<string, string>;
}

export function dataParts(
	boundarySetId: string,
	document: TerritoryDraft,
	{ measures }: Pick<TerritoryGround, 'measures'>,
	wishes: Wishes,
): DataParts {
	const wished = new Set([...Object.keys(wishes.tolerances), wishes.cost]);
	return {
		boundaries: boundarySetId,
		territories: digest(canonicalJson(whatBinds(document))),
		measures: Object.fromEntries(
			measures
				.filter(({ id }) => wished.has(id))
				.map(({ id, values }) => [id, digest(JSON.stringify(values))]),
		),
	};
}

const whatBinds = ({ territories, wishes: _, locks, ...rest }: TerritoryDraft) => ({
	...rest,
	locks: Object.fromEntries(Object.entries(locks).map(([key, { territory }]) => [key, territory])),
	territories: territories.map(({ key, base, capacity, frozen, closing }) => ({
		...{ key, base, capacity, frozen, closing },
	})),
});

/** One digest over all of it, as `data_digest` keeps it. */
export const digestOfParts = (parts: DataParts): string => digest(canonicalJson(parts));

const digest = (text: string) => createHash('sha256').update(text).digest('hex');

/** What differs between then and now, in one sentence; null while nothing does. */
export function whatChanged(was: DataParts, now: DataParts): string | null {
	if (was.boundaries !== now.boundaries) return 'The boundaries have been replaced since.';
	if (was.territories !== now.territories) return 'The territories have been changed since.';
	const ids = Object.keys(was.measures);
	if (ids.some((id) => !Object.hasOwn(now.measures, id))) {
		return 'A measure it was computed from is gone.';
	}
	if (ids.some((id) => was.measures[id] !== now.measures[id])) {
		return 'Figures it was computed from have changed since.';
	}
	return null;
}
