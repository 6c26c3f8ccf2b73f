/** How many rules of a kind a draft may hold; `schemas/draft.ts` refuses more. */
export const ruleLimits = {
	/** forbidden inks, pairs kept alike, pairs kept apart, and regions in one group, each */
	rules: 100_000,
	groups: 10_000,
	groupName: 200,
	reserved: 64,
	/** highest number of an ink, from 0 */
	ink: 255,
	weight: 1e9,
} as const;
