import type { Row } from '../database/schema.ts';
import { findSheetById } from '../repositories/sheets.repository.ts';
import { boundaryView } from '../services/boundary-view.ts';
import { documentOf, draftOf, inksBefore } from '../services/draft.service.ts';
import { storedResult } from '../services/outcome-of-colouring.ts';
import { failSearch, keepSearch } from '../services/search-end.service.ts';
import { Hopeless, runClaimed, wakeSilent, type ClaimedJob } from './claimed-job.ts';
import type { SearchInput, SearchOutcome } from './search.work.ts';
import type { Progress } from './tasks.ts';
import type { Workshop } from './workshop.ts';

/** Searches longer for what one colouring leaves open, in a thread, and stores what came of it. */
export const runSearch = (
	shop: Workshop,
	searchId: string,
	shutdown: AbortSignal,
	effort: SearchInput['effort'] = 'thorough',
) => runClaimed(shop, searchJob(shop, effort), searchId, shutdown);

/** Takes up again every search that was left lying. */
export const wakeSilentSearches = (shop: Workshop) =>
	wakeSilent(shop, 'searches', (searchId) => shop.queue.send(shop.db, 'search', { searchId }));

type Worked = SearchOutcome | { gone: string };

const searchJob = (
	shop: Workshop,
	effort: SearchInput['effort'],
): ClaimedJob<'searches', Worked> => ({
	table: 'searches',
	work: (row, signal, progress) => work(shop, row, effort, signal, progress),
	settle: (claim, worked) =>
		'gone' in worked ? failSearch(shop, claim, worked.gone) : keepSearch(shop, claim, worked),
	fail: (claim, message) => failSearch(shop, claim, message),
	words: {
		firstStep: 'Making the problem',
		stopped: (times) => `It was tried ${times} times and the worker stopped each time.`,
		outOfMemory: 'The search took more memory than one worker may use.',
		fault: 'It could not be worked out because of a fault here. Nothing was changed.',
	},
});

async function work(
	shop: Workshop,
	row: Row<'searches'>,
	effort: SearchInput['effort'],
	signal: AbortSignal,
	progress: (progress: Progress) => void,
): Promise<Worked> {
	const sheet = await findSheetById(shop.db, row.sheet_id);
	const draft = sheet && (await draftOf(shop.db, sheet.id, row.revision));
	const known = draft && storedResult(draft);
	if (!draft || !known) return { gone: 'The colouring it was asked about is not there any more.' };
	const { keys, borders } = await boundaryView(shop.db, draft.boundary_set_id);
	const shown = await inksBefore(shop.db, row.sheet_id, draft);
	const fitting = shown?.length === keys.length ? shown : null;
	const input: SearchInput = {
		...{ keys, borders, draft: documentOf(draft), known, shown: fitting },
		...{ effort, times: row.times },
	};
	// searches leave the threads alone in which people's files are read
	const outcome = await shop.checks.run('searchLonger', input, { signal, progress });
	if (outcome.faults.length > 0) {
		throw new Hopeless(`the checker refused: ${outcome.faults.join(' ')}`);
	}
	return outcome;
}
