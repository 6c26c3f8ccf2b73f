import { firstWishes } from '../../engines/territories/territory-draft.ts';
import type { Row } from '../database/schema.ts';
import { dataParts, digestOfParts, whatChanged, type DataParts } from './proposal-data.ts';
import type { TerritoryState } from './territory-state.ts';

/** What a list stands on: boundaries, territories and every measure whose figures it shows. */
export function partsNow({ sheet, document, ground }: TerritoryState, ids: string[]): DataParts {
	const tolerances = Object.fromEntries(ids.map((id) => [id, 0]));
	return dataParts(sheet.boundary_set_id, document, ground, { ...firstWishes, tolerances });
}

export const measureIds = ({ ground }: TerritoryState): string[] =>
	ground.measures.map(({ id }) => id);

/** Both forms in which a list keeps what it stands on. */
export const keptData = (parts: DataParts) => ({
	data_digest: digestOfParts(parts),
	data_parts: JSON.stringify(parts),
});

/**
 * What has changed since a list was made or last confirmed, in one sentence; null for nothing. An approved
 * or withdrawn list is past: it goes by what held when it was closed.
 */
export function staleSentence(
	handover: Pick<Row<'handovers'>, 'state' | 'data_digest' | 'data_parts'>,
	now: TerritoryState,
): string | null {
	if (handover.state === 'withdrawn') return null;
	const was = handover.data_parts as unknown as DataParts;
	const parts = partsNow(now, Object.keys(was.measures));
	if (digestOfParts(parts) === handover.data_digest) return null;
	return whatChanged(was, parts) ?? 'What it was made from has changed since.';
}
