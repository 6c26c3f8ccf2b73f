import { z } from 'zod';
import { beginSearch, searchStates } from '../search.ts';
import { moment } from './common.ts';
import type { Operation } from './operations.ts';

const path = '/sheets/{sheet}/searches';

const gains = [
	...(['fewer-inks', 'proof', 'higher-bound', 'answer'] as const),
	...(['cheaper-release', 'release-proved', 'release-bound'] as const),
] as const;

const search = z.strictObject({
	number: z.int(),
	state: z
		.enum(searchStates)
		.describe('stored: as a new revision; kept: found, but the rules have changed since'),
	question: z.enum(['inks', 'answer', 'release']),
	times: z.int(),
	revision: z.int().describe('the draft it is about'),
	step: z.string().describe('what is known so far'),
	share: z.number(),
	gain: z.enum(gains).nullable(),
	sentence: z.string().describe('what came of it'),
	storedRevision: z.int().nullable(),
	createdAt: moment,
	createdBy: z.string().nullable(),
	updatedAt: moment,
});

/** The routes by which a colouring is tried longer. */
export const searchOperations = {
	listSearches: {
		...{ method: 'GET', path, scope: 'sheets:read', status: 200 },
		summary: 'Longer tries for what the colouring leaves open, the newest first.',
		answer: z.strictObject({ searches: z.array(search) }),
	},
	beginSearch: {
		...{ method: 'POST', path, scope: 'sheets:write', status: 202 },
		summary: 'Try longer: for fewer inks, a proof, an answer, or a cheaper release of locks.',
		...{ json: beginSearch, answer: z.strictObject({ number: z.int() }) },
		refusals: [409, 413, 415, 422],
	},
} satisfies Record<string, Operation>;
